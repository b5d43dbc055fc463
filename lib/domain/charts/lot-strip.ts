import { formatNumber } from '../units/format'
import { hatchRect } from './hatch'
import type { Ink } from './ink'
import { lines, noteHead, openHead, polyline } from './marks'
import type { Drawing, Shape } from './shape'

export interface StripInput {
  readonly label: string
  readonly unit: string
  readonly decimals: number
  readonly decimal?: 'point' | 'comma'
  readonly signed?: boolean
  readonly mean?: number
  /** Expanded uncertainty of the lot's mean, k = 2. */
  readonly expanded?: number
  readonly specimens: readonly number[]
  readonly lower?: number
  readonly upper?: number
  /** Width of the guard band inside each tolerance limit. */
  readonly guard?: number
  readonly controlLower?: number
  readonly controlUpper?: number
  /** The lot's mean has left its control limits or its tolerance. */
  readonly beyond?: boolean
}

const [WIDTH, HEIGHT, LEFT, RIGHT] = [276, 36, 36.5, 239.5]
const [MEAN_Y, AXIS_Y] = [8, 23]

/**
 * From values to px: the tolerance spans the middle of the strip. With one limit only, the strip runs from it to
 * the furthest of everything shown, or to zero where a bounded quantity begins; with none, over what is shown.
 */
function scaleOf(input: StripInput): (value: number) => number {
  const { lower, upper, mean, expanded = 0, specimens } = input
  const all = [
    ...specimens,
    ...(mean === undefined ? [] : [mean - expanded, mean + expanded]),
    ...[input.controlLower, input.controlUpper, lower, upper].filter((value) => value !== undefined),
  ]
  const [low, high] = [Math.min(...all), Math.max(...all)]
  const from = lower ?? (upper !== undefined && low >= 0 ? 0 : low)
  const to = upper ?? high
  // Everything on the wrong side of the only limit: the strip spans what there is to show.
  const [left, right] = to > from ? [from, to] : [low, high]
  if (!(right > left)) return () => (LEFT + RIGHT) / 2
  return (value) => LEFT + ((value - left) / (right - left)) * (RIGHT - LEFT)
}

function limitShapes(x: number, guardW: number, side: 'lower' | 'upper'): Shape[] {
  const w = Math.min(Math.max(0, guardW), (RIGHT - LEFT) / 2)
  const from = side === 'lower' ? x : x - w
  return [
    lines(hatchRect(from, AXIS_Y - 7, w, 14, 4), { stroke: 'edge', width: 0.8 }),
    lines(
      [[x, AXIS_Y - 17, x, AXIS_Y + 7]],
      { stroke: 'ink', width: 1.6 },
      { mark: 'tolerance-line', state: side },
    ),
  ]
}

/** Where a value is off the strip: an arrow at the edge it lies behind. */
const offArrow = (side: -1 | 1, y: number, ink: Ink): Shape => {
  const [tip, back] = side < 0 ? [1, 6] : [WIDTH - 1, WIDTH - 6]
  return polyline(
    [
      [back, y - 4],
      [tip, y],
      [back, y + 4],
    ],
    { stroke: ink, width: 1.3 },
  )
}

/**
 * One line of a lot's results: tolerance limits with their guard bands, control limits as broken lines, the mean
 * with ± U, and every specimen as an open note below it.
 */
export function lotStrip(input: StripInput): Drawing {
  const at = scaleOf(input)
  const { lower, upper, guard = 0, mean, expanded } = input
  const ink: Ink = input.beyond ? 'vermilion' : 'ink'
  const isOff = (x: number): -1 | 0 | 1 => (x < 4 ? -1 : x > WIDTH - 4 ? 1 : 0)
  const within = (x: number): number => Math.min(WIDTH - 1, Math.max(1, x))
  const controls = [input.controlLower, input.controlUpper].filter((value) => value !== undefined).map(at)
  const marks = input.specimens.map((value): Shape => {
    const side = isOff(at(value))
    return side === 0
      ? {
          ...openHead(at(value), AXIS_Y, 'slate', { rx: 3.6, ry: 2.6 }, { mark: 'specimen' }, 1),
          fill: undefined,
        }
      : offArrow(side, AXIS_Y, 'slate')
  })
  return {
    width: WIDTH,
    height: HEIGHT,
    label: labelOf(input),
    shapes: [
      lines([[0, AXIS_Y, WIDTH, AXIS_Y]], { stroke: 'hair' }),
      ...(lower === undefined && upper === undefined
        ? []
        : [lines([[LEFT, AXIS_Y, RIGHT, AXIS_Y]], { stroke: 'staff' })]),
      ...(lower === undefined ? [] : limitShapes(at(lower), at(lower + guard) - at(lower), 'lower')),
      ...(upper === undefined ? [] : limitShapes(at(upper), at(upper) - at(upper - guard), 'upper')),
      ...controls
        .filter((x) => isOff(x) === 0)
        .map((x) => lines([[x, 2, x, 32]], { stroke: 'slate', dash: [2, 2] }, { mark: 'limit-line' })),
      ...marks,
      ...(mean === undefined
        ? []
        : meanShapes(
            at(mean),
            expanded === undefined ? undefined : [within(at(mean - expanded)), within(at(mean + expanded))],
            ink,
            isOff(at(mean)),
          )),
    ],
  }
}

function meanShapes(
  x: number,
  bar: readonly [number, number] | undefined,
  ink: Ink,
  off: -1 | 0 | 1,
): Shape[] {
  const y = MEAN_Y
  return [
    // Both ends off the strip on one side: there is nothing of the bar to see.
    ...(bar && (off === 0 || bar[1] > bar[0])
      ? [
          lines(
            [
              [bar[0], y, bar[1], y],
              [bar[0], y - 3, bar[0], y + 3],
              [bar[1], y - 3, bar[1], y + 3],
            ],
            { stroke: ink, width: 1.3 },
          ),
        ]
      : []),
    off === 0 ? noteHead(x, y, ink, { rx: 5.4, ry: 3.9 }, { mark: 'mean' }) : offArrow(off, y, ink),
  ]
}

function labelOf(input: StripInput): string {
  const text = (value: number): string =>
    formatNumber(value, {
      decimals: input.decimals,
      decimal: input.decimal,
      sign: input.signed ? 'always' : 'negative',
    })
  const { lower, upper, mean, expanded } = input
  const between =
    lower !== undefined && upper !== undefined
      ? `, tolerance ${text(lower)} to ${text(upper)}`
      : upper !== undefined
        ? `, at most ${text(upper)}`
        : lower !== undefined
          ? `, at least ${text(lower)}`
          : ''
  const said =
    mean === undefined
      ? 'no mean yet'
      : `mean ${text(mean)}${expanded === undefined ? '' : ` ± ${text(Math.abs(expanded)).replace('+', '')}`} ${input.unit}`
  return `${input.label}: ${said}${between}; ${input.specimens.length} ${input.specimens.length === 1 ? 'specimen' : 'specimens'}`
}
