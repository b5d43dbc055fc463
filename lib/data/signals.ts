import type { ControlRule } from '@/lib/domain/control/find-signals'
import type { Side } from '@/lib/domain/control/rule-point'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { StoredSignal } from '@/lib/domain/record/chart-history'
import type { SignalRows } from '@/lib/domain/record/write-plan'
import type { Tx } from './database'

export interface SignalRow {
  readonly id: number
  readonly lotId: number
  readonly lotCode: string
  readonly productId: number
  readonly productCode: string
  readonly productName: string
  readonly characteristic: string
  readonly statistic: string
  readonly limitSetId: number
  /** Set when the pattern runs over several products of one machine. */
  readonly machineId: number | undefined
  readonly limitSetNumber: number
  readonly rule: ControlRule
  readonly side: Side
  /** Ids of the lots of the pattern, in chart order. */
  readonly members: readonly number[]
  readonly departure: number
  readonly state: StoredSignal['state']
  readonly evidenceChanged: boolean
  readonly raisedAt: number
  readonly answeredAt: number | undefined
  readonly answeredById: number | undefined
  readonly cause: string
  readonly answer: string
  readonly version: number
}

const select = {
  id: true,
  lotId: true,
  productId: true,
  characteristic: true,
  statistic: true,
  limitSetId: true,
  machineId: true,
  rule: true,
  side: true,
  members: true,
  departure: true,
  state: true,
  evidenceChanged: true,
  raisedAt: true,
  answeredAt: true,
  answeredById: true,
  cause: true,
  answer: true,
  version: true,
  lot: { select: { code: true } },
  product: { select: { code: true, name: true } },
  limitSet: { select: { number: true } },
} as const

interface Selected
  extends Omit<
    SignalRow,
    | 'lotCode'
    | 'productCode'
    | 'productName'
    | 'limitSetNumber'
    | 'machineId'
    | 'rule'
    | 'side'
    | 'state'
    | 'members'
    | 'raisedAt'
    | 'answeredAt'
    | 'answeredById'
  > {
  readonly rule: string
  readonly side: string
  readonly state: string
  readonly members: string
  readonly machineId: number | null
  readonly raisedAt: Date
  readonly answeredAt: Date | null
  readonly answeredById: number | null
  readonly lot: { readonly code: string }
  readonly product: { readonly code: string; readonly name: string }
  readonly limitSet: { readonly number: number }
}

const rowOf = ({ lot, product, limitSet, ...row }: Selected): SignalRow => ({
  ...row,
  lotCode: lot.code,
  productCode: product.code,
  productName: product.name,
  limitSetNumber: limitSet.number,
  machineId: row.machineId ?? undefined,
  // The guards of the table allow no other words.
  rule: row.rule as ControlRule,
  side: row.side as Side,
  state: row.state as StoredSignal['state'],
  members: JSON.parse(row.members) as readonly number[],
  raisedAt: row.raisedAt.getTime(),
  answeredAt: row.answeredAt?.getTime(),
  answeredById: row.answeredById ?? undefined,
})

/** All signals of a product’s own charts, newest first. */
export const listProductSignals = async (tx: Tx, productId: number): Promise<readonly SignalRow[]> =>
  (
    await tx.signal.findMany({
      where: { productId, machineId: null },
      select,
      orderBy: [{ raisedAt: 'desc' }, { id: 'desc' }],
    })
  ).map(rowOf)

/** All signals of a machine’s charts over its products, newest first. */
export const listMachineSignals = async (tx: Tx, machineId: number): Promise<readonly SignalRow[]> =>
  (
    await tx.signal.findMany({
      where: { machineId },
      select,
      orderBy: [{ raisedAt: 'desc' }, { id: 'desc' }],
    })
  ).map(rowOf)

/** Unanswered signals of all products, oldest first. */
export const listOpenSignals = async (tx: Tx): Promise<readonly SignalRow[]> =>
  (
    await tx.signal.findMany({
      where: { state: 'open' },
      select,
      orderBy: [{ raisedAt: 'asc' }, { id: 'asc' }],
    })
  ).map(rowOf)

export const findSignal = async (tx: Tx, id: number): Promise<SignalRow | undefined> => {
  const row = await tx.signal.findUnique({ where: { id }, select })
  return row ? rowOf(row) : undefined
}

export const storedSignalOf = (row: SignalRow): StoredSignal => ({
  id: row.id,
  limitSetId: row.limitSetId,
  rule: row.rule,
  side: row.side,
  lotId: row.lotId,
  members: row.members,
  departure: row.departure,
  state: row.state,
  answered: row.answeredAt !== undefined,
  evidenceChanged: row.evidenceChanged,
  raisedAt: row.raisedAt,
})

/** Stores what the rules find now: what is new, and what becomes of what is kept. */
export async function storeSignals(tx: Tx, charts: readonly SignalRows[]): Promise<void> {
  const raised = charts.flatMap(({ productId, machineId, characteristic, statistic, raised: found }) =>
    found.map(({ members, raisedAt, ...signal }) => ({
      productId,
      ...signal,
      machineId: machineId ?? null,
      characteristic,
      statistic,
      members: canonicalJson(members),
      raisedAt: new Date(raisedAt),
      state: 'open',
    })),
  )
  if (raised.length > 0) await tx.signal.createMany({ data: raised })
  for (const { id, members, raisedAt, ...change } of charts.flatMap((chart) => chart.changed))
    await tx.signal.update({
      where: { id },
      data: {
        ...change,
        members: canonicalJson(members),
        raisedAt: new Date(raisedAt),
        version: { increment: 1 },
      },
      select: { id: true },
    })
}

/** @returns false when the signal has another version by now, or is not open any more */
export const answerSignalRow = async (
  tx: Tx,
  { id, version }: { readonly id: number; readonly version: number },
  answer: { readonly cause: string; readonly answer: string; readonly at: number; readonly personId: number },
): Promise<boolean> =>
  (
    await tx.signal.updateMany({
      where: { id, version, state: 'open' },
      data: {
        state: 'answered',
        cause: answer.cause,
        answer: answer.answer,
        answeredAt: new Date(answer.at),
        answeredById: answer.personId,
        version: { increment: 1 },
      },
    })
  ).count > 0
