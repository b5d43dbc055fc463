import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import { listDecidedFrom, markDispositions } from '@/lib/data/dispositions'
import { appendLedger } from '@/lib/data/ledger'
import { frozenLimitsOf, insertLimitSet, type LimitSetRow, listLimitSets } from '@/lib/data/limit-sets'
import { lockRow } from '@/lib/data/locks'
import { markLots } from '@/lib/data/lots'
import { findProductByCode, type ProductRow } from '@/lib/data/products'
import { type LimitProposal, proposeLimits } from '@/lib/domain/control/propose-limits'
import { problem } from '@/lib/domain/errors'
import { characteristics } from '@/lib/domain/metrology/characteristics'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { limitsAt } from '@/lib/domain/record/chart-history'
import type { FreezeLimitsInput } from '@/lib/input/limits'
import { askMachineRules, askRules } from './ask-rules'
import type { DecisionEvidence } from './decide-lot'
import { baselineOf, type ChosenLot, loadBaseline } from './limit-baseline'
import { refusal } from './refusal'

export interface FrozenLimitSet {
  readonly productCode: string
  readonly number: number
  readonly provisional: boolean
  readonly lotCount: number
  readonly signalsRaised: number
  /** Signals that the new limits no longer show; they stay and say so. */
  readonly signalsGone: number
}

/**
 * Freezes control limits: dated, signed, numbered, with their baseline and why lots are left out of it. The
 * rules are asked again from the place where the set comes into force; decisions that rested on the older set
 * there are marked.
 * @throws LedgerlineError not-permitted, not-found, bad-input, not-ready (fewer than twenty lots), conflict
 *   (someone froze another set meanwhile)
 */
export async function freezeLimits(
  actor: Actor | undefined,
  input: FreezeLimitsInput,
  at: number = Date.now(),
): Promise<FrozenLimitSet> {
  permit(actor, 'limits.freeze')
  return database().write(async (tx) => {
    const product = await findProductByCode(tx, input.productCode)
    if (!product)
      throw problem('not-found', `There is no product ${input.productCode}.`, { where: 'productCode' })
    await lockRow(tx, 'Product', product.id)
    const sets = await chartSets(tx, product, input)
    const number = (sets.at(-1)?.number ?? 0) + 1
    if (input.supersedes !== number - 1)
      throw problem('conflict', `Limit set ${number - 1} was frozen in the meantime.`, {
        where: 'supersedes',
        mend: 'Load the page again and look at it first.',
      })
    const lots = await loadBaseline(tx, product.id, input)
    const proposed = proposeLimits(
      lots,
      input.statistic,
      characteristics[input.characteristic].oneSided,
      input.alike,
    )
    if (!proposed.ok) throw refusal(proposed.problems)
    const effectiveFrom = input.effectiveFrom ?? usualBeginning(lots, number)
    await insertLimitSet(tx, rowOf(product, input, proposed.value, lots, number, effectiveFrom, actor, at))
    const own = await askRules(tx, product.id, isOf(input))
    const over = await askMachineRules(tx, product.id, isOf(input))
    const signals = { raised: own.raised + over.raised, gone: own.gone + over.gone }
    await markDecisions(tx, product.id, input, sets, effectiveFrom)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'freeze-limits',
      subject: `limits ${product.code} ${input.characteristic} ${input.statistic}`,
      body: {
        number,
        centre: proposed.value.centre,
        sigma: proposed.value.sigma,
        lower: proposed.value.lower,
        upper: proposed.value.upper,
        lots: proposed.value.lotCount,
        leftOut: input.leftOut,
        effectiveFrom,
        target: lots.at(-1)?.target,
        rules: proposed.value.rules,
        reason: input.reason,
        signals,
      },
    })
    return {
      productCode: product.code,
      number,
      provisional: proposed.value.provisional,
      lotCount: proposed.value.lotCount,
      signalsRaised: signals.raised,
      signalsGone: signals.gone,
    }
  })
}

const isOf =
  ({ characteristic, statistic }: FreezeLimitsInput) =>
  (chart: { readonly characteristic: string; readonly statistic: string }): boolean =>
    chart.characteristic === characteristic && chart.statistic === statistic

const chartSets = async (
  tx: Tx,
  product: ProductRow,
  input: FreezeLimitsInput,
): Promise<readonly LimitSetRow[]> => (await listLimitSets(tx, product.id)).filter(isOf(input))

/** The first set holds over its own baseline, too; a later one from the first lot made after its baseline. */
function usualBeginning(lots: readonly ChosenLot[], number: number): number {
  const [first, last] = [lots[0]?.madeAt ?? 0, lots.at(-1)?.madeAt ?? 0]
  return number === 1 ? first : last + 1
}

const rowOf = (
  product: ProductRow,
  input: FreezeLimitsInput,
  proposal: LimitProposal,
  lots: readonly ChosenLot[],
  number: number,
  effectiveFrom: number,
  actor: Actor,
  at: number,
) => ({
  productId: product.id,
  characteristic: input.characteristic,
  statistic: input.statistic,
  number,
  centre: proposal.centre,
  sigma: proposal.sigma,
  lower: proposal.lower,
  upper: proposal.upper,
  sigmaEstimator: proposal.sigmaEstimator,
  lotCount: proposal.lotCount,
  provisional: proposal.provisional,
  baseline: canonicalJson(baselineOf(lots)),
  effectiveFrom,
  frozenAt: at,
  frozenById: actor.personId,
  reason: input.reason,
  target: lots.at(-1)?.target,
  rules: proposal.rules,
})

/** Decisions on lots that another set of this chart held for until now rest on older evidence. */
async function markDecisions(
  tx: Tx,
  productId: number,
  { characteristic, statistic }: FreezeLimitsInput,
  before: readonly LimitSetRow[],
  effectiveFrom: number,
): Promise<void> {
  const older = before.map(frozenLimitsOf)
  const decided = (await listDecidedFrom(tx, productId, effectiveFrom)).filter(({ madeAt, evidence }) => {
    const set = limitsAt(older, madeAt)
    const { limitSets } = JSON.parse(evidence) as DecisionEvidence
    return limitSets.some(
      (one) =>
        one.characteristic === characteristic && one.statistic === statistic && one.number === set?.number,
    )
  })
  await markDispositions(
    tx,
    decided.map((one) => one.id),
  )
  await markLots(
    tx,
    decided.map((one) => one.lotId),
  )
}
