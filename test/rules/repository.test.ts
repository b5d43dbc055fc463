import { existsSync } from 'node:fs'
import { dirname, join, normalize } from 'node:path'
import { describe, expect, it } from 'vitest'
import { keptFiles, root, textOf } from '../support/source-files'

const files = keptFiles().filter((path) => existsSync(join(root, path)))
const isText = (path: string): boolean => !/\.(png|ico|woff2?|ttf|db|pdf|json)$/.test(path)
const sources = files.filter((path) => /\.(ts|tsx|mjs)$/.test(path))
const matching = (pattern: RegExp): readonly string[] => files.filter((path) => pattern.test(path))

/** The rules below as functions of a text, so that each can be shown to refuse. */
const titled = (text: string): boolean =>
  /export const metadata[^=]*= \{ title: '|export (?:async )?function generateMetadata|export const generateMetadata/.test(
    text,
  )
const onlyRedirects = (text: string): boolean => /redirect\(/.test(text) && !/<\w/.test(text)
const machinePaths = /\/(?:work|home|root|Users|tmp)\/[\w.-]|C:\\\\/
const namesSource = (text: string): boolean =>
  /source|ISO |ASTM|JCGM|GUM|EURAMET|NIST|textbook|common practice|from memory|derived|definition/i.test(text)
const headings = (text: string): ReadonlySet<string> =>
  new Set(
    [...text.matchAll(/^#+ (.+)$/gm)].map(([, title = '']) =>
      title
        .toLowerCase()
        .replace(/[^\p{L}\p{N}\s-]/gu, '')
        .trim()
        .replace(/\s/g, '-'),
    ),
  )
const links = (text: string): readonly string[] =>
  [...text.matchAll(/!?\[[^\]]*\]\(([^)\s]+)\)/g)].flatMap(([, to = '']) =>
    /^(https?:|mailto:)/.test(to) ? [] : [to],
  )

function deadLinks(file: string, text: string = textOf(file)): readonly string[] {
  return links(text).filter((to) => {
    const [path = '', anchor] = to.split('#')
    const target = path === '' ? file : normalize(join(dirname(file), decodeURI(path)))
    if (!existsSync(join(root, target))) return true
    return anchor !== undefined && !headings(target === file ? text : textOf(target)).has(anchor)
  })
}

describe('the repository', () => {
  it('has only the folders and files at its top that were agreed on', () => {
    const tops = [...new Set(files.map((path) => path.split('/')[0] ?? ''))].sort()
    const allowed = [
      ...[
        '.ci',
        '.dependency-cruiser.mjs',
        '.gitignore',
        'DEVELOPERS.md',
        'README.md',
        'app',
        'biome.json',
        'lib',
      ],
      ...[
        'instrumentation.ts',
        'next.config.ts',
        'package-lock.json',
        'package.json',
        'playwright.config.ts',
      ],
      ...[
        'prisma',
        'prisma.config.ts',
        'proxy.ts',
        'public',
        'scripts',
        'test',
        'tsconfig.json',
        'vitest.config.ts',
      ],
    ]
    expect(tops.length).toBeGreaterThan(10)
    expect(tops.filter((top) => !allowed.includes(top))).toEqual([])
  })

  it('gives every page a title', () => {
    const pages = matching(/^app\/.*\/page\.tsx$/)
    expect(pages.length).toBeGreaterThan(20)
    expect(pages.filter((path) => !titled(textOf(path)) && !onlyRedirects(textOf(path)))).toEqual([])
    expect(titled('export default roomPage(async () => <p>Lots</p>)')).toBe(false)
    expect(onlyRedirects("export default () => { redirect('/today') }")).toBe(true)
    expect(onlyRedirects("if (!lot) redirect('/lots'); return <p>Lot</p>")).toBe(false)
  })

  it('names a source in every file of formulas', () => {
    const formulas = matching(/^lib\/domain\/(strings|statistics)\/[^/]+\.ts$/)
    expect(formulas.length).toBeGreaterThan(40)
    expect(
      formulas.filter((path) => /export (?:const|function)/.test(textOf(path)) && !namesSource(textOf(path))),
    ).toEqual([])
    expect(namesSource('/** Tension of a string. */ export const tension = 1')).toBe(false)
  })

  it('has no dead link in what people read', () => {
    const documents = matching(/\.md$/)
    expect(documents).toEqual(expect.arrayContaining(['README.md', 'DEVELOPERS.md']))
    expect(documents.flatMap((file) => deadLinks(file).map((to) => `${file}: ${to}`))).toEqual([])
    const bad =
      '# Rooms\n[a](#rooms) [b](#halls) [c](lib/nowhere.ts) ![d](public/none.png) [e](DEVELOPERS.md#no)'
    expect(deadLinks('README.md', bad)).toEqual([
      '#halls',
      'lib/nowhere.ts',
      'public/none.png',
      'DEVELOPERS.md#no',
    ])
  })

  it('names no folder of a machine', () => {
    const own = 'test/rules/repository.test.ts'
    expect(
      files
        .filter((path) => isText(path) && path !== own && path !== 'package-lock.json')
        .filter((path) => machinePaths.test(textOf(path).replaceAll('/tmp/ledgerline', ''))),
    ).toEqual([])
    expect(machinePaths.test('open /home/someone/x')).toBe(true)
  })

  it('leaves no test out and no check switched off', () => {
    const off = /\b(?:it|test|describe)\.(?:skip|todo|only|fails)\b|@ts-ignore|@ts-nocheck/
    const own = 'test/rules/repository.test.ts'
    expect(sources.filter((path) => path !== own && off.test(textOf(path)))).toEqual([])
    const ignored = /biome-ignore(?! lint\/[\w/]+: .{10,}| assist| format)/
    expect(sources.filter((path) => path !== own && ignored.test(textOf(path)))).toEqual([])
    const bad = ["it.skip('x')", "describe.only('x')", "test.todo('x')", '// @ts-ignore']
    expect(bad.filter((text) => !off.test(text))).toEqual([])
    expect(ignored.test('// biome-ignore lint/a11y: no')).toBe(true)
    expect(ignored.test('// biome-ignore lint/a11y/useX: the browser does it by itself')).toBe(false)
  })

  it('lets stored results rest on + − × ÷ √ alone, whose last bit is the same on every engine', () => {
    const engineOwn =
      /Math\.(exp|expm1|log|log10|log2|log1p|sin|cos|tan|asin|acos|atan2?|sinh|cosh|tanh|pow|cbrt|hypot)\(|\*\*(?![*/])/
    const code = (text: string): string => text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/\/\/[^\n]*/g, '')
    const stored = matching(/^lib\/domain\/(units|strings|metrology|control|quality|record)\/.*\.ts$/)
    expect(stored.length).toBeGreaterThan(100)
    expect(stored.filter((path) => engineOwn.test(code(textOf(path))))).toEqual([])
    expect(
      ['Math.exp(x)', 'x ** 2', 'Math.hypot(a, b)'].filter((text) => !engineOwn.test(code(text))),
    ).toEqual([])
  })

  it('serves no page with a style sheet or a script in its text', () => {
    const inline = /<(?:style|script)[\s>]|dangerouslySetInnerHTML/
    const inApp = sources.filter((path) => path.startsWith('app/') && inline.test(textOf(path)))
    expect(inApp).toEqual([])
    expect(inline.test('<style>p{}</style>') && inline.test('<p dangerouslySetInnerHTML={x} />')).toBe(true)
  })
})
