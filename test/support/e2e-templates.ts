/** Before the end-to-end tests: data folders to copy, one with a migrated, empty database, two with a small works. */
import { execFileSync } from 'node:child_process'
import { cpSync, existsSync, mkdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = fileURLToPath(new URL('../..', import.meta.url))
const folder = join(root, 'build/e2e')

export type Template = 'empty' | 'works' | 'alloy'
export const templatePath = (name: Template): string => join(folder, name)

const run = (name: Template, ...args: readonly string[]): void => {
  execFileSync(process.execPath, args, {
    cwd: root,
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, DATA_DIR: templatePath(name), DATABASE_URL: '' },
  })
}

export default function makeTemplates(): void {
  if (!existsSync(join(root, '.next/ledgerline-sources')))
    throw new Error('The end-to-end tests need the built app: run `npm test`, or `npm start` once.')
  rmSync(folder, { recursive: true, force: true })
  mkdirSync(templatePath('empty'), { recursive: true, mode: 0o700 })
  run('empty', 'scripts/migrate.mjs')
  for (const name of ['works', 'alloy'] as const) {
    cpSync(templatePath('empty'), templatePath(name), { recursive: true })
    run(name, '--import', 'tsx', `test/support/e2e-${name}.ts`)
  }
}
