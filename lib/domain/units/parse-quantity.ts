import type { Problem } from '../errors'
import { ok, type Result, refused } from '../result'
import { formatNumber } from './format'
import { parseNumber } from './parse-number'
import { type Dimension, findUnit, fromSi, toSi, type UnitId, unitsOf } from './unit'

export interface QuantityReading {
  readonly dimension: Dimension
  /** The unit meant where none is typed. */
  readonly unit: UnitId
  /** What the value is, to begin the sentence: "Diameter". */
  readonly name: string
  /** Bounds in SI, both allowed values. */
  readonly min?: number
  readonly max?: number
  readonly decimal?: 'point' | 'comma'
  readonly where?: string
}

/** The text as typed, the unit it was understood in, the value in SI. */
export interface ParsedQuantity<Q extends number = number> {
  readonly typed: string
  readonly unit: UnitId
  readonly si: Q
}

// Number or fraction first, then whatever is left is the unit.
const parts = /^([+\-\u2212]?(?:\d+[ \u00a0]+)?\d+\/\d+|[+\-\u2212]?[\d.,]*)\s*(\S.*)?$/s
const fraction = /^([+\-\u2212]?)(?:(\d+)[ \u00a0]+)?(\d+)\/(\d+)$/

const sentence = (reading: QuantityReading, message: string, mend: string): Problem => ({
  code: 'bad-input',
  message: `${reading.name}: ${message}.`,
  mend,
  ...(reading.where === undefined ? {} : { where: reading.where }),
})

function parseFraction(text: string, reading: QuantityReading): Result<number> | undefined {
  const found = fraction.exec(text)
  if (!found) return undefined
  const [, sign, whole, above, below] = found
  const value = Number(whole ?? 0) + Number(above) / Number(below)
  if (!Number.isFinite(value))
    return refused(sentence(reading, `“${text}” divides by zero`, 'Check the fraction.'))
  return ok(sign === '-' || sign === '\u2212' ? -value : value)
}

/** Six significant digits are enough to name a bound. */
const shown = (si: number, id: UnitId): string => {
  const value = fromSi(si, id)
  const digits = Number(value.toPrecision(6))
  const decimals = Math.min(12, (String(digits).split('.')[1] ?? '').length)
  return `${formatNumber(digits, { decimals })} ${id}`
}

function outside(si: number, id: UnitId, reading: QuantityReading): Problem | undefined {
  const { min, max } = reading
  const low = min !== undefined && si < min
  const high = max !== undefined && si > max
  if (!low && !high) return undefined
  const range =
    min !== undefined && max !== undefined
      ? `between ${shown(min, id)} and ${shown(max, id)}`
      : low
        ? `at least ${shown(min, id)}`
        : `at most ${shown(max ?? si, id)}`
  return sentence(
    reading,
    `${shown(si, id)} was read, and it has to be ${range}`,
    'Check the digits and the unit.',
  )
}

/**
 * Reads a measured value with an optional unit behind it: `10.06 thou`, `0,254mm`, `.010`, `25 1/2 in`.
 * Without a unit the reading's own one is meant. Fractions are for inches and feet only. Bounds are checked
 * in SI and told in the unit that was understood.
 */
export function parseQuantity(text: string, reading: QuantityReading): Result<ParsedQuantity> {
  const typed = text.trim()
  const [, numberText = '', unitText] = parts.exec(typed) ?? []
  if (numberText === '') {
    const number = parseNumber(typed, reading)
    return number.ok ? refused(sentence(reading, `“${typed}” is not understood`, 'Type a number.')) : number
  }
  const id = unitText === undefined ? reading.unit : findUnit(reading.dimension, unitText.trim())
  if (id === undefined) {
    // A gap or an exponent is a fault of the number, not an unknown unit.
    const number = parseNumber(typed, reading)
    if (!number.ok && /^[\d.,'’]|^e[+\-\u2212]?\d/i.test(unitText ?? '')) return number
    return refused(
      sentence(
        reading,
        `“${unitText}” is not a unit understood here`,
        `Use one of: ${unitsOf(reading.dimension).join(', ')}.`,
      ),
    )
  }
  const asFraction = parseFraction(numberText, reading)
  if (asFraction && id !== 'in' && id !== 'ft')
    return refused(
      sentence(
        reading,
        `“${typed}” is a fraction, and fractions are for inches`,
        'Add “in”, or type a decimal number.',
      ),
    )
  const number = asFraction ?? parseNumber(numberText, reading)
  if (!number.ok) return number
  const si = toSi(number.value, id)
  if (!Number.isFinite(si))
    return refused(sentence(reading, 'the number is too large to hold', 'Check the digits.'))
  const problem = outside(si, id, reading)
  return problem ? refused(problem) : ok({ typed, unit: id, si })
}

/** `parseQuantity` with the SI value taken through one of the doors of `quantity.ts`. */
export function parseQuantityAs<Q extends number>(
  text: string,
  reading: QuantityReading,
  door: (value: number) => Q,
): Result<ParsedQuantity<Q>> {
  const parsed = parseQuantity(text, reading)
  return parsed.ok ? ok({ ...parsed.value, si: door(parsed.value.si) }) : parsed
}
