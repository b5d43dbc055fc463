import { type CharacteristicId, characteristicIds } from '../metrology/characteristics'
import { type ClosureVerdict, closureVerdict, normalisedError } from '../metrology/closure'
import type { SpecimenEvaluation } from '../metrology/evaluation'
import type { SpecimenSheet } from '../metrology/sheet'
import type { SpecificationBody } from '../metrology/specification'
import { judgeLot, type LotJudgement } from '../quality/judge-lot'
import { type Conformity, judgeSpecimen } from '../quality/judge-specimen'
import { type Proposal, type ProposalInput, proposeDisposition } from '../quality/propose-disposition'
import { guardFactorOf, limitsOf, tolerancedCharacteristics } from '../quality/tolerances'
import { missingOf, type PlanProgress, planProgress } from './plan-progress'
import { type LotSummaries, summariseSpecimens } from './summarise-specimens'

export interface LotToAssess {
  readonly specification: SpecificationBody
  readonly specimens: readonly {
    readonly number: number
    readonly sheet: SpecimenSheet
    readonly results: SpecimenEvaluation['results']
  }[]
  readonly openSignals: ProposalInput['openSignals']
  /** Codes of equipment that was overdue when it was used. */
  readonly overdueEquipment: readonly string[]
}

export interface SpecimenAssessment {
  readonly number: number
  readonly verdicts: Readonly<Partial<Record<CharacteristicId, Conformity>>>
  readonly closure?: { readonly verdict: ClosureVerdict; readonly normalisedError: number }
  /** What the plan still asks of it. */
  readonly missing: readonly string[]
}

export interface LotAssessment {
  readonly summaries: LotSummaries
  readonly specimens: readonly SpecimenAssessment[]
  readonly judgements: readonly LotJudgement[]
  readonly progress: PlanProgress
  readonly proposal: Proposal
}

/**
 * A lot by the decision rule, as far as it has been measured: each specimen against each tolerance, the lot by
 * its plan, and the proposal with every reason. The same at the bench, on the lot's page and when it is decided.
 */
export function assessLot({
  specification,
  specimens,
  openSignals,
  overdueEquipment,
}: LotToAssess): LotAssessment {
  const summaries = summariseSpecimens(specimens)
  const judgements = tolerancedCharacteristics.flatMap((id): LotJudgement[] => {
    const limits = limitsOf(specification, id)
    const summary = summaries[id]
    const guard = guardFactorOf(specification, id)
    return limits && summary
      ? [judgeLot(id, summary, limits, guard, specification.plan.acceptanceConstant)]
      : []
  })
  const assessed = specimens.map(({ number, sheet, results }): SpecimenAssessment => {
    const { closure } = results
    return {
      number,
      verdicts: verdictsOf(specification, results),
      ...(closure && closure.u > 0
        ? {
            closure: {
              verdict: closureVerdict(closure.value, closure.u),
              normalisedError: normalisedError(closure.value, closure.u),
            },
          }
        : {}),
      missing: missingOf(specification.plan, sheet),
    }
  })
  const { closure } = summaries
  return {
    summaries,
    specimens: assessed,
    judgements,
    progress: planProgress(specification.plan, specimens),
    proposal: proposeDisposition({
      specimensPlanned: specification.plan.specimens,
      specimensComplete: assessed.filter((one) => one.missing.length === 0).length,
      judgements,
      ...(closure ? { closure: { mean: closure.mean, u: closure.uMean } } : {}),
      openClosures: assessed.flatMap((one) =>
        one.closure?.verdict === 'open'
          ? [{ specimen: one.number, normalisedError: one.closure.normalisedError }]
          : [],
      ),
      outside: assessed.flatMap(({ number, verdicts }) =>
        characteristicIds.flatMap((id) => (verdicts[id] === 'outside' ? [{ specimen: number, id }] : [])),
      ),
      openSignals,
      overdueEquipment,
    }),
  }
}

/** Each result against its tolerance, for those that have one. */
export const verdictsOf = (
  specification: SpecificationBody,
  results: SpecimenEvaluation['results'],
): SpecimenAssessment['verdicts'] =>
  Object.fromEntries(
    tolerancedCharacteristics.flatMap((id): [CharacteristicId, Conformity][] => {
      const [limits, result] = [limitsOf(specification, id), results[id]]
      return limits && result ? [[id, judgeSpecimen(result, limits, guardFactorOf(specification, id))]] : []
    }),
  )
