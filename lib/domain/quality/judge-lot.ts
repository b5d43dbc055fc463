import type { CharacteristicId } from '../metrology/characteristics'
import { conformanceProbability } from './conformance-probability'
import { type Conformity, judgeSpecimen, type Limits } from './judge-specimen'
import { type LotSummaryBody, sampleStandardDeviationOf } from './lot-summary'

export interface LotJudgement {
  readonly id: CharacteristicId
  readonly n: number
  readonly mean: number
  /** Standard uncertainty of the mean, common part not divided. */
  readonly u: number
  readonly limits: Limits
  readonly guardFactor: 0 | 1
  /** Sample standard deviation of the specimens; undefined below two. */
  readonly s: number | undefined
  /** (nearer limit − mean)/s; undefined without a spread. */
  readonly quality: number | undefined
  readonly acceptanceConstant: number
  /** Largest standard deviation with which a centred lot would still be accepted; two-sided only. */
  readonly largestSpread: number | undefined
  /** By the plan's acceptance constant; undefined when there is too little to say. */
  readonly accepted: boolean | undefined
  /** Probability that the lot's mean lies inside the tolerance. */
  readonly probability: number
  readonly verdict: Conformity
}

/**
 * One characteristic of a lot against its tolerance: the mean with its uncertainty, and the spread against
 * the acceptance constant. Inside only when both hold; outside when the mean is; not proven otherwise.
 *
 * Sources: JCGM 106:2012, 7.2 (conformance probability of a normal state of knowledge); acceptance by
 * variables in the form (limit − mean)/s ≥ k, ISO 3951-1.
 */
export function judgeLot(
  id: CharacteristicId,
  summary: LotSummaryBody,
  limits: Limits,
  guardFactor: 0 | 1,
  acceptanceConstant: number,
): LotJudgement {
  const { n, mean, uMean: u } = summary
  const s = sampleStandardDeviationOf(summary)
  const room = Math.min(
    limits.lower === undefined ? Number.POSITIVE_INFINITY : mean - limits.lower,
    limits.upper === undefined ? Number.POSITIVE_INFINITY : limits.upper - mean,
  )
  const quality = s === undefined || !(s > 0) || !Number.isFinite(room) ? undefined : room / s
  const accepted =
    s === undefined ? undefined : quality === undefined ? room >= 0 : quality >= acceptanceConstant
  const byMean = judgeSpecimen({ value: mean, u }, limits, guardFactor)
  return {
    id,
    n,
    mean,
    u,
    limits,
    guardFactor,
    s,
    quality,
    acceptanceConstant,
    largestSpread:
      limits.lower === undefined || limits.upper === undefined || !(acceptanceConstant > 0)
        ? undefined
        : (limits.upper - limits.lower) / (2 * acceptanceConstant),
    accepted,
    probability: conformanceProbability(mean, u, limits),
    verdict: byMean === 'inside' && accepted !== true ? 'not proven' : byMean,
  }
}
