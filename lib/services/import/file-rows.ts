import { createReadStream } from 'node:fs'
import { type CsvRecord, CsvRecords } from '@/lib/input/bench-file/csv-records'
import { cleanHeaders } from '@/lib/input/bench-file/layout'

/** A data row of a file, or a line that could not be read as one. Rows count from 1, after the header. */
export type FileRow = { readonly row: number } & CsvRecord

/** Reads a file piece by piece: the header first, then its rows. Bytes that are no UTF-8 become U+FFFD. */
export async function* readRecords(path: string, delimiter: string): AsyncGenerator<CsvRecord> {
  const records = new CsvRecords(delimiter)
  const decoder = new TextDecoder('utf-8', { ignoreBOM: true })
  for await (const piece of createReadStream(path, { highWaterMark: 256 * 1024 }))
    yield* records.push(decoder.decode(piece as Buffer, { stream: true }))
  yield* records.push(decoder.decode())
  yield* records.end()
}

/** Header and rows of a file. */
export async function* readFileRows(
  path: string,
  delimiter: string,
): AsyncGenerator<{ readonly headers: readonly string[] } | FileRow> {
  let row = 0
  let headers: readonly string[] | undefined
  for await (const record of readRecords(path, delimiter)) {
    if (headers === undefined) {
      headers = 'cells' in record ? cleanHeaders(record.cells) : []
      yield { headers }
      continue
    }
    row += 1
    yield { ...record, row }
  }
}

/** The headers of a file; none for a file without a line. */
export async function headersOf(path: string, delimiter: string): Promise<readonly string[]> {
  for await (const record of readFileRows(path, delimiter)) return 'headers' in record ? record.headers : []
  return []
}
