import { clampWindow } from './build-staff-chart'
import { lines, words } from './marks'
import type { Shape } from './shape'
import type { ChartLot, ChartSignal, LotWindow, StaffChartInput } from './staff-chart'
import { textWidth } from './text-width'

/** The overview of all lots under a chart: 40 px high, labels beneath. */
export interface StaffBrush {
  readonly width: number
  readonly height: number
  readonly x: number
  readonly w: number
  readonly lotCount: number
  readonly xAt: (index: number) => number
  readonly indexAt: (x: number) => number
  readonly shapes: readonly Shape[]
}

export const BRUSH_HEIGHT = 40
const TOP = 4
/** Fewer lots than these in a window are a list, not a chart. */
export const LEAST_WINDOW = 8

const middleOf = (values: readonly number[]): number => {
  const sorted = values.toSorted((a, b) => a - b)
  return sorted[Math.floor(sorted.length / 2)] ?? 0
}

type Ends = readonly [number, number, number, number]

/** One upright tick for each value, or from the lowest to the highest of those that share a px. */
function ticks(
  values: readonly { readonly value: number; readonly index: number }[],
  xAt: (index: number) => number,
  yAt: (value: number) => number,
): Ends[] {
  const columns = new Map<number, { x: number; y1: number; y2: number }>()
  for (const { value, index } of values) {
    const [x, y] = [xAt(index), yAt(value)]
    const before = columns.get(Math.floor(x))
    if (before) {
      before.y1 = Math.min(before.y1, y)
      before.y2 = Math.max(before.y2, y)
    } else columns.set(Math.floor(x), { x, y1: y, y2: y })
  }
  return [...columns.values()].map(({ x, y1, y2 }) => [x, y1 - 1.6, x, y2 + 1.6])
}

/** Bars of signals; those that would lie on the one before become part of it. */
function signalBars(signals: readonly ChartSignal[], xAt: (index: number) => number): Ends[] {
  const ends = signals
    .map(({ members }) => [xAt(members[0] ?? 0) - 1, xAt(members.at(-1) ?? 0) + 1] as const)
    .sort(([a], [b]) => a - b)
  const bars: [number, number][] = []
  for (const [from, to] of ends) {
    const last = bars.at(-1)
    if (last && from - last[1] < 1) last[1] = Math.max(last[1], to)
    else bars.push([from, to])
  }
  return bars.map(([from, to]) => [from, TOP + 2, to, TOP + 2])
}

/**
 * All lots of the first stave, between its own extremes, in one path a colour: no more ticks than the overview has
 * px of width, each column with its highest and lowest.
 */
function overview(input: StaffChartInput, xAt: (index: number) => number): Shape[] {
  const stave = input.staves[0]
  if (!stave) return []
  const values = stave.values.flatMap((value, index) =>
    value === undefined || !Number.isFinite(value) ? [] : [{ value, index }],
  )
  const middle = stave.limitSets.at(-1)?.centre ?? middleOf(values.map(({ value }) => value))
  const reach = values.reduce((most, { value }) => Math.max(most, Math.abs(value - middle)), 0)
  const yAt = (value: number): number => TOP + 20 - (reach > 0 ? ((value - middle) / reach) * 15 : 0)
  return [
    lines(
      [8, 14, 20, 26, 32].map((y) => [xAt(0) - 4, TOP + y, xAt(input.lots.length - 1) + 4, TOP + y] as const),
      { stroke: 'staff', width: 0.5 },
    ),
    lines(ticks(values, xAt, yAt), { stroke: 'ink', width: xAt(1) - xAt(0) < 2 ? 1 : 2.2 }),
    ...(['answered', 'open'] as const).flatMap((state) => {
      const bars = signalBars(
        stave.signals.filter((signal) => signal.state === state),
        xAt,
      )
      return bars.length > 0
        ? [lines(bars, { stroke: state === 'open' ? 'vermilion' : 'slate', width: 2 })]
        : []
    }),
  ]
}

/** The year at the end of a month's name. */
const YEAR = / (\d{4})$/

/** A month's name and the room beside it, px: where months have less they would be named here and there. */
const MONTH_ROOM = 42

/** Years where they begin, or nothing when months have room, or when no month tells its year. */
function yearMarks(lots: readonly ChartLot[], w: number): readonly (readonly [number, string])[] {
  const marks: (readonly [number, string])[] = []
  let months = 0
  let before: string | undefined
  lots.forEach(({ monthLabel }, index) => {
    if (monthLabel === undefined || monthLabel === before) return
    before = monthLabel
    months += 1
    const year = YEAR.exec(monthLabel)?.[1]
    if (year !== undefined && year !== marks.at(-1)?.[1]) marks.push([index, year])
  })
  return marks.length > 1 && months * MONTH_ROOM > w ? marks : []
}

/** Labels where something begins, as many as stand clear of each other. */
function yearLabels(
  marks: readonly (readonly [number, string])[],
  xAt: (index: number) => number,
  right: number,
): Shape[] {
  let free = Number.NEGATIVE_INFINITY
  return marks.flatMap(([index, year]): Shape[] => {
    const [x, w] = [xAt(index), textWidth(year, 11)]
    if (x < free || x + w > right) return []
    free = x + w + 14
    return [
      lines([[x, TOP + BRUSH_HEIGHT, x, TOP + BRUSH_HEIGHT + 5]], { stroke: 'edge' }),
      words(x, TOP + BRUSH_HEIGHT + 17, year, { ink: 'slate' }),
    ]
  })
}

/**
 * Names of months (or days, where no lot names a month) where they change, as many as stand clear of each other;
 * a year is said once. Years alone where months would be too dense.
 */
function monthLabels(input: StaffChartInput, xAt: (index: number) => number, right: number): Shape[] {
  const years = yearMarks(input.lots, right - xAt(0))
  if (years.length > 0) return yearLabels(years, xAt, right)
  const shapes: Shape[] = []
  const hasMonths = input.lots.some(({ monthLabel }) => monthLabel !== undefined)
  let free = Number.NEGATIVE_INFINITY
  let before: string | undefined
  let year: string | undefined
  input.lots.forEach(({ monthLabel, label }, index) => {
    const name = hasMonths ? monthLabel : label
    if (name === undefined || name === before) return
    before = name
    const own = YEAR.exec(name)?.[0]
    const text = own !== undefined && own === year ? name.replace(YEAR, '') : name
    const x = xAt(index)
    const w = textWidth(text, 11)
    if (x < free || x + w > right) return
    shapes.push(words(x, TOP + BRUSH_HEIGHT + 17, text, { ink: 'slate' }))
    free = x + w + 14
    year = own
  })
  return shapes
}

/** Lays out the overview; the window and its handles are drawn over it. */
export function staffBrush(
  input: StaffChartInput,
  frame: { readonly x: number; readonly w: number; readonly compact: boolean },
  width: number,
): StaffBrush {
  const lotCount = input.lots.length
  const inner = frame.w - 12
  const perLot = lotCount > 1 ? inner / (lotCount - 1) : 0
  const xAt = (index: number): number => frame.x + 6 + index * perLot
  const gaps = input.staves[0]?.values.filter((value) => value === undefined).length ?? 0
  return {
    width,
    height: TOP + BRUSH_HEIGHT + 24,
    x: frame.x,
    w: frame.w,
    lotCount,
    xAt,
    indexAt: (x) => (perLot === 0 ? 0 : (x - frame.x - 6) / perLot),
    shapes: [
      ...(frame.compact
        ? []
        : [
            words(0, TOP + 16, 'All lots', { weight: 600 }),
            words(
              0,
              TOP + 31,
              `${lotCount} lots${gaps === 0 ? '' : gaps === 1 ? ', 1 gap' : `, ${gaps} gaps`}`,
              {
                ink: 'slate',
              },
            ),
          ]),
      ...overview(input, xAt),
      ...monthLabels(input, xAt, frame.x + frame.w),
    ],
  }
}

/** A window moved as a whole; it keeps its width at the ends. */
export function moveWindow(window: LotWindow, by: number, lotCount: number): LotWindow {
  const held = clampWindow(window, lotCount)
  const step = Math.min(lotCount - 1 - held.to, Math.max(-held.from, Math.round(by)))
  return { from: held.from + step, to: held.to + step }
}

/** A window with one end moved; the ends stay at least eight lots apart. */
export function resizeWindow(window: LotWindow, end: 'from' | 'to', to: number, lotCount: number): LotWindow {
  const held = clampWindow(window, lotCount)
  const least = Math.min(LEAST_WINDOW, lotCount) - 1
  return end === 'from'
    ? clampWindow({ from: Math.min(Math.max(0, to), held.to - least), to: held.to }, lotCount)
    : clampWindow({ from: held.from, to: Math.max(Math.min(lotCount - 1, to), held.from + least) }, lotCount)
}
