import { type CharacteristicId, characteristics } from '../metrology/characteristics'
import { type ClosureVerdict, closureVerdict, normalisedError } from '../metrology/closure'
import { formatNumber } from '../units/format'
import type { LotJudgement } from './judge-lot'

export const dispositionVerbs = ['release', 'hold', 'rework', 'regrade', 'concession', 'scrap'] as const

export type DispositionVerb = (typeof dispositionVerbs)[number]

export interface ProposalInput {
  readonly specimensPlanned: number
  /** Specimens on which everything of the plan was measured. */
  readonly specimensComplete: number
  readonly judgements: readonly LotJudgement[]
  /** The lot's mean closure with the standard uncertainty of that mean. */
  readonly closure?: { readonly mean: number; readonly u: number }
  readonly openClosures: readonly { readonly specimen: number; readonly normalisedError: number }[]
  readonly outside: readonly { readonly specimen: number; readonly id: CharacteristicId }[]
  readonly openSignals: readonly { readonly id: number; readonly sentence: string }[]
  readonly overdueEquipment: readonly string[]
}

/** Something a named person has to answer, in words, before the lot can be released. */
export interface Stop {
  readonly id: string
  readonly text: string
}

export interface Reason {
  readonly tone: 'good' | 'doubt' | 'bad'
  readonly text: string
}

export interface Proposal {
  /** Undefined while a stop keeps the program from proposing. */
  readonly verb: DispositionVerb | undefined
  readonly headline: string
  readonly reasons: readonly Reason[]
  readonly stops: readonly Stop[]
  readonly closure: ClosureVerdict | undefined
}

/**
 * The decision rule, printed with the plan:
 * 1. A specimen never decides a lot alone, except that *outside* must be answered.
 * 2. A lot is judged by its plan: mean and spread, with uncertainty.
 * 3. An open closure, an incomplete plan or overdue equipment stops the proposal until answered.
 * 4. A control-chart signal never rejects by itself; it demands an answer before release.
 */
export function proposeDisposition(input: ProposalInput): Proposal {
  const closure =
    input.closure && input.closure.u > 0 ? closureVerdict(input.closure.mean, input.closure.u) : undefined
  const stops = stopsOf(input, closure)
  const reasons = [...input.judgements.map((one) => reasonOf(input, one)), ...closureReason(input, closure)]
  const deciding = input.judgements.filter((one) => !isForInformation(input, one.id))
  const outside = deciding.filter((one) => one.verdict === 'outside')
  const unproven = deciding.filter((one) => one.verdict === 'not proven')
  const judged = deciding.length > 0
  const verb: DispositionVerb | undefined =
    stops.some((stop) => !onlyDemandsAnswer(stop)) || !judged
      ? undefined
      : outside.length > 0 || unproven.length > 0
        ? 'hold'
        : stops.length > 0
          ? undefined
          : 'release'
  return { verb, headline: headlineOf(input, outside, unproven), reasons, stops, closure }
}

/** Signals and specimens outside demand an answer before release; they do not keep the program from proposing *hold*. */
const onlyDemandsAnswer = ({ id }: Stop): boolean => id.startsWith('signal-') || id.startsWith('outside-')

/**
 * Mass per metre has one tolerance and two routes. The weighed one decides; the sounded one stands beside it,
 * and its disagreement is the closure's business. Where nothing was weighed the sounded one decides.
 */
const isForInformation = ({ judgements }: ProposalInput, id: CharacteristicId): boolean =>
  id === 'massPerMetreSounded' && judgements.some((one) => one.id === 'massPerMetreWeighed')

function stopsOf(input: ProposalInput, closure: ClosureVerdict | undefined): readonly Stop[] {
  const { specimensComplete, specimensPlanned } = input
  const stops: Stop[] = []
  if (specimensComplete < specimensPlanned)
    stops.push({
      id: 'plan-incomplete',
      text: `The plan asks for ${specimensPlanned} specimens; ${specimensComplete} ${specimensComplete === 1 ? 'is' : 'are'} complete.`,
    })
  if (closure === 'open')
    stops.push({
      id: 'closure-open',
      text: 'The two routes to mass per metre disagree: the lot’s closure is open. Find the measuring fault, or say why it is accepted.',
    })
  for (const one of input.openClosures)
    stops.push({
      id: `closure-open-${one.specimen}`,
      text: `Specimen ${one.specimen} does not close: normalised error ${formatNumber(one.normalisedError, { decimals: 2, sign: 'always' })}, at most 1.5 is doubtful.`,
    })
  // One answer a specimen: what is wrong with a piece of string shows in several of its results.
  const outside = input.outside.filter((one) => !isForInformation(input, one.id))
  for (const specimen of new Set(outside.map((one) => one.specimen))) {
    const names = outside
      .filter((one) => one.specimen === specimen)
      .map((one) => characteristics[one.id].name.toLowerCase())
    stops.push({
      id: `outside-${specimen}`,
      text: `Specimen ${specimen} is outside its tolerance: ${names.join('; ')}.`,
    })
  }
  for (const code of input.overdueEquipment)
    stops.push({ id: `overdue-${code}`, text: `The calibration of ${code} is overdue.` })
  for (const signal of input.openSignals)
    stops.push({ id: `signal-${signal.id}`, text: `Unanswered signal: ${signal.sentence}` })
  return stops
}

const share = (probability: number): string =>
  probability > 0.999 ? 'more than 0.999' : formatNumber(probability, { decimals: 3 })

function reasonOf(input: ProposalInput, judgement: LotJudgement): Reason {
  const { accepted, acceptanceConstant, id, n, probability, quality, verdict } = judgement
  const name = `${characteristics[id].name}${isForInformation(input, id) ? ' (for information)' : ''}`
  const spread =
    quality === undefined
      ? `n = ${n}`
      : `n = ${n}, (limit − mean)/s = ${formatNumber(quality, { decimals: 2 })} against k = ${formatNumber(acceptanceConstant, { decimals: 2 })}`
  const words = accepted === false && verdict === 'not proven' ? 'not accepted by its plan' : verdict
  return {
    tone: verdict === 'inside' ? 'good' : verdict === 'outside' ? 'bad' : 'doubt',
    text: `${name}: ${words}; probability of conformity ${share(probability)}; ${spread}.`,
  }
}

function closureReason(input: ProposalInput, verdict: ClosureVerdict | undefined): readonly Reason[] {
  if (!input.closure || !verdict) return []
  const error = normalisedError(input.closure.mean, input.closure.u)
  const value = formatNumber(input.closure.mean * 100, { decimals: 2, sign: 'always' })
  return [
    {
      tone: verdict === 'closed' ? 'good' : verdict === 'open' ? 'bad' : 'doubt',
      text: `Closure: ${verdict}; ${value} %, normalised error ${formatNumber(error, { decimals: 2, sign: 'always' })}.`,
    },
  ]
}

function headlineOf(
  input: ProposalInput,
  outside: readonly LotJudgement[],
  unproven: readonly LotJudgement[],
): string {
  const names = (list: readonly LotJudgement[]): string =>
    list.map((one) => characteristics[one.id].name.toLowerCase()).join(', ')
  if (input.judgements.length === 0) return 'Not yet measured.'
  if (outside.length > 0) return `Outside tolerance: ${names(outside)}.`
  if (unproven.length > 0) return `Not proven to be inside tolerance: ${names(unproven)}.`
  return input.specimensComplete < input.specimensPlanned ? 'Inside tolerance so far.' : 'Inside tolerance.'
}
