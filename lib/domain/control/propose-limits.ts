import { ok, type Result, refused } from '../result'
import { autocorrelationBound, lagOneAutocorrelation } from '../statistics/lag-one-autocorrelation'
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

export type SigmaEstimator = 'moving-range mean' | 'mean standard deviation over c4'

export interface LimitProposal {
  readonly centre: number
  /** σ of the charted statistic. */
  readonly sigma: number
  readonly lower: number | undefined
  readonly upper: number
  readonly sigmaEstimator: SigmaEstimator
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
 * - `within-lot-sd`: centre = s̄, upper limit s̄ (1 + 3√(1−c4²)/c4), no lower one.
 *
 * Refused with a sentence for fewer than twenty lots, or when the values do not vary.
 * Sources: ISO 7870-2; ASTM E2587.
 */
export function proposeLimits(
  lots: readonly BaselineLot[],
  statistic: 'mean' | 'within-lot-sd',
  oneSided: boolean,
): Result<LimitProposal> {
  const kept = lots.filter((lot) => !lot.leftOut)
  if (kept.length < FEWEST_BASELINE_LOTS)
    return refused({
      code: 'not-ready',
      message: `Control limits need at least ${FEWEST_BASELINE_LOTS} lots; ${kept.length} ${kept.length === 1 ? 'is' : 'are'} in the baseline.`,
      mend: 'Measure more lots, or leave fewer out.',
    })
  const base = statistic === 'mean' ? meanLimits(lots, oneSided) : spreadLimits(kept)
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
    lotCount: kept.length,
    provisional: kept.length < PROVISIONAL_BELOW,
    beyond: beyond.map(({ lotId, code, value }) => ({ lotId, code, value })),
    advice: adviceOn(kept),
  })
}

type Base = Pick<LimitProposal, 'centre' | 'sigma' | 'lower' | 'upper' | 'sigmaEstimator'>

function meanLimits(lots: readonly BaselineLot[], oneSided: boolean): Base | undefined {
  const limits = individualsLimits(lots.map((lot) => (lot.leftOut ? undefined : lot.value)))
  if (!limits) return undefined
  const { centre, lower, sigma, upper } = limits
  return { centre, sigma, lower: oneSided ? undefined : lower, upper, sigmaEstimator: 'moving-range mean' }
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

/** Lag-1 autocorrelation beyond 1.96/√n is told: neighbours alike make the limits too narrow. */
function adviceOn(kept: readonly BaselineLot[]): readonly string[] {
  const values = kept.map((lot) => lot.value)
  const r1 = lagOneAutocorrelation(values) ?? 0
  const bound = autocorrelationBound(values.length)
  const advice: string[] = []
  if (Math.abs(r1) > bound)
    advice.push(
      `Neighbouring lots are alike (autocorrelation ${r1.toFixed(2)}, more than ${bound.toFixed(2)}): limits from moving ranges are ${r1 > 0 ? 'too narrow and will cry wolf' : 'too wide'}.`,
    )
  const sizes = new Set(kept.map((lot) => lot.n))
  if (sizes.size > 1) advice.push('The lots have different numbers of specimens.')
  return advice
}
