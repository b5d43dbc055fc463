/** What `npm run bench` measures; run by scripts/bench.mjs on an empty, migrated database in DATA_DIR. */
import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { openBulk } from '@/lib/data/bulk/open-bulk'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { staffBrush } from '@/lib/domain/charts/staff-brush'
import { svgText } from '@/lib/domain/charts/svg'
import { readBenchRow } from '@/lib/input/bench-file/bench-row'
import { layoutOf } from '@/lib/input/bench-file/layout'
import { parseStaves } from '@/lib/input/drift-view'
import { svgToPng } from '@/lib/output/svg-to-png'
import { getDrift } from '@/lib/services/get-drift'
import { getImport } from '@/lib/services/get-import'
import { getLot } from '@/lib/services/get-lot'
import { readFileRows } from '@/lib/services/import/file-rows'
import { importPath, workThrough } from '@/lib/services/import/work-through'
import { listLots } from '@/lib/services/list-lots'
import { receiveImport } from '@/lib/services/receive-import'
import { startImport } from '@/lib/services/start-import'
import { foundDemoWorks } from '@/prisma/demo/found-works'
import { measureLot } from '@/prisma/demo/measure-lots'
import { demoProducts } from '@/prisma/demo/products'
import { readLot } from '@/prisma/demo/readings'
import { demoSchedule } from '@/prisma/demo/schedule'
import { decideAsQualityWould } from '@/prisma/demo/tell-story'

interface Measured {
  readonly what: string
  /** Median milliseconds of one piece. */
  readonly each: number
}

const median = (times: readonly number[]): number =>
  [...times].sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? Number.NaN

async function measure(what: string, times: number, work: (index: number) => unknown): Promise<Measured> {
  await work(0)
  const taken: number[] = []
  for (let index = 1; index <= times; index += 1) {
    const start = performance.now()
    await work(index)
    taken.push(performance.now() - start)
  }
  return { what, each: median(taken) }
}

/** Rows of a bench file: the work, and rows a second. */
interface ImportPace {
  readonly what: string
  readonly rowsPerSecond: number
}

/** The lots measured above once more under other codes, as a bench file of 200 rows: read only, then imported. */
async function measureImport(): Promise<readonly ImportPace[]> {
  const { dataDir } = requireEnvironment()
  mkdirSync(join(dataDir, 'imports'), { recursive: true })
  const head =
    'lot,product,made_at,specimen,d1a_mm,d1b_mm,d2a_mm,d2b_mm,d3a_mm,d3b_mm,cut_length_mm,cut_mass_mg,frequency_hz'
  const lines = lots.slice(0, 40).flatMap((lot) =>
    [1, 2, 3, 4, 5].map((number) => {
      const thick = `0.27${90 + ((lot.index + number) % 7)}`
      const made = new Date(lot.madeAt).toISOString()
      return `F-${lot.code},${lot.productCode},${made},${number},${`${thick},`.repeat(6)}500.0,240.${number},301.${number}`
    }),
  )
  const text = [head, ...lines, ''].join('\n')
  const { id } = await receiveImport(actors.orrin, { fileName: 'bench.csv', body: piecesOf(text) })
  const { preview, sha256, version } = await getImport(actors.orrin, id)
  if (!preview) throw new Error('the file was begun before')
  await startImport(actors.orrin, id, { options: preview.options, version, keepAs: '' })
  const path = importPath(dataDir, sha256)
  const layout = layoutOf(preview.headers, preview.options.columns)
  if (!layout.ok) throw new Error('the file has other columns')
  const reading = {
    headers: preview.headers,
    columns: layout.value,
    decimal: 'point',
    timeZone: 'UTC',
  } as const
  const read = await measure('read', 10, async () => {
    for await (const record of readFileRows(path, ','))
      if ('cells' in record && !readBenchRow(record.cells, reading).ok) throw new Error('a row is refused')
  })
  const connection = await openBulk(requireEnvironment())
  const begun = performance.now()
  await workThrough({
    connection,
    read: database().read,
    dataDir,
    stopAsked: () => false,
    progress: () => {},
  })
  const whole = performance.now() - begun
  await connection.close()
  const { stored } = await getImport(actors.orrin, id)
  if (stored !== lines.length) throw new Error(`${stored} of ${lines.length} rows were stored`)
  return [
    { what: 'bench file read and checked', rowsPerSecond: (1000 * lines.length) / read.each },
    { what: 'bench file read, computed and stored', rowsPerSecond: (1000 * lines.length) / whole },
  ]
}

async function* piecesOf(text: string): AsyncGenerator<Uint8Array> {
  yield Buffer.from(text)
}

/** A million square roots, added up: the unit of this computer at this hour. */
const arithmetic = (): number => {
  let sum = 0
  for (let n = 1; n <= 1_000_000; n += 1) sum += Math.sqrt(n)
  return sum
}

const lots = demoSchedule().filter((lot) => lot.micrometres === 279)
const [first] = lots
const product = demoProducts.find(({ code }) => code === first?.productCode)
if (!first || !product) throw new Error('the demo has other products')

const base = await measure('a million square roots (the unit)', 15, arithmetic)
const results: Measured[] = []
const actors = await foundDemoWorks(first.madeAt - 86_400_000)
const started = performance.now()
for (const lot of lots.slice(0, 40)) {
  await measureLot(actors[lot.maker], lot, 5)
  await decideAsQualityWould(actors.orrin, lot)
}
results.push({
  what: 'a lot opened, five specimens stored, judged and decided',
  each: (performance.now() - started) / 40,
})

results.push(
  await measure('readings of a lot made up (the chain backwards)', 20, () => readLot(product, first)),
)
results.push(await measure('lot page read', 20, () => getLot(actors.orrin, lots[20]?.code ?? '')))
results.push(await measure('list of lots read', 20, () => listLots(actors.orrin, { search: '', page: 1 })))
results.push(await measure('drift of 40 lots read', 20, () => getDrift(actors.orrin, product.code)))

const drift = await getDrift(actors.orrin, product.code, parseStaves(undefined))
/** The same lots over and over, as a works of many years has them. */
const longer = (times: number) => ({
  ...drift.chart,
  lots: Array.from({ length: times }, (_, round) =>
    drift.chart.lots.map((lot) => ({
      ...lot,
      lotId: lot.lotId + round * 1000,
      code: `${lot.code}-${round}`,
    })),
  ).flat(),
  staves: drift.chart.staves.map((stave) => ({
    ...stave,
    values: Array.from({ length: times }, () => stave.values).flat(),
    limitSets: [],
    signals: [],
  })),
  barLines: [],
})
for (const times of [1, 25]) {
  const input = longer(times)
  const window = { from: 0, to: input.lots.length - 1 }
  const chart = () => drawStaffChart(layoutStaffChart(buildStaffChart({ ...input, window }), 1200))
  results.push(await measure(`chart of ${input.lots.length} lots laid out`, 10, chart))
  results.push(await measure(`chart of ${input.lots.length} lots as SVG`, 10, () => svgText(chart())))
}
const decades = longer(1250)
const wholeWindow = { from: 0, to: decades.lots.length - 1 }
results.push(
  await measure(`chart of ${decades.lots.length} lots built`, 3, () =>
    buildStaffChart({ ...decades, window: wholeWindow }),
  ),
  await measure(`chart of ${decades.lots.length} lots laid out and drawn`, 3, () =>
    drawStaffChart(layoutStaffChart(buildStaffChart({ ...decades, window: wholeWindow }), 1200)),
  ),
  await measure(`52 lots of ${decades.lots.length} laid out and drawn`, 5, () =>
    drawStaffChart(
      layoutStaffChart(buildStaffChart({ ...decades, window: { from: 25_000, to: 25_051 } }), 1200),
    ),
  ),
  await measure(`overview of ${decades.lots.length} lots`, 3, () =>
    staffBrush(decades, { x: 138, w: 1000, compact: false }, 1200),
  ),
)
const svg = svgText(drawStaffChart(layoutStaffChart(buildStaffChart(drift.chart), 1200)))
results.push(await measure('chart of 40 lots as PNG', 5, () => svgToPng(svg)))
const imports = await measureImport()
await database().close()

process.stdout.write(`${base.what}: ${base.each.toFixed(2)} ms\n\n`)
process.stdout.write(`${'what'.padEnd(58)}${'ms'.padStart(10)}${'units'.padStart(10)}\n`)
for (const { each, what } of results)
  process.stdout.write(
    `${what.padEnd(58)}${each.toFixed(2).padStart(10)}${(each / base.each).toFixed(2).padStart(10)}\n`,
  )

const [readOnly, whole] = imports.map((one) => one.rowsPerSecond)
process.stdout.write(`\n${'import'.padEnd(58)}${'rows/s'.padStart(10)}${'ms a row'.padStart(10)}\n`)
for (const { rowsPerSecond, what } of imports)
  process.stdout.write(
    `${what.padEnd(58)}${rowsPerSecond.toFixed(0).padStart(10)}${(1000 / rowsPerSecond).toFixed(3).padStart(10)}\n`,
  )
process.stdout.write(`reading alone is ${((readOnly ?? 0) / (whole ?? 1)).toFixed(1)} times as fast\n`)
