import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { findProductByCode, setProductActiveRow } from '@/lib/data/products'
import { problem } from '@/lib/domain/errors'

/**
 * Takes a product out of the range, or back into it. Its lots and datasheets stay.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function setProductActive(
  actor: Actor | undefined,
  code: string,
  active: boolean,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'catalogue.keep')
  await database().write(async (tx) => {
    const row = await findProductByCode(tx, code)
    if (!row) throw problem('not-found', `There is no product ${code}.`)
    if (row.active === active) return
    await setProductActiveRow(tx, row.id, active)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: active ? 'activate' : 'deactivate',
      subject: `product ${code}`,
      body: {},
    })
  })
}
