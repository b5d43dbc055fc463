import { lines, noteHead, openHead } from './marks'
import type { Drawing, Shape } from './shape'
import { fitSlur, slurOutline, slurPoint } from './slur'

export interface MiniStaffInput {
  readonly title: string
  /** The newest lots, oldest first; undefined is a gap. */
  readonly values: readonly (number | undefined)[]
  readonly centre?: number
  readonly sigma?: number
  readonly oneSided?: boolean
  readonly leftOut?: readonly number[]
  /** Indices of lots beyond their limits and whether someone has answered. */
  readonly beyond?: readonly { readonly index: number; readonly open: boolean }[]
  readonly runs?: readonly {
    readonly members: readonly number[]
    readonly side: 'above' | 'below'
    readonly open: boolean
  }[]
}

const [WIDTH, HEIGHT, MIDDLE] = [300, 46, 24]
/** px a σ; less where a slur would not find room within the picture otherwise. */
const spaces = [5, 4, 3, 2.4] as const
/** Notes further off than this many σ stand at the edge. */
const FOLLOWED = 3.8
const HEAD = { rx: 3.4, ry: 2.4 }

/** Without limits: the middle of the values, and a space that holds them. */
function scaleOf({ values, centre, sigma }: MiniStaffInput): {
  readonly middle: number
  readonly space: number
} {
  const known = values.filter((value): value is number => value !== undefined && Number.isFinite(value))
  const [low, high] = [Math.min(...known), Math.max(...known)]
  const middle = centre ?? (known.length > 0 ? (low + high) / 2 : 0)
  if (sigma !== undefined && sigma > 0 && Number.isFinite(sigma)) return { middle, space: sigma }
  const extent = Math.max(0, ...known.map((value) => Math.abs(value - middle)))
  return { middle, space: extent > 0 ? extent / 3 : 1 }
}

/** The staff of one characteristic in little, without words: 300 × 46 px, five px a σ where slurs leave room. */
export function miniStaff(input: MiniStaffInput): Drawing {
  let picture = drawn(input, spaces[0])
  for (const smaller of spaces.slice(1)) {
    if (picture.top >= 1 && picture.bottom <= HEIGHT - 1) break
    picture = drawn(input, smaller)
  }
  return picture.drawing
}

/** The picture at a scale, and how far its slurs reach. */
function drawn(
  input: MiniStaffInput,
  perSigma: number,
): { readonly drawing: Drawing; readonly top: number; readonly bottom: number } {
  const { values, sigma, oneSided = false, leftOut = [], beyond = [], runs = [] } = input
  const { middle, space } = scaleOf(input)
  const step = values.length > 1 ? Math.min(16, (WIDTH - 12) / (values.length - 1)) : 0
  const yOf = (value: number): number =>
    MIDDLE - Math.min(FOLLOWED, Math.max(-FOLLOWED, (value - middle) / space)) * perSigma
  const points = values.flatMap((value, index) =>
    value === undefined || !Number.isFinite(value) ? [] : [{ index, x: 6 + index * step, y: yOf(value) }],
  )
  const hasLimits = sigma !== undefined && sigma > 0
  const row = (y: number): readonly [number, number, number, number] => [0, y, WIDTH, y]
  const inner = (oneSided ? [0, 1, 2] : [-2, -1, 0, 1, 2]).map((one) => row(MIDDLE - one * perSigma))
  const limits = (oneSided ? [3] : [3, -3]).map((one) => row(MIDDLE - one * perSigma))
  const heights = [MIDDLE]
  const slurs = runs.flatMap(({ members, side, open }): Shape[] => {
    const within = points.filter(({ index }) => index >= (members[0] ?? 0) && index <= (members.at(-1) ?? -1))
    // Half the size of a full staff: half the clearance, by fitting at double size.
    const curve = fitSlur(
      within.map(({ x, y }) => [x * 2, y * 2] as const),
      side === 'above' ? -1 : 1,
    )
    if (!curve) return []
    for (let part = 0; part <= 24; part += 1) heights.push(slurPoint(curve, part / 24)[1] / 2)
    const ink = open ? 'vermilion' : 'slate'
    const half = slurOutline(curve).map(halved)
    return [
      {
        kind: 'path',
        segments: half,
        fill: ink,
        stroke: ink,
        width: 0.6,
        role: { mark: 'slur', state: open ? 'open' : 'answered' },
      },
    ]
  })
  const out = new Map(beyond.map(({ index, open }) => [index, open]))
  const notes = points.flatMap(({ index, x, y }): Shape[] => {
    const ink = out.get(index) ? 'vermilion' : 'ink'
    return [
      ...(out.has(index) ? [lines([[x - 6, y, x + 6, y]], { stroke: ink }, { mark: 'ledger-line' })] : []),
      leftOut.includes(index)
        ? openHead(x, y, ink, { rx: 3, ry: 2.1 }, { mark: 'note', state: 'left-out' }, 1)
        : noteHead(x, y, ink, HEAD, { mark: 'note' }),
    ]
  })
  const drawing: Drawing = {
    width: WIDTH,
    height: HEIGHT,
    label: `${input.title}: ${points.length} lots${hasLimits ? '' : ', no limits yet'}`,
    shapes: [
      ...(hasLimits
        ? [lines(inner, { stroke: 'staff', width: 0.7 }), lines(limits, { stroke: 'ink', width: 1.2 })]
        : [lines([row(MIDDLE)], { stroke: 'staff', width: 0.7, dash: [2, 4] })]),
      ...slurs,
      ...notes,
    ],
  }
  return { drawing, top: Math.min(...heights), bottom: Math.max(...heights) }
}

const halved = (segment: ReturnType<typeof slurOutline>[number]): ReturnType<typeof slurOutline>[number] => {
  switch (segment[0]) {
    case 'Z':
      return segment
    case 'C':
      return [
        'C',
        segment[1] / 2,
        segment[2] / 2,
        segment[3] / 2,
        segment[4] / 2,
        segment[5] / 2,
        segment[6] / 2,
      ]
    default:
      return [segment[0], segment[1] / 2, segment[2] / 2]
  }
}
