import { createHash } from 'node:crypto'
import { mkdirSync } from 'node:fs'
import { open, readFile, rename, rm } from 'node:fs/promises'
import { join } from 'node:path'
import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { listMappings } from '@/lib/data/import-mappings'
import { insertImport } from '@/lib/data/imports'
import { appendLedger } from '@/lib/data/ledger'
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { CsvRecords, delimiterOf } from '@/lib/input/bench-file/csv-records'
import { cleanHeaders, decimalOf, type ImportOptions, proposedColumns } from '@/lib/input/bench-file/layout'
import { importPath } from './import/work-through'
import { convertSheet } from './import/worker-link'

/** Largest files, bytes: a million rows of readings have about 150 MB. */
export const MOST_CSV_BYTES = 400_000_000
export const MOST_XLSX_BYTES = 50_000_000

/** Characters that a guess at delimiter, decimal sign and columns rests on. */
const HEAD = 200_000

export interface SentFile {
  readonly fileName: string
  readonly body: AsyncIterable<Uint8Array>
}

/**
 * Takes a bench file in, as CSV or XLSX, piece by piece into the data folder, known by its SHA-256, and proposes how
 * to read it. Nothing is imported yet.
 * @returns the import's id
 * @throws LedgerlineError not-permitted; bad-input (empty, too large, not UTF-8, no spreadsheet)
 */
export async function receiveImport(
  actor: Actor | undefined,
  sent: SentFile,
  at: number = Date.now(),
): Promise<{ readonly id: number }> {
  permit(actor, 'imports.run')
  const { dataDir } = requireEnvironment()
  const folder = join(dataDir, 'imports')
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const received = join(folder, `received-${process.pid}-${Math.random().toString(36).slice(2)}`)
  try {
    const { bytes, format, sha256 } = await receive(sent.body, received)
    if (format === 'csv' && /\.xls[xm]?$/i.test(sent.fileName))
      throw problem('bad-input', 'The file is named like a spreadsheet and holds none.', {
        where: 'file',
        mend: 'Save it as .xlsx again; if it is text, give it the ending .csv.',
      })
    const path = importPath(dataDir, sha256)
    if (format === 'xlsx') {
      await convertSheet(received, `${received}.csv`)
      await rename(`${received}.csv`, path)
    } else await rename(received, path)
    const options = await proposedOptions(path)
    const row = await database().write(async (tx) => {
      const fileName =
        sent.fileName
          .replace(/[\p{Cc}\p{Surrogate}/\\]/gu, ' ')
          .trim()
          .slice(0, 200) || 'bench file'
      const facts = await insertImport(tx, {
        fileName,
        sha256,
        bytes,
        format,
        options: canonicalJson(options),
        at,
        personId: actor.personId,
      })
      await appendLedger(tx, {
        at,
        personId: actor.personId,
        verb: 'receive-import',
        subject: `import ${facts.id}`,
        body: { fileName, sha256, bytes },
      })
      return facts
    })
    return { id: row.id }
  } finally {
    await rm(received, { force: true })
    await rm(`${received}.csv`, { force: true })
  }
}

async function receive(body: AsyncIterable<Uint8Array>, path: string) {
  const file = await open(path, 'wx', 0o600)
  const hash = createHash('sha256')
  let bytes = 0
  let format: 'csv' | 'xlsx' = 'csv'
  try {
    let head = Buffer.alloc(0)
    for await (const piece of body) {
      // A first piece may be a single byte.
      if (head.length < 2) {
        head = Buffer.concat([head, piece.subarray(0, 2)])
        format = formatOf(head)
      }
      bytes += piece.byteLength
      const most = format === 'xlsx' ? MOST_XLSX_BYTES : MOST_CSV_BYTES
      if (bytes > most)
        throw problem('bad-input', `The file is larger than ${most / 1e6} MB.`, {
          where: 'file',
          mend: format === 'xlsx' ? 'Save it as CSV.' : 'Divide it into several files.',
        })
      hash.update(piece)
      await file.write(piece)
    }
  } finally {
    await file.close()
  }
  if (bytes === 0)
    throw problem('bad-input', 'The file is empty.', { where: 'file', mend: 'Choose another one.' })
  return { bytes, format, sha256: hash.digest('hex') }
}

function formatOf(head: Uint8Array): 'csv' | 'xlsx' {
  const [a, b] = head
  if (a === 0x50 && b === 0x4b) return 'xlsx'
  if ((a === 0xff && b === 0xfe) || (a === 0xfe && b === 0xff))
    throw problem('bad-input', 'The file is written in UTF-16.', {
      where: 'file',
      mend: 'Save it as CSV in UTF-8.',
    })
  if (a === 0xd0 && b === 0xcf)
    throw problem('bad-input', 'This is a spreadsheet of the old kind (.xls).', {
      where: 'file',
      mend: 'Save it as .xlsx or as CSV.',
    })
  return 'csv'
}

/** Delimiter, decimal sign and columns as they show in the first rows, and as columns of this name were read before. */
async function proposedOptions(path: string): Promise<ImportOptions> {
  const text = (await readHead(path)).toString('utf8')
  const delimiter = delimiterOf(text)
  const rows = new CsvRecords(delimiter).push(text).flatMap((one) => ('cells' in one ? [one.cells] : []))
  const headers = cleanHeaders(rows[0] ?? [])
  const mappings = await listMappings(database().read)
  // The mapping that knows most of these headers.
  const known = mappings
    .map(({ columns }) => ({
      columns,
      count: headers.filter((header) => Object.hasOwn(columns, header)).length,
    }))
    .sort((a, b) => b.count - a.count)[0]
  return {
    delimiter,
    decimal: decimalOf(rows.slice(1, 200)) ?? 'point',
    columns: proposedColumns(headers, known && known.count > 0 ? known.columns : {}),
  }
}

/** The beginning of a file, with a line end behind it, so that a file of one line is a line. */
async function readHead(path: string): Promise<Buffer> {
  const file = await open(path)
  try {
    const { size } = await file.stat()
    if (size <= HEAD) return Buffer.concat([await readFile(path), Buffer.from('\n')])
    const head = Buffer.alloc(HEAD)
    await file.read(head, 0, HEAD, 0)
    return head
  } finally {
    await file.close()
  }
}
