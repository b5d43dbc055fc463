/** The work of `npm run validate` (see validate.mjs): reads files of check cases, runs them, prints and counts. */
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join, relative, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { parseArgs } from 'node:util'
import { type CheckCase, parseCase } from '../lib/domain/validation/check-case'
import type { Comparison } from '../lib/domain/validation/compare'
import { quantities } from '../lib/domain/validation/registry'
import { type CaseResult, decisiveComparison, runCase } from '../lib/domain/validation/run-cases'

const builtIn = fileURLToPath(new URL('../test/reference', import.meta.url))
const say = (line: string) => process.stdout.write(`${line}\n`)

/** Ends the command with a sentence. */
function stop(sentence: string): never {
  process.stderr.write(`${sentence}\n`)
  process.exit(1)
}

function readArguments(): { cases: string; own: boolean; json: string | undefined } {
  try {
    const { values } = parseArgs({ options: { cases: { type: 'string' }, json: { type: 'string' } } })
    return { cases: resolve(values.cases ?? builtIn), own: values.cases !== undefined, json: values.json }
  } catch (error) {
    return stop(
      `${error instanceof Error ? error.message : error}\nUse: npm run validate [-- --cases FILE_OR_FOLDER] [--json OUT]`,
    )
  }
}

function filesOf(path: string): readonly string[] {
  if (!existsSync(path)) return stop(`There is no file or folder ${path}.`)
  if (!statSync(path).isDirectory()) return [path]
  return readdirSync(path)
    .filter((name) => name.endsWith('.json'))
    .sort()
    .map((name) => join(path, name))
}

interface Entry {
  readonly file: string
  readonly result: CaseResult
}

/** A file or an entry that cannot be read is a failed case, so that nothing is left out unnoticed. */
const unreadable = (file: string, id: string, error: string): Entry => ({
  file,
  result: { id, quantity: '', source: '', kind: '', status: 'failed', comparisons: [], error },
})

function runFile(path: string): readonly Entry[] {
  const file = relative(process.cwd(), path) || path
  let content: unknown
  try {
    content = JSON.parse(readFileSync(path, 'utf8'))
  } catch (error) {
    return [unreadable(file, file, `not JSON: ${error instanceof Error ? error.message : error}`)]
  }
  if (!Array.isArray(content)) return [unreadable(file, file, 'not a list of check cases')]
  return content.map((value, index): Entry => {
    const where = `${file}, entry ${index + 1}`
    const parsed = parseCase(value, where)
    if (!parsed.ok) return unreadable(file, where, parsed.problems.map(({ message }) => message).join(' '))
    return { file, result: runCase(parsed.value satisfies CheckCase, quantities) }
  })
}

const show = (value: unknown): string =>
  typeof value === 'number' ? String(Number(value.toPrecision(13))) : (JSON.stringify(value) ?? 'nothing')

function limitOf({ tolerance }: Comparison): string {
  const parts = Object.entries(tolerance ?? {}).map(([name, size]) => `${name} ${size}`)
  return parts.length > 0 ? `within ${parts.join(' or ')}` : 'exactly'
}

const compared = (one: Comparison): string =>
  `${one.path}: got ${show(one.got)}, expected ${show(one.expected)} ${limitOf(one)}`

function lineOf({ result }: Entry): string {
  const { error, comparisons, id, kind, quantity, source } = result
  const verdict = result.status === 'passed' ? 'ok  ' : 'FAIL'
  const decisive = decisiveComparison(result)
  const what = error ?? (decisive ? compared(decisive) : '')
  const many = comparisons.length > 1 ? ` (tightest of ${comparisons.length} values)` : ''
  const origin = [kind, source].filter((part) => part !== '').join(', ')
  const first = `${verdict} ${id} ${quantity} ${what}${result.status === 'passed' ? many : ''} [${origin}]`
  const others = comparisons.filter((one) => !one.passed && one !== decisive).slice(0, 20)
  return [first, ...others.map((one) => `       ${compared(one)}`)].join('\n')
}

const { cases, json, own } = readArguments()
const entries = filesOf(cases)
  .flatMap(runFile)
  // In somebody's own file an unknown quantity is a failure; among the built-in ones it is not built yet.
  .map(
    (entry): Entry =>
      own && entry.result.status === 'not-known'
        ? { ...entry, result: { ...entry.result, status: 'failed' } }
        : entry,
  )

let file = ''
for (const entry of entries) {
  if (entry.result.status === 'not-known') continue
  if (entry.file !== file) say(`\n${entry.file}`)
  file = entry.file
  say(lineOf(entry))
}

const notYet = new Map<string, number>()
for (const { result } of entries)
  if (result.status === 'not-known') notYet.set(result.quantity, (notYet.get(result.quantity) ?? 0) + 1)
if (notYet.size > 0) {
  say('\nNot yet (not counted as passed):')
  for (const [quantity, count] of notYet) say(`  ${quantity}, ${count} ${count === 1 ? 'case' : 'cases'}`)
}

if (json !== undefined) {
  const results = entries.map((entry) => ({ file: entry.file, ...entry.result }))
  writeFileSync(json, `${JSON.stringify(results, undefined, 1)}\n`)
}

const count = (status: CaseResult['status']) =>
  entries.filter(({ result }) => result.status === status).length
const [passed, failed] = [count('passed'), count('failed')]
if (passed + failed === 0) say('\nNo check case was run.')
say(`\n${passed} passed, ${failed} failed`)
process.exitCode = failed > 0 || passed === 0 ? 1 : 0
