import type { Actor } from '@/lib/access/actor'
import { database } from '@/lib/data/database'
import { findLotByCode } from '@/lib/data/lots'
import type { DispositionVerb, Stop } from '@/lib/domain/quality/propose-disposition'
import { answerSignal } from '@/lib/services/answer-signal'
import { decideLot } from '@/lib/services/decide-lot'
import { freezeLimits } from '@/lib/services/freeze-limits'
import { listSignals } from '@/lib/services/list-signals'
import { type LoadedLot, loadLot } from '@/lib/services/lot-assessment'
import { areAlike, defaultCharts } from './default-charts'
import { CONCESSION } from './papers'
import { productOf } from './products'
import type { DemoSchedule } from './schedule'
import { answerOf, hasSwappedDigits, lacksSlot, noCause } from './story-answers'

const HOUR = 3_600_000

async function freezeFirstLimits(quality: Actor, lot: DemoSchedule, at: number): Promise<void> {
  for (const chart of defaultCharts) {
    const alike = chart.statistic === 'mean' && areAlike(productOf(lot.productCode), chart.characteristic)
    const why = alike ? ' Neighbouring lots of nylon are alike by nature, and follow the season.' : ''
    await freezeLimits(
      quality,
      {
        productCode: lot.productCode,
        ...chart,
        leftOut: [],
        ...(alike ? { alike } : {}),
        reason: `First limits, from the first ${lot.index + 1} lots.${why}`,
        supersedes: 0,
      },
      at,
    )
  }
  // Signals among the baseline's own lots, and on the machine's chart that they now stand on, are looked into
  // before the first lot is judged by the limits.
  const signals = (await listSignals(quality)).filter(
    ({ machine, productCode }) => productCode === lot.productCode || machine?.code === lot.machine,
  )
  for (const signal of signals)
    await answerSignal(quality, signal.id, { ...noCause, version: signal.version }, at)
}

interface Decision {
  readonly verb: DispositionVerb
  readonly reason: string
  readonly answers: readonly { readonly stopId: string; readonly answer: string }[]
}

/** An answer to each stop that is not a signal, which is answered where it stands. */
const answersTo = (stops: readonly Stop[], answer: string): Decision['answers'] =>
  stops.filter(({ id }) => !id.startsWith('signal-')).map(({ id }) => ({ stopId: id, answer }))

function decisionOn(lot: DemoSchedule, { assessment }: Pick<LoadedLot, 'assessment'>): Decision {
  const { judgements, proposal } = assessment
  const outside = judgements.some((one) => one.verdict === 'outside' && one.id !== 'massPerMetreSounded')
  const inside = judgements.every((one) => one.verdict === 'inside' || one.id === 'massPerMetreSounded')
  if (lot.code === CONCESSION.lot)
    return {
      verb: 'concession',
      reason: CONCESSION.reason,
      answers: answersTo(proposal.stops, CONCESSION.answer),
    }
  if (proposal.verb === 'release')
    return { verb: 'release', reason: 'Inside tolerance, routes closed.', answers: [] }
  if (inside && (lacksSlot(lot) || hasSwappedDigits(lot)))
    return {
      verb: 'release',
      reason: 'Inside tolerance by balance and rule; the fault of the sounding is named.',
      answers: answersTo(
        proposal.stops,
        'The sounding went wrong, not the string: the weighed route stands.',
      ),
    }
  if (outside)
    return { verb: 'scrap', reason: 'Outside tolerance by mass per metre or size: cut up.', answers: [] }
  if (inside && proposal.stops.every(({ id }) => id.startsWith('outside-')))
    return {
      verb: 'release',
      reason: 'Mean and spread are inside; the specimen outside was looked at.',
      answers: answersTo(proposal.stops, 'One end only: a metre more was cut off there.'),
    }
  return { verb: 'hold', reason: 'Not proven to be inside tolerance: waits for more specimens.', answers: [] }
}

/** What a lot is judged by, as on its page but without computing its results again, which would take longest. */
async function look(
  code: string,
): Promise<Pick<LoadedLot, 'assessment' | 'signals'> & { readonly version: number }> {
  const { read } = database()
  const row = await findLotByCode(read, code)
  if (!row) throw new Error(`The demo has no lot ${code}.`)
  const { assessment, signals } = await loadLot(read, row)
  return { assessment, signals, version: row.version }
}

/** Answers those of these signals that are open. @returns how many they were */
async function answerOpen(
  quality: Actor,
  lot: DemoSchedule,
  signals: LoadedLot['signals'],
  at: number,
): Promise<number> {
  const open = signals.filter((one) => one.state === 'open')
  for (const signal of open)
    await answerSignal(quality, signal.id, { ...answerOf(signal, lot), version: signal.version }, at)
  return open.length
}

/** Of a lot that nobody has looked into yet: only what the rig does to all its lots is answered for it, too. */
export async function answerClosure(quality: Actor, lot: DemoSchedule): Promise<void> {
  const { signals } = await look(lot.code)
  const own = signals.filter(({ characteristic }) => characteristic === 'closure')
  await answerOpen(quality, lot, own, lot.measuredAt + 2.5 * HOUR)
}

/**
 * What quality does a few hours after a lot is measured: answers the signals that it belongs to, releases what
 * is proposed for release, scraps what is outside, holds the rest; freezes first limits when there are enough lots.
 * @returns what was decided
 */
export async function decideAsQualityWould(quality: Actor, lot: DemoSchedule): Promise<DispositionVerb> {
  const at = lot.measuredAt + 3 * HOUR
  if (lot.index + 1 === productOf(lot.productCode).baseline) await freezeFirstLimits(quality, lot, at - HOUR)
  let seen = await look(lot.code)
  if ((await answerOpen(quality, lot, seen.signals, at - HOUR / 2)) > 0) seen = await look(lot.code)
  const { answers, reason, verb } = decisionOn(lot, seen)
  await decideLot(quality, lot.code, { verb, reason, lotVersion: seen.version, answers: [...answers] }, at)
  return verb
}

/** What becomes of a lot that stayed on hold for a week: nobody measured more of it, so it goes as another grade. */
export async function settleHeld(quality: Actor, { code }: DemoSchedule, at: number): Promise<void> {
  const { version } = await look(code)
  const reason = 'A week on hold and still not proven: sold as seconds, with the tension that was measured.'
  await decideLot(quality, code, { verb: 'regrade', reason, lotVersion: version, answers: [] }, at)
}
