import type { SpecimenSheet, TypedValue } from '@/lib/domain/metrology/sheet'
import { airDensity } from '@/lib/domain/strings/air-density'
import { airViscosity } from '@/lib/domain/strings/air-viscosity'
import { deadWeightForce, hangingStringForce } from '@/lib/domain/strings/dead-weight-force'
import { localGravity } from '@/lib/domain/strings/normal-gravity'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import { soundedFundamental } from '@/lib/domain/strings/sounding-forward'
import { plainWireAxialStiffness, plainWireBendingStiffness } from '@/lib/domain/strings/stiffness'
import {
  degreesCelsius,
  hertz,
  kilograms,
  kilogramsPerCubicMetre,
  metres,
  newtons,
  pascals,
} from '@/lib/domain/units/quantity'
import { toSi, type UnitId } from '@/lib/domain/units/unit'
import { demoRig, demoWeights, demoWorks } from './equipment'
import type { DemoProduct } from './products'
import { type Random, seededRandom } from './random'
import { type DemoSchedule, inZeroWeek, WORN_DIE, ZERO_WEEK } from './schedule'

/** What is true of a lot; nobody at the works can see it. */
interface TrueLot {
  readonly diameter: number
  /** Tail − head, metres. */
  readonly taper: number
  readonly density: number
  readonly ovality: number
  readonly celsius: number
  /** Share by which the load pulls less or more than reckoned while this lot is sounded. */
  readonly hang: number
  /** What the zero of the micrometer stands off, metres. */
  readonly zero: number
}

const gravity = localGravity(demoWorks.latitudeDegrees, demoWorks.heightMetres)
const hangingMass = demoWeights
  .filter(({ code }) => code === demoRig.hangerCode || demoRig.weightCodes.some((one) => one === code))
  .reduce((sum, { conventionalMass }) => sum + conventionalMass, 0)

function trueLot(product: DemoProduct, lot: DemoSchedule, random: Random): TrueLot {
  const age = lot.dieCode === WORN_DIE.code ? lot.index - WORN_DIE.from + 1 : 0
  return {
    diameter: product.specification.diameter.target + 0.6e-6 * random.normal(2.5) + age * WORN_DIE.perLot,
    taper: (0.5 + 0.3 * random.uniform()) * 1e-6,
    density: 7850 * (1 + 0.001 * random.normal(2)),
    ovality: 0.6e-6 * random.uniform(),
    celsius: 20 + random.normal(2) * 0.5,
    hang: 0.0006 * random.normal(1.8),
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
    return readSpecimen(product, truth, truth.diameter + alongLot + 0.35e-6 * random.normal(2.5), end, random)
  })
}

function readSpecimen(
  { specification }: DemoProduct,
  lot: TrueLot,
  diameter: number,
  end: 'head' | 'tail',
  random: Random,
): SpecimenSheet {
  const d = metres(diameter)
  const density = kilogramsPerCubicMetre(lot.density)
  const air = { temperature: degreesCelsius(lot.celsius), pressure: pascals(101325), humidity: 0.5 }
  const airRho = airDensity(air)
  const perMetre = solidWireMassPerMetre(d, density)
  const modulus = pascals(206e9)

  const diameters = [1, 2, 3].flatMap((position) =>
    (['a', 'b'] as const).map((direction) => {
      const read =
        diameter + (direction === 'a' ? 0.5 : -0.5) * lot.ovality + lot.zero + 0.5e-6 * random.normal(2.5)
      return { position, direction, value: typedValue(read, 'mm', 1e3, 4, metres) }
    }),
  )

  const cut = specification.plan.cutLength
  const pieceLength = cut + 0.05e-3 * random.normal(2)
  const pieceMass = (perMetre * pieceLength * (1 - airRho / density)) / (1 - airRho / 8000)
  const cutMass = typedValue(pieceMass + 1e-8 * random.normal(2), 'mg', 1e6, 2, kilograms)

  const span = metres(demoRig.spanMetres)
  const hung = deadWeightForce(kilograms(hangingMass), gravity, airRho)
  const below = hangingStringForce(perMetre, metres(demoRig.hangingLengthMetres), gravity)
  const friction = 0.0004 * (2 * random.uniform() - 1)
  const heard = soundedFundamental(
    {
      force: newtons((hung + below) * (1 + lot.hang + friction)),
      span,
      endCondition: demoRig.endCondition,
      axialStiffness: plainWireAxialStiffness(modulus, d),
      bendingStiffness: plainWireBendingStiffness(modulus, d),
      outerDiameter: d,
      air: { density: airRho, viscosity: airViscosity(air.temperature, airRho) },
    },
    perMetre,
  )
  return {
    takenAt: { end },
    diameters,
    weighedState: 'slack',
    cutLength: typedValue(cut, 'mm', 1e3, 1, metres),
    cutMass,
    load: { kind: 'weights', hanger: demoRig.hangerCode, weights: [...demoRig.weightCodes] },
    span: typedValue(span, 'mm', 1e3, 1, metres),
    frequencies: [typedValue(heard, 'Hz', 1, 2, hertz)],
    temperature: typedValue(lot.celsius, '°C', 1, 1, degreesCelsius),
    keptDoubts: [],
  }
}
