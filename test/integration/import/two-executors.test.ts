import { beforeAll, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { freezeLimits } from '@/lib/services/freeze-limits'
import { getLot } from '@/lib/services/get-lot'
import { openLot } from '@/lib/services/open-lot'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { csvOf, type SpecimenOfFile, steelRow } from '../../support/bench-file'
import { importText } from '../../support/import-run'
import { addProduct } from '../../support/second-product'
import { typedHertz, typedMass, typedMetres } from '../../support/sheets'
import { calmTenths } from '../../support/steel-lots'
import { day, requestOf, type SteelWorks, setUpSteelWorks, thick } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const AT = day(400)
const HOUR = 3_600_000

/** 40 lots of two products on one machine: 24 calm ones, then some beyond the limits and a run over both products. */
const lots = [...calmTenths(48), 2565, 2566, 2530, 2546, 2547, 2546, 2548, 2546, 2547, 2546, 2548, 2547].map(
  (tenths, index) => ({
    code: `T-${String(index + 1).padStart(3, '0')}`,
    product: index % 2 === 0 ? 'L254' : 'L255',
    madeAt: day(index + 1),
    tenths,
  }),
)

const specimensOf = (lot: (typeof lots)[number]): readonly SpecimenOfFile[] =>
  [-2, -1, 0, 1, 2].map((step, index) => ({
    lot: lot.code,
    number: index + 1,
    madeAt: lot.madeAt,
    measuredAt: lot.madeAt + HOUR + index * 60_000,
    tenths: lot.tenths + step,
  }))

async function setUp(): Promise<SteelWorks> {
  const works = await setUpSteelWorks()
  await addProduct('L255', 'Larch 255')
  return works
}

const freezeAll = async (works: SteelWorks) => {
  for (const productCode of ['L254', 'L255'])
    for (const [characteristic, statistic] of [
      ['diameter', 'mean'],
      ['massPerMetreWeighed', 'mean'],
      ['diameter', 'within-lot-sd'],
    ] as const)
      await freezeLimits(
        works.quality,
        { productCode, characteristic, statistic, leftOut: [], reason: '', supersedes: 0, alike: false },
        AT,
      )
}

/** Through the app: lot by lot, as a bench does. */
async function throughTheApp(works: SteelWorks, some: typeof lots) {
  for (const lot of some) {
    await openLot(
      works.bench,
      {
        code: lot.code,
        productCode: lot.product,
        madeAt: lot.madeAt,
        machineCode: 'DM-1',
        setting: '',
        materials: [],
      },
      AT,
    )
    const request = requestOf(
      lot.code,
      specimensOf(lot).map(({ tenths }) => {
        const [a, b] = [(tenths / 1e4).toFixed(4), ((tenths + 2) / 1e4).toFixed(4)]
        const { diameters = [] } = thick(a)
        return {
          diameters: diameters.map((one) =>
            one.direction === 'a' ? one : { ...one, value: typedMetres(b) },
          ),
          cutMass: typedMass((199.1 * (tenths / 2540) ** 2).toFixed(2)),
          frequencies: [typedHertz((331.0 * (2540 / tenths)).toFixed(2))],
        }
      }),
    )
    await recordSpecimens(
      works.bench,
      {
        ...request,
        entries: request.entries.map((entry, index) => ({
          ...entry,
          reading: { ...entry.reading, measuredAt: specimensOf(lot)[index]?.measuredAt },
        })),
      },
      AT,
    )
  }
}

const throughTheWorker = (works: SteelWorks, some: typeof lots) =>
  importText(
    works.bench,
    csvOf(some.flatMap((lot) => specimensOf(lot).map((one) => ({ ...steelRow(one), product: lot.product })))),
    AT,
    { batchRows: 35 },
  )

/** Every row of every table that a plan fills, ids and all; only client ids, made at random, are left out. */
async function tables() {
  const { read } = database()
  const orderBy = { id: 'asc' } as const
  return {
    lots: await read.lot.findMany({ orderBy }),
    specimens: await read.specimen.findMany({ orderBy, omit: { clientId: true } }),
    readings: await read.reading.findMany({ orderBy, omit: { clientId: true } }),
    snapshots: await read.inputSnapshot.findMany({ orderBy }),
    evaluations: await read.evaluation.findMany({ orderBy }),
    results: await read.specimenResult.findMany({ orderBy: { evaluationId: 'asc' } }),
    summaries: await read.lotSummary.findMany({
      orderBy: [{ lotId: 'asc' }, { characteristic: 'asc' }],
      omit: { id: true },
    }),
    signals: await read.signal.findMany({ orderBy }),
  }
}

describeOnEachEngine('the same specimens through the app and through the worker', () => {
  type Tables = Awaited<ReturnType<typeof tables>>
  let app: Tables
  let worker: Tables
  let imported: SteelWorks

  describeOnEachEngine('through the app', () => {
    useFreshDatabase()
    beforeAll(async () => {
      const works = await setUp()
      await throughTheApp(works, lots.slice(0, 48))
      await freezeAll(works)
      await throughTheApp(works, lots.slice(48))
      app = await tables()
    }, 120_000)
    it('stores 300 specimens', () => {
      expect(app.specimens).toHaveLength(300)
    })
  })

  describeOnEachEngine('through the worker', () => {
    useFreshDatabase()
    beforeAll(async () => {
      const works = await setUp()
      imported = works
      await throughTheWorker(works, lots.slice(0, 48))
      await freezeAll(works)
      await throughTheWorker(works, lots.slice(48))
      worker = await tables()
    }, 120_000)
    it('tells in the history of a lot which import brought it', async () => {
      const { history } = await getLot(imported.quality, 'T-001')
      expect(history.map(({ person, subject, verb }) => [verb, subject, person])).toEqual([
        // Both runs of this test have one instant; a clock gives each its own.
        ['import-rows', 'import 1', 'T. Aldous'],
        ['import-rows', 'import 2', 'T. Aldous'],
      ])
    })
    it('stores 300 specimens', () => {
      expect(worker.specimens).toHaveLength(300)
    })
  })

  it.each([
    'lots',
    'specimens',
    'readings',
    'snapshots',
    'evaluations',
    'results',
    'summaries',
    'signals',
  ] as const)('gives equal %s, row for row', (name) => {
    expect(worker[name].length).toBeGreaterThan(0)
    expect(worker[name]).toEqual(app[name])
  })

  it('raises signals of the product and of the machine over products in both', () => {
    expect(app.signals.some((one) => one.machineId === null)).toBe(true)
    expect(app.signals.some((one) => one.machineId !== null)).toBe(true)
  })
})
