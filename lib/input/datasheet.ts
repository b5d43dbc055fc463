import { z } from 'zod'
import { parseNote } from '@/lib/domain/strings/pitch'
import { parseQuantityAs } from '@/lib/domain/units/parse-quantity'
import { hertz, metres } from '@/lib/domain/units/quantity'
import { codeText, plainText } from './plain-text'

export const datasheetBounds = {
  notes: 60,
  lengths: 12,
  minLength: 0.1,
  maxLength: 3,
  minA4: 380,
  maxA4: 480,
}

const refuse = (context: z.core.$RefinementCtx, message: string, mend?: string) => {
  context.addIssue({ code: 'custom', message, params: { mend } })
  return z.NEVER
}

/** Notes as a person writes them: names apart by spaces or commas, or a range such as “E2–E4”. */
const notes = plainText('Notes', { max: 400 }).transform((text, context): readonly number[] => {
  const list: number[] = []
  for (const part of text.split(/[\s,;]+/).filter(Boolean)) {
    const ends = part.split(/(?<=\d)(?:\.\.|–|-)(?=[A-Ga-g])/)
    const parsed = ends.map((end) => parseNote(end))
    const bad = parsed.find((one) => !one.ok)
    if (bad && !bad.ok)
      return refuse(
        context,
        bad.problems[0]?.message ?? `“${part}” is not a note.`,
        'Write notes as E4, F#4, Bb3.',
      )
    const [low, high] = parsed.map((one) => (one.ok ? one.value : 0))
    if (low === undefined) continue
    for (let midi = low; midi <= (high ?? low); midi += 1) list.push(midi)
    if (high !== undefined && high < low)
      return refuse(context, `“${part}” runs downwards.`, 'Write the lower note first.')
  }
  const unique = [...new Set(list)].sort((a, b) => a - b)
  if (unique.length === 0)
    return refuse(context, 'At least one note is needed.', 'Write notes as E4, F#4, Bb3.')
  if (unique.length > datasheetBounds.notes)
    return refuse(
      context,
      `${unique.length} notes are more than the ${datasheetBounds.notes} that fit a table.`,
    )
  return unique
})

/** Lengths as a person writes them: apart by spaces or semicolons, millimetres unless a unit follows. */
const lengths = plainText('Lengths', { max: 400 }).transform((text, context) => {
  const parts = text
    .split(/;|,(?=\s)|\s+(?=[\d.])/)
    .map((part) => part.trim())
    .filter(Boolean)
  if (parts.length === 0) return refuse(context, 'At least one length is needed.')
  if (parts.length > datasheetBounds.lengths)
    return refuse(
      context,
      `${parts.length} lengths are more than the ${datasheetBounds.lengths} that fit a table.`,
    )
  const list = []
  for (const part of parts) {
    const parsed = parseQuantityAs(
      part,
      {
        dimension: 'length',
        unit: 'mm',
        name: 'Length',
        min: datasheetBounds.minLength,
        max: datasheetBounds.maxLength,
      },
      metres,
    )
    if (!parsed.ok)
      return refuse(
        context,
        parsed.problems[0]?.message ?? 'Length is not understood.',
        parsed.problems[0]?.mend,
      )
    list.push(parsed.value.si)
  }
  return [...new Set(list)].sort((a, b) => a - b)
})

const a4 = plainText('A4', { max: 20 }).transform((text, context) => {
  const parsed = parseQuantityAs(
    text,
    {
      dimension: 'frequency',
      unit: 'Hz',
      name: 'A4',
      min: datasheetBounds.minA4,
      max: datasheetBounds.maxA4,
    },
    hertz,
  )
  return parsed.ok
    ? parsed.value.si
    : refuse(context, parsed.problems[0]?.message ?? 'A4 is not understood.', parsed.problems[0]?.mend)
})

const table = {
  productCode: codeText('Product'),
  notes,
  lengths,
  a4,
  basis: z.enum(['unloaded-mass', 'loaded-mass', 'plain-formula'], {
    error: 'Choose one of the three bases.',
  }),
  forceUnit: z.enum(['N', 'kgf', 'lbf'], { error: 'Choose newtons, kilograms-force or pounds-force.' }),
}

export const buildDatasheetSchema = z.strictObject(table)

export const publishDatasheetSchema = z.strictObject({
  ...table,
  /** Number of the newest revision that was on the screen, 0 for none: a newer one is told, not covered. */
  supersedes: z.coerce.number().int().min(0),
})

export type BuildDatasheetInput = z.output<typeof buildDatasheetSchema>
export type PublishDatasheetInput = z.output<typeof publishDatasheetSchema>
