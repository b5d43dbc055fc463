import { COVERAGE_FACTOR } from '../metrology/closure'
import { MODEL_VERSION } from '../metrology/model-version'
import type { SpecificationBody, TensionBasis } from '../metrology/specification'
import type { LotSummaryBody } from '../quality/lot-summary'
import { ok, type Result, refused } from '../result'
import { loadBearingSection } from '../strings/load-bearing'
import type { MaterialBody } from '../strings/material'
import { frequencyOfNote, noteName } from '../strings/pitch'
import { axialStiffness as axialStiffnessOf } from '../strings/stiffness'
import { breakingLoad, tensileStrengthAt } from '../strings/strength'
import { elasticStrain, loadedMassPerMetre } from '../strings/stretch'
import { waveSpeed } from '../strings/wave-speed'
import { decimalsForUncertainty, formatQuantity } from '../units/format'
import { type Hertz, kilogramsPerMetre, type Metres, metres, newtons } from '../units/quantity'
import { differenceFromSi } from '../units/unit'
import type { DatasheetBody, DatasheetFigure, DatasheetRow } from './datasheet'
import { lotSpread } from './lot-spread'
import { basisSentences, type TensionMasses, tensionByBasis } from './tension-by-basis'
import { workingState } from './working-state'

export interface DatasheetRequest {
  /** Notes as MIDI numbers, low to high. */
  readonly notes: readonly number[]
  readonly lengths: readonly Metres[]
  readonly a4: Hertz
  readonly basis: TensionBasis
  readonly forceUnit: DatasheetBody['forceUnit']
}

/** A released lot with its summaries, SI. */
export interface ReleasedLot {
  readonly code: string
  readonly madeAt: number
  readonly massPerMetre: LotSummaryBody
  readonly diameter?: LotSummaryBody
  readonly effectiveDensity?: LotSummaryBody
}

export interface DatasheetFacts {
  readonly works: string
  readonly product: DatasheetBody['product']
  readonly materialName: string
  readonly material: MaterialBody
  readonly specificationNumber: number
  readonly specification: SpecificationBody
  readonly lots: readonly ReleasedLot[]
  readonly cautions: readonly string[]
}

/** Most decimals that are printed of a tension, by unit. */
const mostDecimals: Readonly<Record<DatasheetBody['forceUnit'], number>> = { N: 1, kgf: 2, lbf: 1 }

/**
 * A tension table from released lots: mean mass per metre over the lots, tension at each note and length on
 * the stated basis, share of the least breaking load, and the spread that production really has.
 * Refused with a sentence when there is no released lot, or no note or length.
 */
export function buildDatasheet(facts: DatasheetFacts, request: DatasheetRequest): Result<DatasheetBody> {
  const { lots, material, specification } = facts
  const spread = lotSpread(
    lots.map((lot) => lot.massPerMetre),
    (value) => formatQuantity(value, 'mg/m', { decimals: 2, withUnit: true }),
  )
  const mass = figureOf(lots.map((lot) => lot.massPerMetre))
  if (!spread || !mass)
    return refused({
      code: 'not-ready',
      message: `No lot of ${facts.product.name} is released yet, so there is nothing to publish from.`,
      mend: 'Release a lot first.',
    })
  if (request.notes.length === 0 || request.lengths.length === 0)
    return refused({ code: 'bad-input', message: 'A tension table needs at least one note and one length.' })

  const diameters = figureOf(lots.flatMap((lot) => lot.diameter ?? []))
  const diameter: DatasheetFigure = diameters ?? { value: specification.diameter.target }
  const density = figureOf(lots.flatMap((lot) => lot.effectiveDensity ?? [])) ?? {
    value: specification.effectiveDensity.target,
  }
  const bearing = loadBearingSection(specification.core, metres(diameter.value))
  const axialStiffness = axialStiffnessOf(material.youngsModulus.value, bearing.area)
  const unloaded = kilogramsPerMetre(mass.value)
  const masses: TensionMasses = {
    unloaded,
    axialStiffness,
    loaded: loadedMassPerMetre(unloaded, elasticStrain(specification.tension.target, axialStiffness)),
  }
  const strength = tensileStrengthAt(material, bearing.size)
  const breaking = strength && breakingLoad(strength.low, bearing.area)
  const rows = request.notes.map((midi): DatasheetRow => {
    const frequency = frequencyOfNote(midi, request.a4)
    return {
      midi,
      note: noteName(midi),
      frequency,
      cells: request.lengths.map((length) => {
        const tension = tensionByBasis(request.basis, masses, frequency, length)
        const fraction = breaking === undefined ? undefined : tension / breaking
        return { tension, ...(fraction === undefined ? {} : { fraction }), state: workingState(fraction) }
      }),
    }
  })
  const { reference } = specification
  const frequency = frequencyOfNote(reference.midi, request.a4)
  const tension = tensionByBasis(request.basis, masses, frequency, reference.length)
  const semitone = tensionByBasis(
    request.basis,
    masses,
    frequencyOfNote(reference.midi + 1, request.a4),
    reference.length,
  )
  const expandedTension = tension * ((mass.expanded ?? 0) / mass.value)
  const decimals = Math.max(
    0,
    Math.min(
      mostDecimals[request.forceUnit],
      decimalsForUncertainty(differenceFromSi(expandedTension, request.forceUnit), 1) ??
        mostDecimals[request.forceUnit],
    ),
  )
  return ok({
    format: 1,
    works: facts.works,
    product: facts.product,
    material: facts.materialName,
    specification: facts.specificationNumber,
    modelVersion: MODEL_VERSION,
    basis: request.basis,
    a4: request.a4,
    forceUnit: request.forceUnit,
    decimals,
    massPerMetre: mass,
    diameter,
    effectiveDensity: density,
    axialStiffness,
    loadedMassPerMetre: masses.loaded,
    ...(breaking === undefined
      ? {}
      : {
          breakingLoad: {
            value: breaking,
            basis: 'least tensile strength of the material at this diameter, by its table',
          },
        }),
    reference: {
      note: noteName(reference.midi),
      frequency,
      length: reference.length,
      tension,
      waveSpeed: waveSpeed(newtons(tension), masses.loaded),
      newtonsPerCent: (semitone - tension) / 100,
      semitoneRatio: semitone / tension - 1,
    },
    lengths: request.lengths,
    rows,
    spread,
    lots: lots.map(({ code, madeAt, massPerMetre }) => ({
      code,
      madeAt,
      massPerMetre: massPerMetre.mean,
      specimens: massPerMetre.n,
    })),
    method: `Each specimen is weighed, and sounded under a known load; both routes have to agree. ${basisSentences[request.basis]}`,
    cautions: facts.cautions,
  })
}

/**
 * Mean over lots with U = 2u: what measuring has in common (root mean square of the lots' common parts) and
 * the scatter of the lot means over √k. One lot has only its own uncertainty.
 */
function figureOf(summaries: readonly LotSummaryBody[]): DatasheetFigure | undefined {
  const k = summaries.length
  const first = summaries[0]
  if (!first) return undefined
  const value = first.mean + summaries.reduce((sum, lot) => sum + (lot.mean - first.mean), 0) / k
  const common = summaries.reduce((sum, lot) => sum + lot.uCommon * lot.uCommon, 0) / k
  const squares = summaries.reduce((sum, lot) => sum + (lot.mean - value) * (lot.mean - value), 0)
  const scatter = k > 1 ? squares / (k - 1) / k : first.uMean * first.uMean - first.uCommon * first.uCommon
  return { value, expanded: COVERAGE_FACTOR * Math.sqrt(common + Math.max(0, scatter)) }
}
