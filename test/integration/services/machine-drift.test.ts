import { beforeEach, describe, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { metres } from '@/lib/domain/units/quantity'
import { answerSignal } from '@/lib/services/answer-signal'
import { freezeLimits } from '@/lib/services/freeze-limits'
import { getDrift } from '@/lib/services/get-drift'
import { getLot } from '@/lib/services/get-lot'
import { getMachineDrift } from '@/lib/services/get-machine-drift'
import { listDriftMachines } from '@/lib/services/list-drift-machines'
import { openLot } from '@/lib/services/open-lot'
import { proposeLimits } from '@/lib/services/propose-limits'
import { recomputeDerived } from '@/lib/services/recompute-derived'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { refusalOf } from '../../support/refusal-of'
import { addProduct, reviseProduct } from '../../support/second-product'
import { calmTenths } from '../../support/steel-lots'
import { day, fiveAbout, requestOf, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const HOUR = 3_600_000

describeOnEachEngine('charts over the products of a machine', () => {
  useFreshDatabase('test')
  let works: SteelWorks
  beforeEach(async () => {
    works = await setUpSteelWorks()
    await addProduct('L255', 'Larch 255')
  })

  /** A lot of a product, made on a day, its diameter in tenths of a micrometre; measured some hours later. */
  const measure = async (code: string, productCode: string, made: number, tenths: number, hours = 2) => {
    await openLot(
      works.bench,
      { code, productCode, madeAt: day(made), machineCode: 'DM-1', setting: '' },
      day(made) + HOUR,
    )
    await recordSpecimens(works.bench, requestOf(code, fiveAbout(tenths)), day(made) + hours * HOUR)
  }
  const freeze = (productCode: string, at: number) =>
    freezeLimits(
      works.quality,
      {
        productCode,
        characteristic: 'diameter',
        statistic: 'mean',
        leftOut: [],
        reason: '',
        supersedes: 0,
        alike: false,
      },
      at,
    )
  const calmLots = async () => {
    for (const [index, tenths] of calmTenths(40).entries()) {
      const product = index < 20 ? 'L254' : 'L255'
      await measure(`C-${index + 1}`, product, index + 1, tenths)
    }
    await freeze('L254', day(41))
    await freeze('L255', day(41))
  }
  const diameter = { characteristic: 'diameter', statistic: 'mean' } as const

  it('raise one signal for a run that lots of several products make; it is shown, stops them, is answered once', async () => {
    await calmLots()
    for (let index = 0; index < 9; index += 1)
      await measure(`R-${index + 1}`, index % 2 === 0 ? 'L254' : 'L255', 50 + index, 2543)
    const view = await getMachineDrift(works.quality, 'DM-1', [diameter])
    const [signal, ...more] = view.signals
    expect(more).toEqual([])
    expect(signal).toMatchObject({
      rule: 'nine-on-one-side',
      side: 'above',
      machine: { code: 'DM-1' },
      lotCode: 'R-9',
      memberCodes: ['R-1', 'R-2', 'R-3', 'R-4', 'R-5', 'R-6', 'R-7', 'R-8', 'R-9'],
      state: 'open',
    })
    expect(signal?.sentence).toMatch(
      /^Diameter on Drawing machine 1: 9 lots of several products on one side, above their centre lines, R-1 to R-9, \+\d\.\d σ on average\.$/,
    )
    expect(view.chart.staves[0]?.signals).toHaveLength(1)
    expect((await getDrift(works.quality, 'L254', [diameter])).signals).toEqual([])
    const lot = await getLot(works.quality, 'R-4')
    expect(lot.assessment.proposal.stops.map((stop) => stop.id)).toContain(`signal-${signal?.id}`)
    const machines = await listDriftMachines(works.quality)
    expect(machines.find((one) => one.code === 'DM-1')).toMatchObject({ lots: 49, openSignals: 1 })
    await answerSignal(
      works.quality,
      signal?.id ?? 0,
      { cause: 'pressure pad', answer: 'Set anew.', version: signal?.version ?? 0 },
      day(60),
    )
    expect((await getMachineDrift(works.quality, 'DM-1', [diameter])).signals[0]?.state).toBe('answered')
  })

  it('raise the same when everything derived is computed again, and nothing twice', async () => {
    await calmLots()
    for (let index = 0; index < 9; index += 1)
      await measure(`R-${index + 1}`, index % 2 === 0 ? 'L254' : 'L255', 50 + index, 2543)
    const before = await database().read.signal.findMany({ orderBy: { id: 'asc' } })
    expect(before).toHaveLength(1)
    const again = await recomputeDerived(works.administrator, day(70))
    expect(again).toMatchObject({ signalsRaised: 0, signalsChanged: 0, differing: [] })
    expect(await database().read.signal.findMany({ orderBy: { id: 'asc' } })).toEqual(before)
  })

  it('stand in the order made or measured, and draw products without limits as open notes', async () => {
    for (const [index, tenths] of calmTenths(20).entries())
      await measure(`C-${index + 1}`, 'L254', index + 1, tenths)
    await freeze('L254', day(21))
    await measure('N-1', 'L255', 22, 2541, 200)
    await measure('C-21', 'L254', 23, 2540)
    const made = await getMachineDrift(works.quality, 'DM-1', [diameter])
    expect(made.chart.lots.slice(-2).map((one) => one.code)).toEqual(['N-1', 'C-21'])
    expect(made.chart.staves[0]?.leftOut).toEqual([20])
    expect(made.products).toMatchObject([
      { code: 'L254', lots: 21, limits: true },
      { code: 'L255', lots: 1, limits: false },
    ])
    const measured = await getMachineDrift(works.quality, 'DM-1', [diameter], { order: 'measured' })
    expect(measured.chart.lots.slice(-2).map((one) => one.code)).toEqual(['C-21', 'N-1'])
  })

  it('are not for sales, and name a machine that is not there', async () => {
    expect(await refusalOf(getMachineDrift(works.sales, 'DM-1'))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(listDriftMachines(works.sales))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(getMachineDrift(works.quality, 'DM-9'))).toMatchObject({ code: 'not-found' })
  })

  describe('a target that a specification moves', () => {
    const moved = (by: number) =>
      reviseProduct('L254', day(45), (body) => ({
        ...body,
        diameter: {
          target: metres(body.diameter.target + by),
          lower: metres(body.diameter.lower + by),
          upper: metres(body.diameter.upper + by),
        },
      }))

    it('takes the limits along: lots that follow it raise nothing, on the product’s chart and the machine’s', async () => {
      await calmLots()
      await moved(2e-6)
      for (let index = 0; index < 12; index += 1)
        await measure(`F-${index + 1}`, 'L254', 50 + index, 2560 + (index % 2 === 0 ? 2 : -2))
      const { chart, signals } = await getDrift(works.quality, 'L254', [diameter])
      expect(signals).toEqual([])
      const [before, after] = chart.staves[0]?.limitSets ?? []
      expect((after?.centre ?? 0) - (before?.centre ?? 0)).toBeCloseTo(2, 6)
      expect(after?.sigma).toBe(before?.sigma)
      const machine = await getMachineDrift(works.quality, 'DM-1', [diameter])
      expect(machine.signals).toEqual([])
      const values = machine.chart.staves[0]?.values.slice(-12).map((value) => Math.abs(value ?? 99))
      expect(Math.max(...(values ?? [99]))).toBeLessThan(3)
    })

    it('leaves lots that stay behind beyond their limits', async () => {
      await calmLots()
      await moved(2e-6)
      await measure('S-1', 'L254', 50, 2540)
      const { signals } = await getDrift(works.quality, 'L254', [diameter])
      expect(signals).toMatchObject([{ rule: 'beyond-the-limits', side: 'below', lotCode: 'S-1' }])
    })

    it('brings a baseline that spans it to the newer target', async () => {
      await moved(2e-6)
      for (const [index, tenths] of calmTenths(24).entries())
        await measure(`B-${index + 1}`, 'L254', 33 + index, index < 12 ? tenths : tenths + 20)
      const { lots, proposal } = await proposeLimits(works.quality, {
        productCode: 'L254',
        ...diameter,
        leftOut: [],
        alike: false,
      })
      expect(lots.every((one) => one.target === 256e-6)).toBe(true)
      expect((proposal?.centre ?? 0) * 1e6).toBeCloseTo(256, 1)
      expect((proposal?.sigma ?? 1) * 1e6).toBeLessThan(1)
    })
  })
})
