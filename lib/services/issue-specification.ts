import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { appendLedger } from '@/lib/data/ledger'
import { lockRow } from '@/lib/data/locks'
import { findMaterialByCode, materialBodyOf } from '@/lib/data/materials'
import { findProductByCode } from '@/lib/data/products'
import { findRigByCode } from '@/lib/data/rigs'
import { insertSpecification, listSpecificationRows } from '@/lib/data/specifications'
import { problem } from '@/lib/domain/errors'
import { completeSpecification, type SpecificationDraft } from '@/lib/domain/metrology/complete-specification'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { type SpecificationFacts, specificationFactsOf } from './list-products'

export interface IssueSpecificationInput {
  readonly productCode: string
  readonly materialCode: string
  /** Epoch milliseconds. */
  readonly effectiveFrom: number
  readonly note: string
  /** The whole of it, or what a person decides, completed from the material. */
  readonly specification: { readonly body: SpecificationBody } | { readonly draft: SpecificationDraft }
}

/**
 * Issues the next specification revision of a product. It is frozen: lots keep the one they were made under.
 * @throws LedgerlineError not-permitted; not-found for product, material or rig; conflict when it would take
 * force before the newest one does
 */
export async function issueSpecification(
  actor: Actor | undefined,
  { productCode, materialCode, effectiveFrom, note, specification }: IssueSpecificationInput,
  at: number = Date.now(),
): Promise<SpecificationFacts> {
  permit(actor, 'catalogue.keep')
  return database().write(async (tx) => {
    const product = await findProductByCode(tx, productCode)
    if (!product) throw problem('not-found', `There is no product ${productCode}.`)
    await lockRow(tx, 'Product', product.id)
    const material = await findMaterialByCode(tx, materialCode)
    if (!material)
      throw problem('not-found', `There is no material ${materialCode}.`, { where: 'materialCode' })
    const body =
      'body' in specification
        ? specification.body
        : completeSpecification(specification.draft, materialBodyOf(material))
    const rig = await findRigByCode(tx, body.plan.rigCode)
    if (!rig) {
      throw problem('not-found', `There is no rig ${body.plan.rigCode}.`, {
        where: 'rigCode',
        mend: 'Add it under Equipment first.',
      })
    }
    const [newest] = await listSpecificationRows(tx, product.id)
    if (newest && effectiveFrom < newest.effectiveFrom) {
      throw problem('conflict', `Revision ${newest.number} takes force later than that.`, {
        where: 'effectiveDay',
        mend: 'A revision follows the one before it: give the same day or a later one.',
      })
    }
    const number = (newest?.number ?? 0) + 1
    const text = canonicalJson(body)
    const hash = sha256(text)
    const row = await insertSpecification(tx, {
      productId: product.id,
      number,
      effectiveFrom,
      materialId: material.id,
      body: text,
      hash,
      note,
      issuedAt: at,
      issuedById: actor.personId,
    })
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'issue',
      subject: `specification ${productCode} ${number}`,
      body: { material: materialCode, effectiveFrom, note, hash },
    })
    return specificationFactsOf(row)
  })
}
