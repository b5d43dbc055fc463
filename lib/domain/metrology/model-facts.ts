import { airDensity, isOrdinaryAir } from '../strings/air-density'
import { airViscosity } from '../strings/air-viscosity'
import { frequencyOfNote } from '../strings/pitch'
import {
  degreesCelsius,
  type KilogramsPerCubicMetre,
  type PerKelvin,
  pascals,
  perKelvin,
} from '../units/quantity'
import type { EvaluationContext } from './evaluation'
import type { SpecimenSheet } from './sheet'
import { fundamentalOfPlucks, type LoadFacts, loadOf } from './sheet-readings'

/**
 * Linear expansion taken for the frame of a contact gauge, for rules and for the frame of a rig, 1/K: steel
 * (common practice, no source). An aluminium frame at 28 °C would differ by 1e-4 of its length.
 */
export const STEEL_EXPANSION = perKelvin(11.5e-6)

/** The facts that do not change while inputs are varied. */
export interface ModelFacts {
  readonly sheet: SpecimenSheet
  readonly context: EvaluationContext
  readonly celsius: number
  /** Of the specimen; undefined where a bulk expansion does not hold along the string (polymers, gut). */
  readonly expansion: PerKelvin | undefined
  /** The room is one that the formula for the air's density is good for. */
  readonly ordinaryAir: boolean
  readonly airDensity: ReturnType<typeof airDensity>
  readonly airViscosity: ReturnType<typeof airViscosity>
  readonly frequency: ReturnType<typeof fundamentalOfPlucks>
  readonly load: LoadFacts | undefined
  readonly unknownWeights: readonly string[]
  readonly referenceFrequency: ReturnType<typeof frequencyOfNote>
}

/**
 * Density that buoyancy of the weighed piece is reckoned with, kg/m³: the material’s, or what core and wraps of
 * a wound string have together, which is the density that its specification asks for.
 */
export const pieceDensity = ({
  material,
  specification,
}: Pick<EvaluationContext, 'material' | 'specification'>): KilogramsPerCubicMetre =>
  specification.core ? specification.effectiveDensity.target : material.density.value

/** What is read from sheet and works once, before the chain is run. */
export function modelFacts(sheet: SpecimenSheet, context: EvaluationContext): ModelFacts {
  const celsius: number = sheet.temperature?.si ?? context.air.celsius
  const air = {
    temperature: degreesCelsius(celsius),
    pressure: pascals(sheet.pressure?.si ?? context.air.pascals),
    humidity: sheet.humidity ?? context.air.humidity,
  }
  const density = airDensity(air)
  const { load, unknown } = loadOf(sheet, context)
  const { midi, a4 } = context.specification.reference
  return {
    sheet,
    context,
    celsius,
    expansion: context.material.kind === 'metal' ? context.material.thermalExpansion?.value : undefined,
    ordinaryAir: isOrdinaryAir(air),
    airDensity: density,
    airViscosity: airViscosity(air.temperature, density),
    frequency: fundamentalOfPlucks(sheet),
    load,
    unknownWeights: unknown,
    referenceFrequency: frequencyOfNote(midi, a4),
  }
}
