import { ok, type Result, refused } from '../result'
import { exp, ln } from '../units/elementary'
import { positive } from '../units/positive'
import { type Cents, cents, type Hertz, hertz } from '../units/quantity'

/** Concert A of ISO 16:1975, Hz. */
export const STANDARD_A4 = hertz(440)

/** 2^(k/12): table, not powers, so that every engine has the same last bit. */
const semitones = [
  1,
  1.0594630943592953,
  1.122462048309373,
  1.189207115002721,
  1.2599210498948732,
  1.3348398541700344,
  Math.SQRT2,
  1.4983070768766815,
  1.5874010519681996,
  1.681792830507429,
  1.7817974362806785,
  1.887748625363387,
] as const

const sharpNames = ['C', 'C♯', 'D', 'D♯', 'E', 'F', 'F♯', 'G', 'G♯', 'A', 'A♯', 'B'] as const
const flatNames = ['C', 'D♭', 'D', 'E♭', 'E', 'F', 'G♭', 'G', 'A♭', 'A', 'B♭', 'B'] as const
const naturals: Readonly<Record<string, number>> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 }

const wholeNote = (midi: number): number => {
  if (!Number.isInteger(midi) || midi < -60 || midi > 200)
    throw new RangeError(`${midi} is not the number of a note`)
  return midi
}

/**
 * Frequency of a note in equal temperament: f = A4 · 2^((n − 69)/12).
 * n MIDI number (60 = middle C, C4), A4 Hz. Throws a RangeError when n is not whole or A4 not above zero.
 * Source: ISO 16:1975 for 440 Hz; twelve-tone equal temperament.
 */
export function frequencyOfNote(midi: number, a4: Hertz = STANDARD_A4): Hertz {
  const steps = wholeNote(midi) - 69
  const octave = Math.floor(steps / 12)
  const ratio = semitones[steps - 12 * octave] ?? Number.NaN
  // Powers of two are exact, whichever side they stand on.
  let scaled = positive('A4', a4) * ratio
  for (let k = 0; k < Math.abs(octave); k += 1) scaled = octave < 0 ? scaled / 2 : scaled * 2
  return hertz(scaled)
}

/** Cents from `reference` up to `frequency`: 1200 log₂(f/f_ref). Throws a RangeError unless both are above zero. */
export const centsBetween = (frequency: Hertz, reference: Hertz): Cents =>
  cents((1200 * ln(positive('f', frequency) / positive('f_ref', reference))) / Math.LN2)

/** Frequency ratio of an interval in cents: 2^(c/1200). */
export const ratioOfCents = (interval: Cents | number): number => exp((interval * Math.LN2) / 1200)

/** The nearest note and how far the frequency is above it, −50 to +50 cents. */
export function nearestNote(
  frequency: Hertz,
  a4: Hertz = STANDARD_A4,
): { readonly midi: number; readonly cents: Cents } {
  const midi = wholeNote(69 + Math.round(centsBetween(frequency, a4) / 100))
  return { midi, cents: centsBetween(frequency, frequencyOfNote(midi, a4)) }
}

export interface NoteNaming {
  readonly accidental?: 'sharp' | 'flat'
  /** `#` and `b` instead of ♯ and ♭, for files. */
  readonly ascii?: boolean
}

/**
 * Name of a note with its octave, C4 = middle C: "F♯2". Some regions call middle C "C3": show the frequency
 * with the name.
 */
export function noteName(midi: number, { accidental = 'sharp', ascii = false }: NoteNaming = {}): string {
  const octave = Math.floor(wholeNote(midi) / 12) - 1
  const name = (accidental === 'flat' ? flatNames : sharpNames)[midi - 12 * (octave + 1)] ?? ''
  const text = `${name}${octave < 0 ? `\u2212${-octave}` : octave}`
  return ascii ? text.replace('♯', '#').replace('♭', 'b').replace('\u2212', '-') : text
}

/** Reads "E4", "F#2", "F♯2", "Bb2", "b♭2" as the MIDI number; refuses anything else with a sentence. */
export function parseNote(text: string, where?: string): Result<number> {
  const found = /^([A-Ga-g])([#♯b♭]?)([-\u2212]?\d{1,2})$/u.exec(text.trim())
  const natural = naturals[(found?.[1] ?? '').toUpperCase()]
  const octave = Number((found?.[3] ?? '').replace('\u2212', '-'))
  if (!found || natural === undefined || octave < -1 || octave > 9)
    return refused({
      code: 'bad-input',
      message: `“${text.trim()}” is not the name of a note.`,
      mend: 'Write letter, sharp or flat, octave: E4, F#2, Bb2 (middle C is C4; B, not H).',
      ...(where === undefined ? {} : { where }),
    })
  const shift = found[2] === '' ? 0 : found[2] === '#' || found[2] === '♯' ? 1 : -1
  return ok(12 * (octave + 1) + natural + shift)
}
