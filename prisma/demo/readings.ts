import type { KeptDoubt, SpecimenSheet, TypedValue } from '@/lib/domain/metrology/sheet'
import { localGravity } from '@/lib/domain/strings/normal-gravity'
import { degreesCelsius, hertz, kilograms, metres } from '@/lib/domain/units/quantity'
import { toSi, type UnitId } from '@/lib/domain/units/unit'
import { entrySlip } from './entry-slips'
import { type DemoRig, demoGauges, demoWorks, rigOf } from './equipment'
import { type Bench, perfectReadings, type TrueString } from './perfect-readings'
import { type DemoProduct, specificationFor } from './product'
import type { Random } from './random'
import type { DemoSchedule } from './schedule'
import { randomOf, type TrueLot, trueLot } from './true-lot'

const gravity = localGravity(demoWorks.latitudeDegrees, demoWorks.heightMetres)

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

/** A diameter in the steps that its micrometer shows. */
function shownDiameter(si: number, code: string): TypedValue<ReturnType<typeof metres>> {
  const step = demoGauges.find((one) => one.code === code)?.resolution ?? 1e-7
  const decimals = step < 1e-6 ? 4 : 3
  // Steps of half a micrometre; the others are what the decimals leave.
  const shown = step === 5e-7 ? Math.round(si / step) * step : si
  return typedValue(shown, 'mm', 1e3, decimals, metres)
}

/**
 * What five specimens of a lot read: the domain's own chain backwards, from a true string to its readings,
 * with the noise of hands and instruments, rounded to the steps that the instruments show. Seed 0 is the demo;
 * others give works of the same kind with other luck.
 */
export function readLot(product: DemoProduct, lot: DemoSchedule, seed = 0): readonly SpecimenSheet[] {
  const random = randomOf(product, lot, seed)
  const truth = trueLot(product, lot, random, seed)
  return product.specification.plan.takenAt.map((end, index) =>
    readSpecimen({ product, lot, truth, end, number: index + 1 }, random),
  )
}

interface Taken {
  readonly product: DemoProduct
  readonly lot: DemoSchedule
  readonly truth: TrueLot
  readonly end: 'head' | 'tail'
  readonly number: number
}

function trueString({ end, lot, product, truth }: Taken, random: Random): TrueString {
  const { diameterWithin, massFollowsWithin, massWithin } = product.variation
  const { core, effectiveDensity } = specificationFor(product, lot.index)
  const alongLot = (end === 'head' ? -0.5 : 0.5) * truth.taper
  const diameter = truth.diameter + alongLot + truth.spread * diameterWithin * random.normal(2.5)
  const lighter = massWithin === 0 ? 0 : truth.spread * massWithin * random.normal(2.5)
  const grown = diameter / truth.diameter
  return {
    diameter,
    massPerMetre: truth.massPerMetre * grown ** (2 * massFollowsWithin) * (1 + lighter),
    ...(core ? { core } : {}),
    modulus: product.modulus,
    ...(product.expansion === undefined ? {} : { expansion: product.expansion }),
    density: effectiveDensity.target,
  }
}

const benchOf = ({ lot, product, truth }: Taken, rig: DemoRig, friction: number, cut: number): Bench => ({
  celsius: truth.celsius,
  gravity,
  hangingMass: truth.hangingMass,
  hangingLength: rig.hangingLengthMetres,
  reckonedMassPerMetre: specificationFor(product, lot.index).massPerMetre.target,
  pull: truth.pull + friction,
  span: rig.spanMetres,
  endCondition: rig.endCondition,
  cutLength: cut,
  weighedState: product.specification.plan.weighedState,
})

function readSpecimen(taken: Taken, random: Random): SpecimenSheet {
  const { end, lot, number, product, truth } = taken
  const { variation } = product
  const { cutLength, weighedState } = product.specification.plan
  const rig = rigOf(lot.rig)
  const string = trueString(taken, random)
  const friction = variation.friction * (2 * random.uniform() - 1)
  const cut = cutLength + variation.cut * random.normal(2)
  const perfect = perfectReadings(string, benchOf(taken, rig, friction, cut))
  const diameters = [1, 2, 3].flatMap((position) =>
    (['a', 'b'] as const).map((direction) => {
      const oval = (direction === 'a' ? 0.5 : -0.5) * truth.ovality
      const read = perfect.diameter + oval + truth.zero + variation.reading * random.normal(2.5)
      return { position, direction, value: shownDiameter(read, lot.micrometer) }
    }),
  )
  const milligrams = product.family === 'Larch' ? 2 : 1
  const cutMass = perfect.cutMass + variation.weighing * random.normal(2)
  const [hanger = '', ...weights] = product.load
  const heard = typedValue(perfect.frequency, 'Hz', 1, 2, hertz)
  const slip = entrySlip(lot, number, heard.typed, perfect.frequency)
  const doubts: readonly KeptDoubt[] = slip?.doubt ? [slip.doubt] : []
  return {
    takenAt: { end },
    diameters,
    weighedState,
    cutLength: typedValue(cutLength, 'mm', 1e3, 1, metres),
    cutMass: typedValue(cutMass, 'mg', 1e6, milligrams, kilograms),
    load: { kind: 'weights', hanger, weights },
    span: typedValue(rig.spanMetres, 'mm', 1e3, 1, metres),
    frequencies: [slip ? { typed: slip.typed, unit: 'Hz', si: hertz(Number(slip.typed)) } : heard],
    temperature: typedValue(truth.celsius, '°C', 1, 1, degreesCelsius),
    keptDoubts: doubts,
  }
}
