import type { Actor } from '@/lib/access/actor'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { themes } from '@/lib/domain/charts/ink'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import type { LotWindow, StaffChart, StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { staffChartRows } from '@/lib/domain/charts/staff-chart-csv'
import { svgText } from '@/lib/domain/charts/svg'
import { problem } from '@/lib/domain/errors'
import type { ChartFileInput, ChartFormat } from '@/lib/input/chart-file'
import { parseStaves } from '@/lib/input/drift-view'
import { csvText } from '@/lib/output/csv'
import { svgToPng } from '@/lib/output/svg-to-png'
import { getDrift } from './get-drift'

export interface ChartFile {
  readonly name: string
  readonly type: string
  readonly content: string | Uint8Array
}

const types: Readonly<Record<ChartFormat, string>> = {
  svg: 'image/svg+xml; charset=utf-8',
  png: 'image/png',
  csv: 'text/csv; charset=utf-8; header=present',
}

/**
 * The staff chart of a product as a file: the same chart as on the page, as a drawing, a picture or its data.
 * Without lots named, all there are.
 * @throws LedgerlineError not-permitted, not-found, bad-input
 */
export async function saveDriftChart(
  actor: Actor | undefined,
  productCode: string,
  format: ChartFormat,
  input: ChartFileInput,
): Promise<ChartFile> {
  const { chart: drift, product } = await getDrift(actor, productCode, parseStaves(input.staves))
  const chart = buildStaffChart({ ...drift, window: windowOf(drift, input) })
  return {
    name: nameOf(product.code, chart, format),
    type: types[format],
    content: contentOf(chart, format, input),
  }
}

/** From the first to the last lot named; an end that is not named lies open. */
function windowOf({ lots }: StaffChartInput, { from, to }: ChartFileInput): LotWindow {
  const placeOf = (code: string | undefined, where: string, open: number): number => {
    if (code === undefined) return open
    const index = lots.findIndex((lot) => lot.code === code)
    if (index < 0)
      throw problem('not-found', `Lot ${code} is not on this chart.`, {
        where,
        mend: 'Choose a lot of this product whose plan is complete.',
      })
    return index
  }
  const window = { from: placeOf(from, 'from', 0), to: placeOf(to, 'to', Math.max(0, lots.length - 1)) }
  if (window.from > window.to)
    throw problem('bad-input', 'The first lot of the chart was made after the last one.', { where: 'from' })
  return window
}

function nameOf(productCode: string, { lots, window }: StaffChart, format: ChartFormat): string {
  const [first, last] = [lots[window.from]?.code, lots[window.to]?.code]
  const span =
    first === undefined || last === undefined ? '' : first === last ? ` ${first}` : ` ${first} to ${last}`
  return `${productCode}${span}.${format}`
}

function contentOf(
  chart: StaffChart,
  format: ChartFormat,
  { theme, width }: ChartFileInput,
): string | Uint8Array {
  if (format === 'csv') return csvText(staffChartRows(chart))
  const svg = svgText(drawStaffChart(layoutStaffChart(chart, width)), { theme: themes[theme], ground: true })
  return format === 'svg' ? svg : svgToPng(svg)
}
