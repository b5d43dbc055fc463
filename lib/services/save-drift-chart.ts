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
import { type DriftPaper, driftPdf } from '@/lib/output/drift-pdf'
import { svgToPng } from '@/lib/output/svg-to-png'
import { getDrift } from './get-drift'
import { getMachineDrift } from './get-machine-drift'

export interface ChartFile {
  readonly name: string
  readonly type: string
  readonly content: string | Uint8Array
}

/** Whose chart a file shows: what the chart does not know of itself. */
export interface ChartFileFacts {
  /** What the file is called by: the code of a product or a machine. */
  readonly code: string
  /** Names of the products whose lots are on it. */
  readonly products: readonly string[]
  readonly works: string
  readonly timeZone: string
  readonly at: number
}

const types: Readonly<Record<ChartFormat, string>> = {
  svg: 'image/svg+xml; charset=utf-8',
  png: 'image/png',
  csv: 'text/csv; charset=utf-8; header=present',
  pdf: 'application/pdf',
}

/**
 * The staff chart of a product as a file: the same chart as on the page, as a drawing, a picture, a document of
 * paper or its data. Without lots named, all there are.
 * @throws LedgerlineError not-permitted, not-found, bad-input
 */
export async function saveDriftChart(
  actor: Actor | undefined,
  productCode: string,
  format: ChartFormat,
  input: ChartFileInput,
  at: number = Date.now(),
): Promise<ChartFile> {
  const { chart, product, works } = await getDrift(actor, productCode, parseStaves(input.staves), {
    order: input.order,
  })
  return staffChartFile(chart, format, input, {
    code: product.code,
    products: [product.name],
    works: works.name,
    timeZone: works.timeZone,
    at,
  })
}

/**
 * The chart of a machine over its products as a file.
 * @throws LedgerlineError not-permitted, not-found, bad-input
 */
export async function saveMachineChart(
  actor: Actor | undefined,
  machineCode: string,
  format: ChartFormat,
  input: ChartFileInput,
  at: number = Date.now(),
): Promise<ChartFile> {
  const { chart, machine, products, works } = await getMachineDrift(
    actor,
    machineCode,
    parseStaves(input.staves),
    { order: input.order },
  )
  return staffChartFile(chart, format, input, {
    code: machine.code,
    products: products.map((one) => one.name),
    works: works.name,
    timeZone: works.timeZone,
    at,
  })
}

/**
 * Any staff chart as a file, whatever its lots have in common.
 * @throws LedgerlineError not-found, bad-input
 */
export async function staffChartFile(
  drift: StaffChartInput,
  format: ChartFormat,
  input: ChartFileInput,
  facts: ChartFileFacts,
): Promise<ChartFile> {
  const chart = buildStaffChart({ ...drift, window: windowOf(drift, input) })
  return {
    name: nameOf(facts.code, chart, format),
    type: types[format],
    content:
      format === 'pdf'
        ? await driftPdf(chart, paperOf(drift, chart.window, facts))
        : contentOf(chart, format, input),
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

function nameOf(code: string, { lots, window }: StaffChart, format: ChartFormat): string {
  const [first, last] = [lots[window.from]?.code, lots[window.to]?.code]
  const span =
    first === undefined || last === undefined ? '' : first === last ? ` ${first}` : ` ${first} to ${last}`
  return `${code}${span}.${format}`
}

function contentOf(
  chart: StaffChart,
  format: Exclude<ChartFormat, 'pdf'>,
  { theme, width }: ChartFileInput,
): string | Uint8Array {
  if (format === 'csv') return csvText(staffChartRows(chart))
  const svg = svgText(drawStaffChart(layoutStaffChart(chart, width)), { theme: themes[theme], ground: true })
  return format === 'svg' ? svg : svgToPng(svg)
}

/** What the paper says beside the chart: the unanswered signals that a lot of the window takes part in. */
function paperOf(
  { staves }: StaffChartInput,
  { from, to }: LotWindow,
  { products, works, timeZone, at }: ChartFileFacts,
): DriftPaper {
  const days = new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    timeZone,
  })
  return {
    works,
    products,
    signals: staves.flatMap(({ label, signals }) =>
      signals
        .filter(
          ({ state, members }) => state === 'open' && members.some((index) => index >= from && index <= to),
        )
        .map(({ sentence }) => ({ stave: label, sentence })),
    ),
    printedAt: at,
    day: (instant) => days.format(instant),
  }
}
