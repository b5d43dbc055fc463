import type { BulkRow } from '@/lib/data/bulk/bulk-connection'
import { searchKeyOf } from '@/lib/data/equipment-store'
import type { LotRow } from '@/lib/data/lots'
import type { ProductRow } from '@/lib/data/products'
import type { SpecificationRow } from '@/lib/data/specifications'
import type { Problem } from '@/lib/domain/errors'
import type { LotMaterialRole } from '@/lib/domain/record/material-in'
import { ok, type Result, refused } from '@/lib/domain/result'
import type { BenchRow, LotOpening } from '@/lib/input/bench-file/bench-row'
import type { ImportLookups, Names } from './lookups'

/** A lot that a row opens: what is needed to plan on it, and its rows. */
export interface OpenedByRow {
  readonly lot: LotRow
  readonly revision: SpecificationRow
  readonly row: BulkRow
  readonly materials: readonly BulkRow[]
}

const fault = (where: string, message: string, mend: string): Problem => ({
  code: 'bad-input',
  message,
  where,
  mend,
})

const FUTURE_SLACK = 24 * 3_600_000

/** Opens a lot from the first row that names it, with the next free id. Refused with every problem of the row. */
export async function openFromRow(
  { lot: code, opening }: BenchRow,
  lookups: ImportLookups,
  { id, personId, at }: { readonly id: number; readonly personId: number; readonly at: number },
): Promise<Result<OpenedByRow>> {
  const { product: productName, madeAt } = opening
  if (productName === undefined || madeAt === undefined)
    return refused({
      code: 'not-found',
      message: `There is no lot ${code}, and the row does not say ${productName === undefined ? 'of which product it is' : 'when it was made'}.`,
      where: 'lot',
      mend: 'Correct the lot’s code, or give product and made_at, so that the row opens it.',
    })
  const problems: Problem[] = []
  const product = lookups.products.find(productName)
  if (!product)
    problems.push(
      fault(
        'product',
        `There is no product “${productName}”.`,
        'Add it in the Catalogue, or correct the name.',
      ),
    )
  if (madeAt > at + FUTURE_SLACK)
    problems.push(fault('made_at', 'A lot can’t be made in the future.', 'Check the date.'))
  const machine = named(opening, 'machine', lookups.machines, problems)
  const die = named(opening, 'die', lookups.dies, problems)
  const maker = named(opening, 'maker', lookups.people, problems)
  const coil = named(opening, 'coil', lookups.materials, problems)
  const spool = named(opening, 'spool', lookups.materials, problems)
  const revision = product && (await revisionOf(product, opening, madeAt, lookups, problems))
  if (problems.length > 0 || !product || !revision) return refused(...problems)
  const makerId = maker?.id ?? personId
  const wrapRole: LotMaterialRole = product.construction === 'plain' ? 'core' : 'wrap-1'
  const links = [
    ...(coil ? [{ role: coil.kind === 'resin-batch' ? 'resin' : 'core', materialInId: coil.id }] : []),
    ...(spool ? [{ role: wrapRole, materialInId: spool.id }] : []),
  ]
  return ok({
    revision,
    lot: {
      id,
      code,
      state: 'measuring',
      version: 1,
      evidenceChanged: false,
      madeAt,
      measuredAt: undefined,
      lengthMetres: opening.lengthMetres,
      setting: '',
      createdAt: at,
      createdById: personId,
      makerId,
      product,
      specificationRevisionId: revision.id,
      machine,
      die,
    },
    row: {
      id,
      code,
      searchKey: searchKeyOf(code, product.name, product.code),
      productId: product.id,
      specificationRevisionId: revision.id,
      machineId: machine?.id ?? null,
      dieId: die?.id ?? null,
      makerId,
      madeAt,
      lengthMetres: opening.lengthMetres ?? null,
      setting: '',
      createdAt: at,
      createdById: personId,
    },
    materials: links.map(({ materialInId, role }, index) => ({
      lotId: id,
      role,
      place: links.slice(0, index).filter((one) => one.role === role).length + 1,
      materialInId,
    })),
  })
}

const mends = {
  machine: 'Register it in Equipment, or correct its code.',
  die: 'Register it in Equipment, or correct its code.',
  coil: 'Enter it in Materials in, or correct its code.',
  spool: 'Enter it in Materials in, or correct its code.',
  maker: 'Write the name or user name as it stands in Settings, People.',
} as const

async function revisionOf(
  product: ProductRow,
  opening: LotOpening,
  madeAt: number,
  lookups: ImportLookups,
  problems: Problem[],
): Promise<SpecificationRow | undefined> {
  const revisions = await lookups.revisionsOf(product.id)
  const found =
    opening.specification === undefined
      ? revisions.find((one) => one.effectiveFrom <= madeAt)
      : revisions.find((one) => one.number === opening.specification)
  if (found) return found
  problems.push(
    opening.specification === undefined
      ? fault(
          'made_at',
          `${product.name} had no specification in force when this lot was made.`,
          'Issue a revision in the Catalogue, effective from that day, or name a revision under specification.',
        )
      : fault(
          'specification',
          `${product.name} has no specification revision ${opening.specification}.`,
          'Correct the number, or leave it out for the one in force at made_at.',
        ),
  )
  return undefined
}

/** What a row says of a lot that is there already must be true. */
export function contradictions(
  { opening }: BenchRow,
  lot: Pick<LotRow, 'code' | 'die' | 'machine' | 'madeAt' | 'product'>,
  lookups: ImportLookups,
): readonly Problem[] {
  const problems: Problem[] = []
  const product = opening.product === undefined ? undefined : lookups.products.find(opening.product)
  if (opening.product !== undefined && product?.id !== lot.product.id)
    problems.push(
      fault(
        'product',
        `Lot ${lot.code} is of ${lot.product.name}, the row says “${opening.product}”.`,
        'Correct the product or the lot’s code.',
      ),
    )
  if (opening.madeAt !== undefined && opening.madeAt !== lot.madeAt)
    problems.push(
      fault(
        'made_at',
        `Lot ${lot.code} was made at ${new Date(lot.madeAt).toISOString()}, the row says ${new Date(opening.madeAt).toISOString()}.`,
        'Correct the time, or leave it empty: a lot keeps the time it was opened with.',
      ),
    )
  for (const [where, names] of [
    ['machine', lookups.machines],
    ['die', lookups.dies],
  ] as const) {
    const found = named(opening, where, names, problems)
    const stored = lot[where]
    if (found && stored && found.id !== stored.id)
      problems.push(
        fault(
          where,
          `Lot ${lot.code} was made with ${stored.code}, the row says “${opening[where]}”.`,
          `Correct the ${where}, or leave it empty: a lot keeps what it was opened with.`,
        ),
      )
  }
  named(opening, 'maker', lookups.people, problems)
  named(opening, 'coil', lookups.materials, problems)
  named(opening, 'spool', lookups.materials, problems)
  return problems
}

/** What a row names, where it names something; a name that nothing has is a problem. */
function named<Row>(
  opening: LotOpening,
  where: keyof typeof mends,
  names: Names<Row>,
  problems: Problem[],
): Row | undefined {
  const text = opening[where]
  if (text === undefined) return undefined
  const found = names.find(text)
  if (!found) problems.push(fault(where, `There is no ${where} “${text}”.`, mends[where]))
  return found
}
