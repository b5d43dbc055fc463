import { dirname, join, normalize } from 'node:path'

/** What a file asks for: its own words, and the path below the root when it is one of ours. */
export interface Import {
  readonly said: string
  readonly path: string | undefined
}

const importPattern =
  /(?:^|[\s;}])(?:import|export)\s*(?:type\s+)?(?:[\w*{}\s,$]+?\sfrom\s*)?['"]([^'"]+)['"]|\bimport\(\s*['"]([^'"]+)['"]|\brequire(?:\.resolve)?\(\s*['"]([^'"]+)['"]/g

/** Every import of a source text, types and dynamic ones included; comments are not looked into. */
export function importsOf(file: string, text: string): readonly Import[] {
  const code = text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/(^|\s)\/\/[^\n]*/g, '$1')
  return [...code.matchAll(importPattern)].map((match): Import => {
    const said = match[1] ?? match[2] ?? match[3] ?? ''
    if (said.startsWith('@/')) return { said, path: said.slice(2) }
    if (said.startsWith('.')) return { said, path: normalize(join(dirname(file), said)) }
    return { said, path: undefined }
  })
}

const domainOrder = [
  'units',
  'statistics',
  'strings',
  'sound',
  'metrology',
  'control',
  'quality',
  'datasheets',
  'charts',
  'record',
  'validation',
]

const zones = ['domain', 'input', 'data', 'services', 'output', 'access'] as const
type Zone = (typeof zones)[number] | 'app' | 'prisma' | 'scripts' | 'test' | 'other'

export function zoneOf(path: string): Zone {
  const [top, second] = path.split('/')
  if (top === 'lib') return zones.find((zone) => zone === second) ?? 'other'
  if (top === 'app' || path.startsWith('proxy')) return 'app'
  return top === 'prisma' || top === 'scripts' || top === 'test' ? top : 'other'
}

/** Which of our folders a folder may import, and why not the others. */
const table: Readonly<Record<Zone, { readonly may: readonly Zone[]; readonly why: string }>> = {
  domain: { may: ['domain'], why: 'the core runs alike in browser and server and knows nobody' },
  input: { may: ['domain', 'input'], why: 'schemas run in the browser, too' },
  data: { may: ['domain', 'data'], why: 'stored rows know the domain, and nobody above' },
  output: { may: ['domain', 'output'], why: 'writers of files take domain objects' },
  access: { may: ['domain', 'input', 'data', 'access'], why: 'rights are asked by services' },
  services: {
    may: ['domain', 'input', 'data', 'services', 'output', 'access'],
    why: 'a service answers pages, routes and commands alike',
  },
  app: {
    may: ['domain', 'input', 'services', 'access', 'app'],
    why: 'a page that reads the database by itself forgets to ask for rights',
  },
  prisma: {
    may: ['domain', 'input', 'data', 'services', 'output', 'access', 'prisma'],
    why: 'the demo goes through the services',
  },
  scripts: {
    may: ['domain', 'input', 'data', 'services', 'output', 'access', 'prisma', 'scripts'],
    why: 'a command knows no page',
  },
  test: {
    may: [
      'domain',
      'input',
      'data',
      'services',
      'output',
      'access',
      'app',
      'prisma',
      'scripts',
      'test',
      'other',
    ],
    why: '',
  },
  other: { may: ['domain', 'input', 'app', 'test', 'other'], why: 'settings of tools' },
}

const framework = /^(next|react|react-dom|recharts)(\/|$)/
const databaseClient = /^(@prisma\/|better-sqlite3$|pg$)/
/** The sign-in library brings its own door to the database client; the command makes the client. */
const clientToo = ['lib/access/sign-in.ts', 'scripts/generate-clients.mjs', 'scripts/lib/schema.mjs']

const insideDomain = (from: string, to: string): string | undefined => {
  const [layer, asked] = [from, to].map((path) => domainOrder.indexOf(path.split('/')[2] ?? ''))
  return layer !== undefined && asked !== undefined && layer >= 0 && asked > layer
    ? `imports only run downwards (${domainOrder.join(' ← ')})`
    : undefined
}

/** Why a file may not import this; undefined when it may. */
export function objection(from: string, { said, path }: Import): string | undefined {
  const zone = zoneOf(from)
  if (zone === 'test') return undefined
  if (path === undefined) {
    if (framework.test(said) && zone !== 'app' && zone !== 'other' && from !== 'scripts/lib/serve.mjs')
      return 'Next, React and Recharts belong to app'
    if (databaseClient.test(said) && zone !== 'data' && zone !== 'other' && !clientToo.includes(from))
      return 'only lib/data knows the database client'
    if (zone === 'domain') return 'the core imports no package, no system, no network'
    return undefined
  }
  if (path.startsWith('lib/data/generated') && zone !== 'data')
    return 'only lib/data knows the database client'
  const target = zoneOf(path)
  if (zone === 'domain' && target === 'domain') return insideDomain(from, path)
  return table[zone].may.includes(target) ? undefined : table[zone].why
}
