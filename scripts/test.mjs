/**
 * `npm test [-- STAGE …]`: sets everything up and runs every check, or only the stages named. Ends with the seconds
 * of each stage and a line `N passed, N failed`; exit code 1 unless all passed.
 */
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { requireNode } from './lib/node-version.mjs'

requireNode()

const root = dirname(dirname(fileURLToPath(import.meta.url)))
const { setUp } = await import('./setup.mjs')
const { CommandFailed, fail } = await import('./lib/child.mjs')
const { provideChromium, providePostgresql } = await import('./lib/debian.mjs')
const { buildApp } = await import('./lib/build.mjs')
const { bin, notRun, one, playwright, program, runStages, vitest } = await import('./lib/stages.mjs')

/** The share of the long proofs that runs here; `npm run test:long` runs them whole. */
const share = { LEDGERLINE_SHARE: process.env.LEDGERLINE_SHARE ?? '0.05' }

const stages = [
  {
    name: 'format and lint',
    run: () => program(root, [bin(root, '@biomejs/biome/bin/biome'), 'check', '.']),
  },
  {
    name: 'types',
    run: async () => {
      // Declarations of the framework's own (style sheets, routes) are made, not kept.
      const made = await program(root, [bin(root, 'next/dist/bin/next'), 'typegen'])
      return made.failed > 0 ? made : program(root, [bin(root, 'typescript/bin/tsc'), '--noEmit', '-p', '.'])
    },
  },
  {
    name: 'import rules',
    run: () =>
      program(root, [
        bin(root, 'dependency-cruiser/bin/dependency-cruise.mjs'),
        '--config',
        '.dependency-cruiser.mjs',
        ...['app', 'lib', 'prisma', 'scripts', 'proxy.ts'],
      ]),
  },
  { name: 'repository rules', run: () => vitest(root, 'rules') },
  { name: 'formulas', run: () => program(root, [join(root, 'scripts/validate.mjs')]) },
  { name: 'unit', run: () => vitest(root, 'unit') },
  { name: 'components', run: () => vitest(root, 'ui') },
  { name: 'integration SQLite', run: () => vitest(root, 'integration') },
  {
    name: 'integration PostgreSQL',
    run: async () => {
      if (await providePostgresql()) return vitest(root, 'integration-postgresql')
      // As root the package was tried and failed; anyone else may lack the right to install it.
      if (process.getuid?.() === 0) return one(false)
      process.stdout.write(
        'PostgreSQL: not run. Install its server programs (initdb) to run these tests, too.\n',
      )
      return notRun
    },
  },
  { name: 'long proofs, a share', run: () => vitest(root, 'long', share) },
  {
    name: 'build',
    run: async () => {
      await buildApp(root)
      return one(true)
    },
  },
  { name: 'Chromium is there', run: async () => one(await provideChromium(root)) },
  { name: 'end to end', needs: 'build', run: () => playwright(root) },
]

try {
  await setUp()
  const asked = process.argv.slice(2)
  const unknown = asked.find((name) => !stages.some((stage) => stage.name === name))
  if (unknown !== undefined)
    throw new CommandFailed(
      `There is no stage “${unknown}”; there are: ${stages.map((one) => one.name).join(', ')}.`,
    )
  const chosen = asked.length === 0 ? stages : stages.filter((stage) => asked.includes(stage.name))
  process.exitCode = (await runStages(chosen)) ? 0 : 1
} catch (error) {
  fail(error)
}
