import { ok, type Result, refused } from '../result'
import { autocorrelationBound, lagOneAutocorrelation } from '../statistics/lag-one-autocorrelation'
import { sampleStandardDeviation } from '../statistics/sample-standard-deviation'
import type { ControlRule } from './find-signals'
import { individualsLimits, meanOf } from './individuals-chart'
import { meanOfSpread } from './spread-constants'

/** Fewer lots than this say too little about the spread between lots to draw limits from. */
export const FEWEST_BASELINE_LOTS = 20
/** Below this many lots a limit set is called provisional. */
export const PROVISIONAL_BELOW = 60

export interface BaselineLot {
  readonly lotId: number
  readonly code: string
  readonly value: number
  /** Specimens behind the value. */
  readonly n: number
  readonly leftOut: boolean
}

export type SigmaEstimator =
  | 'moving-range mean'
  | 'mean standard deviation over c4'
  | 'overall standard deviation'

export interface LimitProposal {
  readonly centre: number
  /** σ of the charted statistic. */
  readonly sigma: number
  readonly lower: number | undefined
  readonly upper: number
  readonly sigmaEstimator: SigmaEstimator
  /** Rules that the set is asked for: runs mean nothing where lots follow each other by nature. */
  readonly rules: readonly ControlRule[]
  /** Neighbouring lots are taken to be alike by nature (a season, a slow batch). */
  readonly alike: boolean
  readonly lotCount: number
  readonly provisional: boolean
  /** Baseline lots beyond the proposed limits: for a person to look at, never left out by themselves. */
  readonly beyond: readonly { readonly lotId: number; readonly code: string; readonly value: number }[]
  /** Sentences on what the baseline says about itself. */
  readonly advice: readonly string[]
}

/**
 * Limits from baseline lots in chart order.
 * - `mean` (individuals chart of lot means): centre = mean, σ = mean moving range of neighbours / d2(2),
 *   limits ±3σ; one-sided characteristics get an upper limit only.
 *   Where neighbours are alike by nature (`alike`; by default when the lag-1 autocorrelation is above 1.96/√n),
 *   moving ranges are too short: σ = overall standard deviation, and runs on one side are not asked for.
 * - `within-lot-sd`: centre = s̄, upper limit s̄ (1 + 3√(1−c4²)/c4), no lower one.
 *
 * Refused with a sentence for fewer than twenty lots, or when the values do not vary.
 * Sources: ISO 7870-2; ASTM E2587.
 */
export function proposeLimits(
  lots: readonly BaselineLot[],
  statistic: 'mean' | 'within-lot-sd',
  oneSided: boolean,
  alike?: boolean,
): Result<LimitProposal> {
  const kept = lots.filter((lot) => !lot.leftOut)
  if (kept.length < FEWEST_BASELINE_LOTS)
    return refused({
      code: 'not-ready',
      message: `Control limits need at least ${FEWEST_BASELINE_LOTS} lots; ${kept.length} ${kept.length === 1 ? 'is' : 'are'} in the baseline.`,
      mend: 'Measure more lots, or leave fewer out.',
    })
  const isAlike = statistic === 'mean' && (alike ?? followsItself(kept))
  const base = statistic === 'mean' ? meanLimits(lots, oneSided, isAlike) : spreadLimits(kept)
  if (!base || !(base.sigma > 0))
    return refused({
      code: 'not-ready',
      message: 'The baseline lots do not vary, so no limits can be drawn from them.',
      mend: 'Check the resolution of the equipment: its step hides the variation.',
    })
  const beyond = kept.filter(
    (lot) => lot.value > base.upper || (base.lower !== undefined && lot.value < base.lower),
  )
  return ok({
    ...base,
    rules: isAlike ? ['beyond-the-limits'] : ['beyond-the-limits', 'nine-on-one-side'],
    alike: isAlike,
    lotCount: kept.length,
    provisional: kept.length < PROVISIONAL_BELOW,
    beyond: beyond.map(({ lotId, code, value }) => ({ lotId, code, value })),
    advice: adviceOn(kept, isAlike),
  })
}

type Base = Pick<LimitProposal, 'centre' | 'sigma' | 'lower' | 'upper' | 'sigmaEstimator'>

function meanLimits(lots: readonly BaselineLot[], oneSided: boolean, alike: boolean): Base | undefined {
  if (alike) return overallLimits(lots, oneSided)
  const limits = individualsLimits(lots.map((lot) => (lot.leftOut ? undefined : lot.value)))
  if (!limits) return undefined
  const { centre, lower, sigma, upper } = limits
  return { centre, sigma, lower: oneSided ? undefined : lower, upper, sigmaEstimator: 'moving-range mean' }
}

function overallLimits(lots: readonly BaselineLot[], oneSided: boolean): Base | undefined {
  const values = lots.flatMap((lot) => (lot.leftOut ? [] : [lot.value]))
  const sigma = sampleStandardDeviation(values)
  if (sigma === undefined) return undefined
  const centre = meanOf(values)
  return {
    centre,
    sigma,
    lower: oneSided ? undefined : centre - 3 * sigma,
    upper: centre + 3 * sigma,
    sigmaEstimator: 'overall standard deviation',
  }
}

function spreadLimits(kept: readonly BaselineLot[]): Base {
  const centre = meanOf(kept.map((lot) => lot.value))
  const sizes = kept.map((lot) => lot.n).sort((a, b) => a - b)
  const n = Math.max(2, sizes[Math.floor(sizes.length / 2)] ?? 2)
  const c4 = meanOfSpread(n)
  const sigma = (centre * Math.sqrt(1 - c4 * c4)) / c4
  return {
    centre,
    sigma,
    lower: undefined,
    upper: centre + 3 * sigma,
    sigmaEstimator: 'mean standard deviation over c4',
  }
}

const autocorrelationOf = (kept: readonly BaselineLot[]): number =>
  lagOneAutocorrelation(kept.map((lot) => lot.value)) ?? 0

/** Whether neighbouring lots are more alike than chance makes them. */
const followsItself = (kept: readonly BaselineLot[]): boolean =>
  autocorrelationOf(kept) > autocorrelationBound(kept.length)

/** Lag-1 autocorrelation beyond 1.96/√n is told, with what it does to false alarms. */
function adviceOn(kept: readonly BaselineLot[], alike: boolean): readonly string[] {
  const r1 = autocorrelationOf(kept)
  const bound = autocorrelationBound(kept.length)
  const advice: string[] = []
  if (Math.abs(r1) > bound)
    advice.push(
      `Neighbouring lots are ${r1 > 0 ? 'alike' : 'unlike'} (autocorrelation ${r1.toFixed(2)}, beyond ${bound.toFixed(2)}): limits from moving ranges ${r1 > 0 ? 'would be too narrow and cry wolf' : 'are too wide'}.`,
    )
  if (alike)
    advice.push(
      'So the spread is taken from all lots together, and runs on one side are not asked for. If a cause is to be found behind it, find it first, and freeze limits of calm lots.',
    )
  const sizes = new Set(kept.map((lot) => lot.n))
  if (sizes.size > 1) advice.push('The lots have different numbers of specimens.')
  return advice
}
