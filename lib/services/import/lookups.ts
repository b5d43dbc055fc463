import type { Tx } from '@/lib/data/database'
import { dies } from '@/lib/data/dies'
import { type KnownEquipment, loadEquipment } from '@/lib/data/evaluation-facts'
import { machines } from '@/lib/data/machines'
import { materialsIn } from '@/lib/data/materials-in'
import { listPeople } from '@/lib/data/people'
import { listProductRows, type ProductRow } from '@/lib/data/products'
import { listSpecificationRows, type SpecificationRow } from '@/lib/data/specifications'
import type { MaterialInKind } from '@/lib/domain/record/material-in'

/** Something that a row names: found by its code or, where only one has it, by its name; capitals do not matter. */
export interface Names<Row> {
  find(text: string): Row | undefined
}

export function namesOf<Row extends { readonly code: string; readonly name: string }>(
  rows: readonly Row[],
): Names<Row> {
  const byCode = new Map(rows.map((row) => [row.code.toLowerCase(), row]))
  const byName = new Map<string, Row | undefined>()
  for (const row of rows) {
    const name = row.name.toLowerCase()
    byName.set(name, byName.has(name) ? undefined : row)
  }
  return { find: (text) => byCode.get(text.toLowerCase()) ?? byName.get(text.toLowerCase()) }
}

interface Named {
  readonly id: number
  readonly code: string
  readonly name: string
}

/** Everything that rows of a file may name, as it stands while nobody writes. */
export interface ImportLookups {
  readonly products: Names<ProductRow>
  readonly machines: Names<Named>
  readonly dies: Names<Named>
  readonly materials: Names<Named & { readonly kind: MaterialInKind }>
  readonly people: Names<Named>
  readonly equipment: KnownEquipment
  /** Revisions of a product, newest first. */
  revisionsOf(productId: number): Promise<readonly SpecificationRow[]>
}

export async function loadLookups(read: Tx): Promise<ImportLookups> {
  const revisions = new Map<number, readonly SpecificationRow[]>()
  return {
    products: namesOf(await listProductRows(read)),
    machines: namesOf(await machines.list(read)),
    dies: namesOf(await dies.list(read)),
    materials: namesOf(await materialsIn.list(read)),
    people: namesOf((await listPeople(read)).map((one) => ({ ...one, code: one.username }))),
    equipment: await loadEquipment(read),
    revisionsOf: async (productId) => {
      const known = revisions.get(productId) ?? (await listSpecificationRows(read, productId))
      revisions.set(productId, known)
      return known
    },
  }
}
