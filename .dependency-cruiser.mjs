/**
 * The import table of DEVELOPERS.md as lint rules; test/architecture.test.ts walks the same table on its own.
 * Types count as imports.
 */
const no = (name, from, to, comment) => ({ name, severity: 'error', comment, from, to })

/** Downwards only: a folder imports none that stands to its right. */
const order = [
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

const outward = order
  .slice(0, -1)
  .map((layer, index) =>
    no(
      `domain-${layer}-looks-down`,
      { path: `^lib/domain/${layer}/` },
      { path: `^lib/domain/(${order.slice(index + 1).join('|')})/` },
      `lib/domain/${layer} may import only what stands before it: ${order.slice(0, index).join(', ') || 'result, errors'}.`,
    ),
  )

const frameworks = '^node_modules/(next|react|react-dom|recharts)/'
const prisma = '^(node_modules/@prisma/|lib/data/generated/)'

export default {
  forbidden: [
    ...outward,
    no(
      'no-circles',
      {},
      { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
      'Modules in a circle can’t be read one at a time.',
    ),
    no(
      'domain-is-pure',
      { path: '^lib/domain/' },
      { pathNot: '^lib/domain/' },
      'The core imports no framework, database, clock, network or package: it runs alike in browser and server.',
    ),
    no(
      'input-knows-domain-only',
      { path: '^lib/input/' },
      { path: '^(lib|app|prisma|scripts)/', pathNot: '^lib/(input|domain)/' },
      'Schemas run in the browser, too: they import the domain only.',
    ),
    no(
      'data-looks-down',
      { path: '^lib/data/' },
      { path: '^(lib|app)/', pathNot: '^lib/(data|domain)/' },
      'Stored rows know the domain, and nobody above them.',
    ),
    no(
      'output-looks-down',
      { path: '^lib/output/' },
      { path: '^(lib|app)/', pathNot: '^lib/(output|domain)/' },
      'Writers of files take domain objects.',
    ),
    no(
      'access-looks-down',
      { path: '^lib/access/' },
      { path: '^(lib|app)/', pathNot: '^lib/(access|data|input|domain)/' },
      'Rights are asked by services; they ask nobody above.',
    ),
    no(
      'services-know-no-pages',
      { path: '^lib/services/' },
      { path: '^app/' },
      'A service answers pages, routes and commands alike.',
    ),
    no(
      'pages-go-through-services',
      { path: '^(app/|proxy\\.ts)' },
      { path: '^lib/(data|output)/' },
      'A page that reads the database by itself forgets to ask for rights.',
    ),
    no(
      'only-data-knows-the-database-client',
      { pathNot: '^(lib/data/|lib/access/sign-in\\.ts|scripts/generate-clients\\.mjs)' },
      { path: prisma },
      'One folder knows the database client: another engine or version changes one folder.',
    ),
    no(
      'only-app-knows-the-framework',
      { path: '^(lib|prisma|scripts)/', pathNot: '^scripts/lib/serve\\.mjs' },
      { path: frameworks },
      'Next, React and Recharts belong to app: everything else outlives them.',
    ),
    no(
      'no-tests-in-the-product',
      { pathNot: '^test/' },
      { path: '^test/' },
      'The product does not rest on its tests.',
    ),
    no('resolvable', {}, { couldNotResolve: true }, 'An import that leads nowhere.'),
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)generated/|\\.next/' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'node', 'default', 'types'],
    },
  },
}
