import type { StaffLayout, StaveLayout } from './layout-staff-chart'
import { lines, words } from './marks'
import { spreadColumn } from './place-labels'
import { valueText } from './readout'
import type { Role, Shape } from './shape'

/** The part still to be made, on a wash ground. */
export function futureShapes({ frame, plot, bars, staves }: StaffLayout): Shape[] {
  if (frame.future === undefined) return []
  const right = frame.x + frame.w
  const y1 =
    Math.min(
      bars.y1,
      ...staves.slice(0, 1).flatMap(({ y, tolerances }) => tolerances.map((line) => y + line.y)),
    ) - 8
  const top = Math.max(plot.y, y1)
  return [
    { kind: 'rect', x: frame.future, y: top, w: right - frame.future, h: bars.y2 - top, fill: 'wash' },
    ...(right - frame.future > 130
      ? [
          words(right - 4, bars.y2 - 8, 'still to be made', {
            italic: true,
            ink: 'slate',
            anchor: 'end' as const,
          }),
        ]
      : []),
  ]
}

/** Staff, centre and limit lines of one stave, stepping where the limit set changes. */
export function staffShapes({ stave, segments, y, yAt }: StaveLayout): Shape[] {
  const role = (mark: Role['mark'], number: number): Role => ({
    mark,
    stave: stave.key,
    state: `set ${number}`,
  })
  return segments.flatMap(({ segment, x1, x2 }) => {
    const at = (value: number): readonly [number, number, number, number] => [
      x1,
      y + yAt(value),
      x2,
      y + yAt(value),
    ]
    const limits = [segment.upper, segment.lower].filter((value) => value !== undefined)
    return [
      lines(segment.inner.map(at), { stroke: 'staff', width: 0.8 }, role('staff-line', segment.number)),
      lines([at(segment.centre)], { stroke: 'staff', width: 1.3 }, role('centre-line', segment.number)),
      ...(limits.length > 0
        ? [lines(limits.map(at), { stroke: 'ink', width: 1.5 }, role('limit-line', segment.number))]
        : []),
    ]
  })
}

/** A stave without limits has one broken line in the middle of its values; its words are placed with the labels. */
export function unlimitedShapes({ stave, segments, y }: StaveLayout, { frame }: StaffLayout): Shape[] {
  if (stave.withoutLimits === undefined || segments.length > 0) return []
  return [
    lines(
      [[frame.x, y, frame.x + frame.w, y]],
      { stroke: 'staff', width: 0.8, dash: [2, 4] },
      { stave: stave.key },
    ),
  ]
}

/** Tolerance lines; their names are placed with the other labels. */
export function toleranceShapes({ stave, tolerances, y }: StaveLayout, { frame }: StaffLayout): Shape[] {
  return tolerances.map((line) =>
    lines(
      [[frame.x, y + line.y, frame.x + frame.w, y + line.y]],
      { stroke: 'vermilion', dash: [7, 4] },
      { mark: 'tolerance-line', stave: stave.key, state: line.side },
    ),
  )
}

/** Values of limits, centre and tolerance at the right, moved apart where they would touch. */
export function limitValueShapes(
  { stave, segments, tolerances, y, yAt }: StaveLayout,
  layout: StaffLayout,
): Shape[] {
  const { frame, chart } = layout
  const newest = segments.at(-1)
  const isShown = newest && newest.x2 >= frame.x + frame.w - 0.5 ? newest.segment : undefined
  const wanted = [
    ...tolerances.map(({ value }) => ({ value, ink: 'vermilion' as const, weight: 600 as const })),
    ...(isShown
      ? [
          ...(isShown.upper === undefined
            ? []
            : [{ value: isShown.upper, ink: 'ink' as const, weight: 600 as const }]),
          { value: isShown.centre, ink: 'slate' as const, weight: 400 as const },
          ...(isShown.lower === undefined
            ? []
            : [{ value: isShown.lower, ink: 'ink' as const, weight: 600 as const }]),
        ]
      : []),
  ]
  const heights = spreadColumn(
    wanted.map(({ value }) => yAt(value)),
    12,
  )
  return wanted.map(({ value, ink, weight }, index) =>
    words(
      frame.x + frame.w + (frame.compact ? 4 : 8),
      y + (heights[index] ?? 0) + 4,
      valueText(value, stave, chart),
      {
        ink,
        weight,
        role: { stave: stave.key },
      },
    ),
  )
}

/** Bar lines through all staves, and the bar that opens the chart. */
export function barShapes({ bars, frame, staves }: StaffLayout): Shape[] {
  if (staves.length === 0) return []
  const line = (x: number): readonly [number, number, number, number] => [x, bars.y1, x, bars.y2]
  const opened = bars.placed.some(({ x }) => x === frame.x)
  return [
    ...(opened ? [] : [lines([line(frame.x)], { stroke: 'ink', width: 1.1 })]),
    ...bars.placed.map(
      ({ bar, xs, near }): Shape => ({
        kind: 'group',
        title: [
          ...[bar.reason, bar.detail].filter((text) => text !== ''),
          ...(near === 0 ? [] : [`and ${near} more ${near === 1 ? 'change' : 'changes'} close by`]),
        ].join(', '),
        role: { mark: 'bar-line', state: bar.kinds.join(' ') },
        shapes: [lines(xs.map(line), { stroke: 'ink', width: 1.1 })],
      }),
    ),
  ]
}

/** What a crowded window cannot show, in words. */
const hiddenText = (hidden: number, compact: boolean): string =>
  `${hidden} ${hidden === 1 ? 'signal' : 'signals'} not drawn${compact ? '' : ': where they crowd, the one furthest out stands for its column. Zoom in to see each'}.`

/** Reasons under the last stave, and the lot axis. */
export function footShapes(layout: StaffLayout): Shape[] {
  const { reasons, reasonsY, axis, frame, chart, decimated, hidden } = layout
  const { from } = chart.window
  const first = chart.lots[from]
  const opens = first && !reasons.some(({ x, row }) => row === 0 && x < frame.x + 90)
  return [
    ...reasons.flatMap(({ bar, x, row }): Shape[] => {
      if (row === undefined) return []
      const y = reasonsY + row * 31
      return [
        ...(row === 1 ? [lines([[x - 3, y - 10, x - 3, y + 15]], { stroke: 'ink', width: 1.1 })] : []),
        words(x, y, bar.reason, { italic: true }),
        words(x, y + 15, bar.detail, { ink: 'slate' }),
      ]
    }),
    ...(opens && reasons.some(({ row }) => row !== undefined) && from > 0
      ? [words(frame.x, reasonsY, `from ${first.code}`, { italic: true })]
      : []),
    ...axis.ticks.flatMap(({ x, code, day }): Shape[] => [
      lines([[x, axis.y, x, axis.y + 3]], { stroke: 'edge' }),
      words(x, axis.y + 14, code, { anchor: 'middle', ink: 'slate' }),
      words(x, axis.y + 27, day, { anchor: 'middle', ink: 'slate' }),
    ]),
    ...(frame.compact || chart.lots.length === 0
      ? []
      : [words(0, axis.y + 14, axis.prefix ? `Lot, ${axis.prefix}` : 'Lot', { ink: 'slate' })]),
    ...(decimated && !frame.compact
      ? [words(0, axis.y + 27, `${decimated.shown} of ${decimated.of} notes drawn`, { ink: 'slate' })]
      : []),
    ...(hidden > 0 ? [words(frame.x, axis.y + 45, hiddenText(hidden, frame.compact), { ink: 'slate' })] : []),
  ]
}
