import { type CharacteristicId, characteristicIds } from '@/lib/domain/metrology/characteristics'
import type { ChartedStatistic } from '@/lib/domain/record/chart-history'

/** One stave of a product's chart. */
export interface ChartChoice {
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
}

/** The staves of a product's chart unless others are chosen. */
export const defaultCharts: readonly ChartChoice[] = [
  { characteristic: 'diameter', statistic: 'mean' },
  { characteristic: 'massPerMetreWeighed', statistic: 'mean' },
  { characteristic: 'closure', statistic: 'mean' },
  { characteristic: 'massPerMetreWeighed', statistic: 'within-lot-sd' },
]

/** What can be charted, in the order of the staves; density is the tie-breaker between die and wire. */
export const offeredCharts: readonly ChartChoice[] = [
  { characteristic: 'diameter', statistic: 'mean' },
  { characteristic: 'ovality', statistic: 'mean' },
  { characteristic: 'massPerMetreWeighed', statistic: 'mean' },
  { characteristic: 'massPerMetreSounded', statistic: 'mean' },
  { characteristic: 'effectiveDensity', statistic: 'mean' },
  { characteristic: 'closure', statistic: 'mean' },
  { characteristic: 'tension', statistic: 'mean' },
  { characteristic: 'diameter', statistic: 'within-lot-sd' },
  { characteristic: 'massPerMetreWeighed', statistic: 'within-lot-sd' },
]

const SPREAD = 'spread-of-'

/** A chart as it stands in an address: `diameter`, `spread-of-massPerMetreWeighed`. */
export const chartId = ({ characteristic, statistic }: ChartChoice): string =>
  statistic === 'mean' ? characteristic : `${SPREAD}${characteristic}`

/** A chart from an address; undefined when nothing of that name can be charted. */
export function parseChartId(id: string): ChartChoice | undefined {
  const spread = id.startsWith(SPREAD)
  const name = spread ? id.slice(SPREAD.length) : id
  const characteristic = characteristicIds.find((one) => one === name)
  return characteristic && { characteristic, statistic: spread ? 'within-lot-sd' : 'mean' }
}

/**
 * The staves that an address asks for (`diameter,closure`), each once, in the order of the offered ones; without
 * any that can be charted, the usual ones.
 */
export function parseStaves(text: string | undefined): readonly ChartChoice[] {
  const asked = new Set((text ?? '').split(',').map((id) => id.trim()))
  const chosen = offeredCharts.filter((choice) => asked.has(chartId(choice)))
  return chosen.length > 0 ? chosen : defaultCharts
}

/** In which order lots stand on a chart: as they were made, or as they were measured, where gauges show. */
export const driftOrders = ['made', 'measured'] as const

export type DriftOrder = (typeof driftOrders)[number]

/** The order that an address asks for; as made unless it says otherwise. */
export const parseOrder = (text: string | undefined): DriftOrder =>
  text === 'measured' ? 'measured' : 'made'
