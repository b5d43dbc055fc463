import { execFileSync, spawnSync } from 'node:child_process'
import { mkdtempSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { expect, test } from '@playwright/test'
import { removeData, signIn, startServer } from '../support/server'

const root = fileURLToPath(new URL('../..', import.meta.url))

/** A start that has to end by itself: its exit code and what it said. */
const refusedStart = (env: Record<string, string>, ...args: readonly string[]) => {
  const { status, stderr } = spawnSync(process.execPath, ['scripts/start.mjs', ...args], {
    cwd: root,
    encoding: 'utf8',
    timeout: 60_000,
    env: { ...process.env, DATA_DIR: join(root, 'build/e2e/works'), DATABASE_URL: '', PORT: '0', ...env },
  })
  return { status, said: stderr.trim() }
}

/** A certificate for this computer, signed by itself, good for a day. */
const makeCertificate = (folder: string, name: string) => {
  const cert = join(folder, `${name}.pem`)
  const key = join(folder, `${name}-key.pem`)
  const subject = ['-subj', '/CN=localhost', '-addext', 'subjectAltName=DNS:localhost,IP:127.0.0.1']
  const made = ['req', '-x509', '-newkey', 'rsa:2048', '-nodes', '-days', '1', ...subject]
  execFileSync('openssl', [...made, '-out', cert, '-keyout', key], { stdio: 'ignore' })
  return { TLS_CERT: cert, TLS_KEY: key }
}

test('a second start builds nothing and migrates nothing, and what was kept is there', async ({
  browser,
}) => {
  const first = await startServer({ template: 'works' })
  expect(await first.stop()).toBe(0)
  const files = () =>
    readdirSync(join(root, '.next'), { recursive: true, encoding: 'utf8' })
      .filter((name) => name.endsWith('.js'))
      .map((name) => `${name} ${statSync(join(root, '.next', name)).mtimeMs}`)
      .sort()
  const before = files()
  const began = Date.now()
  const second = await startServer({ dataDir: first.dataDir })
  expect(Date.now() - began).toBeLessThan(20_000)
  expect(second.output()).not.toMatch(/Building|Installing|applied|Making/)
  expect(files()).toEqual(before)
  const page = await (await browser.newContext({ baseURL: second.address })).newPage()
  await signIn(page, 'falk')
  await page.context().close()
  expect(await second.stop()).toBe(0)
  removeData(second)
})

for (const signal of ['SIGINT', 'SIGTERM'] as const)
  test(`${signal} ends the server cleanly: exit code 0, nothing listens, no write left in the log`, async () => {
    const server = await startServer({ template: 'works' })
    expect((await fetch(`${server.address}/sign-in`)).status).toBe(200)
    expect(await server.stop(signal)).toBe(0)
    await expect(fetch(`${server.address}/sign-in`)).rejects.toThrow()
    // The database was closed in order: its log is folded in.
    const left = readdirSync(server.dataDir).filter((name) => name.endsWith('-wal'))
    expect(left.map((name) => statSync(join(server.dataDir, name)).size).filter((size) => size > 0)).toEqual(
      [],
    )
    removeData(server)
  })

test('with a certificate it serves https, and cookies that travel by https only', async ({ browser }) => {
  const folder = mkdtempSync(join(tmpdir(), 'ledgerline-tls-'))
  const server = await startServer({ template: 'works', env: makeCertificate(folder, 'own') })
  expect(server.address).toMatch(/^https:\/\/127\.0\.0\.1:\d+$/)
  const context = await browser.newContext({ baseURL: server.address, ignoreHTTPSErrors: true })
  const page = await context.newPage()
  await signIn(page, 'aldous')
  const cookies = await context.cookies()
  expect(cookies.length).toBeGreaterThan(0)
  expect(
    cookies.filter(({ httpOnly, sameSite, secure }) => !secure || !httpOnly || sameSite !== 'Lax'),
  ).toEqual([])
  await expect(fetch(server.address.replace('https', 'http'))).rejects.toThrow()
  await context.close()
  expect(await server.stop()).toBe(0)
  removeData(server)
  rmSync(folder, { recursive: true })
})

test('settings that can’t be served end with a sentence, not with a trace', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'ledgerline-tls-'))
  const own = makeCertificate(folder, 'own')
  const other = makeCertificate(folder, 'other')
  const file = join(folder, 'file')
  writeFileSync(file, 'x')
  const busy = createServer().listen(0, '127.0.0.1')
  await new Promise((resolve) => busy.once('listening', resolve))
  const address = busy.address()
  const port = typeof address === 'object' && address ? String(address.port) : ''
  const cases: readonly (readonly [Record<string, string>, RegExp])[] = [
    [{ PORT: 'eighty' }, /^PORT=eighty is not a whole number\. Give a number from 0 to 65535/],
    [{ PORT: port }, new RegExp(`^PORT: port ${port} of 127\\.0\\.0\\.1 is in use\\.`)],
    [{ HOST: 'a b' }, /^HOST=a b is neither a host name nor an address\./],
    [{ HOST: '192.0.2.1', PORT: '4000' }, /^HOST: 192\.0\.2\.1 is no address of this computer\./],
    [{ DATA_DIR: join(file, 'x') }, /^DATA_DIR: .* can't be made or written to/],
    [{ DATABASE_URL: 'mysql://x' }, /^DATABASE_URL=mysql:\/\/x starts neither with file: nor/],
    [{ TLS_CERT: own.TLS_CERT }, /^TLS_CERT is given without TLS_KEY\./],
    [
      { TLS_CERT: join(folder, 'none'), TLS_KEY: own.TLS_KEY },
      /^TLS_CERT=.* names a file that can’t be read\./,
    ],
    [
      { TLS_CERT: own.TLS_CERT, TLS_KEY: other.TLS_KEY },
      /^TLS_CERT, TLS_KEY: the two do not make a server cert/,
    ],
    [{ TRUST_PROXY: 'perhaps' }, /^TRUST_PROXY=perhaps is neither yes nor no\./],
  ]
  for (const [env, sentence] of cases) {
    const { said, status } = refusedStart(env)
    expect(status, said).toBe(1)
    expect(said).toMatch(sentence)
    expect(said).not.toMatch(/\n\s+at /)
  }
  const { said, status } = refusedStart({}, '--dmeo')
  expect(status).toBe(1)
  expect(said).toMatch(/^--dmeo is not an option of this command/)
  busy.close()
  rmSync(folder, { recursive: true })
})

test('a works of its own is not overwritten by --demo', async ({ browser }) => {
  const server = await startServer({ template: 'works', args: ['--demo'] })
  expect(server.output()).toContain('A works is set up here already; the demo was not loaded.')
  // The secret is made when the first person signs in.
  const page = await (await browser.newContext({ baseURL: server.address })).newPage()
  await signIn(page, 'falk')
  await page.context().close()
  expect(await server.stop()).toBe(0)
  const secret = readdirSync(server.dataDir).filter((name) => /secret/.test(name))
  expect(secret.map((name) => statSync(join(server.dataDir, name)).mode & 0o777)).toEqual([0o600])
  expect(secret.map((name) => readFileSync(join(server.dataDir, name), 'utf8').trim().length > 30)).toEqual([
    true,
  ])
  removeData(server)
})
