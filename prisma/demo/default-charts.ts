import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'

/** The charts of every product (DESIGN §3). */
export const defaultCharts: readonly {
  readonly characteristic: CharacteristicId
  readonly statistic: 'mean' | 'within-lot-sd'
}[] = [
  { characteristic: 'diameter', statistic: 'mean' },
  { characteristic: 'massPerMetreWeighed', statistic: 'mean' },
  { characteristic: 'closure', statistic: 'mean' },
  { characteristic: 'massPerMetreWeighed', statistic: 'within-lot-sd' },
  { characteristic: 'effectiveDensity', statistic: 'mean' },
]
