import type { StaffLayout } from './layout-staff-chart'
import { lines, NOTE_TURN, words } from './marks'
import { noteAt } from './note-at'
import { sigmasText, valueText } from './readout'
import type { Shape } from './shape'
import type { BarLine } from './staff-chart'
import { textWidth } from './text-width'

/** What the pointer reads at one lot. */
export interface PointerReading {
  readonly index: number
  readonly code: string
  readonly day: string
  /** What changed before this lot; empty when nothing did. */
  readonly change: string
  readonly staves: readonly {
    readonly key: string
    readonly label: string
    readonly value: string
    readonly sigmas: string
  }[]
}

const changeAt = ({ chart }: StaffLayout, index: number): BarLine | undefined =>
  chart.barLines.find(({ atIndex }) => atIndex === index)

/** The reading of one lot over all staves; undefined when there is no such lot. */
export function readLot(layout: StaffLayout, index: number): PointerReading | undefined {
  const { chart } = layout
  const lot = chart.lots[index]
  if (!lot || index < chart.window.from || index > chart.window.to) return undefined
  return {
    index,
    code: lot.code,
    day: lot.label,
    change: changeAt(layout, index)?.reason ?? '',
    staves: chart.staves.map((stave) => {
      const note = noteAt(stave, index)
      return {
        key: stave.key,
        label: stave.label,
        value: valueText(note?.value, stave, chart),
        sigmas: note?.sigmas === undefined ? '' : sigmasText(note.sigmas, chart),
      }
    }),
  }
}

/** The reading as one line of words, for screen readers. */
export const readingText = (reading: PointerReading): string =>
  `${reading.code}, ${reading.day}${reading.change === '' ? '' : `, ${reading.change}`}: ${reading.staves
    .map(({ label, value, sigmas }) => `${label} ${value}${sigmas === '' ? '' : `, ${sigmas}`}`)
    .join('; ')}`

/** The nearest lot of the window to a place on the page; undefined without lots. */
export function lotAt({ chart, frame }: StaffLayout, x: number): number | undefined {
  const { from, to } = chart.window
  return to < from ? undefined : Math.min(to, Math.max(from, Math.round(frame.indexAt(x))))
}

/** Line through all staves, broken around each note, with a ring on it; the lot in a flag above. */
export function pointerShapes(layout: StaffLayout, index: number): readonly Shape[] {
  const { chart, staves, bars, plot, frame } = layout
  const lot = chart.lots[index]
  if (!lot || index < chart.window.from || index > chart.window.to) return []
  const x = frame.xAt(index)
  const role = { mark: 'pointer', lot: lot.code } as const
  const rings = staves.flatMap(({ stave, y, yAt, top, bottom }) => {
    const note = noteAt(stave, index)
    // Where the note itself would stand: also for one that is not drawn in a crowded window.
    return note === undefined
      ? []
      : [{ key: stave.key, y: y + Math.min(bottom + 77, Math.max(top - 77, yAt(note.value))) }]
  })
  const stops = [plot.y - 4, ...rings.flatMap(({ y }) => [y - 8, y + 8]), bars.y2 + 8]
  const parts = stops.flatMap((from, place): [number, number, number, number][] => {
    const to = stops[place + 1]
    return place % 2 === 0 && to !== undefined && to > from ? [[x, from, x, to]] : []
  })
  const w = Math.max(44, textWidth(lot.code, 11, 'strong') + 20)
  const middle = Math.min(layout.width - w / 2, Math.max(w / 2, x))
  return [
    lines(parts, { stroke: 'brass' }, role),
    ...rings.map(
      ({ key, y }): Shape => ({
        kind: 'ellipse',
        cx: x,
        cy: y,
        rx: 9,
        ry: 7.2,
        turn: NOTE_TURN,
        stroke: 'brass',
        width: 1.4,
        role: { ...role, stave: key },
      }),
    ),
    { kind: 'rect', x: middle - w / 2, y: 0, w, h: 18, radius: 2, fill: 'brass' },
    words(middle, 13, lot.code, { anchor: 'middle', weight: 600, ink: 'paper' }),
  ]
}

/** What changed before the lot, where its own reason found no room below: over what stands there. */
function changeShapes(layout: StaffLayout, index: number): readonly Shape[] {
  const { reasons, reasonsY, frame, width } = layout
  const bar = changeAt(layout, index)
  if (!bar || reasons.some((one) => one.bar === bar && one.row !== undefined)) return []
  const w = Math.max(textWidth(bar.reason, 13, 'italic') * 1.04, textWidth(bar.detail, 11)) + 8
  const x = Math.max(0, Math.min(frame.xAt(index - 0.5), width - w))
  return [
    { kind: 'rect', x, y: reasonsY - 14, w, h: 35, fill: 'paper' },
    words(x + 4, reasonsY, bar.reason, { italic: true, ink: 'brass' }),
    words(x + 4, reasonsY + 15, bar.detail, { ink: 'slate' }),
  ]
}

/** Values never float: they stand in the label column of their stave, with the distance in σ. */
export function readingShapes(layout: StaffLayout, index: number): readonly Shape[] {
  const reading = readLot(layout, index)
  if (!reading) return []
  const values = layout.staves.flatMap(({ readout, stave }): Shape[] => {
    const own = reading.staves.find(({ key }) => key === stave.key)
    if (!own) return []
    const anchor = layout.frame.compact ? ('end' as const) : ('start' as const)
    return [
      words(readout.valueX, readout.y, own.value, {
        size: 17,
        weight: 500,
        ink: 'brass',
        anchor,
        role: { stave: stave.key },
      }),
      words(readout.sigmaX, readout.y, own.sigmas, {
        ink: 'brass',
        anchor: 'end',
        role: { stave: stave.key },
      }),
    ]
  })
  return [...changeShapes(layout, index), ...values]
}
