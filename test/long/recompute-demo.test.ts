import { beforeAll, describe, expect, it } from 'vitest'
import { recomputeDerived } from '@/lib/services/recompute-derived'
import { foundDemoWorks } from '@/prisma/demo/found-works'
import { measureLot } from '@/prisma/demo/measure-lots'
import { demoSchedule, WIDE_DIE } from '@/prisma/demo/schedule'
import { decideAsQualityWould } from '@/prisma/demo/tell-story'
import { deleteDerivedRows, derivedRows } from '../support/derived-rows'
import { useFreshDatabase } from '../support/template-database'

const whole = Number(process.env.LEDGERLINE_SHARE ?? '1') >= 1

/** Whole: all 740 lots, which takes some minutes. In little: thirty of Larch 279, whose first limits are frozen after twenty-five. */
const lots = demoSchedule().filter(
  (lot) => whole || (lot.micrometres === WIDE_DIE.micrometres && lot.index < 30),
)

describe('the demo works', () => {
  useFreshDatabase()
  let actors: Awaited<ReturnType<typeof foundDemoWorks>>
  beforeAll(async () => {
    actors = await foundDemoWorks((lots[0]?.madeAt ?? 0) - 7 * 86_400_000)
    for (const [index, lot] of lots.entries()) {
      await measureLot(actors[lot.maker], lot, 5)
      if (index < lots.length - 5) await decideAsQualityWould(actors.orrin, lot)
    }
  })

  it(`of ${lots.length} lots is the same after all its results, summaries and open signals were deleted and recomputed`, async () => {
    const before = await derivedRows()
    expect(before.results).toHaveLength(5 * lots.length)
    expect(before.summaries.length).toBeGreaterThan(5 * lots.length)
    await deleteDerivedRows()
    expect((await derivedRows()).summaries).toEqual([])
    const outcome = await recomputeDerived(actors.falk)
    expect(outcome).toMatchObject({ differing: [], restored: before.results.length })
    expect(await derivedRows()).toStrictEqual(before)
  })
})
