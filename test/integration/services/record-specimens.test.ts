import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import { resultRow } from '@/lib/domain/record/result-row'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { supersedeReading } from '@/lib/services/supersede-reading'
import { randomSheet } from '../../support/random-sheets'
import { refusalOf } from '../../support/refusal-of'
import { seededUniform } from '../../support/seeded-random'
import { steelEquipment, steelSheet, typedMass } from '../../support/sheets'
import {
  openSteelLot,
  requestOf,
  type SteelWorks,
  setUpSteelWorks,
  worksContext,
} from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const countReadings = (lotCode: string) =>
  database().read.reading.count({ where: { specimen: { lot: { code: lotCode } } } })

describeOnEachEngine('recordSpecimens', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
  })

  it('stores a lot and brings it up for decision', async () => {
    await openSteelLot(works.bench, 'LA-1', 1)
    const reply = await recordSpecimens(works.bench, requestOf('LA-1', [{}, {}, {}, {}, {}]))
    expect(reply).toMatchObject({ lotCode: 'LA-1', lotState: 'to-decide', lotVersion: 2 })
    expect(reply.specimens.map((one) => one.outcome)).toEqual(Array(5).fill('stored'))
    const summaries = await database().read.lotSummary.findMany({ where: { lot: { code: 'LA-1' } } })
    expect(summaries).toHaveLength(10)
    expect(summaries.every((one) => one.n === 5)).toBe(true)
    const entries = await database().read.ledgerEntry.findMany({ where: { subject: 'lot LA-1' } })
    expect(entries.map((one) => one.verb)).toEqual(['open-lot', 'record-specimens'])
  })

  it('stores what the bench computes live, to the last bit', async () => {
    await openSteelLot(works.bench, 'LA-2', 2)
    const random = seededUniform(2026)
    const sheets = Array.from({ length: 60 }, () => randomSheet(random))
    await recordSpecimens(works.bench, requestOf('LA-2', sheets))
    const stored = await database().read.specimen.findMany({
      where: { lot: { code: 'LA-2' } },
      orderBy: { number: 'asc' },
      select: { evaluations: { select: { result: { omit: { evaluationId: true } } } } },
    })
    const live = sheets.map((sheet) => resultRow(evaluateSpecimen(sheet, worksContext()).results))
    expect(stored.map((one) => one.evaluations[0]?.result)).toStrictEqual(live)
  })

  describe('sent again', () => {
    it('answers as before and stores nothing a second time', async () => {
      await openSteelLot(works.bench, 'LA-3', 3)
      const request = requestOf('LA-3', [{}])
      const first = await recordSpecimens(works.bench, request)
      const entries = await database().read.ledgerEntry.count()
      const again = await recordSpecimens(works.bench, JSON.parse(JSON.stringify(request)))
      expect(again).toEqual(first)
      expect(await countReadings('LA-3')).toBe(1)
      expect(await database().read.ledgerEntry.count()).toBe(entries)
    })

    it('stores once when it arrives many times at the same moment', async () => {
      await openSteelLot(works.bench, 'LA-4', 4)
      const request = requestOf('LA-4', [{}, {}])
      const replies = await Promise.all(
        Array.from({ length: 8 }, () => recordSpecimens(works.bench, request)),
      )
      expect(new Set(replies.map((one) => JSON.stringify(one))).size).toBe(1)
      expect(await countReadings('LA-4')).toBe(2)
    })

    it('is refused with other content under the same id', async () => {
      await openSteelLot(works.bench, 'LA-5', 5)
      const request = requestOf('LA-5', [{}])
      await recordSpecimens(works.bench, request)
      const other = { ...requestOf('LA-5', [{ cutMass: typedMass('201.0') }]), requestId: request.requestId }
      expect(await refusalOf(recordSpecimens(works.bench, other))).toMatchObject({
        code: 'conflict',
        where: 'requestId',
      })
    })

    it('is refused under the same id from another person', async () => {
      await openSteelLot(works.bench, 'LA-6', 6)
      const request = requestOf('LA-6', [{}])
      await recordSpecimens(works.bench, request)
      expect(await refusalOf(recordSpecimens(works.otherBench, request))).toMatchObject({ code: 'conflict' })
    })
  })

  describe('two people at one specimen', () => {
    it('merge different readings', async () => {
      await openSteelLot(works.bench, 'LA-7', 7)
      const { diameters, ...rest } = steelSheet()
      const [first] = requestOf('LA-7', [{}]).entries
      const [second] = requestOf('LA-7', [{}]).entries
      if (!first || !second) throw new Error('no entries')
      const part = (entry: typeof first, sheet: typeof first.reading.sheet) => ({
        requestId: randomUUID(),
        lotCode: 'LA-7',
        entries: [{ ...entry, reading: { ...entry.reading, sheet } }],
      })
      await Promise.all([
        recordSpecimens(works.bench, part(first, { diameters })),
        recordSpecimens(works.otherBench, part(second, rest)),
      ])
      const specimens = await database().read.specimen.findMany({
        where: { lot: { code: 'LA-7' } },
        select: { currentEvaluationId: true, readings: { select: { personId: true } } },
      })
      expect(specimens).toHaveLength(1)
      expect(specimens[0]?.readings.map((one) => one.personId).sort()).toEqual(
        [works.bench.personId, works.otherBench.personId].sort(),
      )
      const result = await database().read.specimenResult.findUnique({
        where: { evaluationId: specimens[0]?.currentEvaluationId ?? 0 },
      })
      expect(result).toMatchObject(resultRow(evaluateSpecimen(steelSheet(), worksContext()).results))
    })

    it('clash on the same reading, told with both values', async () => {
      await openSteelLot(works.bench, 'LA-8', 8)
      await recordSpecimens(works.bench, requestOf('LA-8', [{}]))
      const clash = recordSpecimens(works.otherBench, requestOf('LA-8', [{ cutMass: typedMass('210.1') }]))
      const problem = await refusalOf(clash)
      expect(problem.code).toBe('conflict')
      expect(problem.message).toContain('199.1 mg')
      expect(problem.message).toContain('210.1 mg')
      expect(problem.details).toEqual({ 'cutMass.stored': '199.1 mg', 'cutMass.entered': '210.1 mg' })
      expect(await countReadings('LA-8')).toBe(1)
    })

    it('are told that equal content is there already', async () => {
      await openSteelLot(works.bench, 'LA-9', 9)
      await recordSpecimens(works.bench, requestOf('LA-9', [{}]))
      const reply = await recordSpecimens(works.otherBench, requestOf('LA-9', [{}]))
      expect(reply.specimens).toEqual([{ number: 1, outcome: 'already-there' }])
      expect(await countReadings('LA-9')).toBe(1)
    })

    it('keep all specimens of many requests at once', async () => {
      await openSteelLot(works.bench, 'LA-10', 10)
      const requests = Array.from({ length: 12 }, (_, index) => requestOf('LA-10', [{}], index + 1))
      await Promise.all(
        requests.map((request, index) =>
          recordSpecimens(index % 2 === 0 ? works.bench : works.otherBench, request),
        ),
      )
      expect(await database().read.specimen.count({ where: { lot: { code: 'LA-10' } } })).toBe(12)
      const summary = await database().read.lotSummary.findFirst({
        where: { lot: { code: 'LA-10' }, characteristic: 'diameter' },
      })
      expect(summary?.n).toBe(12)
      const lot = await database().read.lot.findUnique({ where: { code: 'LA-10' } })
      expect(lot?.version).toBe(13)
    })
  })

  describe('refuses', () => {
    it('people without the right, before anything else', async () => {
      expect(await refusalOf(recordSpecimens(works.sales, requestOf('LA-1', [{}])))).toMatchObject({
        code: 'not-permitted',
      })
      expect(await refusalOf(recordSpecimens(undefined, requestOf('LA-1', [{}])))).toMatchObject({
        code: 'not-signed-in',
      })
    })

    it('a lot that is not there', async () => {
      expect(await refusalOf(recordSpecimens(works.bench, requestOf('LA-999', [{}])))).toMatchObject({
        code: 'not-found',
        where: 'lotCode',
      })
    })

    it('equipment that is not registered, or is something else', async () => {
      const withEquipment = (equipment: object) => {
        const request = requestOf('LA-1', [{}], 20)
        const entries = request.entries.map((entry) => ({
          ...entry,
          reading: { ...entry.reading, equipment: { ...steelEquipment, ...equipment } },
        }))
        return recordSpecimens(works.bench, { ...request, entries })
      }
      expect(await refusalOf(withEquipment({ micrometer: 'M-99' }))).toMatchObject({ where: 'micrometer' })
      expect(await refusalOf(withEquipment({ micrometer: 'B-03' }))).toMatchObject({ where: 'micrometer' })
      expect(await refusalOf(withEquipment({ rig: 'RIG-9' }))).toMatchObject({ where: 'rig' })
      const load = { kind: 'weights', hanger: 'H-01', weights: ['W-77'] } as const
      expect(await refusalOf(recordSpecimens(works.bench, requestOf('LA-1', [{ load }], 20)))).toMatchObject({
        where: 'weight',
      })
    })

    it('readings from the future', async () => {
      const request = requestOf('LA-1', [{}], 20)
      const entries = request.entries.map((entry) => ({
        ...entry,
        reading: { ...entry.reading, measuredAt: Date.now() + 3_600_000 },
      }))
      expect(await refusalOf(recordSpecimens(works.bench, { ...request, entries }))).toMatchObject({
        where: 'measuredAt',
      })
    })

    it('and stores nothing of a refused request, good specimens included', async () => {
      await openSteelLot(works.bench, 'LA-11', 11)
      await recordSpecimens(works.bench, requestOf('LA-11', [{}]))
      const request = requestOf('LA-11', [{ cutMass: typedMass('210.1') }, {}])
      await refusalOf(recordSpecimens(works.bench, request))
      expect(await countReadings('LA-11')).toBe(1)
      expect(await database().read.request.count({ where: { clientId: request.requestId } })).toBe(0)
    })
  })
})

describeOnEachEngine('supersedeReading', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
  })

  const recorded = async (code: string, made: number) => {
    await openSteelLot(works.bench, code, made)
    const request = requestOf(code, [{}, {}, {}, {}, {}])
    await recordSpecimens(works.bench, request)
    const readingId = request.entries[1]?.reading.clientId
    if (readingId === undefined) throw new Error('no second specimen')
    return readingId
  }

  const correction = (supersedes: string, mass = '201.1') => ({
    requestId: randomUUID(),
    supersedes,
    reading: {
      clientId: randomUUID(),
      kind: 'weighing' as const,
      sheet: { weighedState: 'slack' as const, cutMass: typedMass(mass), cutLength: steelSheet().cutLength },
      equipment: { balance: 'B-03', rule: 'R-01' },
    },
    reason: 'Two digits were swapped.',
  })

  it('keeps the older reading and evaluates anew', async () => {
    const supersedes = await recorded('LB-1', 1)
    const reply = await supersedeReading(works.bench, correction(supersedes))
    expect(reply).toMatchObject({ lotCode: 'LB-1', specimen: 2, lotState: 'to-decide' })
    const specimen = await database().read.specimen.findFirst({
      where: { lot: { code: 'LB-1' }, number: 2 },
      select: { currentEvaluationId: true, readings: true, evaluations: { orderBy: { number: 'asc' } } },
    })
    expect(specimen?.readings).toHaveLength(2)
    expect(specimen?.evaluations.map((one) => one.cause)).toEqual(['first', 'superseded'])
    expect(specimen?.currentEvaluationId).toBe(specimen?.evaluations[1]?.id)
    const result = await database().read.specimenResult.findUnique({
      where: { evaluationId: specimen?.currentEvaluationId ?? 0 },
      omit: { evaluationId: true },
    })
    const sheet = steelSheet({ cutMass: typedMass('201.1') })
    expect(result).toStrictEqual(resultRow(evaluateSpecimen(sheet, worksContext()).results))
  })

  it('lets one of two corrections at once win, and tells the other', async () => {
    const supersedes = await recorded('LB-2', 2)
    const outcomes = await Promise.allSettled([
      supersedeReading(works.bench, correction(supersedes, '201.1')),
      supersedeReading(works.bench, correction(supersedes, '202.2')),
    ])
    expect(outcomes.map((one) => one.status).sort()).toEqual(['fulfilled', 'rejected'])
    const lost = outcomes.find((one) => one.status === 'rejected')
    expect(lost).toMatchObject({ reason: { problem: { code: 'conflict' } } })
  })

  it('is done once however often it is sent', async () => {
    const supersedes = await recorded('LB-3', 3)
    const input = correction(supersedes)
    const first = await supersedeReading(works.bench, input)
    expect(await supersedeReading(works.bench, input)).toEqual(first)
  })

  it('of another’s reading is for quality', async () => {
    const supersedes = await recorded('LB-4', 4)
    expect(await refusalOf(supersedeReading(works.otherBench, correction(supersedes)))).toMatchObject({
      code: 'not-permitted',
    })
    expect(await supersedeReading(works.quality, correction(supersedes))).toMatchObject({ lotCode: 'LB-4' })
  })
})
