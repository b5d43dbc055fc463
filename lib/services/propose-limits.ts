import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { listLimitSets } from '@/lib/data/limit-sets'
import { listPersonNames } from '@/lib/data/people-names'
import { findProductByCode } from '@/lib/data/products'
import { type LimitProposal, proposeLimits as propose } from '@/lib/domain/control/propose-limits'
import { type Problem, problem } from '@/lib/domain/errors'
import { characteristics } from '@/lib/domain/metrology/characteristics'
import type { ProposeLimitsInput } from '@/lib/input/limits'
import { type ChosenLot, loadBaseline } from './limit-baseline'
import { type LimitSetView, limitSetView } from './limit-set-view'

export interface LimitProposalView {
  readonly productCode: string
  readonly productName: string
  readonly lots: readonly ChosenLot[]
  readonly proposal: LimitProposal | undefined
  /** Why no limits can be proposed from these lots. */
  readonly refusal: Problem | undefined
  /** The newest limit set of this chart. */
  readonly newest: LimitSetView | undefined
}

/**
 * Limits that the chosen baseline lots would give, with what the baseline says about itself. Nothing is stored.
 * @throws LedgerlineError not-permitted, not-found, bad-input
 */
export async function proposeLimits(
  actor: Actor | undefined,
  input: ProposeLimitsInput,
): Promise<LimitProposalView> {
  permit(actor, 'drift.read')
  const { read } = database()
  const product = await findProductByCode(read, input.productCode)
  if (!product)
    throw problem('not-found', `There is no product ${input.productCode}.`, { where: 'productCode' })
  const lots = await loadBaseline(read, product.id, input)
  const proposed = propose(lots, input.statistic, characteristics[input.characteristic].oneSided, input.alike)
  const newest = (await listLimitSets(read, product.id))
    .filter((one) => one.characteristic === input.characteristic && one.statistic === input.statistic)
    .at(-1)
  const names = await listPersonNames(read, newest?.frozenById === undefined ? [] : [newest.frozenById])
  return {
    productCode: product.code,
    productName: product.name,
    lots,
    proposal: proposed.ok ? proposed.value : undefined,
    refusal: proposed.ok ? undefined : proposed.problems[0],
    newest: newest && limitSetView(newest, input, names),
  }
}
