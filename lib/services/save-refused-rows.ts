import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { findImport, listSetAside } from '@/lib/data/imports'
import { type Problem, problem } from '@/lib/domain/errors'
import type { ImportOptions } from '@/lib/input/bench-file/layout'
import { quoted } from '@/lib/output/csv'
import { headersOf } from './import/file-rows'
import { importPath } from './import/work-through'

/** Rows read at once, so that a file of nothing but refused rows does not fill the memory. */
const AT_ONCE = 2_000

export interface RefusedRowsFile {
  readonly name: string
  readonly type: string
  readonly content: string
}

/**
 * The refused rows as a file like the one they came from, cell by cell as they stood, with the reason in a column
 * that an import passes over: mended and sent again it brings what was missing and doubles nothing.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function saveRefusedRows(actor: Actor | undefined, id: number): Promise<RefusedRowsFile> {
  permit(actor, 'imports.read')
  const { read } = database()
  const facts = await findImport(read, id)
  if (!facts) throw problem('not-found', `There is no import ${id}.`)
  const { delimiter } = JSON.parse(facts.options) as ImportOptions
  const headers = await headersOf(importPath(requireEnvironment().dataDir, facts.sha256), delimiter)
  const own = headers.filter((header) => header !== REASON)
  const line = (cells: readonly string[]): string =>
    `${cells.map((cell) => quoted(cell, delimiter)).join(delimiter)}\r\n`
  const parts = [`\uFEFF${line([...own, REASON])}`]
  for (let after = 0; ; ) {
    const rows = await listSetAside(read, id, 'refused', { after, take: AT_ONCE })
    for (const row of rows) {
      const cells = JSON.parse(row.cells) as readonly string[]
      const problems = JSON.parse(row.problems) as readonly Problem[]
      const kept = headers.flatMap((header, index) => (header === REASON ? [] : [cells[index] ?? '']))
      // Cells beyond the last header stay beyond it: a row that was refused for having them keeps them.
      parts.push(line([...kept, problems.map(sentence).join(' '), ...cells.slice(headers.length)]))
    }
    const last = rows.at(-1)
    if (!last) break
    after = last.row
  }
  const name = facts.fileName.replace(/\.(csv|txt|tsv|xlsx)$/i, '')
  return {
    name: `${name} refused rows.csv`,
    type: 'text/csv; charset=utf-8; header=present',
    content: parts.join(''),
  }
}

const REASON = 'refused_because'

const sentence = ({ mend, message, where }: Problem): string =>
  [where === undefined ? '' : `${where}:`, message, mend ?? ''].filter((part) => part !== '').join(' ')
