import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import {
  type DatasheetRevisionRow,
  findDatasheetByCode,
  getRevision,
  listRevisions,
} from '@/lib/data/datasheets'
import { getPerson } from '@/lib/data/people'
import { compareRevisions } from '@/lib/domain/datasheets/compare-revisions'
import type { DatasheetBody } from '@/lib/domain/datasheets/datasheet'
import { problem } from '@/lib/domain/errors'

export interface DatasheetView {
  readonly code: string
  readonly productCode: string
  readonly productName: string
  readonly number: number
  readonly body: DatasheetBody
  readonly hash: string
  readonly publishedAt: number
  readonly publishedBy: string
  readonly supersededAt: number | undefined
  readonly evidenceChanged: boolean
  /** All revisions, newest first, with what changed against the one before. */
  readonly revisions: readonly {
    readonly number: number
    readonly publishedAt: number
    readonly lots: number
    readonly changes: readonly string[]
    readonly evidenceChanged: boolean
  }[]
}

const bodyOf = (row: DatasheetRevisionRow): DatasheetBody => JSON.parse(row.body) as DatasheetBody

/** A published revision, the newest unless a number is given. Old ones stay readable as they were. */
export async function getDatasheet(
  actor: Actor | undefined,
  code: string,
  number?: number,
): Promise<DatasheetView> {
  permit(actor, 'datasheets.read')
  const tx = database().read
  const datasheet = await findDatasheetByCode(tx, code)
  if (!datasheet) throw problem('not-found', `There is no datasheet ${code}.`)
  const all = await listRevisions(tx, datasheet.id)
  const revision = number === undefined ? all[0] : await getRevision(tx, datasheet.id, number)
  if (!revision) throw problem('not-found', `Datasheet ${code} has no revision ${number ?? 1}.`)
  const person =
    revision.publishedById === undefined ? undefined : await getPerson(tx, revision.publishedById)
  return {
    code: datasheet.code,
    productCode: datasheet.product.code,
    productName: datasheet.product.name,
    number: revision.number,
    body: bodyOf(revision),
    hash: revision.hash,
    publishedAt: revision.publishedAt,
    publishedBy: person?.name ?? '',
    supersededAt: revision.supersededAt,
    evidenceChanged: revision.evidenceChanged,
    revisions: all.map((row, index) => {
      const before = all[index + 1]
      const body = bodyOf(row)
      return {
        number: row.number,
        publishedAt: row.publishedAt,
        lots: body.spread.lots,
        changes: compareRevisions(before && bodyOf(before), body),
        evidenceChanged: row.evidenceChanged,
      }
    }),
  }
}
