import type { Problem } from '@/lib/domain/errors'
import type { BenchColumn } from './columns'

/** Most of a cell that is shown in a sentence. */
const SHOWN = 60

/** Control characters but line breaks and tabs, lone surrogates, and the sign for what could not be decoded. */
export const unfit = /(?![\n\r\t])[\p{Cc}\p{Surrogate}\uFFFD]/u

/** What is wrong with a cell: column, sentence, mend, value. */
export const problemOf = (where: string, value: string, message: string, mend: string): Problem => ({
  code: 'bad-input',
  message: `${where} ${message}.`,
  where,
  mend,
  details: { value: shown(value) },
})

/**
 * Problems that name a column of the bench file, told by the header it has in this file and with the cell as it
 * stands there.
 */
export const placedIn = (
  problems: readonly Problem[],
  cells: readonly string[],
  headers: readonly string[],
  columns: readonly BenchColumn[],
): readonly Problem[] =>
  problems.map((one) => {
    const index = columns.findIndex(
      (column) => column.kind === 'word' && column.id === (one.where === 'weight' ? 'weights' : one.where),
    )
    const header = headers[index]
    return header === undefined
      ? one
      : { ...one, where: header, details: { value: shown((cells[index] ?? '').trim()), ...one.details } }
  })

/** A cell as it may stand in a sentence. */
export const shown = (value: string): string => {
  const plain = value.replace(/[\p{Cc}\p{Surrogate}]/gu, '\uFFFD')
  return plain.length > SHOWN ? `${plain.slice(0, SHOWN)}…` : plain
}
