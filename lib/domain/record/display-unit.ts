import { type CharacteristicId, characteristics } from '../metrology/characteristics'
import type { UnitId } from '../units/unit'
import type { ChartedStatistic } from './chart-history'

/** The works' choice of units, as far as results are shown in them. */
export interface ResultUnits {
  readonly diameter: UnitId
  readonly force: UnitId
  readonly mass: UnitId
}

export interface DisplayUnit {
  readonly unit: UnitId
  /** Decimals of a value on a chart; where an uncertainty is shown beside it, that decides. */
  readonly decimals: number
}

/** Results are finer than what is typed: a works that types millimetres reads its charts in micrometres. */
const display = {
  micrometres: { unit: 'µm', decimals: 2 },
  thou: { unit: 'thou', decimals: 3 },
  milligrams: { unit: 'mg/m', decimals: 1 },
  grams: { unit: 'g/m', decimals: 4 },
  density: { unit: 'kg/m³', decimals: 0 },
  ratio: { unit: '%', decimals: 2 },
  cents: { unit: 'cents', decimals: 1 },
} as const satisfies Record<string, DisplayUnit>

/** The unit in which a characteristic's results, charts and limits are shown. */
export function displayUnit(id: CharacteristicId, units: ResultUnits): DisplayUnit {
  switch (characteristics[id].dimension) {
    case 'length':
      return units.diameter === 'in' || units.diameter === 'thou' ? display.thou : display.micrometres
    case 'massPerLength':
      return units.mass === 'g' || units.mass === 'kg' ? display.grams : display.milligrams
    case 'force':
      return { unit: units.force, decimals: 2 }
    case 'density':
      return display.density
    case 'ratio':
      return display.ratio
    default:
      return display.cents
  }
}

/** The same for a chart: a spread needs one more decimal than the values it comes from. */
export function chartUnit(
  id: CharacteristicId,
  statistic: ChartedStatistic,
  units: ResultUnits,
): DisplayUnit {
  const { unit, decimals } = displayUnit(id, units)
  return { unit, decimals: statistic === 'mean' ? decimals : decimals + 1 }
}

/** What a chart shows, as a person reads it. */
export const chartName = (id: CharacteristicId, statistic: ChartedStatistic): string =>
  statistic === 'mean'
    ? characteristics[id].name
    : `Spread within the lot, ${characteristics[id].name.charAt(0).toLowerCase()}${characteristics[id].name.slice(1)}`
