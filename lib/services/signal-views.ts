import { isCharacteristic, statisticOf } from '@/lib/data/chart-histories'
import type { Tx } from '@/lib/data/database'
import { listLotCodes } from '@/lib/data/lots'
import { listMachineNames } from '@/lib/data/machines'
import { listPersonNames } from '@/lib/data/people-names'
import type { SignalRow } from '@/lib/data/signals'
import type { ControlRule } from '@/lib/domain/control/find-signals'
import type { Side } from '@/lib/domain/control/rule-point'
import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import type { ChartedStatistic, StoredSignal } from '@/lib/domain/record/chart-history'
import { chartName } from '@/lib/domain/record/display-unit'
import { signalSentence } from '@/lib/domain/record/signal-sentence'
import type { WorksFacts } from './get-works'

/** A signal as a person reads it. Instants are epoch milliseconds, the departure is SI. */
export interface SignalView {
  readonly id: number
  readonly sentence: string
  /** The lot that completed the pattern. */
  readonly lotCode: string
  /** Lots of the pattern, in chart order. */
  readonly memberCodes: readonly string[]
  readonly memberIds: readonly number[]
  readonly productCode: string
  readonly productName: string
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
  readonly chartName: string
  /** Set when the pattern runs over several products of one machine; the departure is then in σ. */
  readonly machine: { readonly code: string; readonly name: string } | undefined
  readonly rule: ControlRule
  readonly side: Side
  readonly departure: number
  readonly limitSetNumber: number
  readonly state: StoredSignal['state']
  readonly evidenceChanged: boolean
  readonly raisedAt: number
  readonly answeredAt: number | undefined
  readonly answeredBy: string | undefined
  readonly cause: string
  readonly answer: string
  readonly version: number
}

/** Signals with the codes of their lots, the names of who answered, and their sentences. */
export async function signalViews(
  tx: Tx,
  rows: readonly SignalRow[],
  works: Pick<WorksFacts, 'units' | 'numberFormat'>,
): Promise<readonly SignalView[]> {
  const codes = await listLotCodes(tx, [...new Set(rows.flatMap((row) => row.members))])
  const names = await listPersonNames(
    tx,
    rows.flatMap((row) => row.answeredById ?? []),
  )
  const machines = await listMachineNames(tx, [...new Set(rows.flatMap((row) => row.machineId ?? []))])
  return rows.flatMap((row): SignalView[] => {
    if (!isCharacteristic(row.characteristic)) return []
    const { characteristic } = row
    const statistic = statisticOf(row.statistic)
    const machine = row.machineId === undefined ? undefined : machines.get(row.machineId)
    const memberCodes = row.members.map((id) => codes.get(id) ?? '')
    return [
      {
        id: row.id,
        sentence: signalSentence(
          { ...row, characteristic, statistic, memberCodes, machineName: machine?.name },
          works.units,
          works.numberFormat,
        ),
        lotCode: row.lotCode,
        memberCodes,
        memberIds: row.members,
        productCode: row.productCode,
        productName: row.productName,
        characteristic,
        statistic,
        chartName: chartName(characteristic, statistic),
        machine,
        rule: row.rule,
        side: row.side,
        departure: row.departure,
        limitSetNumber: row.limitSetNumber,
        state: row.state,
        evidenceChanged: row.evidenceChanged,
        raisedAt: row.raisedAt,
        answeredAt: row.answeredAt,
        answeredBy: row.answeredById === undefined ? undefined : names.get(row.answeredById),
        cause: row.cause,
        answer: row.answer,
        version: row.version,
      },
    ]
  })
}
