import type { z } from 'zod'
import type { Problem } from '@/lib/domain/errors'
import { ok, type Result, refused } from '@/lib/domain/result'
import { parseNumber } from '@/lib/domain/units/parse-number'
import { parseQuantity } from '@/lib/domain/units/parse-quantity'
import type { Dimension, UnitId } from '@/lib/domain/units/unit'

/** The fields of a form by name, as the browser sent them. */
export type FormFields = Readonly<Record<string, string | undefined>>

const problemAt = (where: string, message: string, mend?: string): Problem => ({
  code: 'bad-input',
  message,
  where,
  ...(mend === undefined ? {} : { mend }),
})

const textOf = (fields: FormFields, field: string): string => (fields[field] ?? '').trim()

/** A text by a schema of `plain-text.ts`. */
export function textField<Schema extends z.ZodType>(
  fields: FormFields,
  field: string,
  schema: Schema,
): Result<z.output<Schema>> {
  const parsed = schema.safeParse(fields[field] ?? '')
  if (parsed.success) return ok(parsed.data)
  return refused(...parsed.error.issues.slice(0, 1).map(({ message }) => problemAt(field, message)))
}

export interface QuantityField {
  /** Begins the sentence: "Resolution". */
  readonly name: string
  readonly dimension: Dimension
  /** The unit meant where none is typed. */
  readonly unit: UnitId
  /** SI, both allowed. */
  readonly min: number
  readonly max: number
}

/** A measured number, in SI; a unit may follow it. */
export function quantityField(fields: FormFields, field: string, rules: QuantityField): Result<number> {
  const parsed = parseQuantity(textOf(fields, field), { ...rules, where: field })
  return parsed.ok ? ok(parsed.value.si) : parsed
}

/** The same, where nothing typed means undefined. */
export const optionalQuantityField = (
  fields: FormFields,
  field: string,
  rules: QuantityField,
): Result<number | undefined> =>
  textOf(fields, field) === '' ? ok(undefined) : quantityField(fields, field, rules)

export interface NumberField {
  readonly name: string
  readonly min: number
  readonly max: number
  readonly whole?: boolean
}

/** A number without a unit. */
export function numberField(
  fields: FormFields,
  field: string,
  { name, min, max, whole = false }: NumberField,
): Result<number> {
  const parsed = parseNumber(textOf(fields, field), { name, where: field })
  if (!parsed.ok) return parsed
  if (whole && !Number.isInteger(parsed.value))
    return refused(problemAt(field, `${name}: ${parsed.value} is not a whole number.`))
  if (parsed.value < min || parsed.value > max)
    return refused(problemAt(field, `${name} has to be between ${min} and ${max}, not ${parsed.value}.`))
  return parsed
}

/** One of a closed list. */
export function choiceField<Value extends string>(
  fields: FormFields,
  field: string,
  name: string,
  values: readonly Value[],
): Result<Value> {
  const text = textOf(fields, field)
  const found = values.find((value) => value === text)
  return found === undefined
    ? refused(
        problemAt(
          field,
          text === '' ? `${name}: nothing is chosen.` : `${name}: “${text}” is not one of the choices.`,
        ),
      )
    : ok(found)
}

/** A ticked box sends `yes`, an empty one nothing. */
export const checkField = (fields: FormFields, field: string): Result<boolean> => ok(fields[field] === 'yes')

/** The version of a row that was on the screen. */
export const versionField = (fields: FormFields): Result<number> =>
  numberField(fields, 'version', { name: 'Version', min: 1, max: 1_000_000_000, whole: true })

const calendarDay = /^(\d{4})-(\d{2})-(\d{2})$/

/** A calendar day as date fields send it, `2026-11-27`; whether it exists is checked. */
export function dayField(fields: FormFields, field: string, name: string): Result<string> {
  const text = textOf(fields, field)
  const [, year, month, day] = calendarDay.exec(text) ?? []
  const at = new Date(Date.UTC(Number(year), Number(month) - 1, Number(day)))
  const exists = year !== undefined && !Number.isNaN(at.getTime()) && at.toISOString().slice(0, 10) === text
  if (exists && Number(year) >= 1900 && Number(year) < 2200) return ok(text)
  return refused(
    problemAt(
      field,
      text === '' ? `${name}: no date was given.` : `${name}: “${text}” is not a date between 1900 and 2200.`,
      'Give year, month and day, such as 2026-11-27.',
    ),
  )
}

export const optionalDayField = (
  fields: FormFields,
  field: string,
  name: string,
): Result<string | undefined> =>
  textOf(fields, field) === '' ? ok(undefined) : dayField(fields, field, name)

/** Codes apart by spaces or commas, each as works write them. */
export function codesField(
  fields: FormFields,
  field: string,
  schema: z.ZodType<string>,
): Result<readonly string[]> {
  const codes = textOf(fields, field)
    .split(/[\s,;]+/)
    .filter((code) => code !== '')
  const wrong = codes.flatMap((code) => {
    const parsed = schema.safeParse(code)
    return parsed.success
      ? []
      : [problemAt(field, `“${code}”: ${parsed.error.issues[0]?.message ?? 'not a code.'}`)]
  })
  return wrong.length > 0 ? refused(...wrong) : ok([...new Set(codes)])
}
