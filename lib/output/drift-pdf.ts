import type { Content, TableCell, TDocumentDefinitions } from 'pdfmake/interfaces'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { printTheme } from '@/lib/domain/charts/ink'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { valueText } from '@/lib/domain/charts/readout'
import type { Drawing, Shape } from '@/lib/domain/charts/shape'
import type { StaffChart, StaffSegment, StaveModel } from '@/lib/domain/charts/staff-chart'
import { svgText } from '@/lib/domain/charts/svg'
import { formatNumber } from '@/lib/domain/units/format'
import { pdfBytes, withSigns } from './pdf'

/** What a printed chart says beside its marks, wherever the chart comes from. */
export interface DriftPaper {
  readonly works: string
  /** Names of the products whose lots are on the chart. */
  readonly products: readonly string[]
  /** Unanswered signals that the lots shown take part in, as sentences, each with the name of its stave. */
  readonly signals: readonly { readonly stave: string; readonly sentence: string }[]
  readonly printedAt: number
  /** A day as the works writes it, with its year. */
  readonly day: (instant: number) => string
}

const colours = printTheme
const svgFonts = { sans: 'sans', serif: 'serif', accidentals: 'signs' }
/** Points of an A4 page lying on its side, within its margins. */
const WIDTH = 770
const HEIGHT = 452
/** px of the chart on that width: its smallest letters of 11 px come out at 9.4 points. */
const CHART = 900
/** More sentences than these belong on the screen, where they can be answered. */
const MOST_SIGNALS = 120

const count = (many: number, one: string): string => `${many} ${one}${many === 1 ? '' : 's'}`

/** On paper a note leads nowhere. */
const withoutLinks = (shapes: readonly Shape[]): Shape[] =>
  shapes.map((shape) =>
    shape.kind === 'group' ? { ...shape, href: undefined, shapes: withoutLinks(shape.shapes) } : shape,
  )

function drawingOf(chart: StaffChart): Drawing {
  const drawing = drawStaffChart(layoutStaffChart(chart, CHART))
  return { ...drawing, shapes: withoutLinks(drawing.shapes) }
}

/** As many staves a page as fit at full size; a stave that is higher than a page is drawn smaller. */
function pagesOf(chart: StaffChart): Drawing[] {
  const most = (HEIGHT / WIDTH) * CHART
  const pages: Drawing[] = []
  let left = chart.staves
  while (left.length > 0 || pages.length === 0) {
    let many = Math.max(1, left.length)
    let drawing = drawingOf({ ...chart, staves: left.slice(0, many) })
    while (many > 1 && drawing.height > most) {
      many -= 1
      drawing = drawingOf({ ...chart, staves: left.slice(0, many) })
    }
    pages.push(drawing)
    left = left.slice(many)
  }
  return pages
}

/**
 * A staff chart as a document of A4 pages lying on their side: drawn in lines, not pixels, with its period, products,
 * limits in a table and unanswered signals in sentences. The same chart and facts give the same bytes.
 */
export const driftPdf = (chart: StaffChart, paper: DriftPaper): Promise<Uint8Array> =>
  pdfBytes(driftDocument(chart, paper))

export function driftDocument(chart: StaffChart, paper: DriftPaper): TDocumentDefinitions {
  const title = `${chart.title}, lot by lot`
  return {
    pageSize: 'A4',
    pageOrientation: 'landscape',
    pageMargins: [36, 28, 36, 38],
    compress: true,
    info: {
      title,
      author: paper.works,
      subject: periodOf(chart, paper),
      creator: 'Ledgerline',
      producer: 'Ledgerline',
      creationDate: new Date(paper.printedAt),
    },
    defaultStyle: { font: 'sans', fontSize: 10, color: colours.ink, lineHeight: 1.15 },
    footer: (page: number, pages: number) => ({
      columns: [
        { text: withSigns(`${paper.works}: ${title}. Printed ${paper.day(paper.printedAt)}`) },
        { text: `page ${page} of ${pages}`, alignment: 'right', width: 90 },
      ],
      margin: [36, 8, 36, 0],
      fontSize: 9.5,
      color: colours.slate,
    }),
    content: [
      headOf(chart, paper),
      ...pagesOf(chart).map(
        (drawing, page): Content => ({
          svg: svgText(drawing, { theme: colours, fonts: svgFonts }),
          fit: [WIDTH, HEIGHT],
          margin: [0, 8, 0, 0],
          ...(page > 0 ? { pageBreak: 'before' as const } : {}),
        }),
      ),
      limitsOf(chart),
      signalsOf(paper),
    ],
  }
}

/** "52 lots, LA-309 to LA-360, made 20 Jul 2026 to 26 Oct 2026". */
function periodOf({ lots, window }: StaffChart, { day }: DriftPaper): string {
  const [first, last] = [lots[window.from], lots[window.to]]
  if (!first || !last) return 'no lots yet'
  if (first === last) return `1 lot, ${first.code}, made ${day(first.madeAt)}`
  return `${count(window.to - window.from + 1, 'lot')}, ${first.code} to ${last.code}, made ${day(first.madeAt)} to ${day(last.madeAt)}`
}

function headOf(chart: StaffChart, paper: DriftPaper): Content {
  const products = paper.products.filter((name) => name !== chart.title)
  return [
    {
      columns: [
        { text: withSigns(chart.title), font: 'serif', bold: true, fontSize: 20, lineHeight: 1 },
        { text: withSigns(paper.works), font: 'serif', italics: true, fontSize: 12, alignment: 'right' },
      ],
    },
    {
      text: withSigns(
        [
          periodOf(chart, paper),
          ...(products.length === 0
            ? []
            : [`${products.length === 1 ? 'product' : 'products'} ${products.join(', ')}`]),
        ].join('; '),
      ),
      color: colours.slate,
    },
    { canvas: [{ type: 'line', x1: 0, y1: 5, x2: WIDTH, y2: 5, lineWidth: 1, lineColor: colours.ink }] },
  ]
}

const heading = (text: string, more: { readonly pageBreak?: 'before' } = {}): Content => ({
  text,
  font: 'serif',
  bold: true,
  fontSize: 13,
  margin: [0, 12, 0, 4],
  ...more,
})

const right = (text: string): TableCell => ({ text, alignment: 'right' })

function limitRow(stave: StaveModel, segment: StaffSegment, chart: StaffChart): TableCell[] {
  const value = (one: number | undefined): TableCell => right(valueText(one, stave, chart))
  const [first, last] = [chart.lots[segment.fromIndex], chart.lots[segment.toIndex]]
  return [
    { text: withSigns(stave.label), bold: true },
    { text: withSigns(stave.unitLabel) },
    `${segment.number}${segment.provisional ? ', provisional' : ''}`,
    first === last ? (first?.code ?? '') : `${first?.code ?? ''} to ${last?.code ?? ''}`,
    value(segment.lower),
    value(segment.centre),
    value(segment.upper),
    right(formatNumber(segment.sigma, { decimals: stave.decimals + 1, decimal: chart.decimal })),
    { text: withSigns(toleranceText(stave, chart)) },
  ]
}

const toleranceText = (stave: StaveModel, chart: StaffChart): string =>
  stave.tolerances
    .map(
      ({ side, value }) => `${side === 'above' ? 'at most' : 'at least'} ${valueText(value, stave, chart)}`,
    )
    .reverse()
    .join(', ')

function limitsOf(chart: StaffChart): Content {
  const rows = chart.staves.flatMap((stave): TableCell[][] =>
    stave.segments.length > 0
      ? stave.segments.map((segment) => limitRow(stave, segment, chart))
      : [
          [
            { text: withSigns(stave.label), bold: true },
            { text: withSigns(stave.unitLabel) },
            { text: stave.withoutLimits ?? 'no limits', colSpan: 6, italics: true, font: 'serif' },
            '',
            '',
            '',
            '',
            '',
            { text: withSigns(toleranceText(stave, chart)) },
          ],
        ],
  )
  if (rows.length === 0) return []
  const names = ['Chart', 'Unit', 'Set', 'Lots', 'Lower', 'Centre', 'Upper', 'σ', 'Tolerance']
  return [
    heading('Limits', { pageBreak: 'before' }),
    {
      table: {
        headerRows: 1,
        dontBreakRows: true,
        widths: ['*', 'auto', 'auto', 'auto', 'auto', 'auto', 'auto', 'auto', 'auto'],
        body: [
          names.map(
            (text, place): TableCell => ({
              text,
              color: colours.slate,
              alignment: place >= 4 && place <= 7 ? 'right' : 'left',
            }),
          ),
          ...rows,
        ],
      },
      layout: {
        hLineWidth: (line: number) => (line === 1 ? 0.8 : 0.4),
        vLineWidth: () => 0,
        hLineColor: (line: number) => (line === 1 ? colours.ink : colours.hair),
        paddingLeft: (column: number) => (column === 0 ? 0 : 6),
        paddingRight: () => 6,
        paddingTop: () => 3,
        paddingBottom: () => 3,
      },
    },
  ]
}

function signalsOf({ signals }: DriftPaper): Content {
  if (signals.length === 0)
    return [heading('Signals'), { text: 'No signal among these lots waits for an answer.' }]
  const told = signals.slice(-MOST_SIGNALS)
  const more = signals.length - told.length
  return [
    heading(`Signals that wait for an answer: ${signals.length}`),
    ...(more > 0 ? [{ text: `The newest ${told.length} of them; ${more} more on the screen.` }] : []),
    {
      ul: told.map(({ stave, sentence }) => ({
        text: [
          ...withSigns(stave).map((part) => ({ ...part, bold: true })),
          { text: ': ' },
          ...withSigns(sentence),
        ],
        margin: [0, 1, 0, 1] as [number, number, number, number],
      })),
    },
  ]
}
