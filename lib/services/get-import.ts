import type { Actor } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { listMappings } from '@/lib/data/import-mappings'
import {
  countSetAside,
  findImport,
  type ImportFacts,
  type ImportRowFacts,
  listImportsOfFile,
  listSetAside,
} from '@/lib/data/imports'
import { listPersonNames } from '@/lib/data/people-names'
import { getWorks as findWorks } from '@/lib/data/works'
import { type Problem, problem } from '@/lib/domain/errors'
import { readBenchRow } from '@/lib/input/bench-file/bench-row'
import { type ImportOptions, layoutOf } from '@/lib/input/bench-file/layout'
import { readFileRows } from './import/file-rows'
import { importPath } from './import/work-through'
import { importProgress } from './import/worker-link'

/** Rows of the file that a preview shows, and rows set aside that a page lists. */
const PREVIEW_ROWS = 12
export const SET_ASIDE_ROWS = 100

export interface PreviewRow {
  readonly line: number
  readonly cells: readonly string[]
  /** What would be refused of it as it stands. */
  readonly problems: readonly Problem[]
}

export interface ImportPreview {
  readonly options: ImportOptions
  readonly headers: readonly string[]
  readonly rows: readonly PreviewRow[]
  /** What is wrong with the columns: nothing can be imported before it is mended. */
  readonly problems: readonly Problem[]
  readonly mappings: readonly string[]
}

export interface SetAsideRow extends Omit<ImportRowFacts, 'problems' | 'cells' | 'entry' | 'decidedById'> {
  readonly problems: readonly Problem[]
  readonly decidedBy: string | undefined
}

export interface ImportView extends ImportFacts {
  readonly by: string | undefined
  readonly rowsPerSecond: number | undefined
  /** Only while it waits for a person to say how it is read. */
  readonly preview: ImportPreview | undefined
  readonly refusedRows: readonly SetAsideRow[]
  readonly differingRows: readonly SetAsideRow[]
  readonly openDifferences: number
  /** Runs of the same file before this one. */
  readonly earlier: readonly { readonly id: number; readonly createdAt: number; readonly state: string }[]
  readonly mayRun: boolean
  readonly mayChoose: boolean
}

/**
 * An import with what there is to see of it: how its file would be read, how far it is, what was set aside.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function getImport(actor: Actor | undefined, id: number): Promise<ImportView> {
  permit(actor, 'imports.read')
  const { read } = database()
  const facts = await findImport(read, id)
  if (!facts) throw problem('not-found', `There is no import ${id}.`)
  const refused = await listSetAside(read, id, 'refused', { take: SET_ASIDE_ROWS })
  const differing = await listSetAside(read, id, 'differs', { take: SET_ASIDE_ROWS })
  const names = await listPersonNames(read, [
    facts.createdById,
    ...differing.flatMap((row) => row.decidedById ?? []),
  ])
  const view = ({ cells: _, entry: __, problems, decidedById, ...row }: ImportRowFacts): SetAsideRow => ({
    ...row,
    problems: JSON.parse(problems) as readonly Problem[],
    decidedBy: decidedById === undefined ? undefined : names.get(decidedById),
  })
  const progress = importProgress(id)
  return {
    ...facts,
    rowsDone: Math.max(facts.rowsDone, facts.state === 'running' ? (progress?.rowsDone ?? 0) : 0),
    by: names.get(facts.createdById),
    rowsPerSecond: progress?.rowsPerSecond || undefined,
    preview: facts.state === 'draft' ? await previewOf(facts) : undefined,
    refusedRows: refused.map(view),
    differingRows: differing.map(view),
    openDifferences: await countSetAside(read, id, 'differs', 'open'),
    earlier: (await listImportsOfFile(read, facts.sha256)).filter((one) => one.id < id),
    mayRun: may(actor, 'imports.run'),
    mayChoose: may(actor, 'readings.supersede-any'),
  }
}

async function previewOf(facts: ImportFacts): Promise<ImportPreview> {
  const { read } = database()
  const mappings = await listMappings(read)
  const options = JSON.parse(facts.options) as ImportOptions
  const path = importPath(requireEnvironment().dataDir, facts.sha256)
  const timeZone = (await findWorks(read))?.timeZone ?? 'UTC'
  let headers: readonly string[] = []
  const rows: PreviewRow[] = []
  for await (const record of readFileRows(path, options.delimiter)) {
    if ('headers' in record) {
      headers = record.headers
      continue
    }
    const layout = layoutOf(headers, options.columns)
    rows.push(
      'broken' in record
        ? {
            line: record.line,
            cells: [record.text],
            problems: [{ code: 'bad-input', message: record.broken, mend: 'Mend the line.' }],
          }
        : {
            line: record.line,
            cells: record.cells,
            problems: layout.ok
              ? problemsOf(
                  readBenchRow(record.cells, {
                    headers,
                    columns: layout.value,
                    decimal: options.decimal,
                    timeZone,
                  }),
                )
              : [],
          },
    )
    if (rows.length === PREVIEW_ROWS) break
  }
  const layout = layoutOf(headers, options.columns)
  return {
    options,
    headers,
    rows,
    problems: problemsOf(layout),
    mappings: mappings.map((one) => one.name),
  }
}

const problemsOf = (
  result: { readonly ok: true } | { readonly ok: false; readonly problems: readonly Problem[] },
): readonly Problem[] => (result.ok ? [] : result.problems)
