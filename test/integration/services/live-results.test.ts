import { beforeAll, expect, it } from 'vitest'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import { getBench } from '@/lib/services/get-bench'
import { getLot } from '@/lib/services/get-lot'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { randomSheet } from '../../support/random-sheets'
import { seededUniform } from '../../support/seeded-random'
import { openSteelLot, requestOf, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

describeOnEachEngine('what the bench shows live', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await openSteelLot(works.bench, 'LL-1', 1)
  })

  it('is what is stored, to the last bit: results, budgets, corrections', async () => {
    const random = seededUniform(31)
    const bench = await getBench(works.bench, 'LL-1')
    // The context reaches the browser as JSON.
    const context = JSON.parse(JSON.stringify(bench.context)) as EvaluationContext
    const sheets = Array.from({ length: 40 }, () => randomSheet(random))
    const live = sheets.map((sheet) => evaluateSpecimen(sheet, context))
    await recordSpecimens(works.bench, JSON.parse(JSON.stringify(requestOf('LL-1', sheets))))
    const { specimens } = await getLot(works.bench, 'LL-1')
    expect(specimens.map((one) => one.evaluation?.verified)).toEqual(Array(40).fill(true))
    for (const [index, stored] of specimens.entries()) {
      expect(stored.results).toStrictEqual(live[index]?.results)
      expect(stored.budgets).toStrictEqual(live[index]?.budgets)
      expect(stored.corrections).toStrictEqual(live[index]?.corrections)
      expect(stored.steps).toStrictEqual(live[index]?.steps)
    }
  })
})
