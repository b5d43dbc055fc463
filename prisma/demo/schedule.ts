import { type DemoMachine, rigOf } from './equipment'
import { type DemoLotMaterial, materialsOf } from './material-plan'
import { demoProducts } from './products'
import {
  CHANGED_DIE,
  COARSE_MICROMETER,
  inCoarseDays,
  LATE_LOT,
  NEXT_DIE,
  WIDE_DIE,
  WORN_DIE,
} from './story-facts'
import { dayOfLot, workingDay } from './working-days'

export { inZeroWeek, NEXT_DIE, WIDE_DIE, WORN_DIE, ZERO_WEEK } from './story-facts'

/** A lot of the demo before anything of it is measured. */
export interface DemoSchedule {
  readonly code: string
  readonly productCode: string
  readonly micrometres: number
  /** From 0 within the product. */
  readonly index: number
  /** From 0, in working days since the first. */
  readonly day: number
  readonly madeAt: number
  /** When its traveller reached the bench: at once, but for a lot that lay. */
  readonly openedAt: number
  readonly measuredAt: number
  readonly machine: DemoMachine
  /** Wound strings and nylon come off a winder or an extruder: no die is charted. */
  readonly dieCode: string | undefined
  readonly materials: readonly DemoLotMaterial[]
  readonly rig: string
  readonly micrometer: string
  readonly maker: 'aldous' | 'imrie'
  readonly lengthMetres: number
}

const MINUTE = 60_000

export function dieOf(micrometres: number, index: number): string {
  if (micrometres === WIDE_DIE.micrometres && index >= WIDE_DIE.from) return WIDE_DIE.code
  if (micrometres === 330 && index >= CHANGED_DIE.from) return CHANGED_DIE.code
  if (micrometres !== 254) return `D-${micrometres}`
  if (index < WORN_DIE.from) return 'D-06'
  return index < WORN_DIE.from + WORN_DIE.lots ? WORN_DIE.code : NEXT_DIE
}

/** Every lot of every product, in the order in which they were made. */
export function demoSchedule(): readonly DemoSchedule[] {
  return demoProducts
    .flatMap((product, order) => {
      const { place } = product
      return Array.from({ length: product.lots }, (_, index): DemoSchedule => {
        const day = dayOfLot(index, place, product.lots)
        const madeAt =
          workingDay(day) + (6 * 60 + 40 + place * 95 + ((index * 37) % 60) + shiftOf(order)) * MINUTE
        const late = product.code === LATE_LOT.productCode && index === LATE_LOT.index
        const openedAt = late ? madeAt + workingDay(day + LATE_LOT.workingDays) - workingDay(day) : madeAt
        const rig = rigOf(product.specification.plan.rigCode)
        return {
          code: `${product.prefix}-${String(index + 1).padStart(3, '0')}`,
          productCode: product.code,
          micrometres: product.micrometres,
          index,
          day,
          madeAt,
          openedAt,
          measuredAt: openedAt + (40 + ((index * 13) % 30)) * MINUTE,
          machine: product.machine,
          dieCode: product.family === 'Larch' ? dieOf(product.micrometres, index) : undefined,
          materials: materialsOf(product.code, index),
          rig: rig.code,
          micrometer: inCoarseDays(product.machine, day) ? COARSE_MICROMETER.micrometer : rig.micrometerCode,
          maker: (index + (order < 4 ? 0 : order)) % 3 === 2 ? 'imrie' : 'aldous',
          lengthMetres:
            product.family === 'Larch' ? 1300 + ((index * 53) % 17) * 10 : 300 + ((index * 53) % 17) * 5,
        }
      })
    })
    .sort((a, b) => a.madeAt - b.madeAt || (a.code < b.code ? -1 : 1))
}

/** Lots of other machines come off at other minutes. */
const shiftOf = (order: number): number => (order < 4 ? 0 : order < 8 ? 17 : order < 11 ? 29 : 44)
