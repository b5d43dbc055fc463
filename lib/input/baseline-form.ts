import type { Problem } from '@/lib/domain/errors'
import { ok, type Result, refused } from '@/lib/domain/result'
import { parseChartId } from './drift-view'
import {
  type FreezeLimitsInput,
  freezeLimitsSchema,
  type ProposeLimitsInput,
  proposeLimitsSchema,
} from './limits'
import { parseInput } from './parse-input'

type Fields = Readonly<Record<string, string | undefined>>

interface LeftOutLine {
  readonly lotCode: string
  readonly reason: string
}

/**
 * Lots left out of a baseline, one a line: the lot's code, then why (`LA-336 load 10 g short`). Empty lines count
 * for nothing; a line without a reason is refused, as nothing is left out without one.
 */
export function parseLeftOut(text: string): Result<readonly LeftOutLine[]> {
  const lines = text
    .split(/\r?\n/)
    .map((line) => line.trim())
    .filter((line) => line !== '')
  const problems: Problem[] = []
  const found = lines.map((line): LeftOutLine => {
    const [, lotCode = '', reason = ''] = /^([^\s:,;]+)[\s:,;–-]*(.*)$/u.exec(line) ?? []
    if (reason.length < 3)
      problems.push({
        code: 'bad-input',
        message: `Left out: “${line}” gives no reason.`,
        where: 'leftOut',
        mend: 'Write the lot’s code and why it is left out, such as “LA-336 load 10 g short”.',
      })
    return { lotCode, reason }
  })
  const twice = found.find(
    ({ lotCode }, index) => found.findIndex((one) => one.lotCode === lotCode) !== index,
  )
  if (twice)
    problems.push({
      code: 'bad-input',
      message: `Left out: ${twice.lotCode} stands there twice.`,
      where: 'leftOut',
      mend: 'Keep one line for each lot.',
    })
  return problems.length > 0 ? refused(...problems) : ok(found)
}

const filled = (text: string | undefined): string | undefined => {
  const kept = text?.trim()
  return kept ? kept : undefined
}

const unknownChart = (): Result<never> =>
  refused({
    code: 'bad-input',
    message: 'Chart: nothing of that name is charted.',
    where: 'chart',
    mend: 'Choose a chart of the list.',
  })

/** What a proposal is asked for in an address: product, chart, first and last lot, those left out. */
export function parseBaseline(fields: Fields): Result<ProposeLimitsInput> {
  const chart = parseChartId(fields.chart ?? '')
  if (!chart) return unknownChart()
  const leftOut = parseLeftOut(fields.leftOut ?? '')
  if (!leftOut.ok) return leftOut
  return parseInput(proposeLimitsSchema, {
    ...chart,
    productCode: fields.product ?? '',
    firstLotCode: filled(fields.first),
    lastLotCode: filled(fields.last),
    leftOut: leftOut.value,
    alike: fields.alike === 'yes' ? true : fields.alike === 'no' ? false : undefined,
  })
}

/** The same with the signature: a reason, the set that stood on the screen, and from when it holds. */
export function parseBaselineForm(fields: Fields): Result<FreezeLimitsInput> {
  const baseline = parseBaseline(fields)
  if (!baseline.ok) return baseline
  return parseInput(freezeLimitsSchema, {
    ...baseline.value,
    effectiveFrom: filled(fields.effectiveFrom),
    reason: fields.reason ?? '',
    supersedes: Number(fields.supersedes),
  })
}
