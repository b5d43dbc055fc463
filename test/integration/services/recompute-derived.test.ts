import { randomUUID } from 'node:crypto'
import { beforeAll, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { answerSignal } from '@/lib/services/answer-signal'
import { decideLot } from '@/lib/services/decide-lot'
import { freezeLimits } from '@/lib/services/freeze-limits'
import { getLot } from '@/lib/services/get-lot'
import { listSignals } from '@/lib/services/list-signals'
import { recomputeDerived } from '@/lib/services/recompute-derived'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { supersedeReading } from '@/lib/services/supersede-reading'
import { deleteDerivedRows, derivedRows } from '../../support/derived-rows'
import { dropGuards, onRawConnection } from '../../support/raw-connection'
import { refusalOf } from '../../support/refusal-of'
import { steelSheet, typedMass } from '../../support/sheets'
import { calmTenths, measureLots } from '../../support/steel-lots'
import {
  day,
  fiveAbout,
  openSteelLot,
  requestOf,
  type SteelWorks,
  setUpSteelWorks,
} from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

/** A short life of a works: limits, a run, a signal answered, one that no longer holds, corrections, decisions. */
async function live(works: SteelWorks): Promise<void> {
  await measureLots(works, calmTenths(21))
  for (const [characteristic, statistic] of [
    ['diameter', 'mean'],
    ['effectiveDensity', 'mean'],
  ] as const)
    await freezeLimits(
      works.quality,
      {
        productCode: 'L254',
        characteristic,
        statistic,
        leftOut: [{ lotCode: 'L-7', reason: 'Zero was off.' }],
        reason: '',
        supersedes: 0,
      },
      day(25),
    )
  await measureLots(works, [2560, ...Array(9).fill(2542)], 31)
  const [first] = await listSignals(works.quality)
  if (!first) throw new Error('no signal')
  await answerSignal(
    works.quality,
    first.id,
    { cause: 'Die 7 worn', answer: 'Changed.', version: first.version },
    day(41),
  )
  await openSteelLot(works.bench, 'L-50', 50)
  const request = requestOf('L-50', fiveAbout(2562))
  await recordSpecimens(works.bench, request, day(51))
  for (const { reading } of request.entries)
    await supersedeReading(
      works.bench,
      {
        requestId: randomUUID(),
        supersedes: reading.clientId,
        reading: {
          clientId: randomUUID(),
          kind: 'section',
          sheet: { diameters: steelSheet().diameters },
          equipment: { micrometer: 'M-14' },
        },
        reason: 'Zero of the micrometer was off.',
      },
      day(52),
    )
  // A late lot in the middle of the run, and one that is still being measured.
  await openSteelLot(works.bench, 'L-35b', 35.5)
  await recordSpecimens(works.bench, requestOf('L-35b', fiveAbout(2541)), day(53))
  await openSteelLot(works.bench, 'L-54', 54)
  await recordSpecimens(works.bench, requestOf('L-54', [{ cutMass: typedMass('199.4') }]), day(54))
  await openSteelLot(works.bench, 'L-55', 55)
  await recordSpecimens(works.bench, requestOf('L-55', fiveAbout(2570).slice(0, 2)), day(55))
  await decideLot(
    works.quality,
    'L-55',
    { verb: 'scrap', reason: 'Far off.', lotVersion: 2, answers: [] },
    day(56),
  )
}

describeOnEachEngine('recomputeDerived', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await live(works)
  })

  it('changes nothing on a whole database, and says in the ledger that it was done', async () => {
    const before = await derivedRows()
    // The life above has to hold everything that is derived, or the comparison says little.
    expect(before.signals.map((one) => one.state).sort()).toEqual(
      expect.arrayContaining(['answered', 'no-longer-holds', 'open']),
    )
    const outcome = await recomputeDerived(works.administrator)
    expect(outcome).toMatchObject({ restored: 0, differing: [], signalsRaised: 0, signalsChanged: 0 })
    expect(outcome.evaluations).toBe(before.results.length)
    expect(await derivedRows()).toStrictEqual(before)
    const last = await database().read.ledgerEntry.findFirst({ orderBy: { sequence: 'desc' } })
    expect(last?.verb).toBe('recompute-derived')
  })

  it('gives the same database back when every derived row is deleted', async () => {
    const before = await derivedRows()
    await deleteDerivedRows()
    expect((await derivedRows()).results).toEqual([])
    const outcome = await recomputeDerived(works.administrator)
    expect(outcome.restored).toBe(before.results.length)
    expect(outcome.signalsRaised).toBe(before.signals.filter((one) => one.state === 'open').length)
    expect(await derivedRows()).toStrictEqual(before)
  })

  it('finds a result that was forged', async () => {
    await dropGuards('SpecimenResult')
    const lot = await getLot(works.quality, 'L-3')
    expect(lot.specimens.map((one) => one.evaluation?.verified)).toEqual([true, true, true, true, true])
    await onRawConnection((run) =>
      run(`update "SpecimenResult" set "diameter" = "diameter" * 1.0000000001 where "evaluationId" =
        (select "currentEvaluationId" from "Specimen" s join "Lot" l on l."id" = s."lotId"
         where l."code" = 'L-3' and s."number" = 2)`),
    )
    const outcome = await recomputeDerived(works.administrator)
    expect(outcome.differing).toEqual(['L-3, specimen 2, evaluation 1'])
    const forged = await getLot(works.quality, 'L-3')
    expect(forged.specimens.map((one) => one.evaluation?.verified)).toEqual([true, false, true, true, true])
  })

  it('is for administrators', async () => {
    expect(await refusalOf(recomputeDerived(works.quality))).toMatchObject({ code: 'not-permitted' })
  })
})
