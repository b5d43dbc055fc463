import type { Problem } from '@/lib/domain/errors'
import type { EquipmentCodes } from '@/lib/domain/record/reading'
import { codeText, plainText } from '../plain-text'
import type { LotOpening } from './bench-row'
import type { WordColumn } from './columns'
import { problemOf, shown } from './row-problem'
import { parseTime } from './wall-time'

const gaugeColumns = ['rig', 'micrometer', 'balance', 'rule', 'counter'] as const
const openingCodes = ['product', 'machine', 'die', 'coil', 'spool'] as const

/** Made once: a file asks them a million times. */
const schemas = {
  lot: codeText('lot'),
  product: plainText('product', { max: 80 }),
  machine: codeText('machine'),
  die: codeText('die'),
  coil: codeText('coil'),
  spool: codeText('spool'),
  maker: plainText('maker', { max: 80 }),
  measurer: plainText('measurer', { max: 80 }),
  rig: codeText('rig'),
  micrometer: codeText('micrometer'),
  balance: codeText('balance'),
  rule: codeText('rule'),
  counter: codeText('counter'),
  weight: codeText('Weight'),
} as const

/** Word cells of a row with the headers they stand under. */
export type Words = Partial<Record<WordColumn, { readonly text: string; readonly header: string }>>

/** The words of a row, checked one by one; problems are added to the list. */
export function readWords(words: Words, timeZone: string, problems: Problem[]) {
  const checked = (id: Exclude<keyof typeof schemas, 'weight'>): string | undefined => {
    const word = words[id]
    if (!word) return undefined
    const parsed = schemas[id].safeParse(word.text)
    if (parsed.success) return parsed.data
    problems.push({
      code: 'bad-input',
      message: parsed.error.issues[0]?.message ?? 'is not understood',
      where: word.header,
      mend: 'Write it as it stands in Ledgerline.',
      details: { value: shown(word.text) },
    })
    return undefined
  }
  const time = (id: 'made_at' | 'measured_at'): number | undefined => {
    const word = words[id]
    if (!word) return undefined
    const parsed = parseTime(word.text, timeZone)
    if (parsed.ok) return parsed.value
    problems.push(
      ...parsed.problems.map((one) => ({ ...one, where: word.header, details: { value: shown(word.text) } })),
    )
    return undefined
  }
  const whole = (id: 'specimen' | 'specification', most: number): number | undefined => {
    const word = words[id]
    if (!word) return undefined
    if (/^[1-9]\d{0,3}$/.test(word.text) && Number(word.text) <= most) return Number(word.text)
    problems.push(
      problemOf(
        word.header,
        word.text,
        `is a whole number from 1 to ${most}, not “${shown(word.text)}”`,
        'Correct the number.',
      ),
    )
    return undefined
  }
  const codes = Object.fromEntries(
    openingCodes.flatMap((id) => {
      const code = checked(id)
      return code === undefined ? [] : [[id, code]]
    }),
  )
  const equipment: EquipmentCodes = Object.fromEntries(
    gaugeColumns.flatMap((id) => {
      const code = checked(id)
      return code === undefined ? [] : [[id, code]]
    }),
  )
  const maker = checked('maker')
  const madeAt = time('made_at')
  const specification = whole('specification', 9999)
  const measuredAt = time('measured_at')
  const measurer = checked('measurer')
  const weights = words.weights?.text.split(/[\s,;+]+/).filter((code) => code !== '')
  const badWeight = weights?.find((code) => !schemas.weight.safeParse(code).success)
  if (badWeight !== undefined && words.weights)
    problems.push(
      problemOf(
        words.weights.header,
        badWeight,
        `holds “${shown(badWeight)}”, which is no code of a weight`,
        'List codes apart by spaces.',
      ),
    )
  const twice = weights?.find((code, index) => weights.indexOf(code) !== index)
  if (twice !== undefined && words.weights)
    problems.push(
      problemOf(
        words.weights.header,
        twice,
        `names weight ${twice} twice, and it can hang only once`,
        'List each weight once.',
      ),
    )
  return {
    lot: checked('lot'),
    specimen: whole('specimen', 9999),
    opening: {
      ...codes,
      ...(maker === undefined ? {} : { maker }),
      ...(madeAt === undefined ? {} : { madeAt }),
      ...(specification === undefined ? {} : { specification }),
    } as LotOpening,
    ...(measuredAt === undefined ? {} : { measuredAt }),
    ...(measurer === undefined ? {} : { measurer }),
    equipment,
    ...(weights === undefined || weights.length === 0 ? {} : { weights }),
  }
}
