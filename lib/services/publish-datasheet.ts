import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { countDatasheets, insertDatasheet, insertRevision } from '@/lib/data/datasheets'
import { sha256 } from '@/lib/data/hash'
import { appendLedger, ledgerHead } from '@/lib/data/ledger'
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { PublishDatasheetInput } from '@/lib/input/datasheet'
import { previewDatasheet } from './build-datasheet'

export interface PublishedRevision {
  readonly datasheetCode: string
  readonly number: number
  readonly hash: string
  readonly changes: readonly string[]
}

/**
 * Freezes a numbered revision: body, hash, lots it rests on, and an anchor of the ledger as it stood.
 * @throws LedgerlineError not-permitted, not-found, not-ready, or conflict when a newer revision was published
 */
export async function publishDatasheet(
  actor: Actor | undefined,
  { supersedes, ...input }: PublishDatasheetInput,
  at: number = Date.now(),
): Promise<PublishedRevision> {
  permit(actor, 'datasheets.publish')
  return database().write(async (tx) => {
    const preview = await previewDatasheet(tx, input, at)
    const { body, changes, lotIds, newest, productId } = preview
    const number = (newest?.number ?? 0) + 1
    if (supersedes !== number - 1)
      throw problem('conflict', `Revision ${number - 1} was published in the meantime.`, {
        where: 'supersedes',
        mend: 'Look at it, then publish again.',
      })
    const code = `DS-${String((await countDatasheets(tx)) + 1).padStart(4, '0')}`
    const datasheet = preview.datasheet ?? (await insertDatasheet(tx, code, productId, at))
    const text = canonicalJson(body)
    const hash = sha256(text)
    const head = await ledgerHead(tx)
    await insertRevision(tx, {
      datasheetId: datasheet.id,
      number,
      basis: body.basis,
      modelVersion: body.modelVersion,
      body: text,
      hash,
      ledgerCount: head.count,
      ledgerHash: head.hash,
      at,
      publishedById: actor.personId,
      lotIds,
    })
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'publish',
      subject: `datasheet ${datasheet.code}`,
      body: { revision: number, hash, lots: lotIds.length, product: body.product.code, changes },
    })
    return { datasheetCode: datasheet.code, number, hash, changes }
  })
}
