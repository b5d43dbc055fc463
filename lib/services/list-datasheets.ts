import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type DatasheetListRow, listDatasheets as listRows } from '@/lib/data/datasheets'

export type { DatasheetListRow }

/** All datasheets by code, each with its newest revision. */
export async function listDatasheets(actor: Actor | undefined): Promise<readonly DatasheetListRow[]> {
  permit(actor, 'datasheets.read')
  return listRows(database().read)
}
