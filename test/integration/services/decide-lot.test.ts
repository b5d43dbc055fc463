import { randomUUID } from 'node:crypto'
import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import type { DecideLotInput } from '@/lib/input/decision'
import { decideLot } from '@/lib/services/decide-lot'
import { getLot } from '@/lib/services/get-lot'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { supersedeReading } from '@/lib/services/supersede-reading'
import { refusalOf } from '../../support/refusal-of'
import { steelSheet, typedHertz, typedMass } from '../../support/sheets'
import { measureLot } from '../../support/steel-lots'
import { openSteelLot, requestOf, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const decision = (change: Partial<DecideLotInput> = {}): DecideLotInput => ({
  verb: 'release',
  reason: 'Conforms on both routes.',
  lotVersion: 2,
  answers: [],
  ...change,
})

describeOnEachEngine('decideLot', () => {
  useFreshDatabase()
  let works: SteelWorks
  let code: string
  let count = 0
  beforeAll(async () => {
    works = await setUpSteelWorks()
  })
  beforeEach(() => {
    count += 1
    code = `LD-${count}`
  })

  it('keeps proposal, evidence and their hash with the decision, and says so in the ledger', async () => {
    await measureLot(works, code, 1, 2540)
    expect(await decideLot(works.quality, code, decision())).toMatchObject({
      verb: 'release',
      number: 1,
      state: 'released',
      lotVersion: 3,
    })
    const kept = await database().read.disposition.findFirst({ where: { lot: { code } } })
    expect(kept?.evidenceHash).toBe(sha256(kept?.evidence ?? ''))
    const view = await getLot(works.quality, code)
    expect(view.dispositions).toMatchObject([
      {
        number: 1,
        verb: 'release',
        decidedBy: 'M. Orrin',
        current: true,
        evidenceChanged: false,
        proposal: { verb: 'release', stops: [] },
        evidence: { lotVersion: 2, specificationRevision: 1 },
      },
    ])
    expect(view.dispositions[0]?.evidence.evaluations).toHaveLength(5)
    expect(view.history.map((one) => one.verb)).toEqual(['open-lot', 'record-specimens', 'decide-release'])
  })

  it('lets one of two browsers win, and tells the other by whom it was decided', async () => {
    await measureLot(works, code, 1, 2540)
    const other = { ...works.quality, personId: works.administrator.personId, name: 'A. Wren' }
    const outcomes = await Promise.allSettled([
      decideLot(works.quality, code, decision()),
      decideLot(other, code, decision({ verb: 'hold', reason: 'Let me look first.' })),
    ])
    const won = outcomes.findIndex((one) => one.status === 'fulfilled')
    const lost = outcomes[1 - won]
    expect(outcomes.map((one) => one.status).sort()).toEqual(['fulfilled', 'rejected'])
    const winner = won === 0 ? { name: 'M. Orrin', verb: 'release' } : { name: 'A. Wren', verb: 'hold' }
    expect(lost).toMatchObject({
      reason: {
        problem: { code: 'already-decided', details: { decidedBy: winner.name, verb: winner.verb } },
      },
    })
    expect(await database().read.disposition.count({ where: { lot: { code } } })).toBe(1)
  })

  it('is about what was seen: a lot that was measured on since is looked at again first', async () => {
    await measureLot(works, code, 1, 2540)
    await recordSpecimens(works.bench, requestOf(code, [{}], 6))
    expect(await refusalOf(decideLot(works.quality, code, decision()))).toMatchObject({ code: 'conflict' })
    expect(await decideLot(works.quality, code, decision({ lotVersion: 3 }))).toMatchObject({
      state: 'released',
    })
  })

  it('is for quality', async () => {
    await measureLot(works, code, 1, 2540)
    for (const actor of [works.bench, works.sales, works.administrator])
      expect(await refusalOf(decideLot(actor, code, decision()))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(decideLot(undefined, code, decision()))).toMatchObject({ code: 'not-signed-in' })
  })

  it('releases an incomplete plan only with an answer to it', async () => {
    await openSteelLot(works.bench, code, 1)
    await recordSpecimens(works.bench, requestOf(code, [{}, {}]))
    const refused = await refusalOf(decideLot(works.quality, code, decision()))
    expect(refused).toMatchObject({ code: 'not-ready', where: 'answers' })
    expect(Object.keys(refused.details ?? {})).toContain('plan-incomplete')
    const answers = Object.keys(refused.details ?? {}).map((stopId) => ({
      stopId,
      answer: 'The coil ended; both specimens are good.',
    }))
    await decideLot(works.quality, code, decision({ answers }))
    const [kept] = (await getLot(works.quality, code)).dispositions
    expect(kept?.answers).toEqual(answers)
  })

  it('releases a lot whose routes disagree only with an answer to it', async () => {
    await openSteelLot(works.bench, code, 1)
    const octave = { frequencies: [typedHertz('165.5')] }
    await recordSpecimens(works.bench, requestOf(code, [{}, {}, {}, {}, octave]))
    const refused = await refusalOf(decideLot(works.quality, code, decision()))
    expect(Object.keys(refused.details ?? {})).toContain('closure-open-5')
  })

  it('holds, reworks and scraps without asking', async () => {
    await openSteelLot(works.bench, code, 1)
    await recordSpecimens(works.bench, requestOf(code, [{}]))
    expect(
      await decideLot(works.quality, code, decision({ verb: 'scrap', reason: 'Kinked all along.' })),
    ).toMatchObject({ state: 'scrapped' })
  })

  describe('afterwards', () => {
    it('a bench can’t add readings to a released lot, quality can, and the decision is marked', async () => {
      await measureLot(works, code, 1, 2540)
      await decideLot(works.quality, code, decision())
      const request = requestOf(code, [{}], 6)
      expect(await refusalOf(recordSpecimens(works.bench, request))).toMatchObject({ code: 'not-permitted' })
      await recordSpecimens(works.quality, requestOf(code, [{}], 6))
      const { lot, dispositions } = await getLot(works.quality, code)
      expect(lot).toMatchObject({ state: 'released', evidenceChanged: true })
      expect(dispositions[0]).toMatchObject({ evidenceChanged: true, current: true })
    })

    it('a correction marks decision and datasheets, and a new decision follows the old one', async () => {
      await openSteelLot(works.bench, code, 1)
      const request = requestOf(code, [{}, {}, {}, {}, {}])
      await recordSpecimens(works.bench, request)
      await decideLot(works.quality, code, decision())
      const revisionId = await publishedOn(code)
      const reply = await supersedeReading(works.quality, {
        requestId: randomUUID(),
        supersedes: request.entries[0]?.reading.clientId ?? '',
        reading: {
          clientId: randomUUID(),
          kind: 'weighing',
          sheet: { cutMass: typedMass('199.5'), cutLength: steelSheet().cutLength },
          equipment: { balance: 'B-03', rule: 'R-01' },
        },
        reason: 'Weighed with the hook on.',
      })
      expect(reply.evidenceChanged).toEqual({ decisions: 1, datasheets: 1 })
      const revision = await database().read.datasheetRevision.findUnique({ where: { id: revisionId } })
      expect(revision?.evidenceChanged).toBe(true)
      await decideLot(works.quality, code, decision({ lotVersion: reply.lotVersion }))
      const { lot, dispositions } = await getLot(works.quality, code)
      expect(lot.evidenceChanged).toBe(false)
      expect(dispositions.map((one) => [one.number, one.current, one.evidenceChanged])).toEqual([
        [2, true, false],
        [1, false, true],
      ])
    })

    it('a lot in rework comes back when its plan was measured anew', async () => {
      await measureLot(works, code, 1, 2540)
      await decideLot(works.quality, code, decision({ verb: 'rework', reason: 'Draw it again.' }))
      const again = await recordSpecimens(works.bench, requestOf(code, [{}, {}, {}, {}], 6))
      expect(again.lotState).toBe('rework')
      const last = await recordSpecimens(works.bench, requestOf(code, [{}], 10))
      expect(last.lotState).toBe('to-decide')
    })
  })

  /** A revision that rests on a lot, stored directly: publishing has its own tests. */
  async function publishedOn(lotCode: string): Promise<number> {
    return database().write(async (tx) => {
      const lot = await tx.lot.findUniqueOrThrow({ where: { code: lotCode } })
      const at = new Date()
      const sheet = await tx.datasheet.create({
        data: { code: `DS-${lotCode}`, productId: lot.productId, createdAt: at },
      })
      const revision = await tx.datasheetRevision.create({
        data: {
          datasheetId: sheet.id,
          number: 1,
          basis: 'unloaded-mass',
          modelVersion: '1',
          body: '{}',
          hash: sha256('{}'),
          ledgerCount: 0,
          ledgerHash: '',
          publishedAt: at,
        },
      })
      await tx.datasheetLot.create({ data: { revisionId: revision.id, lotId: lot.id } })
      return revision.id
    })
  }
})
