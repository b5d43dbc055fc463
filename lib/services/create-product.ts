import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { findProductByCode, insertProduct } from '@/lib/data/products'
import { problem } from '@/lib/domain/errors'
import type { ProductInput } from '@/lib/input/catalogue'
import { type ProductFacts, productFactsOf } from './list-products'

/**
 * Adds a product; it can be measured once a specification is issued.
 * @throws LedgerlineError not-permitted; conflict when the code is taken
 */
export async function createProduct(
  actor: Actor | undefined,
  { code, ...values }: ProductInput,
  at: number = Date.now(),
): Promise<ProductFacts> {
  permit(actor, 'catalogue.keep')
  return database().write(async (tx) => {
    if (await findProductByCode(tx, code))
      throw problem('conflict', `The code ${code} is taken.`, { where: 'code', mend: 'Choose another one.' })
    const row = await insertProduct(tx, code, values, at)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'create',
      subject: `product ${code}`,
      body: { ...values },
    })
    return productFactsOf(row)
  })
}
