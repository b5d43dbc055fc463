import { z } from 'zod'
import type { Problem } from '@/lib/domain/errors'
import { ok, type Result, refused } from '@/lib/domain/result'
import { type BenchColumn, benchColumn, likelyName } from './columns'

/** How a file is read: what each of its columns is, and its signs. Kept with the import as canonical JSON. */
export const importOptionsSchema = z.strictObject({
  delimiter: z.enum([',', ';', '\t']),
  decimal: z.enum(['point', 'comma']),
  /** Header of the file → name of a column of the bench file, `as-note` or `leave-out`. */
  columns: z.record(z.string().max(500), z.string().max(60)),
})

export type ImportOptions = z.output<typeof importOptionsSchema>

export const delimiters = { ',': 'comma', ';': 'semicolon', '\t': 'tab' } as const

/** Most columns that a file may have: a plan of many positions has some dozens. */
const MOST_COLUMNS = 200

/** What a header is read as; headers are names that somebody else chose, and may be called `constructor`. */
export const nameOf = (columns: ImportOptions['columns'], header: string): string | undefined =>
  Object.hasOwn(columns, header) ? columns[header] : undefined

/** Headers as they stand, a byte-order mark taken off, empty ones at the end left out. */
export function cleanHeaders(cells: readonly string[]): readonly string[] {
  const headers = cells.map((cell, index) => (index === 0 ? cell.replace(/^\uFEFF/, '') : cell).trim())
  const last = headers.findLastIndex((header) => header !== '')
  return headers.slice(0, last + 1)
}

/**
 * What each header means before a person has said anything: a column's own name, a name kept under this header
 * earlier, a likely one, else a note.
 */
export const proposedColumns = (
  headers: readonly string[],
  kept: Readonly<Record<string, string>> = {},
): Readonly<Record<string, string>> => {
  const taken = new Set<string>()
  const proposals = headers.map((header): readonly [string, string] => {
    const own = header.toLowerCase()
    const found =
      benchColumn(own) && own !== 'as-note' ? own : (nameOf(kept, header) ?? likelyName(header) ?? 'as-note')
    const name = isRepeatable(found) || !taken.has(found) ? found : 'as-note'
    taken.add(name)
    return [header, name]
  })
  return Object.fromEntries(proposals)
}

const isRepeatable = (name: string): boolean => {
  const column = benchColumn(name)
  return column?.kind === 'note' || column?.kind === 'left-out'
}

const sentence = (message: string, mend: string, where?: string): Problem => ({
  code: 'bad-input',
  message,
  mend,
  ...(where === undefined ? {} : { where }),
})

/**
 * The columns of a file in the order of its headers. Refused when a name is unknown or stands twice, when two
 * columns are the same diameter or value in different units, or when a needed column is missing.
 */
export function layoutOf(
  headers: readonly string[],
  columns: ImportOptions['columns'],
): Result<readonly BenchColumn[]> {
  const problems: Problem[] = []
  if (headers.length > MOST_COLUMNS)
    return refused(
      sentence(
        `The first line has ${headers.length} cells, and ${MOST_COLUMNS} columns is the most.`,
        'Check that the first line holds the names of the columns, and what stands between cells.',
      ),
    )
  const twice = headers.find((header, index) => header !== '' && headers.indexOf(header) !== index)
  if (twice !== undefined)
    problems.push(sentence(`The file has two columns named “${twice}”.`, 'Name each column once.', twice))
  const found = headers.map((header): BenchColumn => {
    const name = nameOf(columns, header) ?? 'as-note'
    const column = benchColumn(name)
    if (!column)
      problems.push(
        sentence(
          `“${name}” is no column of the bench file.`,
          'Choose one of the list, a note, or leave it out.',
          header,
        ),
      )
    return column ?? { kind: 'left-out' }
  })
  const seen = new Map<string, string>()
  found.forEach((column, index) => {
    const key = keyOf(column)
    const header = headers[index] ?? ''
    if (key === undefined) return
    const before = seen.get(key)
    if (before !== undefined)
      problems.push(
        sentence(
          `The columns “${before}” and “${header}” are both read as ${key}.`,
          'Keep one, and make the other a note.',
          header,
        ),
      )
    seen.set(key, header)
  })
  for (const needed of ['lot', 'specimen'])
    if (!seen.has(needed))
      problems.push(
        sentence(
          `No column is read as ${needed}: it is missing from the file.`,
          `Say below which column holds it, or add a column named ${needed} to the file.`,
          needed,
        ),
      )
  return problems.length > 0 ? refused(...problems) : ok(found)
}

function keyOf(column: BenchColumn): string | undefined {
  if (column.kind === 'word') return column.id
  if (column.kind === 'value') return column.base
  if (column.kind === 'diameter') return `d${column.position}${column.direction}`
  return undefined
}

/**
 * The decimal sign of a file from its cells, where it shows without doubt: numbers with a comma and none with a
 * point, or the other way round. Undefined when both or neither occur.
 */
export function decimalOf(rows: readonly (readonly string[])[]): ImportOptions['decimal'] | undefined {
  let comma = 0
  let point = 0
  for (const cell of rows.flat()) {
    if (/^\s*[+-]?\d*,\d+\s*$/.test(cell)) comma += 1
    else if (/^\s*[+-]?\d*\.\d+\s*$/.test(cell)) point += 1
  }
  return comma > 0 && point === 0 ? 'comma' : point > 0 && comma === 0 ? 'point' : undefined
}
