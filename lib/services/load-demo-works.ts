import { spawn } from 'node:child_process'
import { existsSync } from 'node:fs'
import { join } from 'node:path'
import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { requireEnvironment } from '@/lib/data/env'
import { problem } from '@/lib/domain/errors'
import { isWorksMissing } from './works-missing'

/**
 * The demo is loaded by a process of its own, the one that `npm start -- --demo` uses, so that the server goes
 * on answering. Its last line of output is the progress.
 */
export interface DemoProgress {
  readonly state: 'absent' | 'offered' | 'running' | 'failed'
  readonly line: string
}

const key = Symbol.for('ledgerline.demo-works')

const holder = globalThis as typeof globalThis & { [key]?: DemoProgress }

const script = (): string => join(process.cwd(), 'scripts', 'load-demo.mjs')

/** Whether a demo is offered, how far its loading is, or why it failed. */
export const demoProgress = (): DemoProgress =>
  holder[key] ?? { state: existsSync(script()) ? 'offered' : 'absent', line: '' }

const lastLine = (text: string): string | undefined =>
  text
    .split(/[\r\n]+/)
    .map((line) => line.trim())
    .filter((line) => line !== '')
    .at(-1)

/**
 * Begins loading the demo works into an empty one; `demoProgress` tells how far it is.
 * @throws LedgerlineError not-permitted; conflict when the works is not empty; not-found without a demo
 */
export async function loadDemoWorks(actor: Actor | undefined): Promise<void> {
  permit(actor, 'settings.keep')
  const { state } = demoProgress()
  if (state === 'running') return
  if (state === 'absent') throw problem('not-found', 'This version has no demo works.')
  if (!(await isWorksMissing())) {
    throw problem('conflict', 'This works is set up already.', {
      mend: 'Start Ledgerline with another DATA_DIR to see the demo.',
    })
  }
  holder[key] = { state: 'running', line: '' }
  const { dataDir, databaseUrl } = requireEnvironment()
  const child = spawn(process.execPath, [script()], {
    env: { ...process.env, DATA_DIR: dataDir, DATABASE_URL: databaseUrl },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  const hear = (chunk: Buffer) => {
    const line = lastLine(chunk.toString('utf8'))
    if (line !== undefined) holder[key] = { state: 'running', line }
  }
  child.stdout.on('data', hear)
  child.stderr.on('data', hear)
  const end = (failed: boolean) => {
    holder[key] = failed ? { state: 'failed', line: holder[key]?.line ?? '' } : undefined
  }
  child.once('error', () => end(true))
  child.once('close', (code) => end(code !== 0))
}
