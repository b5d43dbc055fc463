import type { SignalView } from '@/lib/services/signal-views'
import type { DemoSchedule } from './schedule'
import {
  inHardTwin,
  inZeroWeek,
  MISSING_SLOT,
  NYLON_SEASON,
  OCTAVE,
  SWAPPED_DIGITS,
  UNCOUNTED_HOOK,
  WORN_DIE,
  WRONG_ALLOY,
} from './story-facts'
import { isUneven } from './uneven-lots'

export interface StoryAnswer {
  readonly cause: string
  readonly answer: string
}

export const noCause: StoryAnswer = {
  cause: 'none found',
  answer: 'Looked at with the lots around it: no cause found, kept under watch.',
}

const size = ({ characteristic }: SignalView): boolean =>
  characteristic === 'diameter' || characteristic === 'massPerMetreWeighed'

const mass = ({ characteristic }: SignalView): boolean =>
  characteristic === 'massPerMetreWeighed' || characteristic === 'effectiveDensity'

const isLot = (lot: DemoSchedule, story: { readonly productCode: string; readonly index: number }): boolean =>
  lot.productCode === story.productCode && lot.index === story.index

export const hasWrongAlloy = ({ index, productCode }: DemoSchedule): boolean =>
  productCode === WRONG_ALLOY.productCode &&
  index >= WRONG_ALLOY.from &&
  index < WRONG_ALLOY.from + WRONG_ALLOY.lots

export const lacksSlot = ({ day, rig }: DemoSchedule): boolean =>
  rig === MISSING_SLOT.rig && day === MISSING_SLOT.day

export const isOctave = (lot: DemoSchedule): boolean => isLot(lot, OCTAVE)
export const hasSwappedDigits = (lot: DemoSchedule): boolean => isLot(lot, SWAPPED_DIGITS)

const wrapOf = (lot: DemoSchedule): string =>
  lot.materials.find(({ role }) => role === 'wrap-1')?.code ?? 'its spool'

/** What quality found behind a signal, as it would be written down that day. */
export function answerOf(signal: SignalView, lot: DemoSchedule): StoryAnswer {
  const { characteristic, statistic } = signal
  if (statistic === 'within-lot-sd')
    return isUneven(lot)
      ? {
          cause: 'brake of the bronze winder sticks',
          answer: 'Specimens of a lot differ more than they used to. Brake cleaned, felt to be renewed.',
        }
      : noCause
  if (characteristic === 'closure') return closureAnswer(lot)
  if (lot.machine === 'DM-1' && inZeroWeek(lot.day) && characteristic !== 'massPerMetreWeighed')
    return {
      cause: 'micrometer zero',
      answer:
        'Density moves on every size while mass holds: M-14 read high on a pin; its zero was set again.',
    }
  if (lot.dieCode === WORN_DIE.code && signal.side === 'above' && size(signal))
    return {
      cause: `die ${WORN_DIE.code.slice(2)} wearing`,
      answer:
        'Diameter and mass climb together, density holds. Drawn on under watch; the next die is ordered.',
    }
  if (hasWrongAlloy(lot) && mass(signal))
    return {
      cause: `wrap of spool ${wrapOf(lot)} too light`,
      answer:
        'Both routes agree that the density is low: not the alloy ordered. Spool set aside, mill asked.',
    }
  if (inHardTwin(lot.machine, lot.day) && mass(signal))
    return {
      cause: `wrap of spool ${wrapOf(lot)}`,
      answer: 'A little light since this heat is wound; inside tolerance. Its hardness is asked of the mill.',
    }
  if (lot.productCode.startsWith(NYLON_SEASON.family.toUpperCase()))
    return { cause: 'season', answer: 'Nylon takes up water in a damp room; pieces are conditioned longer.' }
  return noCause
}

function closureAnswer(lot: DemoSchedule): StoryAnswer {
  if (lacksSlot(lot))
    return {
      cause: `${MISSING_SLOT.weight} not hung`,
      answer: 'Found on the bench beside the rig at the end of the shift. The weighed route stands.',
    }
  if (isOctave(lot))
    return {
      cause: 'octave sounded',
      answer: 'The second partial was read; the specimen is kept for sounding.',
    }
  if (hasSwappedDigits(lot))
    return {
      cause: 'digits changed places',
      answer: 'The note beside the counter has them the other way round.',
    }
  if (lot.rig === UNCOUNTED_HOOK.rig && lot.day >= UNCOUNTED_HOOK.from)
    return {
      cause: 'not found yet',
      answer:
        'The sounded route has read light on rig 3 since then, on all that hangs there. Weights to be weighed.',
    }
  return noCause
}
