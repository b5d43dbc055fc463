import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import type { DemoProduct } from './product'

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

/**
 * Whether quality knows that neighbouring lots are alike on a chart: those of nylon follow each other, and the
 * season, in size and mass. Both routes follow together, so that their closure does not.
 */
export const areAlike = ({ variation }: DemoProduct, characteristic: CharacteristicId): boolean =>
  variation.follows > 0 && characteristic !== 'closure'
