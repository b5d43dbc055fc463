import { type Face, textWidth } from './text-width'

export interface Box {
  readonly x: number
  readonly y: number
  readonly w: number
  readonly h: number
}

export interface Spot {
  readonly x: number
  /** Baseline. */
  readonly y: number
  readonly anchor: 'start' | 'middle' | 'end'
}

/** A label that wants to stand somewhere, its favourite place first. */
export interface Wish<T> {
  readonly of: T
  readonly text: string
  /** Said instead where there is no room for the whole text. */
  readonly shorter?: string
  readonly size: number
  readonly face: Face
  /** The higher, the earlier it chooses: how far out the mark stands. */
  readonly rank: number
  readonly spots: readonly Spot[]
}

export interface Surroundings {
  /** What no label may touch: notes, staffs, slurs. */
  readonly taken: readonly Box[]
  /** x of bar lines, and the heights between which they run. */
  readonly bars: readonly { readonly x: number; readonly y1: number; readonly y2: number }[]
  readonly within: Box
}

/** The box that letters fill: from the top of capitals to the foot of descenders. */
export function labelBox(text: string, size: number, face: Face, { x, y, anchor }: Spot): Box {
  const w = textWidth(text, size, face)
  const left = anchor === 'start' ? x : anchor === 'middle' ? x - w / 2 : x - w
  return { x: left, y: y - 0.74 * size, w, h: 0.96 * size }
}

export const boxesTouch = (a: Box, b: Box, apart = 0): boolean =>
  a.x < b.x + b.w + apart && b.x < a.x + a.w + apart && a.y < b.y + b.h + apart && b.y < a.y + a.h + apart

const isInside = (box: Box, outer: Box): boolean =>
  box.x >= outer.x &&
  box.x + box.w <= outer.x + outer.w &&
  box.y >= outer.y &&
  box.y + box.h <= outer.y + outer.h

/**
 * Finds a free spot for each label: the one whose mark stands further out chooses first; a label that finds none
 * is left out (its mark is read by the pointer). No label touches another, a mark or a bar line.
 */
export function placeLabels<T>(
  wishes: readonly Wish<T>[],
  { taken, bars, within }: Surroundings,
): { readonly of: T; readonly text: string; readonly spot: Spot }[] {
  const placed: { of: T; text: string; spot: Spot; box: Box }[] = []
  const isFree = (box: Box): boolean =>
    isInside(box, within) &&
    !taken.some((one) => boxesTouch(box, one, 1)) &&
    !placed.some((one) => boxesTouch(box, one.box, 3)) &&
    !bars.some(({ x, y1, y2 }) => boxesTouch(box, { x, y: y1, w: 0, h: y2 - y1 }, 2))
  for (const { of, text: whole, shorter, size, face, spots } of wishes.toSorted((a, b) => b.rank - a.rank))
    for (const text of shorter === undefined ? [whole] : [whole, shorter]) {
      const spot = spots.find((one) => isFree(labelBox(text, size, face, one)))
      if (!spot) continue
      placed.push({ of, text, spot, box: labelBox(text, size, face, spot) })
      break
    }
  return placed.map(({ of, text, spot }) => ({ of, text, spot }))
}

/** Moves values of one column apart until neighbours are `apart` px from each other, as little as possible. */
export function spreadColumn(heights: readonly number[], apart: number): number[] {
  const order = heights.map((_, index) => index).sort((a, b) => (heights[a] ?? 0) - (heights[b] ?? 0))
  const moved = [...heights]
  // Pool neighbours that overlap and centre each pool on the mean of what its members want.
  const pools: { members: number[]; centre: number }[] = []
  for (const index of order) {
    let pool = { members: [index], centre: heights[index] ?? 0 }
    for (let before = pools.at(-1); before; before = pools.at(-1)) {
      const reach = (before.members.length + pool.members.length) / 2
      if (pool.centre - before.centre >= reach * apart) break
      pools.pop()
      const members = [...before.members, ...pool.members]
      const offsets = members.map(
        (member, place) => (heights[member] ?? 0) - (place - (members.length - 1) / 2) * apart,
      )
      pool = { members, centre: offsets.reduce((sum, value) => sum + value, 0) / members.length }
    }
    pools.push(pool)
  }
  for (const { members, centre } of pools)
    members.forEach((member, place) => {
      moved[member] = centre + (place - (members.length - 1) / 2) * apart
    })
  return moved
}
