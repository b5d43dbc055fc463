import type { SpecimenSheet, TypedValue } from '@/lib/domain/metrology/sheet'
import { localGravity } from '@/lib/domain/strings/normal-gravity'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import { degreesCelsius, hertz, kilograms, kilogramsPerCubicMetre, metres } from '@/lib/domain/units/quantity'
import { toSi, type UnitId } from '@/lib/domain/units/unit'
import { demoRig, demoWeights, demoWorks } from './equipment'
import { type Bench, perfectReadings, type TrueString } from './perfect-readings'
import type { DemoProduct } from './products'
import { type Random, seededRandom } from './random'
import { type DemoSchedule, inZeroWeek, WIDE_DIE, WORN_DIE, ZERO_WEEK } from './schedule'

/** What is true of a lot; nobody at the works can see it. */
interface TrueLot {
  readonly diameter: number
  /** Tail − head, metres. */
  readonly taper: number
  readonly density: number
  readonly ovality: number
  readonly celsius: number
  /** Share by which the load pulls less or more than reckoned while this lot is sounded. */
  readonly pull: number
  /** What the zero of the micrometer stands off, metres. */
  readonly zero: number
}

const gravity = localGravity(demoWorks.latitudeDegrees, demoWorks.heightMetres)
const hangingMass = demoWeights
  .filter(({ code }) => code === demoRig.hangerCode || demoRig.weightCodes.some((one) => one === code))
  .reduce((sum, { conventionalMass }) => sum + conventionalMass, 0)

/** Between lots: 0.6 µm in diameter, 0.1 % in density, 0.07 % in the pull, 0.4 µm in the micrometer's zero. */
function trueLot(product: DemoProduct, lot: DemoSchedule, random: Random): TrueLot {
  const worn = lot.dieCode === WORN_DIE.code ? (lot.index - WORN_DIE.from + 1) * WORN_DIE.perLot : 0
  const wide = lot.dieCode === WIDE_DIE.code ? WIDE_DIE.wider : 0
  return {
    diameter: product.specification.diameter.target + 0.6e-6 * random.normal(2.5) + worn + wide,
    taper: (0.5 + 0.3 * random.uniform()) * 1e-6,
    density: 7850 * (1 + 0.001 * random.normal(2)),
    ovality: 0.6e-6 * random.uniform(),
    celsius: 20 + random.normal(2) * 0.5,
    pull: 0.0008 * random.normal(1.8),
    zero: 0.4e-6 * random.normal(2) + (inZeroWeek(lot.day) ? ZERO_WEEK.error : 0),
  }
}

function typedValue<Q extends number>(
  si: number,
  unit: UnitId,
  perUnit: number,
  decimals: number,
  door: (value: number) => Q,
): TypedValue<Q> {
  const typed = (si * perUnit).toFixed(decimals)
  return { typed, unit, si: door(toSi(Number(typed), unit)) }
}

/**
 * What five specimens of a lot read: the domain's own chain backwards, from a true string to its readings,
 * with the noise of hands and instruments, rounded to the steps that the instruments show.
 */
export function readLot(product: DemoProduct, lot: DemoSchedule): readonly SpecimenSheet[] {
  const random = seededRandom(lot.micrometres * 1000 + lot.index)
  const truth = trueLot(product, lot, random)
  return product.specification.plan.takenAt.map((end) => {
    const alongLot = (end === 'head' ? -0.5 : 0.5) * truth.taper
    const diameter = truth.diameter + alongLot + 0.35e-6 * random.normal(2.5)
    return readSpecimen(product, truth, diameter, end, random)
  })
}

const trueString = (diameter: number, density: number): TrueString => ({
  diameter,
  massPerMetre: solidWireMassPerMetre(metres(diameter), kilogramsPerCubicMetre(density)),
  density: 7850,
  modulus: 206e9,
  expansion: 11.5e-6,
})

const benchOf = ({ specification }: DemoProduct, lot: TrueLot, friction: number, cut: number): Bench => ({
  celsius: lot.celsius,
  gravity,
  hangingMass,
  hangingLength: demoRig.hangingLengthMetres,
  reckonedMassPerMetre: specification.massPerMetre.target,
  pull: lot.pull + friction,
  span: demoRig.spanMetres,
  endCondition: demoRig.endCondition,
  cutLength: cut,
  weighedState: 'slack',
})

function readSpecimen(
  product: DemoProduct,
  lot: TrueLot,
  diameter: number,
  end: 'head' | 'tail',
  random: Random,
): SpecimenSheet {
  const { cutLength } = product.specification.plan
  const friction = 0.0004 * (2 * random.uniform() - 1)
  const cut = cutLength + 0.05e-3 * random.normal(2)
  const perfect = perfectReadings(trueString(diameter, lot.density), benchOf(product, lot, friction, cut))
  const diameters = [1, 2, 3].flatMap((position) =>
    (['a', 'b'] as const).map((direction) => {
      const oval = (direction === 'a' ? 0.5 : -0.5) * lot.ovality
      const read = perfect.diameter + oval + lot.zero + 0.5e-6 * random.normal(2.5)
      return { position, direction, value: typedValue(read, 'mm', 1e3, 4, metres) }
    }),
  )
  return {
    takenAt: { end },
    diameters,
    weighedState: 'slack',
    cutLength: typedValue(cutLength, 'mm', 1e3, 1, metres),
    cutMass: typedValue(perfect.cutMass + 1e-8 * random.normal(2), 'mg', 1e6, 2, kilograms),
    load: { kind: 'weights', hanger: demoRig.hangerCode, weights: [...demoRig.weightCodes] },
    span: typedValue(demoRig.spanMetres, 'mm', 1e3, 1, metres),
    frequencies: [typedValue(perfect.frequency, 'Hz', 1, 2, hertz)],
    temperature: typedValue(lot.celsius, '°C', 1, 1, degreesCelsius),
    keptDoubts: [],
  }
}
