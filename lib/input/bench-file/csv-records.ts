/** Longest record that is kept in memory, characters: a row of readings has a few hundred. */
const LONGEST = 65_536

/** A row of the file, or a line that is none. Lines count from 1. */
export type CsvRecord =
  | { readonly line: number; readonly cells: readonly string[] }
  | { readonly line: number; readonly broken: string; readonly text: string }

/**
 * Reads comma-separated text (RFC 4180, any one delimiter, any line end) piece by piece. What can't be a record
 * costs its own line and no other: a quote that is never closed does not swallow the rows below it, a line without
 * end is passed over without being kept. Blank lines are no records.
 */
export class CsvRecords {
  private text = ''
  private line = 1
  /** Inside a line that is too long: everything up to its end is dropped. */
  private dropping = false
  private readonly delimiter: string

  constructor(delimiter: string) {
    this.delimiter = delimiter
  }

  /** Records that are complete with this piece. */
  push(piece: string): readonly CsvRecord[] {
    this.text += piece
    return this.read(false)
  }

  /** The rest of the file. */
  end(): readonly CsvRecord[] {
    return this.read(true)
  }

  private read(final: boolean): readonly CsvRecord[] {
    const records: CsvRecord[] = []
    let position = 0
    while (position < this.text.length) {
      const taken = this.take(position, final)
      if (taken === undefined) break
      if (taken.record) records.push(taken.record)
      this.line += taken.lines
      position = taken.next
    }
    this.text = this.text.slice(position)
    if (!final && this.text.length > 2 * LONGEST) {
      if (!this.dropping) records.push(this.tooLong(this.text))
      this.dropping = true
      this.text = this.text.endsWith('\r') ? '\r' : ''
    }
    return records
  }

  private tooLong(text: string): CsvRecord {
    return {
      line: this.line,
      broken: `The line is longer than ${LONGEST} characters.`,
      text: text.slice(0, 200),
    }
  }

  /** The record that begins at `position`; undefined while its end is not there yet. */
  private take(position: number, final: boolean): Taken | undefined {
    const end = lineEnd(this.text, position, final)
    if (end === undefined) return undefined
    const line = this.text.slice(position, end.at)
    if (this.dropping) {
      this.dropping = false
      return { next: end.next, lines: 1 }
    }
    if (line.trim() === '') return { next: end.next, lines: 1 }
    if (line.length > LONGEST) return { record: this.tooLong(line), next: end.next, lines: 1 }
    if (!line.includes('"'))
      return {
        record: { line: this.line, cells: line.split(this.delimiter) },
        next: end.next,
        lines: 1,
      }
    const quoted = readQuoted(this.text, position, this.delimiter, final)
    if (quoted === 'unfinished') return undefined
    if (quoted !== 'never closed' && quoted !== 'text behind a quote')
      return { record: { line: this.line, cells: quoted.cells }, next: quoted.next, lines: quoted.lines }
    const broken =
      quoted === 'never closed'
        ? 'A quote is opened on this line and never closed.'
        : 'There is text behind a closing quote.'
    return { record: { line: this.line, broken, text: line.slice(0, 1000) }, next: end.next, lines: 1 }
  }
}

interface Taken {
  readonly record?: CsvRecord
  readonly next: number
  readonly lines: number
}

/** Where a line ends and the next one begins: after CRLF, LF or CR. Undefined when that is not there yet. */
function lineEnd(
  text: string,
  position: number,
  final: boolean,
): { readonly at: number; readonly next: number } | undefined {
  for (let at = position; at < text.length; at += 1) {
    const sign = text.charCodeAt(at)
    if (sign === 10) return { at, next: at + 1 }
    if (sign !== 13) continue
    if (at + 1 < text.length) return { at, next: text.charCodeAt(at + 1) === 10 ? at + 2 : at + 1 }
    return final ? { at, next: at + 1 } : undefined
  }
  return final ? { at: text.length, next: text.length } : undefined
}

type Quoted =
  | { readonly cells: readonly string[]; readonly next: number; readonly lines: number }
  | 'unfinished'
  | 'never closed'
  | 'text behind a quote'

/** A record with quoted cells, which may hold delimiters, doubled quotes and line ends. */
function readQuoted(text: string, start: number, delimiter: string, final: boolean): Quoted {
  const cells: string[] = []
  let position = start
  let lines = 1
  for (;;) {
    if (text[position] === '"') {
      const close = closingQuote(text, position + 1, start)
      if (close === 'too far') return 'never closed'
      if (close === undefined) return final ? 'never closed' : 'unfinished'
      const cell = text.slice(position + 1, close).replaceAll('""', '"')
      lines += cell.match(/\r\n|\n|\r/g)?.length ?? 0
      cells.push(cell)
      position = close + 1
      if (position >= text.length) return final ? { cells, next: position, lines } : 'unfinished'
      const sign = text[position]
      if (sign !== delimiter && sign !== '\n' && sign !== '\r') return 'text behind a quote'
    } else {
      const from = position
      while (
        position < text.length &&
        text[position] !== delimiter &&
        text[position] !== '\n' &&
        text[position] !== '\r'
      )
        position += 1
      if (position >= text.length && !final) return 'unfinished'
      cells.push(text.slice(from, position))
    }
    if (position < text.length && text[position] === delimiter) {
      position += 1
      continue
    }
    const end = lineEnd(text, position, final)
    return end === undefined ? 'unfinished' : { cells, next: end.next, lines }
  }
}

/** The quote that closes a cell, doubled ones passed over. */
function closingQuote(text: string, from: number, start: number): number | 'too far' | undefined {
  let at = text.indexOf('"', from)
  while (at >= 0) {
    if (at - start > LONGEST) return 'too far'
    if (text[at + 1] !== '"') return at
    at = text.indexOf('"', at + 2)
  }
  return text.length - start > LONGEST ? 'too far' : undefined
}

/** The delimiter of a file by its first line: the one that stands there most often outside quotes. */
export function delimiterOf(head: string): ',' | ';' | '\t' {
  const [line = ''] = head.replace(/^\uFEFF/, '').split(/\r\n|\n|\r/)
  const outside = line.replace(/"(?:[^"]|"")*"/g, '')
  const counts = ([',', ';', '\t'] as const).map((sign) => [sign, outside.split(sign).length] as const)
  return counts.reduce((best, one) => (one[1] > best[1] ? one : best))[0]
}
