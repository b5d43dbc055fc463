import { rigOf } from '@/prisma/demo/equipment'
import type { DemoProduct } from '@/prisma/demo/product'
import type { DemoSchedule } from '@/prisma/demo/schedule'
import { CHANGED_DIE, LATE_LOT } from '@/prisma/demo/story-facts'

/** How the works would have been without a story; what is not named stays. */
interface Switch {
  readonly product?: (product: DemoProduct) => DemoProduct
  readonly lot?: (lot: DemoSchedule) => DemoSchedule
}

const switches: Readonly<Record<string, Switch>> = {
  'nylon-season': { product: ({ season: _, ...product }) => product },
  'moved-target': { product: ({ revised: _, ...product }) => product },
  'changed-die': {
    lot: (lot) => (lot.dieCode === CHANGED_DIE.code ? { ...lot, dieCode: CHANGED_DIE.before } : lot),
  },
  'late-lot': {
    lot: (lot) =>
      lot.productCode === LATE_LOT.productCode && lot.index === LATE_LOT.index
        ? { ...lot, openedAt: lot.madeAt, measuredAt: lot.measuredAt - (lot.openedAt - lot.madeAt) }
        : lot,
  },
  'coarse-micrometer': { lot: (lot) => ({ ...lot, micrometer: rigOf(lot.rig).micrometerCode }) },
}

/** The works as it would be with one story switched off: of each product and lot what it would have been. */
export function withoutStory(key: string): {
  readonly product: (product: DemoProduct) => DemoProduct
  readonly lot: (lot: DemoSchedule) => DemoSchedule
} {
  const found = switches[key]
  if (!found) throw new Error(`The story ${key} cannot be switched off.`)
  const products = new Map<DemoProduct, DemoProduct>()
  const { lot = (one) => one, product = (one) => one } = found
  return {
    lot,
    // One object for one product: charts are told apart by it.
    product: (one) => {
      const other = products.get(one) ?? product(one)
      products.set(one, other)
      return other
    },
  }
}
