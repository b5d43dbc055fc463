import type { CharacteristicId } from '../metrology/characteristics'
import type { SpecificationBody } from '../metrology/specification'
import type { ChartedStatistic } from './chart-history'

/** What a specification asks for on a chart, SI; undefined where it has no target (ratios, ovality, spreads). */
export function targetOf(
  specification: SpecificationBody,
  characteristic: CharacteristicId,
  statistic: ChartedStatistic,
): number | undefined {
  if (statistic !== 'mean') return undefined
  switch (characteristic) {
    case 'diameter':
      return specification.diameter.target
    case 'massPerMetreWeighed':
    case 'massPerMetreSounded':
      return specification.massPerMetre.target
    case 'effectiveDensity':
      return specification.effectiveDensity.target
    case 'tension':
      return specification.tension.target
    default:
      return undefined
  }
}
