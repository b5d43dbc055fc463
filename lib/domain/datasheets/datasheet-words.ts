import { formatNumber, formatQuantity } from '../units/format'
import type { UnitId } from '../units/unit'
import type { DatasheetBody, DatasheetCell, WorkingState } from './datasheet'
import { basisSentences } from './tension-by-basis'
import { WORKING_BOUNDS } from './working-state'

type Decimal = 'point' | 'comma'

export const forceUnitNames: Readonly<Record<DatasheetBody['forceUnit'], string>> = {
  N: 'newtons',
  kgf: 'kilograms-force',
  lbf: 'pounds-force',
}

/** What the shading of a cell says. */
export const workingStateWords = (decimal: Decimal): Readonly<Record<WorkingState, string>> => {
  const [slack, working, upper] = [WORKING_BOUNDS.slack, WORKING_BOUNDS.working, WORKING_BOUNDS.upper].map(
    (bound) => formatNumber(bound, { decimals: 2, decimal }),
  )
  return {
    slack: `below ${slack}, slack`,
    working: `${slack} to ${working}, working`,
    upper: `${working} to ${upper}, only if the maker of the instrument agrees`,
    over: `above ${upper}, not offered`,
  }
}

export interface FigureInWords {
  readonly name: string
  readonly value: string
  readonly note?: string
}

/** The figures at the head of a datasheet, as they are printed. */
export function figuresInWords(body: DatasheetBody, decimal: Decimal): readonly FigureInWords[] {
  const { massPerMetre, diameter, effectiveDensity, reference } = body
  const number = (value: number, decimals: number): string => formatNumber(value, { decimals, decimal })
  const quantity = (value: number, unit: UnitId, decimals: number): string =>
    formatQuantity(value, unit, { decimals, decimal, withUnit: true })
  const expanded = (value: number | undefined, unit: UnitId, decimals: number): string | undefined =>
    value === undefined ? undefined : `± ${formatQuantity(value, unit, { decimals, decimal })} (k = 2)`
  return [
    {
      name: 'Mass per metre',
      value: quantity(massPerMetre.value, 'mg/m', 1),
      note: expanded(massPerMetre.expanded, 'mg/m', 1),
    },
    {
      name: 'Diameter',
      value: quantity(diameter.value, 'mm', 4),
      note: expanded(diameter.expanded, 'mm', 4) ?? 'by the specification',
    },
    {
      name: 'Effective density',
      value: quantity(effectiveDensity.value, 'kg/m³', 0),
      note: 'of the measured circle',
    },
    {
      name: 'Breaking load',
      value: body.breakingLoad ? quantity(body.breakingLoad.value, body.forceUnit, 0) : '–',
      note: body.breakingLoad ? 'least, by the material’s table' : 'not known',
    },
    {
      name: `${reference.note} on ${number(reference.length * 1000, 0)} mm`,
      value: quantity(reference.tension, body.forceUnit, body.decimals),
      note: `${number(reference.frequency, 2)} Hz`,
    },
    {
      name: 'Wave speed',
      value: `${number(reference.waveSpeed, 1)} m/s`,
      note: `at ${reference.note}`,
    },
    {
      name: 'One semitone up',
      value: `+${number(reference.semitoneRatio * 100, 1)} %`,
      note: 'tension',
    },
    {
      name: 'One cent',
      value: quantity(reference.newtonsPerCent, body.forceUnit, 2),
      note: `at ${reference.note}`,
    },
  ]
}

/** How the readings were made; the law itself is said by `lawInWords`. */
export const methodInWords = (body: DatasheetBody): string =>
  body.method.replace(` ${basisSentences[body.basis]}`, '')

/** The law of the basis, with the value that the table was reckoned with beside the mass per metre. */
export function lawInWords(
  body: DatasheetBody,
  decimal: Decimal,
): { readonly law: string; readonly values: string } {
  const values =
    body.basis === 'unloaded-mass'
      ? `EA = ${formatQuantity(body.axialStiffness, 'N', { decimals: 0, decimal, withUnit: true })}.`
      : body.basis === 'loaded-mass'
        ? `µ_loaded = ${formatQuantity(body.loadedMassPerMetre, 'mg/m', { decimals: 2, decimal, withUnit: true })}.`
        : ''
  return { law: basisSentences[body.basis], values }
}

/** A length over its column, in millimetres. */
export const lengthInWords = (length: number, decimal: Decimal): string => {
  const millimetres = length * 1000
  const whole = Math.abs(millimetres - Math.round(millimetres)) < 1e-6
  return `${formatNumber(millimetres, { decimals: whole ? 0 : 1, decimal })} mm`
}

/** A cell of the table: the tension, or “over” where it is not offered, and the share of the breaking load. */
export const cellInWords = (
  cell: DatasheetCell,
  { forceUnit, decimals }: DatasheetBody,
  decimal: Decimal,
): { readonly tension: string; readonly share: string } => ({
  tension: cell.state === 'over' ? 'over' : formatQuantity(cell.tension, forceUnit, { decimals, decimal }),
  share: cell.fraction === undefined ? '' : formatNumber(cell.fraction, { decimals: 2, decimal }),
})

/** Over the table: A4 and temperature that its frequencies and tensions hold for. */
export const tableInWords = (body: DatasheetBody, decimal: Decimal): string =>
  `with the share of the least breaking load beside it. A4 = ${formatNumber(body.a4, { decimals: Number.isInteger(body.a4) ? 0 : 1, decimal })} Hz, equal temperament, 20 °C`

/**
 * What stiffness would add at the reference note, in cents, were the ends pinned: ½ B of the frequency, with
 * B = π²EI/(TL²) and EI = EA·d²/16 of a round wire. Source: Fletcher, J. Acoust. Soc. Am. 36 (1964) 203.
 */
export function stiffnessInWords(
  { axialStiffness, diameter, reference }: DatasheetBody,
  decimal: Decimal,
): string {
  const { length, note, tension } = reference
  const bending = (axialStiffness * diameter.value * diameter.value) / 16
  const share = (Math.PI * Math.PI * bending) / (tension * length * length)
  const cents = (600 / Math.LN2) * share
  const added = cents < 0.05 ? 'less than 0.1' : formatNumber(cents, { decimals: 1, decimal })
  const shown = decimal === 'comma' ? added.replace('.', ',') : added
  return `Stiffness is not in the table: between pinned ends it would raise ${note} on ${lengthInWords(length, decimal)} by ${shown} cents.`
}
