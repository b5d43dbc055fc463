import { type ChartChoice, chartId, type DriftOrder, defaultCharts } from '@/lib/input/drift-view'

/** Whose chart it is: a product's in its own units, or a machine's over its products in σ. */
export interface DriftSubject {
  readonly kind: 'product' | 'machine'
  readonly code: string
}

export interface DriftPlace {
  /** Staves as the address names them; empty for the usual ones. */
  readonly staves?: string
  readonly order?: DriftOrder
  readonly lot?: string
  readonly from?: string
  readonly to?: string
}

/** The parameters of a chart's address; what is usual is left out. */
export const driftParameters = (
  { code, kind }: DriftSubject,
  { from, lot, order, staves, to }: DriftPlace = {},
): URLSearchParams =>
  new URLSearchParams(
    Object.entries({
      [kind]: code,
      staves,
      order: order === 'measured' ? order : undefined,
      lot,
      from,
      to,
    }).flatMap(([name, value]) => (value ? [[name, value] as [string, string]] : [])),
  )

export const driftAddress = (subject: DriftSubject, place: DriftPlace = {}): string =>
  `/drift?${driftParameters(subject, place)}`

/** A product's chart. */
export const driftHref = (productCode: string, staves = '', lot?: string): string =>
  driftAddress({ kind: 'product', code: productCode }, { staves, ...(lot === undefined ? {} : { lot }) })

/** The address of a chart with these staves, the usual ones unnamed. */
export function stavesParameter(charts: readonly ChartChoice[]): string {
  const ids = charts.map(chartId).join(',')
  return ids === defaultCharts.map(chartId).join(',') ? '' : ids
}
