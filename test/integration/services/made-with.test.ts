import { beforeAll, describe, expect, it } from 'vitest'
import { getDie } from '@/lib/services/get-die'
import { getMachine } from '@/lib/services/get-machine'
import { listDrawn } from '@/lib/services/list-drawn'
import { NEWEST_LOTS } from '@/lib/services/made-with'
import { openLot } from '@/lib/services/open-lot'
import { refusalOf } from '../../support/refusal-of'
import { type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

describeOnEachEngine('what was made', () => {
  useFreshDatabase()
  let works: SteelWorks
  /** The works' clock is one hour before UTC in winter. */
  const made: readonly (readonly [
    code: string,
    madeAt: string,
    lengthMetres: number | undefined,
    die: string,
  ])[] = [
    ['L-1', '2026-01-10T08:00:00Z', 1200, 'D-7'],
    ['L-2', '2026-01-31T22:30:00Z', 800, 'D-7'],
    ['L-3', '2026-01-31T23:30:00Z', 500, 'D-7'],
    ['L-4', '2026-02-03T08:00:00Z', undefined, 'D-7'],
    ['L-5', '2026-02-04T08:00:00Z', 900, 'D-8'],
  ]
  beforeAll(async () => {
    works = await setUpSteelWorks()
    for (const [code, madeAt, lengthMetres, dieCode] of made)
      await openLot(works.bench, {
        code,
        productCode: 'L254',
        madeAt: Date.parse(madeAt),
        machineCode: 'DM-1',
        dieCode,
        lengthMetres,
        setting: '',
      })
  })

  describe('getDie', () => {
    it('sums the metres drawn through it and counts the lots that give none', async () => {
      const { newest, products, row, total } = await getDie(works.bench, 'D-7')
      expect(row).toMatchObject({ code: 'D-7', name: 'Die 7' })
      expect(total).toEqual({
        lots: 4,
        metres: 2500,
        withoutLength: 1,
        firstMadeAt: Date.parse('2026-01-10T08:00:00Z'),
        lastMadeAt: Date.parse('2026-02-03T08:00:00Z'),
      })
      expect(products).toMatchObject([{ code: 'L254', name: 'Larch 254', lots: 4, metres: 2500 }])
      expect(newest.map(({ code }) => code)).toEqual(['L-4', 'L-3', 'L-2', 'L-1'])
    })

    it('divides them by the months of the works’ clock, with what the die had behind it', async () => {
      expect((await getDie(works.bench, 'D-7')).months).toMatchObject([
        { month: '2026-02', lots: 2, metres: 500, withoutLength: 1, metresSoFar: 2500 },
        { month: '2026-01', lots: 2, metres: 2000, withoutLength: 0, metresSoFar: 2000 },
      ])
    })

    it('is for the workshop', async () => {
      expect(await refusalOf(getDie(works.sales, 'D-7'))).toMatchObject({ code: 'not-permitted' })
      expect(await refusalOf(getDie(works.bench, 'D-99'))).toMatchObject({ code: 'not-found' })
    })
  })

  describe('getMachine', () => {
    it('shows its lots over all dies, the newest few by name', async () => {
      const view = await getMachine(works.bench, 'DM-1')
      expect(view.total).toMatchObject({ lots: 5, metres: 3400, withoutLength: 1 })
      expect(view.newest[0]).toMatchObject({ code: 'L-5', productName: 'Larch 254', state: 'measuring' })
      for (let number = 6; number < 6 + NEWEST_LOTS; number += 1)
        await openLot(works.bench, {
          code: `L-${number}`,
          productCode: 'L254',
          madeAt: Date.parse('2026-03-02T08:00:00Z'),
          machineCode: 'DM-1',
          setting: '',
        })
      const grown = await getMachine(works.bench, 'DM-1')
      expect(grown.total.lots).toBe(5 + NEWEST_LOTS)
      expect(grown.newest).toHaveLength(NEWEST_LOTS)
    })

    it('is for the workshop', async () => {
      expect(await refusalOf(getMachine(works.sales, 'DM-1'))).toMatchObject({ code: 'not-permitted' })
      expect(await refusalOf(getMachine(works.bench, 'DM-9'))).toMatchObject({ code: 'not-found' })
    })
  })

  describe('listDrawn', () => {
    it('sums each die as its own page does', async () => {
      const rows = [...(await listDrawn(works.bench)).values()]
      for (const code of ['D-7', 'D-8']) {
        const { row, total } = await getDie(works.bench, code)
        expect(rows.find(({ dieId }) => dieId === row.id)).toEqual({
          dieId: row.id,
          lots: total.lots,
          metres: total.metres,
          withoutLength: total.withoutLength,
        })
      }
      expect(rows).toHaveLength(2)
      expect(await refusalOf(listDrawn(works.sales))).toMatchObject({ code: 'not-permitted' })
    })
  })
})
