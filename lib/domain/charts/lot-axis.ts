import type { PlotFrame } from './plot-frame'
import type { StaffChart } from './staff-chart'
import { textWidth } from './text-width'

export interface LotTick {
  readonly index: number
  readonly x: number
  /** The code without the letters that all codes of the chart share. */
  readonly code: string
  readonly day: string
}

const strides = [1, 2, 3, 6, 12, 24, 48, 60, 120, 240, 480, 1200, 2400, 6000, 12_000, 24_000, 60_000]

/** What all codes begin with, up to and with their last dash: "LA-"; empty when they differ. */
export function sharedPrefix(codes: readonly string[]): string {
  const first = codes[0]
  if (first === undefined) return ''
  const prefix = first.slice(0, first.lastIndexOf('-') + 1)
  return codes.every((code) => code.startsWith(prefix) && code.length > prefix.length) ? prefix : ''
}

/** A window longer than this has the same day twice: months with their years stand instead. */
const LONG = 330 * 86_400_000

/** The month of a lot: named at it, or at the last lot before it where the month changed. */
function monthAt(lots: StaffChart['lots'], index: number): string | undefined {
  for (let at = index; at >= 0; at -= 1) {
    const name = lots[at]?.monthLabel
    if (name !== undefined) return name
  }
  return undefined
}

/** Ticks of the lot axis: as many as stand clear of each other, at round code numbers where codes are numbered. */
export function lotTicks(
  chart: StaffChart,
  frame: PlotFrame,
): { readonly prefix: string; readonly ticks: readonly LotTick[] } {
  const { from, to } = chart.window
  const lots = chart.lots.slice(from, to + 1)
  const prefix = sharedPrefix(lots.map(({ code }) => code))
  const codeOf = (code: string): string => code.slice(prefix.length)
  const widest = lots.reduce(
    (most, { code, label }) => Math.max(most, textWidth(codeOf(code), 11), textWidth(label, 11)),
    20,
  )
  const stride =
    strides.find((lotsApart) => lotsApart * frame.step >= widest + 16) ?? Math.max(1, lots.length)
  const offset = lots.findIndex(({ code }) => Number(codeOf(code)) % stride === 0)
  const start = from + (offset >= 0 && offset < stride ? offset : 0)
  const isLong = (chart.lots[to]?.madeAt ?? 0) - (chart.lots[from]?.madeAt ?? 0) > LONG
  const dayOf = (index: number, day: string): string => (isLong ? (monthAt(chart.lots, index) ?? day) : day)
  const ticks: LotTick[] = []
  for (let index = start; index <= to; index += stride) {
    const lot = chart.lots[index]
    if (lot) ticks.push({ index, x: frame.xAt(index), code: codeOf(lot.code), day: dayOf(index, lot.label) })
  }
  return { prefix, ticks }
}
