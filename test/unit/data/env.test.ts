import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { filePath, readEnvironment, requireEnvironment } from '@/lib/data/env'

const folder = mkdtempSync(join(tmpdir(), 'ledgerline-test-'))
const certificate = join(folder, 'cert.pem')
const key = join(folder, 'key.pem')
writeFileSync(certificate, 'x')
writeFileSync(key, 'x')
afterAll(() => rmSync(folder, { recursive: true }))

describe('readEnvironment', () => {
  it('fills in everything', () => {
    expect(readEnvironment({}, '/works')).toEqual({
      ok: true,
      value: {
        port: 3000,
        host: '127.0.0.1',
        dataDir: '/works/data',
        engine: 'sqlite',
        databaseUrl: 'file:/works/data/ledgerline.db',
        tls: undefined,
        trustProxy: false,
      },
    })
  })

  it('takes an empty variable for one that is not set', () => {
    expect(
      readEnvironment(
        { PORT: '', HOST: '', DATA_DIR: '', DATABASE_URL: '', TLS_CERT: '', TLS_KEY: '', TRUST_PROXY: '' },
        '/works',
      ),
    ).toEqual(readEnvironment({}, '/works'))
  })

  it.each([
    [{ PORT: '0' }, { port: 0 }],
    [{ PORT: '65535' }, { port: 65535 }],
    [{ HOST: '0.0.0.0' }, { host: '0.0.0.0' }],
    [{ HOST: '::1' }, { host: '::1' }],
    [{ HOST: 'quality.works.example' }, { host: 'quality.works.example' }],
    [
      { DATA_DIR: 'elsewhere' },
      { dataDir: '/works/elsewhere', databaseUrl: 'file:/works/elsewhere/ledgerline.db' },
    ],
    [{ DATA_DIR: '/srv/data' }, { dataDir: '/srv/data', databaseUrl: 'file:/srv/data/ledgerline.db' }],
    [{ DATABASE_URL: 'file:./x.db' }, { engine: 'sqlite', databaseUrl: 'file:/works/x.db' }],
    [{ DATABASE_URL: 'file:/srv/x y.db' }, { engine: 'sqlite', databaseUrl: 'file:/srv/x y.db' }],
    [
      { DATABASE_URL: 'postgresql://me:secret@db:5432/works?sslmode=require' },
      { engine: 'postgresql', databaseUrl: 'postgresql://me:secret@db:5432/works?sslmode=require' },
    ],
    [{ DATABASE_URL: 'postgres://db/works' }, { engine: 'postgresql' }],
    [{ DATABASE_URL: 'postgresql:///works?host=/run/postgresql' }, { engine: 'postgresql' }],
    [{ TRUST_PROXY: 'yes' }, { trustProxy: true }],
    [{ TRUST_PROXY: '1' }, { trustProxy: true }],
    [{ TRUST_PROXY: 'False' }, { trustProxy: false }],
  ])('accepts %o', (env, expected) => {
    const result = readEnvironment(env, '/works')
    expect(result).toMatchObject({ ok: true, value: expected })
  })

  it('accepts a certificate with its key', () => {
    expect(readEnvironment({ TLS_CERT: certificate, TLS_KEY: key })).toMatchObject({
      ok: true,
      value: { tls: { certPath: certificate, keyPath: key } },
    })
  })

  it.each([
    ['PORT', 'eighty', 'PORT=eighty is not a whole number.'],
    ['PORT', '80.5', 'PORT=80.5 is not a whole number.'],
    ['PORT', '-1', 'PORT=-1 is not a whole number.'],
    ['PORT', '65536', 'PORT=65536 is above 65535.'],
    ['HOST', 'http://x', 'HOST=http://x is neither a host name nor an address.'],
    ['HOST', 'a b', 'HOST=a b is neither a host name nor an address.'],
    ['DATABASE_URL', 'mysql://x', 'DATABASE_URL=mysql://x starts neither with file: nor with postgresql://.'],
    ['DATABASE_URL', 'file:', 'DATABASE_URL=file: starts neither with file: nor with postgresql://.'],
    ['DATABASE_URL', 'file:x.db?mode=ro', 'DATABASE_URL=file:x.db?mode=ro has options after the path.'],
    ['DATABASE_URL', 'postgresql://', 'DATABASE_URL=postgresql:// is not a complete address.'],
    ['DATABASE_URL', 'postgresql://db', 'DATABASE_URL=postgresql://db is not a complete address.'],
    ['TLS_CERT', '/nowhere/cert.pem', 'TLS_CERT=/nowhere/cert.pem names a file that can’t be read.'],
    ['TRUST_PROXY', 'perhaps', 'TRUST_PROXY=perhaps is neither yes nor no.'],
  ])('refuses %s=%s with a sentence', (name, value, message) => {
    const result = readEnvironment({ [name]: value })
    expect(result).toMatchObject({ ok: false, problems: [{ code: 'bad-input', message, where: name }] })
    expect(result.ok || result.problems[0]?.mend).toMatch(/^Give .*\.$/)
  })

  it('refuses a certificate without its key, and the other way round', () => {
    expect(readEnvironment({ TLS_CERT: certificate })).toMatchObject({
      ok: false,
      problems: [{ message: 'TLS_CERT is given without TLS_KEY.', where: 'TLS_KEY' }],
    })
    expect(readEnvironment({ TLS_KEY: key })).toMatchObject({
      ok: false,
      problems: [{ message: 'TLS_KEY is given without TLS_CERT.', where: 'TLS_CERT' }],
    })
  })

  it('names every bad variable at once', () => {
    const result = readEnvironment({ PORT: 'x', TRUST_PROXY: 'x' })
    expect(result.ok ? [] : result.problems.map(({ where }) => where)).toEqual(['PORT', 'TRUST_PROXY'])
  })

  it('never shows a password', () => {
    const result = readEnvironment({ DATABASE_URL: 'mysql://me:secret@db/works' })
    expect(JSON.stringify(result)).not.toContain('secret')
    expect(JSON.stringify(result)).toContain('mysql://…@db/works')
  })
})

describe('requireEnvironment', () => {
  it('throws the sentences', () => {
    expect(() => requireEnvironment({ PORT: 'x', HOST: '%' })).toThrow(
      'PORT=x is not a whole number. Give a number from 0 to 65535, such as PORT=3000.\nHOST=% is neither',
    )
  })
})

describe('filePath', () => {
  it('is what follows file:', () => expect(filePath('file:/srv/x.db')).toBe('/srv/x.db'))
})
