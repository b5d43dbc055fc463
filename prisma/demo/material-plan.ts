import type { LotMaterialRole, MaterialInKind } from '@/lib/domain/record/material-in'
import type { DemoProduct } from './product'
import { demoProducts, productOf } from './products'
import { HARD_TWIN, inHardTwin, WRONG_ALLOY } from './story-facts'
import { dayOfLot, WORKING_DAYS } from './working-days'

export interface DemoLotMaterial {
  readonly role: LotMaterialRole
  readonly code: string
}

/** A coil, spool or resin batch as it comes in. */
export interface DemoMaterialIn {
  readonly code: string
  readonly name: string
  readonly kind: MaterialInKind
  readonly materialCode: string
  readonly heat: string
  readonly supplier: string
  readonly parentCode?: string
  readonly sizeMetres?: number
  readonly massKilograms?: number
  readonly note: string
}

const two = (number: number): string => String(number).padStart(2, '0')

/** Lots that one coil, spool or batch lasts for; a batch of resin feeds all nylon for so many days. */
const LASTS = { wire: 12, core: 25, wrap: 8, ribbon: 5, resinDays: 20 } as const

interface Planned {
  readonly materials: readonly (readonly DemoLotMaterial[])[]
  readonly bought: readonly DemoMaterialIn[]
}

const supplierOf = { steel: 'Aldermoor Wire', bronze: 'Pinnock & Lisle', resin: 'Estover Polymers' } as const

const block = (index: number, lasts: number): number => Math.floor(index / lasts) + 1

function wire(product: DemoProduct): Planned {
  const code = (index: number) => `C-${product.micrometres}-${two(block(index, LASTS.wire))}`
  const lots = Array.from({ length: product.lots }, (_, index) => index)
  return {
    materials: lots.map((index) => [{ role: 'core', code: code(index) }]),
    bought: [...new Set(lots.map(code))].map((one, number) => ({
      code: one,
      name: `Wire for ${product.name}, coil ${number + 1}`,
      kind: 'coil',
      materialCode: 'MUSIC-WIRE',
      heat: String(4100 + product.micrometres + 7 * Math.floor(number / 2)),
      supplier: supplierOf.steel,
      massKilograms: 60,
      note: '',
    })),
  }
}

/** Which spool a wound lot has: the usual ones, the brass sold as bronze, the hard heat. */
function spoolKind(product: DemoProduct, index: number): 'usual' | 'brass' | 'hard' {
  if (
    product.code === WRONG_ALLOY.productCode &&
    index >= WRONG_ALLOY.from &&
    index < WRONG_ALLOY.from + WRONG_ALLOY.lots
  )
    return 'brass'
  return inHardTwin(product.machine, dayOfLot(index, product.place, product.lots)) ? 'hard' : 'usual'
}

function wound(product: DemoProduct): Planned {
  const bronze = product.family === 'Rowan'
  const materialCode = bronze ? 'PHOSPHOR-BRONZE-5' : 'STAINLESS-430'
  const lasts = bronze ? LASTS.wrap : LASTS.ribbon
  const bought = new Map<string, DemoMaterialIn>()
  const buy = (one: DemoMaterialIn) => bought.set(one.code, bought.get(one.code) ?? one)
  let spool = 0
  let lotsOnIt = 0
  let kindOnIt: string | undefined
  const materials = Array.from({ length: product.lots }, (_, index): readonly DemoLotMaterial[] => {
    const kind = spoolKind(product, index)
    if (kind !== kindOnIt || lotsOnIt === lasts) {
      spool += 1
      lotsOnIt = 0
      kindOnIt = kind
    }
    lotsOnIt += 1
    const core = `C-${product.prefix}-${two(block(index, LASTS.core))}`
    const coil =
      kind === 'hard'
        ? `K-${product.prefix}-H`
        : kind === 'brass'
          ? `K-${product.prefix}-P`
          : `K-${product.prefix}-${two(block(spool - 1, 3))}`
    buy({
      code: core,
      name: `Core of ${product.name}`,
      kind: 'coil',
      materialCode: 'MUSIC-WIRE',
      heat: String(5200 + product.micrometres + block(index, LASTS.core)),
      supplier: supplierOf.steel,
      ...(product.specification.core ? { sizeMetres: product.specification.core.size } : {}),
      massKilograms: 40,
      note: '',
    })
    buy({
      code: coil,
      name: `${bronze ? 'Wrap wire' : 'Ribbon'} for ${product.name}`,
      kind: 'coil',
      materialCode,
      heat:
        kind === 'hard'
          ? HARD_TWIN.heat
          : String(7000 + product.micrometres + 3 * spool - (kind === 'brass' ? 1 : 0)),
      supplier: supplierOf.bronze,
      massKilograms: 50,
      note: '',
    })
    const code = `S-${product.prefix}-${two(spool)}`
    buy({
      code,
      name: `${bronze ? 'Wrap' : 'Ribbon'} spool ${spool} for ${product.name}`,
      kind: 'spool',
      materialCode,
      heat: '',
      supplier: '',
      parentCode: coil,
      note: '',
    })
    return [
      { role: 'core', code: core },
      { role: 'wrap-1', code },
    ]
  })
  return { materials, bought: [...bought.values()] }
}

const resinCode = (day: number): string => `P-${two(block(day, LASTS.resinDays))}`

function extruded(product: DemoProduct): Planned {
  const code = (index: number) => resinCode(dayOfLot(index, product.place, product.lots))
  return {
    materials: Array.from({ length: product.lots }, (_, index) => [{ role: 'resin', code: code(index) }]),
    bought: Array.from({ length: WORKING_DAYS / LASTS.resinDays }, (_, number) => ({
      code: resinCode(number * LASTS.resinDays),
      name: `Nylon, batch ${number + 1}`,
      kind: 'resin-batch',
      materialCode: product.materialCode,
      heat: '',
      supplier: supplierOf.resin,
      massKilograms: 25,
      note: '',
    })),
  }
}

const planOf = (product: DemoProduct): Planned =>
  product.family === 'Larch' ? wire(product) : product.family === 'Alder' ? extruded(product) : wound(product)

const plans = new Map<string, Planned>()

function planned(code: string): Planned {
  const plan = plans.get(code) ?? planOf(productOf(code))
  plans.set(code, plan)
  return plan
}

/** What a lot is made of. */
export const materialsOf = (productCode: string, index: number): readonly DemoLotMaterial[] =>
  planned(productCode).materials[index] ?? []

/** A coil, spool or batch with what it was wound from before it. */
export function materialsNamed(code: string): readonly DemoMaterialIn[] {
  const all = demoProducts.flatMap((product) => planned(product.code).bought)
  const own = all.find((one) => one.code === code)
  if (!own) throw new Error(`The demo has no material ${code}.`)
  return [...(own.parentCode === undefined ? [] : materialsNamed(own.parentCode)), own]
}
