import { database } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { findProductByCode, insertProduct } from '@/lib/data/products'
import { insertSpecification } from '@/lib/data/specifications'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { BEGIN } from './steel-works'

/** A further product of the works under test, specified like the first. */
export const addProduct = (code: string, name: string): Promise<void> =>
  database().write(async (tx) => {
    const first = await tx.specificationRevision.findFirstOrThrow({ orderBy: { id: 'asc' } })
    const product = await insertProduct(tx, code, { name, family: 'Larch', construction: 'plain' }, BEGIN)
    await insertSpecification(tx, {
      productId: product.id,
      number: 1,
      effectiveFrom: BEGIN - 3_600_000,
      materialId: first.materialId,
      body: first.body,
      hash: sha256(first.body),
      note: '',
      issuedAt: BEGIN,
      issuedById: first.issuedById ?? 1,
    })
  })

/** A second revision of a product that changes what it asks for, from a moment on. */
export const reviseProduct = (
  code: string,
  effectiveFrom: number,
  change: (body: SpecificationBody) => SpecificationBody,
): Promise<void> =>
  database().write(async (tx) => {
    const product = await findProductByCode(tx, code)
    if (!product) throw new Error(`no product ${code}`)
    const first = await tx.specificationRevision.findFirstOrThrow({ where: { productId: product.id } })
    const body = canonicalJson(change(JSON.parse(first.body) as SpecificationBody))
    await insertSpecification(tx, {
      productId: product.id,
      number: 2,
      effectiveFrom,
      materialId: first.materialId,
      body,
      hash: sha256(body),
      note: '',
      issuedAt: effectiveFrom,
      issuedById: first.issuedById ?? 1,
    })
  })
