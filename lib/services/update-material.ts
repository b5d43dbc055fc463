import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { findMaterialByCode, updateMaterialRow } from '@/lib/data/materials'
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { MaterialInput } from '@/lib/input/catalogue'
import { changedMeanwhile } from './changed-meanwhile'

/**
 * Changes what the works knows of a material. Results already computed keep the values they rest on;
 * specification revisions already issued keep their targets.
 * @throws LedgerlineError not-permitted, not-found, conflict when someone changed it in the meantime
 */
export async function updateMaterial(
  actor: Actor | undefined,
  code: string,
  version: number,
  { body, ...values }: MaterialInput,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'catalogue.keep')
  await database().write(async (tx) => {
    const before = await findMaterialByCode(tx, code)
    if (!before) throw problem('not-found', `There is no material ${code}.`)
    const change = { ...values, kind: body.kind, body: canonicalJson(body) }
    if (!(await updateMaterialRow(tx, code, version, change))) throw changedMeanwhile(before.name)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'change',
      subject: `material ${code}`,
      body: { ...values, body },
    })
  })
}
