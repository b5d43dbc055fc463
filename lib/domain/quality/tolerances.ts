import type { CharacteristicId } from '../metrology/characteristics'
import type { SpecificationBody } from '../metrology/specification'
import type { Limits } from './judge-specimen'

/** The characteristics that a specification sets limits to, in the order of the tables. */
export const tolerancedCharacteristics = [
  'diameter',
  'ovality',
  'massPerMetreWeighed',
  'massPerMetreSounded',
  'effectiveDensity',
  'tension',
] as const satisfies readonly CharacteristicId[]

/** Limits of a characteristic by the specification; undefined for those without a tolerance of their own. */
export function limitsOf(specification: SpecificationBody, id: CharacteristicId): Limits | undefined {
  const { diameter, massPerMetre, ovalityMax, effectiveDensity, tension } = specification
  switch (id) {
    case 'diameter':
      return { lower: diameter.lower, upper: diameter.upper }
    case 'ovality':
      return { upper: ovalityMax }
    case 'massPerMetreWeighed':
    case 'massPerMetreSounded':
      return { lower: massPerMetre.lower, upper: massPerMetre.upper }
    case 'effectiveDensity':
      return { lower: effectiveDensity.lower, upper: effectiveDensity.upper }
    case 'tension':
      return { lower: tension.lower, upper: tension.upper }
    default:
      return undefined
  }
}

/**
 * Guard factor r of the guard band r·U: as the specification says, else 1 for tension and mass (they are
 * promised to the musician) and 0 for the rest.
 */
export function guardFactorOf(specification: SpecificationBody, id: CharacteristicId): 0 | 1 {
  const typed = specification.guardFactors[id]
  if (typed !== undefined) return typed
  return id === 'tension' || id === 'massPerMetreWeighed' || id === 'massPerMetreSounded' ? 1 : 0
}
