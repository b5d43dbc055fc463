/** The built app on a free port of this computer, with a data folder of its own: one for each test file. */
import { type ChildProcess, spawn } from 'node:child_process'
import { cpSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { type Browser, test as base, expect, type Page } from '@playwright/test'
import { type Template, templatePath } from './e2e-templates'

const root = fileURLToPath(new URL('../..', import.meta.url))

export interface Server {
  readonly address: string
  readonly dataDir: string
  /** Everything it said so far. */
  output(): string
  /** Ends it as a person at the keyboard would; resolves with its exit code. */
  stop(signal?: 'SIGINT' | 'SIGTERM'): Promise<number>
}

export interface ServerOptions {
  readonly template?: Template
  readonly env?: Readonly<Record<string, string>>
  readonly args?: readonly string[]
  /** The folder of an earlier server, to start on its data again. */
  readonly dataDir?: string
}

const ended = (child: ChildProcess): Promise<number> =>
  new Promise((resolve) => {
    if (child.exitCode !== null) resolve(child.exitCode)
    else child.once('exit', (code, signal) => resolve(code ?? (signal ? 128 : 0)))
  })

/** What a person's shell would hand on: nothing of the test tool's own. */
const environment = (): Record<string, string | undefined> =>
  Object.fromEntries(
    Object.entries(process.env).filter(([name]) => !/^(NODE_|TEST_|PW_|PLAYWRIGHT)/.test(name)),
  )

/** Starts `npm start`'s own program and waits for the address that it prints. */
export async function startServer(options: ServerOptions = {}): Promise<Server> {
  const dataDir = options.dataDir ?? mkdtempSync(join(tmpdir(), 'ledgerline-e2e-'))
  if (options.dataDir === undefined)
    cpSync(templatePath(options.template ?? 'works'), dataDir, { recursive: true })
  const child = spawn(process.execPath, ['scripts/start.mjs', ...(options.args ?? [])], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...environment(),
      PORT: '0',
      DATA_DIR: dataDir,
      DATABASE_URL: '',
      ...options.env,
    } as unknown as NodeJS.ProcessEnv,
  })
  let output = ''
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', (part) => {
      output += part
    })
  const address = await new Promise<string>((resolve, reject) => {
    const look = () => {
      const found = /serves (https?:\/\/\S+)/.exec(output)?.[1]
      if (found) resolve(found)
    }
    child.stdout.on('data', look)
    setTimeout(() => reject(new Error(`the server does not answer:\n${output}`)), 60_000).unref()
    child.once('exit', (code) => reject(new Error(`the server ended with ${code}:\n${output}`)))
  })
  return {
    address,
    dataDir,
    output: () => output,
    stop: async (signal = 'SIGTERM') => {
      child.kill(signal)
      return ended(child)
    },
  }
}

/** Lines of a server that say that something went wrong. */
const alarming = /⨯|Error:|error:|Unhandled|ECONN/

export const removeData = (server: Server): void => rmSync(server.dataDir, { recursive: true, force: true })

export const passwordOf = (username: string): string => `tarnbeck-${username}`

/** A browser of its own in which this person has signed in. */
export async function signedIn(browser: Browser, server: Server, username: string, more = {}): Promise<Page> {
  const context = await browser.newContext({ baseURL: server.address, ...more })
  const page = await context.newPage()
  await signIn(page, username)
  return page
}

export async function signIn(page: Page, username: string): Promise<void> {
  await page.goto('/sign-in')
  await page.getByLabel('Sign-in name').fill(username)
  await page.getByLabel('Password').fill(passwordOf(username))
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'))
}

/** Tests with a server of the file's own; what the server says in alarm fails the file. */
export const serverTest = (template: Template) =>
  base.extend<{ server: Server }, { ownServer: Server }>({
    ownServer: [
      // biome-ignore lint/correctness/noEmptyPattern: the test tool reads what a fixture needs from this pattern
      async ({}, use) => {
        const server = await startServer({ template })
        await use(server)
        const code = await server.stop()
        removeData(server)
        expect(
          server
            .output()
            .split('\n')
            .filter((line) => alarming.test(line)),
        ).toEqual([])
        expect(code).toBe(0)
      },
      { scope: 'worker', timeout: 120_000 },
    ],
    server: async ({ ownServer }, use) => use(ownServer),
    baseURL: async ({ ownServer }, use) => use(ownServer.address),
  })
