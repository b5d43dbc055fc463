import type { Actor } from '@/lib/access/actor'
import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import { answerSignal } from '@/lib/services/answer-signal'
import { decideLot } from '@/lib/services/decide-lot'
import { freezeLimits } from '@/lib/services/freeze-limits'
import { getDrift } from '@/lib/services/get-drift'
import { getLot } from '@/lib/services/get-lot'
import type { SignalView } from '@/lib/services/signal-views'
import { type DemoSchedule, inZeroWeek, WORN_DIE } from './schedule'

const HOUR = 3_600_000

/** After so many lots of a product quality freezes its first control limits. */
const baselineLots = (micrometres: number): number => (micrometres === 254 ? 60 : 25)

const charts: readonly {
  readonly characteristic: CharacteristicId
  readonly statistic: 'mean' | 'within-lot-sd'
}[] = [
  { characteristic: 'diameter', statistic: 'mean' },
  { characteristic: 'massPerMetreWeighed', statistic: 'mean' },
  { characteristic: 'closure', statistic: 'mean' },
  { characteristic: 'massPerMetreWeighed', statistic: 'within-lot-sd' },
  { characteristic: 'effectiveDensity', statistic: 'mean' },
]

async function freezeFirstLimits(quality: Actor, lot: DemoSchedule, at: number): Promise<void> {
  for (const chart of charts)
    await freezeLimits(
      quality,
      {
        productCode: lot.productCode,
        ...chart,
        leftOut: [],
        reason: `First limits, from the first ${lot.index + 1} lots.`,
        supersedes: 0,
      },
      at,
    )
  // Signals among the baseline's own lots are looked into before the first lot is judged by the limits.
  const { signals } = await getDrift(quality, lot.productCode, charts)
  for (const signal of signals.filter((one) => one.state === 'open'))
    await answerSignal(quality, signal.id, { ...noCause, version: signal.version }, at)
}

const noCause = {
  cause: 'none found',
  answer: 'Looked at with the lots around it: no cause found, kept under watch.',
} as const

/** What quality found behind a signal, as it would be written down that day. */
function answerOf(
  signal: SignalView,
  lot: DemoSchedule,
): { readonly cause: string; readonly answer: string } {
  if (signal.characteristic === 'diameter' && inZeroWeek(lot.day))
    return { cause: 'micrometer zero', answer: 'M-14 read high on a pin; its zero was set again.' }
  if (signal.characteristic === 'effectiveDensity')
    return {
      cause: 'micrometer zero',
      answer: 'Mass per metre holds while density moves: the zero of M-14 was checked.',
    }
  if (lot.dieCode === WORN_DIE.code && signal.side === 'above')
    return {
      cause: `die ${WORN_DIE.code.slice(2)} wearing`,
      answer:
        'Diameter and mass climb together, density holds. Drawn on under watch; the next die is ordered.',
    }
  return noCause
}

/**
 * What quality does a few hours after a lot is measured: answers the signals that it belongs to, releases what
 * is proposed for release, scraps what is outside, holds the rest; freezes first limits when there are enough lots.
 */
export async function decideAsQualityWould(quality: Actor, lot: DemoSchedule): Promise<void> {
  const at = lot.measuredAt + 3 * HOUR
  if (lot.index + 1 === baselineLots(lot.micrometres)) await freezeFirstLimits(quality, lot, at - HOUR)
  const seen = await getLot(quality, lot.code)
  for (const signal of seen.signals.filter((one) => one.state === 'open'))
    await answerSignal(
      quality,
      signal.id,
      { ...answerOf(signal, lot), version: signal.version },
      at - HOUR / 2,
    )
  const { assessment, lot: facts } = await getLot(quality, lot.code)
  const { proposal } = assessment
  const outside = assessment.judgements.some(
    (one) => one.verdict === 'outside' && one.id !== 'massPerMetreSounded',
  )
  const verb = proposal.verb === 'release' ? 'release' : outside ? 'scrap' : 'hold'
  const reasons = {
    release: 'Inside tolerance, routes closed.',
    scrap: 'Outside tolerance by mass per metre: cut up.',
    hold: 'Not proven to be inside tolerance: waits for more specimens.',
  } as const
  await decideLot(
    quality,
    lot.code,
    { verb, reason: reasons[verb], lotVersion: facts.version, answers: [] },
    at,
  )
}
