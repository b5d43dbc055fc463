import { ok, type Result, refused } from '../result'
import { type ParsedQuantity, parseQuantity, type QuantityReading } from '../units/parse-quantity'
import { type UnitId, unitsOf } from '../units/unit'

export interface ExpectedReading extends Omit<QuantityReading, 'min' | 'max'> {
  /** Bounds of what can be measured at all, SI. */
  readonly min: number
  readonly max: number
  /** What the plan leads one to expect, SI; without it the unit is simply the default one. */
  readonly expected?: number
}

/** A reading may differ from the expected one by this factor and still be taken for the same thing. */
const NEAR = 1.35

const near = (si: number, expected: number): boolean => si > 0 && si / expected < NEAR && expected / si < NEAR

/** Units that people type a plain number in, by dimension. */
const usualUnits: Readonly<Partial<Record<QuantityReading['dimension'], readonly UnitId[]>>> = {
  length: ['mm', 'µm', 'in', 'thou', 'm'],
  mass: ['mg', 'g'],
}

/**
 * A typed number in the unit that makes sense of it: for a wire of 0.254 mm, `0,254`, `254`, `.010` and `10`
 * are all the same. A unit that was typed is believed. Where the default unit lands near what is expected, or
 * no other one does, it is the default unit; where exactly one other unit does, it is that one, and the entry
 * says so; nothing is guessed between two.
 */
export function understandEntry(text: string, reading: ExpectedReading): Result<ParsedQuantity> {
  const plain = parseQuantity(text, reading)
  const { dimension, expected } = reading
  const typedUnit = /[a-zµμ°"″%]/i.test(text)
  if (expected === undefined || typedUnit) return plain
  if (plain.ok && near(plain.value.si, expected)) return plain
  const others = (usualUnits[dimension] ?? unitsOf(dimension)).filter((unit) => unit !== reading.unit)
  const fitting = others.flatMap((unit) => {
    const parsed = parseQuantity(text, { ...reading, unit })
    return parsed.ok && near(parsed.value.si, expected) ? [parsed.value] : []
  })
  const [first, second] = fitting
  if (first && !second) return ok(first)
  return plain.ok ? plain : refused(...plain.problems)
}
