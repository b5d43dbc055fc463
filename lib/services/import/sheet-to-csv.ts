import { open, writeFile } from 'node:fs/promises'
import readXlsxFile from 'read-excel-file/node'
import { quoted } from '@/lib/output/csv'

/** Most that a spreadsheet may unpack to, bytes, and most cells of its first sheet. */
const MOST_BYTES = 300_000_000
const MOST_CELLS = 3_000_000

export type SheetOutcome =
  | { readonly ok: true }
  | { readonly ok: false; readonly message: string; readonly mend: string }

const refuse = (message: string, mend: string): SheetOutcome => ({ ok: false, message, mend })

/**
 * Turns the first sheet of an XLSX file into a bench file: commas, decimal points, times without an offset as the
 * sheet shows them. What it would unpack to is read from its directory before anything is unpacked.
 */
export async function sheetToCsv(from: string, to: string): Promise<SheetOutcome> {
  const size = await unpackedSize(from)
  if (size === undefined)
    return refuse('This is no spreadsheet that can be opened.', 'Save it as .xlsx again, or as CSV.')
  if (size > MOST_BYTES)
    return refuse(
      `This spreadsheet would unpack to ${Math.round(size / 1e6)} MB, and ${MOST_BYTES / 1e6} MB is the most.`,
      'Divide it into several files, or save it as CSV.',
    )
  let rows: readonly (readonly unknown[])[]
  try {
    const [first] = await readXlsxFile(from)
    rows = first?.data ?? []
  } catch {
    return refuse('This spreadsheet can’t be read.', 'Save it as .xlsx again, or as CSV.')
  }
  if (rows.length === 0) return refuse('The first sheet is empty.', 'Put the table on the first sheet.')
  if (rows.length * (rows[0]?.length ?? 0) > MOST_CELLS)
    return refuse(`The first sheet has more than ${MOST_CELLS / 1e6} million cells.`, 'Save it as CSV.')
  await writeFile(to, rows.map((row) => `${row.map(cellText).join(',')}\r\n`).join(''))
  return { ok: true }
}

const cellText = (cell: unknown): string => quoted(textOf(cell), ',')

function textOf(cell: unknown): string {
  if (cell === null || cell === undefined) return ''
  // A sheet's times have no zone: they are wall time, kept in UTC's place.
  if (cell instanceof Date) return cell.toISOString().slice(0, 23)
  if (typeof cell === 'number') return plainNumber(cell)
  return String(cell)
}

/** A number without an exponent, with all the digits that it was typed with. */
function plainNumber(value: number): string {
  const text = String(value)
  if (Math.abs(value) >= 1e21) return BigInt(value).toString()
  return text.includes('e') ? value.toFixed(20).replace(/\.?0+$/, '') : text
}

const DIRECTORY_END = 0x06054b50
const DIRECTORY_ENTRY = 0x02014b50
/** The end of the directory with the longest comment that a file may have. */
const TAIL = 65_557

/** Sum of the unpacked sizes that a ZIP file's directory names, bytes; undefined when it has none that can be read. */
export async function unpackedSize(path: string): Promise<number | undefined> {
  const file = await open(path)
  try {
    const { size } = await file.stat()
    const tail = Buffer.alloc(Math.min(TAIL, size))
    await file.read(tail, 0, tail.length, size - tail.length)
    let end = tail.length - 22
    while (end >= 0 && tail.readUInt32LE(end) !== DIRECTORY_END) end -= 1
    if (end < 0) return undefined
    const [length, start] = [tail.readUInt32LE(end + 12), tail.readUInt32LE(end + 16)]
    if (start + length > size || length > 50_000_000) return undefined
    const directory = Buffer.alloc(length)
    await file.read(directory, 0, length, start)
    let sum = 0
    for (let at = 0; at + 46 <= length; ) {
      if (directory.readUInt32LE(at) !== DIRECTORY_ENTRY) return undefined
      sum += directory.readUInt32LE(at + 24)
      at +=
        46 +
        directory.readUInt16LE(at + 28) +
        directory.readUInt16LE(at + 30) +
        directory.readUInt16LE(at + 32)
    }
    return sum
  } finally {
    await file.close()
  }
}
