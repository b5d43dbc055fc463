import { formatNumber } from '../units/format'
import { hatchRect } from './hatch'
import { lines, polyline, words } from './marks'
import { niceTicks } from './nice-ticks'
import type { Drawing, Shape } from './shape'

export interface TensionCurve {
  readonly label: string
  /** Tension at each pitch, in the drawing's unit; pitches in semitones, rising. */
  readonly points: readonly { readonly semitone: number; readonly tension: number }[]
}

export interface TensionCurvesInput {
  readonly unit: string
  readonly decimal?: 'point' | 'comma'
  /** The longest first, as in the legend. */
  readonly curves: readonly TensionCurve[]
  readonly pitches: readonly { readonly semitone: number; readonly label: string }[]
  readonly breaking?: number
  /** Tensions between which the string works, and up to which it is offered with agreement. */
  readonly working?: { readonly from: number; readonly to: number; readonly upper: number }
}

const [WIDTH, HEIGHT] = [400, 262]
const PLOT = { x: 34, y: 14, w: 358, h: 226 }
const dashes = [[7, 3], undefined, [2, 2.5], [10, 3, 2, 3], [4, 2]] as const

/** The part of a curve up to the height of the plot; the last stretch is cut where it leaves. */
function below(points: readonly (readonly [number, number])[], top: number): [number, number][] {
  const kept: [number, number][] = []
  for (const [x, y] of points) {
    const last = kept.at(-1)
    if (y >= top) {
      kept.push([x, y])
      continue
    }
    if (last && last[1] > top) kept.push([last[0] + ((x - last[0]) * (last[1] - top)) / (last[1] - y), top])
    break
  }
  return kept
}

/** Tension against pitch for several lengths, with working zone, upper zone and breaking line; black on white. */
export function tensionCurves(input: TensionCurvesInput): Drawing {
  const { curves, pitches, breaking, working } = input
  const all = curves.flatMap(({ points }) => points)
  const semitones = all.map(({ semitone }) => semitone)
  const [low, high] = [Math.min(...semitones), Math.max(...semitones)]
  const most = Math.max(0, ...all.map(({ tension }) => tension))
  const top = (breaking !== undefined && breaking <= most * 1.6 ? breaking : most) * 1.08 || 1
  const xAt = (semitone: number): number =>
    PLOT.x + (high > low ? (semitone - low) / (high - low) : 0.5) * PLOT.w
  const yAt = (tension: number): number => PLOT.y + PLOT.h * (1 - tension / top)
  const clampY = (tension: number): number => yAt(Math.min(top, Math.max(0, tension)))
  const ticks = niceTicks(0, top, 4)
  const small = { size: 9.5 as const }
  const zone = (from: number, to: number) => ({
    x: PLOT.x,
    y: clampY(to),
    w: PLOT.w,
    h: clampY(from) - clampY(to),
  })
  const work = working && zone(working.from, working.to)
  const upper = working && zone(working.to, working.upper)
  const cut = breaking === undefined ? PLOT.y : Math.max(PLOT.y, yAt(breaking))
  const shapes: Shape[] = [
    ...(work ? [{ kind: 'rect' as const, ...work, fill: 'wash' as const }] : []),
    ...(upper
      ? [lines(hatchRect(upper.x, upper.y, upper.w, upper.h, 5), { stroke: 'staff', width: 0.7 })]
      : []),
    ...ticks.values.flatMap((value): Shape[] => [
      lines([[PLOT.x, yAt(value), PLOT.x + PLOT.w, yAt(value)]], { stroke: 'staff', width: 0.6 }),
      words(
        PLOT.x - 5,
        yAt(value) + 3.5,
        formatNumber(value, { decimals: ticks.decimals, decimal: input.decimal }),
        { ...small, anchor: 'end' },
      ),
    ]),
    ...(breaking !== undefined && breaking <= top
      ? [
          lines(
            [[PLOT.x, yAt(breaking), PLOT.x + PLOT.w, yAt(breaking)]],
            { stroke: 'ink', width: 2 },
            { mark: 'limit-line' },
          ),
          words(
            PLOT.x + 4,
            yAt(breaking) - 4,
            `breaks near ${formatNumber(breaking, { decimals: 0 })} ${input.unit}`,
            { ...small, weight: 600 },
          ),
        ]
      : []),
    ...(work && work.h > 16
      ? [words(PLOT.x + 6, work.y + 14, 'working zone', { italic: true, size: 12 })]
      : []),
    ...curves.map(({ label, points }, index) =>
      polyline(
        below(
          points.map(({ semitone, tension }) => [xAt(semitone), yAt(tension)] as const),
          cut,
        ),
        {
          stroke: 'ink',
          width: index === 1 || curves.length === 1 ? 1.8 : 1.2,
          dash: curves.length === 1 ? undefined : dashes[index % dashes.length],
        },
        { role: { mark: 'curve', state: label } },
      ),
    ),
    ...legend(curves),
    ...pitchTicks(pitches, xAt),
    words(PLOT.x - 5, 11, input.unit, { ...small, anchor: 'end' }),
  ]
  return {
    width: WIDTH,
    height: HEIGHT,
    label: `Tension in ${input.unit} against pitch for ${curves.map(({ label }) => label).join(', ')}`,
    shapes,
  }
}

/** Lower right, where rising curves leave room. */
function legend(curves: readonly TensionCurve[]): Shape[] {
  if (curves.length < 2) return []
  return curves.flatMap(({ label }, index): Shape[] => {
    const y = PLOT.y + PLOT.h - 13 * (curves.length - index) - 2
    return [
      lines([[PLOT.x + PLOT.w - 68, y, PLOT.x + PLOT.w - 42, y]], {
        stroke: 'ink',
        width: index === 1 ? 1.8 : 1.2,
        dash: dashes[index % dashes.length],
      }),
      words(PLOT.x + PLOT.w - 37, y + 3.5, label, { size: 9.5 }),
    ]
  })
}

/** As many names of notes as stand clear of each other. */
function pitchTicks(pitches: TensionCurvesInput['pitches'], xAt: (semitone: number) => number): Shape[] {
  let free = Number.NEGATIVE_INFINITY
  return pitches.flatMap(({ semitone, label }): Shape[] => {
    const x = xAt(semitone)
    if (x < free) return []
    free = x + 26
    return [
      lines([[x, PLOT.y + PLOT.h, x, PLOT.y + PLOT.h + 4]], { stroke: 'ink' }),
      words(x, PLOT.y + PLOT.h + 15, label, { size: 9.5, anchor: 'middle' }),
    ]
  })
}
