import { mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll } from 'vitest'
import type { Actor } from '@/lib/access/actor'
import { openBulk } from '@/lib/data/bulk/open-bulk'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { sha256 } from '@/lib/data/hash'
import { changeImport, findImport, type ImportFacts, insertImport, listSetAside } from '@/lib/data/imports'
import type { Problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { CsvRecords, delimiterOf } from '@/lib/input/bench-file/csv-records'
import { cleanHeaders, decimalOf, proposedColumns } from '@/lib/input/bench-file/layout'
import { getImport, type ImportView } from '@/lib/services/get-import'
import { type ImportRun, runImport } from '@/lib/services/import/run-import'
import { sheetToCsv } from '@/lib/services/import/sheet-to-csv'
import { giveUpRunning, type Workplace, workThrough } from '@/lib/services/import/work-through'
import { receiveImport } from '@/lib/services/receive-import'
import { startImport } from '@/lib/services/start-import'

export interface ImportedText {
  readonly facts: ImportFacts
  readonly ended: string
}

/** Puts a text into the imports folder and the table, ready to run. */
export async function draftImport(
  actor: Actor,
  text: string,
  at: number,
): Promise<{ id: number; path: string }> {
  const { dataDir } = requireEnvironment()
  const folder = join(dataDir, 'imports')
  mkdirSync(folder, { recursive: true })
  const path = join(folder, `${sha256(text)}.csv`)
  writeFileSync(path, text)
  const delimiter = delimiterOf(text)
  const reader = new CsvRecords(delimiter)
  const rows = [...reader.push(text.slice(0, 100_000)), ...reader.end()].flatMap((one) =>
    'cells' in one ? [one.cells] : [],
  )
  const headers = cleanHeaders(rows[0] ?? [])
  const options = {
    delimiter,
    decimal: decimalOf(rows.slice(1, 50)) ?? 'point',
    columns: proposedColumns(headers),
  }
  const row = await database().write(async (tx) => {
    const facts = await insertImport(tx, {
      fileName: 'bench.csv',
      sha256: sha256(text),
      bytes: text.length,
      format: 'csv',
      options: canonicalJson(options),
      at,
      personId: actor.personId,
    })
    await changeImport(tx, { id: facts.id, states: ['draft'] }, { state: 'running' })
    return facts
  })
  return { id: row.id, path }
}

/** Runs an import in this process, as the worker does. */
export async function runDraft(
  actor: Actor,
  { id, path }: { readonly id: number; readonly path: string },
  change: Partial<ImportRun> = {},
): Promise<ImportedText> {
  const connection = await openBulk(requireEnvironment())
  try {
    const ended = await runImport(id, {
      read: database().read,
      connection,
      importer: { personId: actor.personId, mayAddToDecided: actor.roles.includes('quality') },
      timeZone: 'Europe/Oslo',
      path,
      ...change,
    })
    const facts = await findImport(database().read, id)
    if (!facts) throw new Error('the import is gone')
    return { facts, ended }
  } finally {
    await connection.close()
  }
}

/** Imports a text from beginning to end. */
export const importText = async (
  actor: Actor,
  text: string,
  at: number,
  change: Partial<ImportRun> = {},
): Promise<ImportedText> => runDraft(actor, await draftImport(actor, text, at), { now: () => at, ...change })

/** Rows set aside: line, kind, column, sentence. */
export async function setAsideOf(importId: number) {
  const rows = [
    ...(await listSetAside(database().read, importId, 'refused', { take: 10_000 })),
    ...(await listSetAside(database().read, importId, 'differs', { take: 10_000 })),
  ].sort((a, b) => a.row - b.row)
  return rows.map((one) => {
    const problems = JSON.parse(one.problems) as readonly Problem[]
    return { ...one, problems, first: problems[0]?.message ?? '', where: problems.map(({ where }) => where) }
  })
}

/** What the server's import thread offers, in this process: for tests of the services without a server. */
export function withImportThread(): void {
  const key = Symbol.for('ledgerline.import-worker')
  const place = globalThis as typeof globalThis & { [key]?: unknown }
  beforeAll(() => {
    place[key] = { nudge: () => {}, progress: new Map(), convert: sheetToCsv }
  })
  afterAll(() => {
    place[key] = undefined
  })
}

/** Sends a file as the page does, in pieces. */
export async function sendFile(
  actor: Actor,
  content: string | Buffer,
  fileName = 'bench.csv',
): Promise<ImportView> {
  const bytes = typeof content === 'string' ? Buffer.from(content) : content
  async function* pieces() {
    for (let at = 0; at < bytes.length; at += 65_536) yield bytes.subarray(at, at + 65_536)
  }
  const { id } = await receiveImport(actor, { fileName, body: pieces() })
  return getImport(actor, id)
}

/** Begins it as it was proposed, with these columns changed. */
export async function begin(
  actor: Actor,
  { id, preview, version }: ImportView,
  { columns = {}, keepAs = '' }: { columns?: Readonly<Record<string, string>>; keepAs?: string } = {},
): Promise<void> {
  if (!preview) throw new Error('it was begun before')
  const options = { ...preview.options, columns: { ...preview.options.columns, ...columns } }
  await startImport(actor, id, { options, version, keepAs })
}

/** Works through everything that waits, as the thread does. */
export async function workAll({
  once = false,
  ...change
}: Partial<Workplace> & { once?: boolean } = {}): Promise<void> {
  const connection = await openBulk(requireEnvironment())
  try {
    const place: Workplace = {
      connection,
      read: database().read,
      dataDir: requireEnvironment().dataDir,
      stopAsked: () => false,
      progress: () => {},
      ...change,
    }
    while ((await workThrough(place)) && !once);
  } finally {
    await connection.close()
  }
}

/** What a thread does first that has died several times. */
export async function giveUp(): Promise<boolean> {
  const connection = await openBulk(requireEnvironment())
  try {
    return await giveUpRunning({ connection, read: database().read })
  } finally {
    await connection.close()
  }
}

/** Sends, begins as proposed, and works through. */
export async function importFile(
  actor: Actor,
  content: string | Buffer,
  fileName?: string,
): Promise<ImportView> {
  const view = await sendFile(actor, content, fileName)
  await begin(actor, view)
  await workAll()
  return getImport(actor, view.id)
}
