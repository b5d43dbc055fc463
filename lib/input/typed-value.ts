import { z } from 'zod'
import type { TypedValue } from '@/lib/domain/metrology/sheet'
import { parseQuantityAs, type QuantityReading } from '@/lib/domain/units/parse-quantity'
import { isUnit } from '@/lib/domain/units/unit'

/** Longest text a person types for one value. */
const LONGEST = 40

/** What is read, between which bounds, in SI. */
export type ValueRules = Pick<QuantityReading, 'dimension' | 'name'> & {
  readonly min: number
  readonly max: number
}

/**
 * A value as typed with its unit. The SI value is always found anew from the text by the same parser on both
 * sides; one that comes along must agree, so that what the browser computed with is what is stored.
 */
export const typedValue = <Q extends number>(rules: ValueRules, door: (value: number) => Q) =>
  z
    .strictObject({
      typed: z
        .string({ error: `${rules.name}: the text that was typed is needed.` })
        .max(LONGEST, { error: `${rules.name}: more than ${LONGEST} characters were typed.` }),
      unit: z.string({ error: `${rules.name}: the unit is needed.` }),
      si: z.number().optional(),
    })
    .transform(({ typed, unit, si }, context): TypedValue<Q> => {
      const refuse = (message: string, mend: string | undefined) => {
        context.addIssue({ code: 'custom', message, params: { mend } })
        return z.NEVER
      }
      if (!isUnit(unit)) return refuse(`${rules.name}: “${unit.slice(0, LONGEST)}” is not a unit.`, undefined)
      const parsed = parseQuantityAs(typed, { ...rules, unit }, door)
      if (!parsed.ok) {
        const [first] = parsed.problems
        return refuse(first?.message ?? `${rules.name} is not understood.`, first?.mend)
      }
      if (si !== undefined && si !== parsed.value.si)
        return refuse(
          `${rules.name}: “${typed}” in ${parsed.value.unit} is not ${si} in SI.`,
          'Load the page again, so that both sides read numbers alike.',
        )
      return parsed.value
    })
