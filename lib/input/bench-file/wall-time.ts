import type { Problem } from '@/lib/domain/errors'
import { ok, type Result, refused } from '@/lib/domain/result'

const pattern =
  /^(\d{4})-(\d{2})-(\d{2})(?:[T ](\d{2}):(\d{2})(?::(\d{2})(?:[.,](\d{1,3})\d*)?)?(Z|[+-](?:0\d|1[0-4]):?[0-5]\d)?)?$/i

/** Years that a works' ledger can hold. */
const EARLIEST = 1900
const LATEST = 2200

const refuse = (text: string, message: string, mend: string): Result<never> =>
  refused({ code: 'bad-input', message: `“${text.slice(0, 40)}” ${message}.`, mend } satisfies Problem)

/**
 * A time as a file writes it, as epoch milliseconds: ISO 8601, a day alone (its first moment), a space for the T.
 * Without an offset it is wall time in `timeZone`; an hour that the clocks skipped never was, one they went through
 * twice is two moments: both are refused.
 */
export function parseTime(text: string, timeZone: string): Result<number> {
  const found = pattern.exec(text.trim())
  if (!found)
    return refuse(text, 'is not a date and time', 'Write it as 2026-11-25T14:20 or 2026-11-25T14:20Z.')
  const [, y, mo, d, h = '0', mi = '0', s = '0', ms = '0', offset] = found
  const [year, month, day, hour, minute, second] = [y, mo, d, h, mi, s].map(Number) as [
    number,
    number,
    number,
    number,
    number,
    number,
  ]
  const wall = Date.UTC(year, month - 1, day, hour, minute, second, Number(ms.padEnd(3, '0')))
  const back = new Date(wall)
  if (
    back.getUTCMonth() !== month - 1 ||
    back.getUTCDate() !== day ||
    hour > 23 ||
    minute > 59 ||
    second > 59 ||
    year < EARLIEST ||
    year >= LATEST
  )
    return refuse(text, 'is no day or time of the calendar', 'Check year, month, day and time.')
  if (offset) {
    const at = wall - minutesOf(offset) * 60_000
    return ok(at)
  }
  const moments = momentsOf(wall, timeZone)
  const [first, second_] = moments
  if (first === undefined)
    return refuse(
      text,
      `never was in ${timeZone}: the clocks went past it`,
      'Add the offset, such as +00:00, or correct the hour.',
    )
  if (second_ !== undefined)
    return refuse(
      text,
      `was twice in ${timeZone}: the clocks were put back`,
      'Add the offset, such as +01:00 or +00:00.',
    )
  return ok(first)
}

function minutesOf(offset: string): number {
  if (offset.toUpperCase() === 'Z') return 0
  const [, sign, hours, minutes] = /^([+-])(\d{2}):?(\d{2})$/.exec(offset) ?? []
  return (sign === '-' ? -1 : 1) * (Number(hours) * 60 + Number(minutes))
}

const HALF_DAY = 12 * 3_600_000

/** Moments at which the clocks of a zone show this wall time: one, none or two. */
function momentsOf(wall: number, timeZone: string): readonly number[] {
  const offsets = new Set([offsetAt(wall - HALF_DAY, timeZone), offsetAt(wall + HALF_DAY, timeZone)])
  return [...offsets]
    .map((offset) => wall - offset)
    .filter((at) => at + offsetAt(at, timeZone) === wall)
    .sort((a, b) => a - b)
}

const formats = new Map<string, Intl.DateTimeFormat>()

function formatOf(timeZone: string): Intl.DateTimeFormat {
  const known = formats.get(timeZone)
  if (known) return known
  const made = new Intl.DateTimeFormat('en-US', {
    timeZone,
    hourCycle: 'h23',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
    era: 'short',
  })
  formats.set(timeZone, made)
  return made
}

/** What the clocks of a zone are ahead of UTC at a moment, milliseconds. */
function offsetAt(at: number, timeZone: string): number {
  const second = Math.floor(at / 1000) * 1000
  const parts = new Map(
    formatOf(timeZone)
      .formatToParts(second)
      .map((part) => [part.type, Number(part.value)]),
  )
  const part = (type: Intl.DateTimeFormatPartTypes): number => parts.get(type) ?? 0
  return (
    Date.UTC(part('year'), part('month') - 1, part('day'), part('hour'), part('minute'), part('second')) -
    second
  )
}
