import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { findProductByCode, listProductRows, type ProductRow } from '@/lib/data/products'
import {
  findSpecificationInForce,
  listSpecificationRows,
  type SpecificationRow,
  specificationBodyOf,
} from '@/lib/data/specifications'
import { problem } from '@/lib/domain/errors'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'

export interface SpecificationFacts {
  readonly number: number
  readonly effectiveFrom: number
  readonly issuedAt: number
  readonly issuedById: number | undefined
  readonly materialCode: string
  readonly materialName: string
  readonly note: string
  readonly hash: string
  readonly body: SpecificationBody
}

export interface ProductFacts {
  readonly code: string
  readonly name: string
  readonly family: string
  readonly construction: string
  readonly active: boolean
}

export interface ListedProduct extends ProductFacts {
  readonly inForce: SpecificationFacts | undefined
}

export interface ProductWithRevisions extends ListedProduct {
  /** Newest first. */
  readonly revisions: readonly SpecificationFacts[]
}

export const specificationFactsOf = (row: SpecificationRow): SpecificationFacts => ({
  number: row.number,
  effectiveFrom: row.effectiveFrom,
  issuedAt: row.issuedAt,
  issuedById: row.issuedById,
  materialCode: row.materialCode,
  materialName: row.materialName,
  note: row.note,
  hash: row.hash,
  body: specificationBodyOf(row),
})

export const productFactsOf = ({ id: _, ...facts }: ProductRow): ProductFacts => facts

/** All products by family and code, each with the specification revision in force. */
export async function listProducts(
  actor: Actor | undefined,
  at: number = Date.now(),
): Promise<readonly ListedProduct[]> {
  permit(actor, 'catalogue.read')
  const { read } = database()
  const listed: ListedProduct[] = []
  for (const row of await listProductRows(read)) {
    const inForce = await findSpecificationInForce(read, row.id, at)
    listed.push({ ...productFactsOf(row), inForce: inForce && specificationFactsOf(inForce) })
  }
  return listed
}

/**
 * A product with all its specification revisions.
 * @throws LedgerlineError not-found
 */
export async function requireProduct(
  actor: Actor | undefined,
  code: string,
  at: number = Date.now(),
): Promise<ProductWithRevisions> {
  permit(actor, 'catalogue.read')
  const { read } = database()
  const row = await findProductByCode(read, code)
  if (!row) throw problem('not-found', `There is no product ${code}.`)
  const inForce = await findSpecificationInForce(read, row.id, at)
  const revisions = await listSpecificationRows(read, row.id)
  return {
    ...productFactsOf(row),
    inForce: inForce && specificationFactsOf(inForce),
    revisions: revisions.map(specificationFactsOf),
  }
}
