/**
 * The environment, checked once before anything is opened. A bad variable is a sentence, not a stack trace.
 * Imports no database code, so that the start command can ask it first.
 */
import { accessSync, constants } from 'node:fs'
import { isAbsolute, join, resolve } from 'node:path'
import { z } from 'zod'
import type { Problem } from '@/lib/domain/errors'
import { ok, type Result, refused } from '@/lib/domain/result'

export interface Environment {
  /** 0 lets the system choose a free port. */
  readonly port: number
  readonly host: string
  /** Absolute. Holds the database, the session secret and back-ups. */
  readonly dataDir: string
  readonly engine: 'sqlite' | 'postgresql'
  /** `file:` with an absolute path, or `postgresql://…`. */
  readonly databaseUrl: string
  readonly tls: { readonly certPath: string; readonly keyPath: string } | undefined
  /** Whether `x-forwarded-*` headers are believed. */
  readonly trustProxy: boolean
}

export type RawEnvironment = Readonly<Record<string, string | undefined>>

const hostPattern =
  /^(?:[0-9a-fA-F:.]+(?:%[\w.-]+)?|[a-zA-Z0-9](?:[a-zA-Z0-9-]*[a-zA-Z0-9])?(?:\.[a-zA-Z0-9-]+)*)$/

const readable = (path: string): boolean => {
  try {
    accessSync(path, constants.R_OK)
    return true
  } catch {
    return false
  }
}

/** A server (a host, or the folder of a socket) and a database on it. */
const namesDatabase = (url: string): boolean => {
  if (!URL.canParse(url)) return false
  const { hostname, pathname, searchParams } = new URL(url)
  return (hostname !== '' || Boolean(searchParams.get('host'))) && pathname.length > 1
}

/** An empty variable counts as not set: that is how a line of an environment file is switched off. */
const optional = <Schema extends z.ZodType<unknown, string>>(schema: Schema) =>
  z.preprocess((value) => (value === '' ? undefined : value), schema.optional())

const variables = z.object({
  PORT: optional(
    z
      .string()
      .regex(/^\d{1,5}$/, 'is not a whole number')
      .transform(Number)
      .refine((port) => port <= 65535, 'is above 65535'),
  ),
  HOST: optional(z.string().regex(hostPattern, 'is neither a host name nor an address')),
  DATA_DIR: optional(z.string().refine((path) => !path.includes('\0'), 'is not a path')),
  DATABASE_URL: optional(
    z
      .string()
      .refine((url) => /^file:./.test(url) || /^postgres(?:ql)?:\/\//.test(url), {
        error: 'starts neither with file: nor with postgresql://',
        abort: true,
      })
      .refine((url) => url.startsWith('file:') || namesDatabase(url), 'is not a complete address')
      .refine((url) => !url.startsWith('file:') || !/[?#]/.test(url), 'has options after the path'),
  ),
  TLS_CERT: optional(z.string().refine(readable, 'names a file that can’t be read')),
  TLS_KEY: optional(z.string().refine(readable, 'names a file that can’t be read')),
  TRUST_PROXY: optional(
    z
      .string()
      .toLowerCase()
      .refine((word) => ['1', 'true', 'yes', '0', 'false', 'no'].includes(word), 'is neither yes nor no')
      .transform((word) => ['1', 'true', 'yes'].includes(word)),
  ),
})

const mends: Readonly<Record<string, string>> = {
  PORT: 'Give a number from 0 to 65535, such as PORT=3000.',
  HOST: 'Give the address to listen on, such as HOST=127.0.0.1.',
  DATA_DIR: 'Give the folder that holds the works’ data, such as DATA_DIR=./data.',
  DATABASE_URL:
    'Give file: and a path, such as DATABASE_URL=file:./data/ledgerline.db, or postgresql://user@host/name, or leave it out.',
  TLS_CERT: 'Give the path of a certificate in PEM form that this account may read.',
  TLS_KEY: 'Give the path of a private key in PEM form that this account may read.',
  TRUST_PROXY: 'Give yes or no.',
}

/** A password in an address never reaches a message or a log. */
const shown = (name: string, value: string | undefined): string =>
  name === 'DATABASE_URL' ? (value ?? '').replace(/\/\/[^@/]*@/, '//…@') : (value ?? '')

/**
 * Checks the variables and fills in what is not given. Relative paths count from `root`.
 * The result's problems have the variable's name in `where`.
 */
export const readEnvironment = (env: RawEnvironment, root: string = process.cwd()): Result<Environment> => {
  const parsed = variables.safeParse(env)
  if (!parsed.success) {
    return refused(
      ...parsed.error.issues.map((issue): Problem => {
        const name = String(issue.path[0])
        return {
          code: 'bad-input',
          message: `${name}=${shown(name, env[name])} ${issue.message}.`,
          where: name,
          mend: mends[name],
        }
      }),
    )
  }
  const { PORT, HOST, DATA_DIR, DATABASE_URL, TLS_CERT, TLS_KEY, TRUST_PROXY } = parsed.data
  if ((TLS_CERT === undefined) !== (TLS_KEY === undefined)) {
    const [given, missing] = TLS_CERT === undefined ? ['TLS_KEY', 'TLS_CERT'] : ['TLS_CERT', 'TLS_KEY']
    return refused({
      code: 'bad-input',
      message: `${given} is given without ${missing}.`,
      where: missing,
      mend: 'Give both to serve https, or neither.',
    })
  }
  const dataDir = resolve(root, DATA_DIR ?? 'data')
  return ok({
    port: PORT ?? 3000,
    host: HOST ?? '127.0.0.1',
    dataDir,
    ...storage(DATABASE_URL, dataDir, root),
    tls:
      TLS_CERT !== undefined && TLS_KEY !== undefined
        ? { certPath: resolve(root, TLS_CERT), keyPath: resolve(root, TLS_KEY) }
        : undefined,
    trustProxy: TRUST_PROXY ?? false,
  })
}

const storage = (
  url: string | undefined,
  dataDir: string,
  root: string,
): Pick<Environment, 'engine' | 'databaseUrl'> => {
  if (url === undefined) return { engine: 'sqlite', databaseUrl: `file:${join(dataDir, 'ledgerline.db')}` }
  if (!url.startsWith('file:')) return { engine: 'postgresql', databaseUrl: url }
  const path = url.slice('file:'.length)
  return { engine: 'sqlite', databaseUrl: `file:${isAbsolute(path) ? path : resolve(root, path)}` }
}

/** @throws Error with all sentences, one a line, when a variable is bad */
export const requireEnvironment = (env: RawEnvironment = process.env, root?: string): Environment => {
  const result = readEnvironment(env, root)
  if (result.ok) return result.value
  throw new Error(result.problems.map(({ message, mend }) => `${message} ${mend ?? ''}`.trim()).join('\n'))
}

/** The path of the database file, of a `file:` address. */
export const filePath = (databaseUrl: string): string => databaseUrl.slice('file:'.length)
