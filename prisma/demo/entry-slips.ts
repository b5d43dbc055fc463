import { doubtFrequency } from '@/lib/domain/metrology/entry-doubts'
import type { KeptDoubt } from '@/lib/domain/metrology/sheet'
import type { DemoSchedule } from './schedule'
import { OCTAVE, SWAPPED_DIGITS } from './story-facts'

export interface EntrySlip {
  readonly typed: string
  /** What the entry check asked, and why the measurer kept the entry all the same. */
  readonly doubt?: KeptDoubt
}

/**
 * Two neighbouring digits with their places changed, 329.7 to 327.9: of the pairs about the point the one that
 * does most below one and a half per cent, as a slip that nobody sees at once; where those digits are alike, the
 * first two.
 */
export function swapped(typed: string): string {
  const point = typed.indexOf('.')
  const pairs = [
    [point - 2, point - 1],
    [point - 1, point + 1],
    [point + 1, point + 2],
  ] as const
  const withSwapped = ([left, right]: readonly [number, number]): string => {
    const letters = [...typed]
    letters[left] = typed[right] ?? ''
    letters[right] = typed[left] ?? ''
    return letters.join('')
  }
  const size = (text: string): number => Math.abs(Number(text) / Number(typed) - 1)
  const slight = pairs
    .map(withSwapped)
    .filter((text) => size(text) < 0.015)
    .sort((a, b) => size(b) - size(a))[0]
  return slight !== undefined && size(slight) > 0.003 ? slight : withSwapped([0, 1])
}

/** What was typed for a frequency where the bench made one of its slips; undefined where it made none. */
export function entrySlip(
  { index, productCode }: Pick<DemoSchedule, 'index' | 'productCode'>,
  specimen: number,
  heard: string,
  expected: number,
): EntrySlip | undefined {
  const here = (story: typeof OCTAVE | typeof SWAPPED_DIGITS) =>
    story.productCode === productCode && story.index === index && story.specimen === specimen
  if (!here(OCTAVE) && !here(SWAPPED_DIGITS)) return undefined
  const typed = here(OCTAVE) ? (Number(heard) * OCTAVE.times).toFixed(2) : swapped(heard)
  const question = doubtFrequency({
    name: 'Frequency',
    unit: 'Hz',
    decimals: 2,
    typed,
    si: Number(typed),
    expected,
    usual: 0.003,
    because: 'This load on this span should sound near it for the mass that was weighed.',
  })?.question
  if (question === undefined) return { typed }
  const reason = here(OCTAVE)
    ? 'That is what the counter shows.'
    : 'Read off again: it stands so in my notes.'
  return { typed, doubt: { field: 'frequency', question, reason } }
}
