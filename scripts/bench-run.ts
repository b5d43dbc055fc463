/** What `npm run bench` measures; run by scripts/bench.mjs on an empty, migrated database in DATA_DIR. */
import { database } from '@/lib/data/database'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { staffBrush } from '@/lib/domain/charts/staff-brush'
import { svgText } from '@/lib/domain/charts/svg'
import { parseStaves } from '@/lib/input/drift-view'
import { svgToPng } from '@/lib/output/svg-to-png'
import { getDrift } from '@/lib/services/get-drift'
import { getLot } from '@/lib/services/get-lot'
import { listLots } from '@/lib/services/list-lots'
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
const whole = { from: 0, to: decades.lots.length - 1 }
results.push(
  await measure(`chart of ${decades.lots.length} lots built`, 3, () =>
    buildStaffChart({ ...decades, window: whole }),
  ),
  await measure(`chart of ${decades.lots.length} lots laid out and drawn`, 3, () =>
    drawStaffChart(layoutStaffChart(buildStaffChart({ ...decades, window: whole }), 1200)),
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
await database().close()

process.stdout.write(`${base.what}: ${base.each.toFixed(2)} ms\n\n`)
process.stdout.write(`${'what'.padEnd(58)}${'ms'.padStart(10)}${'units'.padStart(10)}\n`)
for (const { each, what } of results)
  process.stdout.write(
    `${what.padEnd(58)}${each.toFixed(2).padStart(10)}${(each / base.each).toFixed(2).padStart(10)}\n`,
  )
