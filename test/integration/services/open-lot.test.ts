import { randomUUID } from 'node:crypto'
import { beforeAll, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { insertSpecification } from '@/lib/data/specifications'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { metres } from '@/lib/domain/units/quantity'
import { getLot } from '@/lib/services/get-lot'
import { listLots } from '@/lib/services/list-lots'
import { openLot } from '@/lib/services/open-lot'
import { refusalOf } from '../../support/refusal-of'
import { steelContext } from '../../support/steel-context'
import { day, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

describeOnEachEngine('openLot', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await database().write(async (tx) => {
      const product = await tx.product.findUniqueOrThrow({ where: { code: 'L254' } })
      const material = await tx.material.findUniqueOrThrow({ where: { code: 'STEEL' } })
      const { specification } = steelContext()
      const body = canonicalJson({ ...specification, ovalityMax: metres(1e-6) })
      await insertSpecification(tx, {
        productId: product.id,
        number: 2,
        effectiveFrom: day(10),
        materialId: material.id,
        body,
        hash: sha256(body),
        note: 'Rounder from now on.',
        issuedAt: day(9),
        issuedById: works.quality.personId,
      })
    })
  })

  const lot = (code: string, madeAt = day(5)) => ({ code, productCode: 'L254', madeAt, setting: '' })

  it('fixes the specification revision in force when the lot was made', async () => {
    expect(await openLot(works.bench, lot('O-1', day(9)))).toMatchObject({ revision: 1 })
    expect(await openLot(works.bench, lot('O-2', day(10)))).toMatchObject({ revision: 2 })
  })

  it('takes the revision on the traveller where one is named', async () => {
    expect(await openLot(works.bench, { ...lot('O-3', day(12)), revision: 1 })).toMatchObject({ revision: 1 })
    expect(await refusalOf(openLot(works.bench, { ...lot('O-4'), revision: 7 }))).toMatchObject({
      code: 'not-found',
      where: 'revision',
    })
  })

  it('refuses a lot made before there was a specification', async () => {
    expect(await refusalOf(openLot(works.bench, lot('O-5', day(-40))))).toMatchObject({ code: 'not-ready' })
  })

  it('opens a code once', async () => {
    await openLot(works.bench, lot('O-6'))
    expect(await refusalOf(openLot(works.bench, lot('O-6')))).toMatchObject({
      code: 'conflict',
      where: 'code',
    })
  })

  it('answers as before when the same request comes again', async () => {
    const input = { ...lot('O-7'), requestId: randomUUID() }
    const first = await openLot(works.bench, input)
    expect(await openLot(works.bench, input)).toEqual(first)
    const entries = await database().read.ledgerEntry.count({ where: { subject: 'lot O-7' } })
    expect(entries).toBe(1)
  })

  it('lets one of two people open a code at the same moment', async () => {
    const outcomes = await Promise.allSettled([
      openLot(works.bench, lot('O-8')),
      openLot(works.otherBench, lot('O-8')),
    ])
    expect(outcomes.map((one) => one.status).sort()).toEqual(['fulfilled', 'rejected'])
    const lost = outcomes.find((one) => one.status === 'rejected')
    expect(lost).toMatchObject({ reason: { problem: { code: 'conflict' } } })
  })

  it('refuses machines, dies and products that are not there, and a day to come', async () => {
    expect(await refusalOf(openLot(works.bench, { ...lot('O-9'), machineCode: 'DM-9' }))).toMatchObject({
      where: 'machineCode',
    })
    expect(await refusalOf(openLot(works.bench, { ...lot('O-9'), dieCode: 'D-99' }))).toMatchObject({
      where: 'dieCode',
    })
    expect(await refusalOf(openLot(works.bench, { ...lot('O-9'), productCode: 'X' }))).toMatchObject({
      where: 'productCode',
    })
    expect(await refusalOf(openLot(works.bench, lot('O-9', Date.now() + 3 * 86_400_000)))).toMatchObject({
      where: 'madeAt',
    })
  })

  it('is for those who measure', async () => {
    expect(await refusalOf(openLot(works.sales, lot('O-10')))).toMatchObject({ code: 'not-permitted' })
  })

  it('shows a lot that has no specimen yet, and lists it newest first', async () => {
    await openLot(works.bench, { ...lot('O-11', day(30)), machineCode: 'DM-1', dieCode: 'D-7' })
    const view = await getLot(works.bench, 'O-11')
    expect(view).toMatchObject({
      lot: { state: 'measuring', version: 1, madeBy: 'T. Aldous', die: { name: 'Die 7' } },
      specification: { number: 2 },
      specimens: [],
      signals: [],
      dispositions: [],
    })
    expect(view.assessment.proposal.verb).toBeUndefined()
    const { lots, count } = await listLots(works.bench, { search: '', page: 1 })
    expect(lots[0]).toMatchObject({ code: 'O-11', specimens: 0, openSignals: 0 })
    expect(lots).toHaveLength(count)
  })
})
