import { randomUUID } from 'node:crypto'
import { beforeEach, describe, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import type { FreezeLimitsInput } from '@/lib/input/limits'
import { answerSignal } from '@/lib/services/answer-signal'
import { decideLot } from '@/lib/services/decide-lot'
import { freezeLimits } from '@/lib/services/freeze-limits'
import { getDrift } from '@/lib/services/get-drift'
import { getLot } from '@/lib/services/get-lot'
import { listSignals } from '@/lib/services/list-signals'
import { proposeLimits } from '@/lib/services/propose-limits'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { supersedeReading } from '@/lib/services/supersede-reading'
import { refusalOf } from '../../support/refusal-of'
import { calmTenths, measureLot, measureLots } from '../../support/steel-lots'
import {
  day,
  fiveAbout,
  openSteelLot,
  requestOf,
  type SteelWorks,
  setUpSteelWorks,
  thick,
} from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const freezing = (change: Partial<FreezeLimitsInput> = {}): FreezeLimitsInput => ({
  productCode: 'L254',
  characteristic: 'diameter',
  statistic: 'mean',
  leftOut: [],
  reason: '',
  supersedes: 0,
  ...change,
})

const signals = () =>
  database().read.signal.findMany({ orderBy: { id: 'asc' }, include: { lot: { select: { code: true } } } })

describeOnEachEngine('control limits and signals', () => {
  useFreshDatabase('test')
  let works: SteelWorks
  beforeEach(async () => {
    works = await setUpSteelWorks()
  })

  describe('freezeLimits', () => {
    it('refuses fewer than twenty lots with a sentence, and proposes nothing', async () => {
      await measureLots(works, calmTenths(19))
      expect(await refusalOf(freezeLimits(works.quality, freezing()))).toMatchObject({
        code: 'not-ready',
        message: expect.stringContaining('20 lots'),
      })
      const view = await proposeLimits(works.quality, freezing())
      expect(view.lots).toHaveLength(19)
      expect(view).toMatchObject({ proposal: undefined, refusal: { code: 'not-ready' }, newest: undefined })
    })

    it('freezes a numbered, signed, provisional set with its baseline and what was left out', async () => {
      await measureLots(works, [...calmTenths(20), 2560])
      const input = freezing({ leftOut: [{ lotCode: 'L-21', reason: 'Die changed too late.' }] })
      const { proposal } = await proposeLimits(works.quality, input)
      expect(await freezeLimits(works.quality, input, day(30))).toMatchObject({
        number: 1,
        provisional: true,
        lotCount: 20,
        signalsRaised: 0,
      })
      const { limitSets } = await getDrift(works.quality, 'L254')
      expect(limitSets).toMatchObject([
        {
          number: 1,
          centre: proposal?.centre,
          sigma: proposal?.sigma,
          firstLotCode: 'L-1',
          lastLotCode: 'L-20',
          leftOut: [{ lotCode: 'L-21', reason: 'Die changed too late.' }],
          frozenBy: 'M. Orrin',
          frozenAt: day(30),
          effectiveFrom: day(1),
        },
      ])
    })

    it('asks the rules over its own baseline: what was not left out and lies beyond is a signal', async () => {
      await measureLots(works, [...calmTenths(20), 2560])
      expect(await freezeLimits(works.quality, freezing(), day(30))).toMatchObject({ signalsRaised: 1 })
      expect(await signals()).toMatchObject([
        { rule: 'beyond-the-limits', side: 'above', state: 'open', lot: { code: 'L-21' } },
      ])
    })

    it('supersedes the set before it, and only the one that was looked at', async () => {
      await measureLots(works, calmTenths(20))
      await freezeLimits(works.quality, freezing(), day(30))
      expect(await refusalOf(freezeLimits(works.quality, freezing()))).toMatchObject({
        code: 'conflict',
        where: 'supersedes',
      })
      await measureLots(works, calmTenths(20), 40)
      await freezeLimits(works.quality, freezing({ supersedes: 1, firstLotCode: 'L-40' }), day(70))
      const { limitSets, chart } = await getDrift(works.quality, 'L254')
      expect(limitSets.map((one) => [one.number, one.supersededAt])).toEqual([
        [1, day(70)],
        [2, undefined],
      ])
      // The second set holds for lots made after its baseline.
      expect(chart.staves[0]?.limitSets.map((one) => [one.number, one.fromIndex, one.toIndex])).toEqual([
        [1, 0, 39],
      ])
    })

    it('is for quality, and names lots that are not on the chart', async () => {
      await measureLots(works, calmTenths(20))
      expect(await refusalOf(freezeLimits(works.bench, freezing()))).toMatchObject({ code: 'not-permitted' })
      expect(await refusalOf(freezeLimits(works.quality, freezing({ firstLotCode: 'L-99' })))).toMatchObject({
        code: 'not-found',
        where: 'firstLotCode',
      })
    })

    it('marks decisions that rested on the set it replaces', async () => {
      await measureLots(works, calmTenths(20))
      await freezeLimits(works.quality, freezing(), day(30))
      await measureLots(works, calmTenths(20), 40)
      await decideLot(works.quality, 'L-50', { verb: 'release', reason: 'Good.', lotVersion: 2, answers: [] })
      await decideLot(works.quality, 'L-2', { verb: 'release', reason: 'Good.', lotVersion: 2, answers: [] })
      await freezeLimits(works.quality, freezing({ supersedes: 1, effectiveFrom: day(45) }), day(70))
      expect((await getLot(works.quality, 'L-50')).lot.evidenceChanged).toBe(true)
      expect((await getLot(works.quality, 'L-2')).lot.evidenceChanged).toBe(false)
    })
  })

  describe('signals', () => {
    beforeEach(async () => {
      await measureLots(works, calmTenths(20))
      await freezeLimits(works.quality, freezing(), day(30))
    })

    it('are raised once, by the lot that completes the pattern', async () => {
      await measureLot(works, 'L-31', 31, 2560)
      const once = await signals()
      expect(once).toMatchObject([{ rule: 'beyond-the-limits', lot: { code: 'L-31' }, state: 'open' }])
      await measureLot(works, 'L-32', 32, 2540)
      expect(await signals()).toEqual(once)
    })

    it('of a run grow with it', async () => {
      await measureLots(works, Array(9).fill(2542), 31)
      expect(await signals()).toMatchObject([{ rule: 'nine-on-one-side', lot: { code: 'L-39' } }])
      await measureLot(works, 'L-40', 40, 2542)
      const [run, ...others] = await signals()
      expect(others).toEqual([])
      expect(JSON.parse(run?.members ?? '[]')).toHaveLength(10)
    })

    it('are raised once when several lots are measured at the same moment', async () => {
      for (let index = 31; index <= 36; index += 1) await openSteelLot(works.bench, `L-${index}`, index)
      await Promise.all(
        Array.from({ length: 6 }, (_, index) =>
          recordSpecimens(works.bench, requestOf(`L-${31 + index}`, fiveAbout(2542 + index))),
        ),
      )
      const found = await signals()
      const keys = found.map((one) => [one.rule, one.side, one.limitSetId, one.lotId].join(' '))
      expect(new Set(keys).size).toBe(keys.length)
    })

    it('must be answered before a release, and an answer is given once', async () => {
      await measureLot(works, 'L-31', 31, 2553)
      const release = { verb: 'release', reason: 'Conforms.', lotVersion: 2, answers: [] } as const
      const refused = await refusalOf(decideLot(works.quality, 'L-31', { ...release, answers: [] }))
      expect(refused).toMatchObject({ code: 'not-ready', where: 'signals' })
      const [signal] = await listSignals(works.quality)
      if (!signal) throw new Error('no signal')
      expect(signal.sentence).toMatch(/^Diameter: L-31 is beyond the upper limit, \+1\.\d\d.µm/)
      const answer = { cause: 'Die 7 worn', answer: 'Die comes out now.', version: signal.version }
      expect(await refusalOf(answerSignal(works.bench, signal.id, answer))).toMatchObject({
        code: 'not-permitted',
      })
      await answerSignal(works.quality, signal.id, answer, day(32))
      expect(await refusalOf(answerSignal(works.quality, signal.id, answer))).toMatchObject({
        code: 'already-decided',
        message: expect.stringContaining('M. Orrin'),
      })
      const { signals: [shown] = [] } = await getLot(works.quality, 'L-31')
      expect(shown).toMatchObject({ state: 'answered', answeredBy: 'M. Orrin', cause: 'Die 7 worn' })
      // The mean is inside its tolerance, so only the signal stood in the way.
      expect(await decideLot(works.quality, 'L-31', { ...release, answers: [] })).toMatchObject({
        state: 'released',
      })
    })

    it('hold a lot without an answer', async () => {
      await measureLot(works, 'L-31', 31, 2560)
      expect(
        await decideLot(works.quality, 'L-31', {
          verb: 'hold',
          reason: 'Signal not understood yet.',
          lotVersion: 2,
          answers: [],
        }),
      ).toMatchObject({ state: 'held' })
    })

    it('are asked again behind a late lot: an answered one stays and says that it no longer holds', async () => {
      await measureLots(works, Array(9).fill(2542), 31)
      const [run] = await listSignals(works.quality)
      if (!run) throw new Error('no signal')
      await answerSignal(works.quality, run.id, {
        cause: 'New coil',
        answer: 'Nothing to do.',
        version: run.version,
      })
      await openSteelLot(works.bench, 'L-34b', 34.5)
      await recordSpecimens(works.bench, requestOf('L-34b', fiveAbout(2537)))
      const after = await signals()
      expect(after).toMatchObject([
        { id: run.id, state: 'no-longer-holds', evidenceChanged: true, cause: 'New coil' },
      ])
    })

    it('no longer hold when a correction takes their cause away', async () => {
      await openSteelLot(works.bench, 'L-31', 31)
      const request = requestOf('L-31', fiveAbout(2560))
      await recordSpecimens(works.bench, request, day(31))
      expect(await signals()).toMatchObject([{ state: 'open' }])
      for (const { reading } of request.entries)
        await supersedeReading(works.bench, {
          requestId: randomUUID(),
          supersedes: reading.clientId,
          reading: {
            clientId: randomUUID(),
            kind: 'section',
            sheet: thick('0.2540'),
            equipment: { micrometer: 'M-14' },
          },
          reason: 'Zero of the micrometer was off.',
        })
      expect(await signals()).toMatchObject([{ state: 'no-longer-holds', evidenceChanged: false }])
    })
  })

  describe('getDrift', () => {
    it('draws an empty chart before there is a lot', async () => {
      const { chart, signals: none } = await getDrift(works.quality, 'L254')
      expect(chart.lots).toEqual([])
      expect(chart.staves.map((one) => one.values)).toEqual([[], [], [], []])
      expect(none).toEqual([])
    })

    it('shows lots in chart order, bar lines where the die changed, tolerances of the revision', async () => {
      await openSteelLot(works.bench, 'L-2', 2, 'D-8')
      await recordSpecimens(works.bench, requestOf('L-2', fiveAbout(2541)))
      await openSteelLot(works.bench, 'L-1', 1, 'D-7')
      await recordSpecimens(works.bench, requestOf('L-1', fiveAbout(2540)))
      await openSteelLot(works.bench, 'L-3', 3, 'D-8')
      const { chart } = await getDrift(works.bench, 'L254')
      expect(chart.lots.map((one) => one.code)).toEqual(['L-1', 'L-2'])
      expect(chart.barLines).toMatchObject([{ atIndex: 1, kind: 'die', reason: 'Die 8 in' }])
      const [diameter, , closure, spread] = chart.staves
      expect(diameter?.unitLabel).toBe('µm, lot means')
      expect(diameter?.values[0]).toBeCloseTo(254, 3)
      expect(diameter?.tolerance).toMatchObject({ label: 'specification revision 1' })
      expect(closure?.signed).toBe(true)
      expect(spread?.oneSided).toBe(true)
      expect(spread?.values[0]).toBe(0)
    })

    it('is not for sales', async () => {
      expect(await refusalOf(getDrift(works.sales, 'L254'))).toMatchObject({ code: 'not-permitted' })
    })
  })
})
