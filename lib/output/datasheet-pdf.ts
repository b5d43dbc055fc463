import type { Content, TableCell, TDocumentDefinitions } from 'pdfmake/interfaces'
import { datasheetCurves, datasheetLots } from '@/lib/domain/charts/datasheet-charts'
import { printTheme } from '@/lib/domain/charts/ink'
import { lotMarks } from '@/lib/domain/charts/lot-marks'
import type { Drawing } from '@/lib/domain/charts/shape'
import { svgText } from '@/lib/domain/charts/svg'
import { tensionCurves } from '@/lib/domain/charts/tension-curves'
import { warningSign } from '@/lib/domain/charts/warning-sign'
import type { DatasheetBody, DatasheetCell, WorkingState } from '@/lib/domain/datasheets/datasheet'
import {
  cellInWords,
  figuresInWords,
  forceUnitNames,
  lawInWords,
  lengthInWords,
  methodInWords,
  stiffnessInWords,
  tableInWords,
  workingStateWords,
} from '@/lib/domain/datasheets/datasheet-words'
import { formatNumber } from '@/lib/domain/units/format'
import { pdfBytes, withSigns } from './pdf'

export interface PublishedPaper {
  readonly code: string
  readonly number: number
  readonly publishedAt: number
  readonly publishedBy: string
  readonly hash: string
  readonly revisions: readonly {
    readonly number: number
    readonly publishedAt: number
    readonly lots: number
    readonly changes: readonly string[]
  }[]
  readonly decimal: 'point' | 'comma'
  /** A day as the works writes it. */
  readonly day: (instant: number) => string
}

const colours = printTheme
const INK = colours.ink
/** Faces of the document, by which the drawings inside it are set, too. */
const svgFonts = { sans: 'sans', serif: 'serif', accidentals: 'signs' }
const WIDTH = 523

const drawing = (picture: Drawing, width: number): Content => ({
  svg: svgText(picture, { theme: colours, fonts: svgFonts }),
  width,
})

const heading = (text: string, more = ''): Content => ({
  text: [
    { text, font: 'serif', bold: true, fontSize: 12 },
    { text: more === '' ? '' : `   ${more}`, fontSize: 8, color: colours.slate },
  ],
  margin: [0, 9, 0, 3],
})

/** Greys and hatches survive black-and-white print: white is slack, grey works, dark is not offered. */
const fills: Readonly<Record<WorkingState, string | undefined>> = {
  slack: undefined,
  working: colours.wash,
  upper: '#D9CFB8',
  over: '#B9B2A3',
}

const ruled = {
  hLineWidth: (line: number) => (line === 1 ? 0.8 : 0.4),
  vLineWidth: () => 0,
  hLineColor: (line: number) => (line === 1 ? INK : colours.hair),
  paddingLeft: () => 3,
  paddingRight: () => 3,
  paddingTop: () => 2,
  paddingBottom: () => 2,
}

/**
 * A published revision as a document of A4 paper: what stands on the page of the revision, cautions and the law of
 * the basis included. The same revision gives the same bytes.
 */
export const datasheetPdf = (body: DatasheetBody, paper: PublishedPaper): Promise<Uint8Array> =>
  pdfBytes(documentOf(body, paper))

export function documentOf(body: DatasheetBody, paper: PublishedPaper): TDocumentDefinitions {
  const title = `${body.product.name}, ${paper.code} revision ${paper.number}`
  return {
    pageSize: 'A4',
    pageMargins: [36, 28, 36, 38],
    compress: true,
    info: {
      title,
      author: body.works,
      subject: `Tension in ${forceUnitNames[body.forceUnit]}`,
      creator: 'Ledgerline',
      producer: 'Ledgerline',
      creationDate: new Date(paper.publishedAt),
    },
    defaultStyle: { font: 'sans', fontSize: 9, color: INK, lineHeight: 1.15 },
    footer: (page: number, pages: number) => ({
      columns: [
        { text: `${paper.code} revision ${paper.number}, ${body.product.name}` },
        { text: `Check code ${paper.hash.slice(0, 12)}   page ${page} of ${pages}`, alignment: 'right' },
      ],
      margin: [36, 8, 36, 0],
      fontSize: 8,
      color: colours.slate,
    }),
    content: [
      headOf(body, paper),
      heading('In figures'),
      figures(body, paper.decimal),
      heading(`Tension in ${forceUnitNames[body.forceUnit]}`, tableInWords(body, paper.decimal)),
      tensionTable(body, paper.decimal),
      legend(paper.decimal),
      pictures(body, paper.decimal),
      cautions(body),
      revisions(paper),
    ],
  }
}

function headOf(body: DatasheetBody, paper: PublishedPaper): Content {
  const facts: readonly (readonly [string, string])[] = [
    ['Datasheet', paper.code],
    ['Revision', String(paper.number)],
    ['Issued', paper.day(paper.publishedAt)],
    ['Specification', `revision ${body.specification}`],
  ]
  return [
    {
      columns: [
        [
          { text: body.works, font: 'serif', italics: true, fontSize: 12 },
          { text: body.product.name, font: 'serif', bold: true, fontSize: 26, lineHeight: 1 },
          { text: `${body.material}, ${body.product.construction}`, font: 'serif', fontSize: 11 },
        ],
        {
          width: 150,
          table: {
            widths: ['*', 'auto'],
            body: facts.map(([name, value]) => [
              { text: name, color: colours.slate },
              { text: value, bold: true, alignment: 'right' },
            ]),
          },
          layout: { defaultBorder: false, paddingTop: () => 1, paddingBottom: () => 1 },
          margin: [0, 8, 0, 0],
        },
      ],
    },
    { canvas: [{ type: 'line', x1: 0, y1: 6, x2: WIDTH, y2: 6, lineWidth: 1.4, lineColor: INK }] },
  ]
}

function figures(body: DatasheetBody, decimal: 'point' | 'comma'): Content {
  const all = figuresInWords(body, decimal)
  const cell = ({ name, note, value }: (typeof all)[number]): Content => ({
    stack: [
      { text: withSigns(name), fontSize: 8, color: colours.slate },
      { text: withSigns(value), bold: true, fontSize: 10 },
      { text: withSigns(note ?? ''), font: 'serif', italics: true, fontSize: 8, color: colours.slate },
    ],
  })
  return {
    table: { widths: ['*', '*', '*', '*'], body: [all.slice(0, 4).map(cell), all.slice(4, 8).map(cell)] },
    layout: { ...ruled, hLineWidth: () => 0.4, hLineColor: () => colours.hair, paddingLeft: () => 0 },
  }
}

function tensionTable(body: DatasheetBody, decimal: 'point' | 'comma'): Content {
  const head: TableCell[] = [
    { text: 'Note', bold: true },
    { text: 'Hz', alignment: 'right', color: colours.slate },
    ...body.lengths.map(
      (length): TableCell => ({ text: lengthInWords(length, decimal), bold: true, alignment: 'right' }),
    ),
  ]
  const cellOf = (cell: DatasheetCell): TableCell => {
    const { share, tension } = cellInWords(cell, body, decimal)
    return {
      text: [
        { text: tension, bold: cell.state === 'working' },
        { text: share === '' ? '' : `   ${share}`, fontSize: 7 },
      ],
      alignment: 'right',
      ...(fills[cell.state] === undefined ? {} : { fillColor: fills[cell.state] }),
    }
  }
  return {
    table: {
      headerRows: 1,
      dontBreakRows: true,
      widths: [34, 40, ...body.lengths.map(() => '*')],
      body: [
        head,
        ...body.rows.map((row): TableCell[] => [
          { text: withSigns(row.note), bold: true },
          {
            text: formatNumber(row.frequency, { decimals: 2, decimal }),
            alignment: 'right',
            color: colours.slate,
          },
          ...row.cells.map(cellOf),
        ]),
      ],
    },
    layout: ruled,
  }
}

function legend(decimal: 'point' | 'comma'): Content {
  const words = workingStateWords(decimal)
  return {
    columns: (['slack', 'working', 'upper', 'over'] as const).map((state) => ({
      width: 'auto' as const,
      columns: [
        {
          width: 18,
          canvas: [
            {
              type: 'rect' as const,
              x: 0,
              y: 1,
              w: 14,
              h: 7,
              lineWidth: 0.5,
              lineColor: colours.edge,
              color: fills[state] ?? colours.paper,
            },
          ],
        },
        { width: 'auto' as const, text: words[state], fontSize: 7.5 },
      ],
    })),
    columnGap: 12,
    margin: [0, 5, 0, 0],
  }
}

function pictures(body: DatasheetBody, decimal: 'point' | 'comma'): Content {
  const curves = datasheetCurves(body, decimal)
  const { law, values } = lawInWords(body, decimal)
  const left: Content[] = curves
    ? [heading('Tension against pitch'), drawing(tensionCurves(curves), 250)]
    : []
  const right: Content[] = [
    heading('What the works really makes'),
    drawing(lotMarks(datasheetLots(body, decimal)), 250),
    {
      text: `Mass per metre of the released lots, one mark a lot. ${body.spread.statement}`,
      margin: [0, 3, 0, 0],
    },
    heading('How it was found'),
    { text: withSigns(methodInWords(body)) },
    { text: [{ text: `${law} `, bold: true }, { text: values }], margin: [0, 2, 0, 0] },
    { text: withSigns(stiffnessInWords(body, decimal)), margin: [0, 2, 0, 0] },
  ]
  return {
    columns: left.length > 0 ? [{ stack: left }, { stack: right }] : [{ stack: right }],
    columnGap: 23,
    unbreakable: true,
  }
}

const cautions = (body: DatasheetBody): Content => ({
  table: {
    widths: ['auto', '*'],
    dontBreakRows: true,
    body: [
      [
        drawing(warningSign, 18),
        {
          stack: [
            { text: 'A string under tension can hurt.', bold: true },
            ...body.cautions.map((text) => ({
              text,
              margin: [0, 1, 0, 0] as [number, number, number, number],
            })),
          ],
        },
      ],
    ],
  },
  layout: {
    hLineWidth: () => 0.8,
    vLineWidth: (line: number) => (line === 1 ? 0 : 0.8),
    paddingLeft: () => 8,
    paddingRight: () => 8,
    paddingTop: () => 6,
    paddingBottom: () => 6,
  },
  fontSize: 8,
  margin: [0, 10, 0, 6],
  unbreakable: true,
})

const revisions = (paper: PublishedPaper): Content => ({
  table: {
    headerRows: 1,
    widths: [30, 70, '*', 50],
    body: [
      ['Rev.', 'Date', 'What changed', 'Rests on'].map((text) => ({ text, color: colours.slate })),
      ...paper.revisions
        .filter((one) => one.number <= paper.number)
        .map((one) => [
          { text: String(one.number), bold: one.number === paper.number },
          paper.day(one.publishedAt),
          { text: withSigns(one.changes.join(', ')) },
          `${one.lots} ${one.lots === 1 ? 'lot' : 'lots'}`,
        ]),
    ],
  },
  layout: { ...ruled, paddingLeft: () => 0 },
  fontSize: 8,
})
