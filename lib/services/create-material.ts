import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { findMaterialByCode, insertMaterial } from '@/lib/data/materials'
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { MaterialInput } from '@/lib/input/catalogue'
import { type MaterialFacts, materialFactsOf } from './list-materials'

/**
 * Adds a material of the works' own.
 * @throws LedgerlineError not-permitted; conflict when the code is taken
 */
export async function createMaterial(
  actor: Actor | undefined,
  code: string,
  { body, ...values }: MaterialInput,
  at: number = Date.now(),
): Promise<MaterialFacts> {
  permit(actor, 'catalogue.keep')
  return database().write(async (tx) => {
    if (await findMaterialByCode(tx, code))
      throw problem('conflict', `The code ${code} is taken.`, { where: 'code', mend: 'Choose another one.' })
    const text = canonicalJson(body)
    const row = await insertMaterial(
      tx,
      code,
      { ...values, kind: body.kind, body: text },
      { builtIn: false, at },
    )
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'create',
      subject: `material ${code}`,
      body: { ...values, body },
    })
    return materialFactsOf(row)
  })
}
