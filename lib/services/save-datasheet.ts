import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { datasheetCsv } from '@/lib/output/datasheet-csv'
import { datasheetPdf } from '@/lib/output/datasheet-pdf'
import { getDatasheet } from './get-datasheet'
import { getWorks } from './get-works'

export const datasheetFormats = ['pdf', 'csv'] as const
export type DatasheetFormat = (typeof datasheetFormats)[number]

export interface DatasheetFile {
  readonly name: string
  readonly type: string
  readonly content: string | Uint8Array
}

/**
 * A published revision as a file, from its frozen body alone: the same revision gives the same numbers for ever.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function saveDatasheet(
  actor: Actor | undefined,
  code: string,
  number: number,
  format: DatasheetFormat,
): Promise<DatasheetFile> {
  permit(actor, 'datasheets.read')
  const view = await getDatasheet(actor, code, number)
  const name = `${view.code} revision ${view.number}.${format}`
  if (format === 'csv')
    return { name, type: 'text/csv; charset=utf-8; header=present', content: datasheetCsv(view, view.body) }
  const works = await getWorks(actor)
  const days = new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    timeZone: works.timeZone,
  })
  const content = await datasheetPdf(view.body, {
    ...view,
    decimal: works.numberFormat,
    day: (instant) => days.format(instant),
  })
  return { name, type: 'application/pdf', content }
}
