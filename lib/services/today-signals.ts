import { isCharacteristic, statisticOf } from '@/lib/data/chart-histories'
import { listMachineNames } from '@/lib/data/machines'
import { listLotStates, listSignalsOfToday } from '@/lib/data/today-desks'
import type { ControlRule } from '@/lib/domain/control/find-signals'
import { signalEvents } from '@/lib/domain/quality/signal-events'
import { chartName } from '@/lib/domain/record/display-unit'
import { signalHref } from '@/lib/domain/record/signal-href'
import { signalSentence } from '@/lib/domain/record/signal-sentence'
import {
  type AskedToday,
  agoOf,
  counted,
  type FoundToday,
  namesOf,
  SHOWN,
  totalOf,
  type WaitingItem,
} from './today-item'

/** Signals that are looked at to find the events behind them; the rest is counted. */
const LOOKED_AT = 240

type Open = Awaited<ReturnType<typeof listSignalsOfToday>>['signals'][number]
type Lots = Awaited<ReturnType<typeof listLotStates>>

/** Unanswered signals, one line an event: what shares a lot is one thing to look into. Four queries. */
export async function signalsOfToday(asked: AskedToday): Promise<FoundToday> {
  const { tx } = asked
  const { count, signals } = await listSignalsOfToday(tx, LOOKED_AT)
  const lots = await listLotStates(
    tx,
    signals.flatMap((signal) => signal.members),
  )
  const machines = await listMachineNames(tx, [...new Set(signals.flatMap((one) => one.machineId ?? []))])
  const items = signalEvents(signals)
    .slice(0, SHOWN)
    .flatMap((event) => eventItem(event, lots, machines, asked))
  return { items, totals: totalOf('signal', count, '/drift') }
}

function eventItem(
  event: readonly Open[],
  lots: Lots,
  machines: ReadonlyMap<number, { readonly code: string; readonly name: string }>,
  { at, works }: AskedToday,
): readonly WaitingItem[] {
  // What runs over products says more than what one of them shows: it names the machine.
  const first = event.find((one) => one.machineId !== undefined) ?? event[0]
  if (!first || !isCharacteristic(first.characteristic)) return []
  const machine = machines.get(first.machineId ?? 0)
  const codes = (signal: Open): readonly string[] => signal.members.flatMap((id) => lots.get(id)?.code ?? [])
  const members = [...new Set(event.flatMap((one) => one.members))].flatMap((id) => lots.get(id) ?? [])
  const waiting = members.filter((lot) => lot.state === 'to-decide').length
  const products = [...new Set(event.map((one) => one.product.name))]
  const charts = [
    ...new Set(
      event.flatMap((one) =>
        isCharacteristic(one.characteristic)
          ? [chartName(one.characteristic, statisticOf(one.statistic)).toLowerCase()]
          : [],
      ),
    ),
  ]
  const sentence = signalSentence(
    {
      ...first,
      // The guards of the table allow no other words.
      rule: first.rule as ControlRule,
      side: first.side === 'above' ? 'above' : 'below',
      characteristic: first.characteristic,
      statistic: statisticOf(first.statistic),
      memberCodes: codes(first),
      ...(machine === undefined ? {} : { machineName: machine.name }),
    },
    works.units,
    works.numberFormat,
  )
  const others = event.length - 1
  return [
    {
      kind: 'signal',
      key: `signal ${first.id}`,
      since: Math.min(...event.map((one) => one.raisedAt)),
      mark: first.rule === 'nine-on-one-side' ? 'run' : 'beyond',
      title: `${machine?.name ?? namesOf(products, 2)}: ${namesOf(charts, 2)}`,
      text: `${sentence}${others > 0 ? ` ${others === 1 ? 'One more signal' : `${others} more signals`} of the same lots.` : ''} It rejects no lot, and is answered before release.`,
      stake: `${counted(members.length, 'lot', 'lots')}${machine === undefined ? '' : ` of ${namesOf(products, 2)}`}${waiting > 0 ? `, ${waiting} to decide` : ''}`,
      waiting: agoOf(Math.min(...event.map((one) => one.raisedAt)), at),
      href: signalHref({
        id: first.id,
        productCode: first.product.code,
        lotCode: codes(first).at(-1),
        machineCode: machine?.code,
      }),
      deed: 'Answer',
    },
  ]
}
