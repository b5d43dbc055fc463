/**
 * What the database reports, as sentences. The two engines and the client between say the same thing in
 * different words: SQLite names the fields of a broken unique constraint, PostgreSQL its name.
 */
import { LedgerlineError, problem } from '@/lib/domain/errors'

/** An error of the client, of an adapter (`kind`, `originalCode`) or of a driver. */
interface Chain {
  readonly kind?: unknown
  readonly originalCode?: unknown
  readonly originalMessage?: unknown
  readonly code?: unknown
  readonly message?: unknown
  readonly cause?: unknown
  readonly meta?: Readonly<Record<string, unknown>>
}

const isChain = (value: unknown): value is Chain => typeof value === 'object' && value !== null

/** The error and everything that it was caused by, the driver's own report included. */
const links = (error: unknown): readonly Chain[] => {
  const found: Chain[] = []
  let next: unknown = error
  while (isChain(next) && !found.includes(next) && found.length < 10) {
    found.push(next)
    next = next.cause ?? next.meta?.driverAdapterError
  }
  return found
}

const codesOf = (error: unknown): readonly string[] =>
  links(error).flatMap((link) =>
    [link.code, link.originalCode, link.kind].filter((code): code is string => typeof code === 'string'),
  )

const messagesOf = (error: unknown): readonly string[] =>
  links(error).flatMap((link) =>
    [link.message, link.originalMessage].filter((message): message is string => typeof message === 'string'),
  )

/** Another connection holds the file (SQLite). The transaction was not stored. */
export const isBusy = (error: unknown): boolean =>
  codesOf(error).some((code) => code.startsWith('SQLITE_BUSY') || code.startsWith('SQLITE_LOCKED'))

/** The database broke a tie between two transactions (PostgreSQL: deadlock, serialisation). Not stored. */
export const isSerialisationFailure = (error: unknown): boolean =>
  codesOf(error).some((code) => code === 'P2034' || code === '40001' || code === '40P01')

/** A connection that only reads was asked to write. */
export const isReadOnlyRefusal = (error: unknown): boolean =>
  codesOf(error).some((code) => code === 'SQLITE_READONLY' || code === '25006')

const isFull = (error: unknown): boolean =>
  codesOf(error).some((code) => ['SQLITE_FULL', '53100', 'ENOSPC'].includes(code))

const isUnreadable = (error: unknown): boolean =>
  codesOf(error).some((code) =>
    ['SQLITE_CORRUPT', 'SQLITE_NOTADB', 'SQLITE_IOERR', 'SQLITE_CANTOPEN', 'SQLITE_READONLY'].some((start) =>
      code.startsWith(start),
    ),
  ) || messagesOf(error).some((message) => message.startsWith('Cannot open database'))

const unreachableCodes = new Set([
  'P1001',
  'P1002',
  'P1017',
  'DatabaseNotReachable',
  'ConnectionClosed',
  'ECONNREFUSED',
  'ENOTFOUND',
  // The server is being stopped, or not started yet.
  '57P01',
  '57P03',
])

const isUnreachable = (error: unknown): boolean => codesOf(error).some((code) => unreachableCodes.has(code))

/**
 * The table and fields of a broken unique constraint, whichever engine reported it; undefined for any other
 * error. On PostgreSQL both come from the constraint's name (`Lot_code_key`).
 */
export const uniqueViolation = (
  error: unknown,
): { readonly table: string | undefined; readonly fields: readonly string[] } | undefined => {
  if (
    !codesOf(error).some(
      (code) =>
        code === 'P2002' ||
        code === '23505' ||
        code.startsWith('SQLITE_CONSTRAINT_UNIQUE') ||
        code === 'SQLITE_CONSTRAINT_PRIMARYKEY',
    )
  )
    return undefined
  for (const message of messagesOf(error)) {
    const sqlite = /UNIQUE constraint failed: ([\w., ]+)/.exec(message)?.[1]
    if (sqlite) {
      const columns = sqlite.split(', ').map((column) => column.split('.'))
      return { table: columns[0]?.[0], fields: columns.map((parts) => parts.at(-1) ?? '') }
    }
    const named = /unique constraint "(\w+?)_(\w+)_key"/.exec(message)
    if (named) return { table: named[1], fields: (named[2] ?? '').split('_') }
    const primary = /unique constraint "(\w+)_pkey"/.exec(message)
    if (primary) return { table: primary[1], fields: ['id'] }
  }
  return { table: undefined, fields: [] }
}

/** Whether the error is a broken unique constraint that has this field in it. */
export const isUniqueViolation = (error: unknown, field: string): boolean =>
  uniqueViolation(error)?.fields.includes(field) ?? false

/** A guard in `prisma/guards` begins its refusal with these words; the client may put it in backticks. */
const refusalPattern = /Ledgerline: ([^`\n]+)/

/** What a guard of the database said, or undefined. */
export const guardRefusal = (error: unknown): string | undefined => {
  for (const message of messagesOf(error)) {
    const refusal = refusalPattern.exec(message)?.[1]
    if (refusal !== undefined) return refusal.trim()
    // PostgreSQL's own words for a broken check; the constraint is called after its table.
    const table = /relation "(\w+)" violates check constraint/.exec(message)?.[1]
    if (table !== undefined) return `A value in ${table} is not one that it may have.`
  }
  return undefined
}

/**
 * The problem that a person reads for an error of the database; undefined when it is none of those known here.
 * A LedgerlineError is returned as it is.
 */
export const storageProblem = (error: unknown): LedgerlineError | undefined => {
  if (error instanceof LedgerlineError) return error
  const known = explain(error)
  if (known === undefined) return undefined
  return new LedgerlineError(known.problem, { cause: error })
}

const explain = (error: unknown): LedgerlineError | undefined => {
  const refusal = guardRefusal(error)
  if (refusal !== undefined) return problem('conflict', refusal)
  if (isFull(error))
    return problem('storage', 'The disk that holds the database is full; nothing of this was stored.', {
      mend: 'Make room on that disk, then do it again.',
    })
  if (isBusy(error) || isSerialisationFailure(error))
    return problem('busy', 'The database was held by other work for too long; nothing of this was stored.', {
      mend: 'Try again in a moment.',
    })
  if (isUnreadable(error))
    return problem('storage', 'The database file can’t be read or written.', {
      mend: 'See that the data folder exists and is writable; `npm start` makes a missing database.',
    })
  if (isUnreachable(error))
    return problem('storage', 'The database server does not answer.', {
      mend: 'See that it runs and that DATABASE_URL is right.',
    })
  const unique = uniqueViolation(error)
  if (unique)
    return problem(
      'conflict',
      `${article(unique.table)} with this ${unique.fields.join(' and ')} exists already.`,
      {
        where: unique.fields[0],
      },
    )
  const codes = codesOf(error)
  if (codes.includes('P2025'))
    return problem('not-found', 'What was to be changed is not there any more.', {
      mend: 'Load the page again to see what is there now.',
    })
  if (codes.includes('P2003') || codes.includes('23503') || codes.includes('SQLITE_CONSTRAINT_FOREIGNKEY'))
    return problem('conflict', 'Something that this refers to does not exist, or is still referred to.')
  return undefined
}

/** `SpecificationRevision` → `A specification revision`. */
const article = (table: string | undefined): string => {
  const words = (table ?? 'entry').replace(/(?<=[a-z])(?=[A-Z])/g, ' ').toLowerCase()
  return `${/^[aeiou]/.test(words) ? 'An' : 'A'} ${words}`
}
