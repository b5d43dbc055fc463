/** The stages of `npm test`: each ends with how many of its checks passed and failed. */
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { run } from './child.mjs'

/**
 * @typedef {{ passed: number, failed: number }} Count
 * @typedef {{ name: string, needs?: string, run: () => Promise<Count> }} Stage
 */

export const one = (ok) => (ok ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 })

/** Nothing could be checked here, and the summary says so. */
export const notRun = { passed: 0, failed: 0 }

/** A program that is one check: passed when it ends with 0. */
export const program = async (root, args, env = {}) =>
  one((await run(process.execPath, args, { cwd: root, env })) === 0)

export const bin = (root, path) => join(root, 'node_modules', path)

const freshReport = (root, name) => {
  const folder = join(root, 'build/test')
  mkdirSync(folder, { recursive: true })
  const file = join(folder, `${name}.json`)
  rmSync(file, { force: true })
  return file
}

const readReport = (file) => (existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : undefined)

/**
 * What a report of the unit test tool says. A test that was skipped or only planned proves nothing: it counts as
 * failed, as does a run without any test, and one that ended badly though no test failed.
 */
export const countVitest = (report, code) => {
  if (report === undefined) return { passed: 0, failed: 1 }
  const { numPassedTests = 0, numFailedTests = 0, numPendingTests = 0, numTodoTests = 0 } = report
  const failed = numFailedTests + numPendingTests + numTodoTests
  const broken = failed === 0 && (code !== 0 || numPassedTests === 0)
  return { passed: numPassedTests, failed: broken ? 1 : failed }
}

/** The same for the browser test tool; a test that passed only at the second try counts as failed. */
export const countPlaywright = (report, code) => {
  if (report?.stats === undefined) return { passed: 0, failed: 1 }
  const { expected = 0, unexpected = 0, flaky = 0, skipped = 0 } = report.stats
  const failed = unexpected + flaky + skipped
  const broken = failed === 0 && (code !== 0 || expected === 0)
  return { passed: expected, failed: broken ? 1 : failed }
}

/** Runs one project of the unit test tool. */
export const vitest = async (root, project, env = {}) => {
  const report = freshReport(root, project)
  const args = [
    'run',
    '--project',
    project,
    '--reporter=dot',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ]
  const code = await run(process.execPath, [bin(root, 'vitest/vitest.mjs'), ...args], { cwd: root, env })
  return countVitest(readReport(report), code)
}

/** Runs the end-to-end tests against the built app. */
export const playwright = async (root) => {
  const report = freshReport(root, 'end-to-end')
  const code = await run(process.execPath, [bin(root, '@playwright/test/cli.js'), 'test'], {
    cwd: root,
    env: { LEDGERLINE_E2E_REPORT: report },
  })
  return countPlaywright(readReport(report), code)
}

const seconds = (ms) => `${(ms / 1000).toFixed(0)} s`

/**
 * Runs the stages in order. One that needs a stage that failed is not tried and counts as failed. Says the seconds
 * of each at the end, and last `N passed, N failed`.
 * @param {readonly Stage[]} stages
 * @returns {Promise<boolean>} whether all passed
 */
export const runStages = async (stages, write = (text) => process.stdout.write(text)) => {
  const done = []
  for (const stage of stages) {
    const missing = done.find((one) => one.name === stage.needs && one.count.failed > 0)
    const start = Date.now()
    if (missing) {
      write(`\n== ${stage.name}: not tried, as ${missing.name} failed\n`)
      done.push({ name: stage.name, count: one(false), took: 0 })
      continue
    }
    write(`\n== ${stage.name}\n`)
    let count
    try {
      count = await stage.run()
    } catch (error) {
      write(`${error?.stack ?? error}\n`)
      count = one(false)
    }
    done.push({ name: stage.name, count, took: Date.now() - start })
  }
  write('\n')
  for (const { name, count, took } of done)
    write(
      `${count.failed > 0 ? 'FAILED ' : count.passed > 0 ? 'passed ' : 'NOT RUN'}  ${name.padEnd(28)} ${String(count.passed).padStart(5)} passed ${String(count.failed).padStart(4)} failed ${seconds(took).padStart(7)}\n`,
    )
  const total = (key) => done.reduce((sum, { count }) => sum + count[key], 0)
  write(`\n${total('passed')} passed, ${total('failed')} failed\n`)
  return total('failed') === 0 && total('passed') > 0
}
