import { type CharacteristicId, characteristics } from '../metrology/characteristics'
import { closureVerdict } from '../metrology/closure'
import type { SpecificationBody } from '../metrology/specification'
import { judgeLot } from './judge-lot'
import { roomToLimits } from './judge-specimen'
import type { LotSummaryBody } from './lot-summary'
import { proposeDisposition } from './propose-disposition'
import { guardFactorOf, limitsOf, tolerancedCharacteristics } from './tolerances'

export interface LotStanding {
  readonly standing: 'outside' | 'open closure' | 'doubtful' | 'calm'
  /** Why, in one sentence. */
  readonly reason: string
}

/**
 * A measured lot at a glance, from its summaries alone: for a list of many lots. The lot's own page asks every
 * specimen, its equipment and its signals, and may stop where this is calm; it never calls inside what this calls
 * outside, as both judge the same means by the same plan.
 */
export function lotStanding(
  specification: SpecificationBody,
  summaries: Readonly<Partial<Record<CharacteristicId, LotSummaryBody>>>,
): LotStanding {
  const judged = tolerancedCharacteristics.flatMap((id) => {
    const limits = limitsOf(specification, id)
    const summary = summaries[id]
    if (!limits || !summary) return []
    const { acceptanceConstant } = specification.plan
    const judgement = judgeLot(id, summary, limits, guardFactorOf(specification, id), acceptanceConstant)
    const straying = Math.min(roomToLimits(summary.min, limits), roomToLimits(summary.max, limits)) < 0
    return [{ judgement, straying }]
  })
  const judgements = judged.map(({ judgement }) => judgement)
  const { closure: summary } = summaries
  const closure = summary && { mean: summary.mean, u: summary.uMean }
  const { headline, verb } = proposeDisposition({
    specimensPlanned: 0,
    specimensComplete: 0,
    judgements,
    ...(closure ? { closure } : {}),
    openClosures: [],
    outside: [],
    openSignals: [],
    overdueEquipment: [],
  })
  if (headline.startsWith('Outside')) return { standing: 'outside', reason: headline }
  if (closure && closure.u > 0 && closureVerdict(closure.mean, closure.u) === 'open')
    return {
      standing: 'open closure',
      reason: 'The two routes to mass per metre disagree: its closure is open.',
    }
  if (verb !== 'release') return { standing: 'doubtful', reason: headline }
  const strays = judged.filter(({ straying }) => straying)
  if (strays.length > 0) {
    const names = strays.map(({ judgement }) => characteristics[judgement.id].name.toLowerCase())
    return {
      standing: 'doubtful',
      reason: `Inside by its mean; a specimen lies beyond: ${names.join(', ')}.`,
    }
  }
  return { standing: 'calm', reason: headline }
}
