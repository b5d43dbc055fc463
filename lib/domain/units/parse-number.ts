import { ok, type Result, refused } from '../result'

export interface NumberReading {
  /** The only decimal sign allowed, where a file declares one. Without it comma and point both count. */
  readonly decimal?: 'point' | 'comma'
  /** What the number is, to begin the sentence: "Diameter". */
  readonly name?: string
  /** Field or column that is meant. */
  readonly where?: string
}

const plainNumber = /^[+\-\u2212]?(?:\d+(?:[.,]\d+)?|[.,]\d+)$/

const reasonOf = (text: string): { message: string; mend: string } => {
  if (text === '') return { message: 'nothing was typed', mend: 'Type a number.' }
  const shown = `“${text.length > 40 ? `${text.slice(0, 40)}…` : text}”`
  if (!/\d/.test(text)) return { message: `${shown} has no digits`, mend: 'Type a number, such as 0.254.' }
  if (/^[+\-\u2212]?[\d\s.,'’\u00a0\u202f]+$/.test(text)) {
    if (/[\s'’\u00a0\u202f]/.test(text))
      return {
        message: `${shown} has a gap between its digits`,
        mend: 'Type the digits without spaces or thousands signs.',
      }
    if (text.includes(',') && text.includes('.'))
      return {
        message: `${shown} has both a comma and a point`,
        mend: 'Type one decimal sign and no thousands signs.',
      }
    if (/[.,].*[.,]/.test(text))
      return { message: `${shown} has more than one decimal sign`, mend: 'Type one decimal sign only.' }
    return {
      message: `${shown} has no digit after its decimal sign`,
      mend: 'Finish the number, or leave the decimal sign out.',
    }
  }
  if (/^[+\-\u2212]?[\d.,]+e[+\-\u2212]?\d+$/i.test(text))
    return { message: `${shown} is written with a power of ten`, mend: 'Write the number out in full.' }
  return { message: `${shown} is not a plain number`, mend: 'Type digits with at most one decimal sign.' }
}

/**
 * Reads a measured number strictly. Comma and point are both decimal signs, and no grouping is understood,
 * so each accepted text has one reading: `0,254`, `.010`, `254`, `+3`, `−1.5` (minus as hyphen or U+2212).
 * Refused with a sentence: nothing, stray text, gaps, both signs, two signs, powers of ten, overflow.
 */
export function parseNumber(text: string, reading: NumberReading = {}): Result<number> {
  const refuse = (message: string, mend: string) =>
    refused({
      code: 'bad-input' as const,
      message: reading.name
        ? `${reading.name}: ${message}.`
        : `${message.charAt(0).toUpperCase()}${message.slice(1)}.`,
      mend,
      ...(reading.where === undefined ? {} : { where: reading.where }),
    })
  const trimmed = text.trim()
  if (!plainNumber.test(trimmed)) {
    const { message, mend } = reasonOf(trimmed)
    return refuse(message, mend)
  }
  if (reading.decimal === 'comma' && trimmed.includes('.'))
    return refuse(`“${trimmed}” has a point where commas are declared`, 'Use the comma as decimal sign.')
  if (reading.decimal === 'point' && trimmed.includes(','))
    return refuse(`“${trimmed}” has a comma where points are declared`, 'Use the point as decimal sign.')
  const value = Number(trimmed.replace(',', '.').replace('\u2212', '-'))
  if (!Number.isFinite(value)) return refuse('the number is too large to hold', 'Check the digits.')
  // No negative zero: it would be stored, hashed and shown differently from zero.
  return ok(value === 0 ? 0 : value)
}
