/** A works whose four products are drawn on two machines, and a bench file of many lots of theirs. */
import { database } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { machines } from '@/lib/data/machines'
import { insertProduct } from '@/lib/data/products'
import { insertSpecification } from '@/lib/data/specifications'
import { freezeLimits } from '@/lib/services/freeze-limits'
import { csvOf, type FileCells, steelRow } from './bench-file'
import { importText } from './import-run'
import { seededUniform } from './seeded-random'
import { BEGIN, day, type SteelWorks, setUpSteelWorks } from './steel-works'

const HOUR = 3_600_000
const TEN_MINUTES = 600_000

/** Two products a machine; the first of each has limit sets. */
const products = [
  { code: 'L254', machine: 'DM-1', limits: true },
  { code: 'L255', machine: 'DM-1', limits: false },
  { code: 'L256', machine: 'DM-2', limits: true },
  { code: 'L257', machine: 'DM-2', limits: false },
] as const

export const SPECIMENS = 5

/** Rows of lots made one after the other, ten minutes apart; now and then one lies off. */
export function rowsOfLots(lots: number, from: number, prefix: string, seed: number): readonly FileCells[] {
  const random = seededUniform(seed)
  const normal = () => random() + random() + random() + random() - 2
  return Array.from({ length: lots }, (_, index) => {
    const product = products[index % products.length] ?? products[0]
    const lot = `${prefix}-${String(index + 1).padStart(6, '0')}`
    const madeAt = from + index * TEN_MINUTES
    const about = 2540 + 3 * normal() + (index % 997 === 500 ? 14 : 0)
    return Array.from({ length: SPECIMENS }, (_, number) => ({
      ...steelRow({
        lot,
        number: number + 1,
        madeAt,
        measuredAt: madeAt + HOUR + number * 60_000,
        tenths: Math.round(about + normal()),
      }),
      product: product.code,
      machine: product.machine,
    }))
  }).flat()
}

/** Sets it up in the database under test, with forty lots a product and limits frozen on them. */
export async function setUpManyLots(): Promise<SteelWorks> {
  const works = await setUpSteelWorks()
  await database().write(async (tx) => {
    const first = await tx.specificationRevision.findFirstOrThrow()
    await machines.insert(tx, 'DM-2', { name: 'Drawing machine 2', kind: 'drawing machine' }, BEGIN)
    for (const { code } of products.slice(1)) {
      const product = await insertProduct(
        tx,
        code,
        { name: `Larch ${code.slice(1)}`, family: 'Larch', construction: 'plain' },
        BEGIN,
      )
      await insertSpecification(tx, {
        productId: product.id,
        number: 1,
        effectiveFrom: BEGIN - HOUR,
        materialId: first.materialId,
        body: first.body,
        hash: sha256(first.body),
        note: '',
        issuedAt: BEGIN,
        issuedById: works.quality.personId,
      })
    }
  })
  await importText(works.bench, csvOf(rowsOfLots(160, BEGIN, 'BASE', 7)), day(20))
  for (const { code } of products.filter(({ limits }) => limits))
    for (const [characteristic, statistic] of [
      ['diameter', 'mean'],
      ['massPerMetreWeighed', 'mean'],
      ['diameter', 'within-lot-sd'],
    ] as const)
      await freezeLimits(
        works.quality,
        {
          productCode: code,
          characteristic,
          statistic,
          leftOut: [],
          reason: '',
          supersedes: 0,
          alike: false,
        },
        day(20),
      )
  return works
}
