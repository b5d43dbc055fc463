import { formatQuantity } from '../units/format'
import { fromSi, toSi, type UnitId, unit as unitOf, unitsOf } from '../units/unit'

export type DoubtChoice =
  | { readonly kind: 'measure-again' }
  | { readonly kind: 'meant'; readonly si: number; readonly typed: string }
  | { readonly kind: 'keep' }

/** A question about an entry. Nothing is changed before a person has answered. */
export interface EntryDoubt {
  readonly kind: 'ratio' | 'digits' | 'unit' | 'far'
  readonly question: string
  readonly detail: string
  readonly choices: readonly DoubtChoice[]
}

export interface EntryFacts {
  readonly name: string
  /** Unit and decimals it is shown in. */
  readonly unit: UnitId
  readonly decimals: number
  /** The digits as typed; neighbouring ones may have been swapped. */
  readonly typed: string
  readonly si: number
  /** What the set-up and the product lead one to expect, SI. */
  readonly expected: number
  /** Relative departure that is still ordinary. */
  readonly usual: number
  /** A sentence on what the expectation rests on. */
  readonly because: string
}

/** Frequencies that are heard instead of the fundamental, with their names. */
const partials = [
  { ratio: 1 / 2, words: 'an octave low' },
  { ratio: 2, words: 'an octave high' },
  { ratio: 3, words: 'the third partial' },
  { ratio: 1 / 3, words: 'a third of the fundamental' },
  { ratio: 4, words: 'two octaves high' },
] as const

/** Within this much of a simple ratio the ratio is named. */
const RATIO_TOLERANCE = 0.05

const away = (si: number, expected: number): number => Math.abs(si / expected - 1)

/** An octave or another partial sounded, or a mass ten times off: the ratio to the expected value says so. */
function ratioDoubt(
  facts: EntryFacts,
  ratios: readonly { readonly ratio: number; readonly words: string }[],
) {
  const { expected, si } = facts
  return ratios.find(({ ratio }) => away(si, expected * ratio) < RATIO_TOLERANCE)
}

/**
 * The entry with two neighbouring digits swapped back, where that brings it to what is expected and the entry
 * as typed is not. 327.9 typed for 329.7 is 0.5 % off: it is asked about when the usual departure is smaller.
 */
function swappedDigits(facts: EntryFacts): { readonly typed: string; readonly si: number } | undefined {
  const { expected, si, unit, usual } = facts
  const { digits, rest } = partsOf(facts.typed)
  const candidates: { typed: string; si: number }[] = []
  for (let index = 0; index + 1 < digits.length; index += 1) {
    // The two digits may stand on either side of the decimal sign.
    const next = /[.,]/.test(digits[index + 1] ?? '') ? index + 2 : index + 1
    const [left, right] = [digits[index] ?? '', digits[next] ?? '']
    if (!/\d/.test(left) || !/\d/.test(right) || left === right) continue
    const letters = [...digits]
    letters[index] = right
    letters[next] = left
    const text = letters.join('')
    const value = toSi(numberOf(text), unit)
    if (Number.isFinite(value) && away(value, expected) <= usual)
      candidates.push({ typed: text + rest, si: value })
  }
  candidates.sort((a, b) => away(a.si, expected) - away(b.si, expected))
  return away(si, expected) > usual ? candidates[0] : undefined
}

/** The number of an entry, and the unit typed behind it, if any. */
function partsOf(typed: string): { readonly digits: string; readonly rest: string } {
  const digits = /^[\d.,]*/.exec(typed.trim())?.[0] ?? ''
  return { digits, rest: typed.trim().slice(digits.length) }
}

const numberOf = (digits: string): number => (digits === '' ? Number.NaN : Number(digits.replace(',', '.')))

/** The same digits in another unit of the dimension, where that is what is expected: 254 mm for 254 µm. */
function otherUnit({ decimals, expected, typed, unit, usual }: EntryFacts) {
  const value = numberOf(partsOf(typed).digits)
  const found = unitsOf(unitOf(unit).dimension).find(
    (other) => other !== unit && away(toSi(value, other), expected) <= usual,
  )
  if (found === undefined) return undefined
  const si = toSi(value, found)
  return { si, unit: found, typed: String(Number(fromSi(si, unit).toFixed(decimals + 2))) }
}

const show = ({ unit, decimals }: EntryFacts, si: number): string =>
  formatQuantity(si, unit, { decimals, withUnit: true })

/** A sounded frequency against the one that load, span and product predict. */
export function doubtFrequency(facts: EntryFacts): EntryDoubt | undefined {
  const found = ratioDoubt(facts, partials)
  if (!found) return doubtDigits(facts)
  const meant = facts.si / found.ratio
  const typed = String(Number(fromSi(meant, facts.unit).toFixed(facts.decimals)))
  return {
    kind: 'ratio',
    question: `Is ${show(facts, facts.si)} ${found.words}?`,
    detail: `${facts.because} Nothing has been changed.`,
    choices: [
      { kind: 'measure-again' },
      { kind: 'meant', si: toSi(Number(typed), facts.unit), typed },
      { kind: 'keep' },
    ],
  }
}

/** Any entry: swapped digits first, then another unit, then a departure that is far from ordinary. */
export function doubtDigits(facts: EntryFacts): EntryDoubt | undefined {
  const swapped = swappedDigits(facts)
  if (swapped)
    return {
      kind: 'digits',
      question: `Were two digits swapped in ${facts.typed}?`,
      detail: `${facts.because} ${swapped.typed} would fit. Nothing has been changed.`,
      choices: [{ kind: 'measure-again' }, { kind: 'meant', ...swapped }, { kind: 'keep' }],
    }
  if (away(facts.si, facts.expected) <= 3 * facts.usual) return undefined
  const other = otherUnit(facts)
  if (other)
    return {
      kind: 'unit',
      question: `Is ${facts.typed} meant in ${other.unit}?`,
      detail: `${facts.because} Nothing has been changed.`,
      choices: [
        { kind: 'measure-again' },
        { kind: 'meant', si: toSi(Number(other.typed), facts.unit), typed: other.typed },
        { kind: 'keep' },
      ],
    }
  return {
    kind: 'far',
    question: `Is ${facts.name.toLowerCase()} really ${show(facts, facts.si)}?`,
    detail: `${facts.because} Nothing has been changed.`,
    choices: [{ kind: 'measure-again' }, { kind: 'keep' }],
  }
}

/** A weighed mass: ten times off is a slipped decimal sign or another unit. */
export function doubtMass(facts: EntryFacts): EntryDoubt | undefined {
  const found = ratioDoubt(facts, [
    { ratio: 10, words: 'ten times too heavy' },
    { ratio: 0.1, words: 'ten times too light' },
    { ratio: 1000, words: 'in another unit' },
    { ratio: 0.001, words: 'in another unit' },
  ])
  if (!found) return doubtDigits(facts)
  const meant = facts.si / found.ratio
  const typed = String(Number(fromSi(meant, facts.unit).toFixed(facts.decimals)))
  return {
    kind: 'ratio',
    question: `Is ${show(facts, facts.si)} ${found.words}?`,
    detail: `${facts.because} Nothing has been changed.`,
    choices: [
      { kind: 'measure-again' },
      { kind: 'meant', si: toSi(Number(typed), facts.unit), typed },
      { kind: 'keep' },
    ],
  }
}
