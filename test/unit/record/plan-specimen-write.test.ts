import { describe, expect, it } from 'vitest'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import { contextFor } from '@/lib/domain/record/evaluation-facts'
import { planSpecimenWrite } from '@/lib/domain/record/plan-specimen-write'
import { resultRow, resultsOf } from '@/lib/domain/record/result-row'
import { deepFreeze } from '../../support/deep-freeze'
import { randomSheet } from '../../support/random-sheets'
import { seededUniform } from '../../support/seeded-random'
import { diameterAt, steelEquipment, steelSheet, typedHertz, typedMass } from '../../support/sheets'
import {
  diameterChart,
  entryOf,
  lotState,
  planned,
  sha256,
  steelFacts,
  stored,
} from '../../support/write-states'

const five = [1, 2, 3, 4, 5].map((number) => entryOf(number))

/** Sheets whose diameters all read this. */
const thick = (typed: string) => ({
  diameters: [1, 2, 3].flatMap((position) => [
    diameterAt(position, 'a', typed),
    diameterAt(position, 'b', typed),
  ]),
})

const fiveOf = (typed: string) => [1, 2, 3, 4, 5].map((number) => entryOf(number, thick(typed)))

describe('planSpecimenWrite: a first entry', () => {
  const plan = planned(lotState(), [entryOf(1)])

  it('writes specimen, reading, snapshot, evaluation and summaries', () => {
    expect(plan.specimens).toEqual([
      { clientId: 's1', lotId: 354, number: 1, takenAt: 'head', createdAt: 5000 },
    ])
    expect(plan.readings).toMatchObject([
      {
        clientId: 'r1',
        specimenClientId: 's1',
        kind: 'sheet',
        personId: 3,
        measuredAt: 1000,
        recordedAt: 5000,
      },
    ])
    expect(plan.evaluations).toMatchObject([{ specimenClientId: 's1', number: 1, cause: 'first', at: 5000 }])
    expect(plan.snapshots).toHaveLength(1)
    expect(plan.summaries.map((one) => one.characteristic)).toContain('closure')
    expect(plan.summaries.every((one) => one.n === 1)).toBe(true)
  })

  it('keeps the reading as canonical JSON with its hash', () => {
    const [reading] = plan.readings
    expect(JSON.parse(reading?.body ?? '')).toEqual({ format: 1, values: steelSheet() })
    expect(reading?.hash).toBe(sha256(reading?.body ?? ''))
  })

  it('leaves a lot measuring while its plan is incomplete', () => {
    expect(plan.lot).toEqual({
      id: 354,
      state: 'measuring',
      evidenceChanged: false,
      version: 2,
      measuredAt: 1000,
    })
  })

  it('drafts one ledger entry that names every reading by its hash', () => {
    expect(plan.ledger).toMatchObject({
      verb: 'record-specimens',
      subject: 'lot LA-354',
      personId: 3,
      at: 5000,
    })
    expect(plan.ledger?.body).toMatchObject({
      specimens: [{ number: 1, reading: 'r1', hash: plan.readings[0]?.hash }],
    })
  })

  it('snapshots only what the specimen rests on', () => {
    const body = JSON.parse(plan.snapshots[0]?.body ?? '')
    expect(body.weights.map((one: { code: string }) => one.code)).toEqual(['H-01', 'W-02', 'W-05'])
    expect(body.rig.code).toBe('RIG-2')
  })
})

describe('planSpecimenWrite: several entries', () => {
  it('brings a lot up for decision when its plan is complete', () => {
    const plan = planned(lotState(), five)
    expect(plan.lot.state).toBe('to-decide')
    expect(plan.summaries.every((one) => one.n === 5)).toBe(true)
    // Equal equipment is one snapshot, however many specimens.
    expect(plan.snapshots).toHaveLength(1)
  })

  it('gives the same summaries one by one as all at once, to the last bit', () => {
    const values = ['0.2540', '0.2543', '0.2539', '0.2541', '0.2544']
    const entries = values.map((typed, index) => entryOf(index + 1, thick(typed)))
    const whole = planned(lotState(), entries)
    let step = lotState()
    let summaries: typeof whole.summaries = []
    for (const entry of [...entries].reverse()) {
      const plan = planned(step, [entry])
      step = stored(step, [entry], plan)
      summaries = plan.summaries
    }
    expect(summaries).toEqual(whole.summaries)
  })

  it('stores nothing of a request when one entry is refused, and names every refusal', () => {
    const first = planned(lotState(), [entryOf(1), entryOf(2)])
    const state = stored(lotState(), [entryOf(1), entryOf(2)], first)
    const again = planSpecimenWrite(
      state,
      [
        entryOf(1, { cutMass: typedMass('210.1') }, { clientId: 'r1b' }),
        entryOf(2, { cutMass: typedMass('201.1') }, { clientId: 'r2b' }),
        entryOf(3),
      ],
      { personId: 4 },
      6000,
      sha256,
    )
    expect(again.ok).toBe(false)
    if (!again.ok)
      expect(again.problems.map((one) => [one.code, one.message.includes('199.1 mg')])).toEqual([
        ['conflict', true],
        ['conflict', true],
      ])
  })

  it('takes equal content as already there and writes no row for it', () => {
    const state = stored(lotState(), [entryOf(1)], planned(lotState(), [entryOf(1)]))
    const plan = planned(state, [entryOf(1, {}, { clientId: 'r1b' })])
    expect(plan.alreadyThere).toEqual([1])
    expect([plan.readings, plan.evaluations, plan.ledger]).toEqual([[], [], undefined])
  })

  it('changes nothing that it was given', () => {
    const state = deepFreeze(lotState({ charts: [diameterChart([254e-6, 254e-6])] }))
    expect(() => planned(state, deepFreeze([...five]))).not.toThrow()
  })
})

describe('planSpecimenWrite: two people at one specimen', () => {
  const section = entryOf(1, {}, { values: { diameters: steelSheet().diameters }, clientId: 'a' })
  const { diameters: _, ...others } = steelSheet()
  const rest = entryOf(1, {}, { values: others, clientId: 'b' })

  it('merges their readings into one sheet and evaluates it as a whole', () => {
    const state = stored(lotState(), [section], planned(lotState(), [section]))
    const plan = planned(state, [{ ...rest, specimen: { clientId: 'other', number: 1 } }])
    expect(plan.specimens).toEqual([])
    expect(plan.readings).toMatchObject([{ specimenClientId: 's1', clientId: 'b' }])
    expect(plan.evaluations).toMatchObject([{ number: 2, cause: 'superseded' }])
    const whole = planned(lotState(), [entryOf(1)])
    expect(plan.evaluations[0]?.result).toEqual(whole.evaluations[0]?.result)
  })
})

describe('planSpecimenWrite: corrections', () => {
  const before = planned(lotState(), five)
  const state = stored(lotState(), five, before)
  const correction = entryOf(
    2,
    {},
    {
      clientId: 'r2b',
      kind: 'weighing',
      values: { weighedState: 'slack', cutMass: typedMass('201.1'), cutLength: steelSheet().cutLength },
      supersedes: 'r2',
      reason: 'Two digits were swapped.',
    },
  )

  it('adds a reading and a further evaluation, and replaces the summary', () => {
    const plan = planned(state, [correction])
    expect(plan.readings).toMatchObject([{ supersedes: 'r2', reason: 'Two digits were swapped.' }])
    expect(plan.evaluations).toMatchObject([{ number: 2, cause: 'superseded' }])
    const mass = plan.summaries.find((one) => one.characteristic === 'massPerMetreWeighed')
    const old = before.summaries.find((one) => one.characteristic === 'massPerMetreWeighed')
    expect(mass?.max).toBeGreaterThan(old?.max ?? 0)
  })

  it('judges with the equipment as it was known when it was used', () => {
    const facts = steelFacts()
    const later = { ...facts, gauges: facts.gauges.map((one) => ({ ...one, error: one.error + 1e-6 })) }
    const plan = planned({ ...state, facts: later }, [correction])
    expect(plan.snapshots[0]?.hash).toBe(before.snapshots[0]?.hash)
  })

  it('takes new equipment as it is known now', () => {
    const facts = steelFacts()
    const [micrometer] = facts.gauges
    const other = { ...facts, gauges: [...facts.gauges, { ...micrometer, code: 'B-09', uAbsolute: 2e-7 }] }
    const plan = planned({ ...state, facts: other as typeof facts }, [
      { ...correction, reading: { ...correction.reading, equipment: { balance: 'B-09', rule: 'R-01' } } },
    ])
    expect(JSON.parse(plan.snapshots[0]?.body ?? '')).toMatchObject({
      balance: { code: 'B-09' },
      micrometer: { code: 'M-14' },
    })
  })

  it('refuses a second correction of the same reading', () => {
    const once = stored(state, [correction], planned(state, [correction]))
    const twice = planSpecimenWrite(
      once,
      [{ ...correction, reading: { ...correction.reading, clientId: 'r2c' } }],
      { personId: 9 },
      7000,
      sha256,
    )
    expect(twice).toMatchObject({
      ok: false,
      problems: [{ code: 'conflict', details: { newerReading: 'r2b' } }],
    })
  })

  it('refuses a correction of a reading that is not there', () => {
    const plan = planSpecimenWrite(
      state,
      [{ ...correction, reading: { ...correction.reading, supersedes: 'nowhere' } }],
      { personId: 9 },
      7000,
      sha256,
    )
    expect(plan).toMatchObject({ ok: false, problems: [{ code: 'not-found' }] })
  })

  it('takes a lot back to measuring when a sounding is withdrawn', () => {
    const withdrawn = entryOf(
      3,
      {},
      {
        clientId: 'r3b',
        kind: 'sounding',
        values: { frequencies: [] },
        supersedes: 'r3',
        reason: 'Wrong string.',
      },
    )
    expect(planned(state, [withdrawn]).lot.state).toBe('measuring')
  })

  it('marks what was decided and published on older evidence', () => {
    const decided = {
      ...state,
      lot: { ...state.lot, state: 'released' as const },
      disposition: { id: 31, evidenceChanged: false, decidedAt: 6000 },
      datasheetRevisions: [4, 5],
    }
    const plan = planned(decided, [correction], 7000)
    expect(plan.lot).toMatchObject({ state: 'released', evidenceChanged: true })
    expect(plan.evidenceChanged).toEqual({ dispositions: [31], datasheetRevisions: [4, 5] })
  })

  it('brings a lot back from rework when the plan was measured anew', () => {
    const reworked = {
      ...state,
      lot: { ...state.lot, state: 'rework' as const },
      disposition: { id: 31, evidenceChanged: false, decidedAt: 6000 },
    }
    const anew = [6, 7, 8, 9, 10].map((number) => entryOf(number))
    expect(planned(reworked, anew.slice(0, 4), 7000).lot.state).toBe('rework')
    expect(planned(reworked, anew, 7000).lot.state).toBe('to-decide')
  })
})

describe('planSpecimenWrite: signals', () => {
  const calm = Array.from({ length: 8 }, (_, index) => 254e-6 + (index % 2 === 0 ? 2e-7 : -2e-7))
  const above = Array.from({ length: 8 }, () => 254.2e-6)

  it('raises one that the lot completes, dated by what it rests on', () => {
    const plan = planned(lotState({ charts: [diameterChart(above)] }), fiveOf('0.2544'))
    expect(plan.signals).toMatchObject([
      {
        characteristic: 'diameter',
        statistic: 'mean',
        raised: [
          {
            rule: 'nine-on-one-side',
            side: 'above',
            lotId: 354,
            members: [1, 2, 3, 4, 5, 6, 7, 8, 354],
            raisedAt: 5000,
          },
        ],
      },
    ])
  })

  it('raises none while the lot is still being measured', () => {
    expect(
      planned(lotState({ charts: [diameterChart(calm)] }), fiveOf('0.2580').slice(0, 4)).signals,
    ).toEqual([])
    expect(planned(lotState({ charts: [diameterChart(calm)] }), fiveOf('0.2580')).signals).toMatchObject([
      { raised: [{ rule: 'beyond-the-limits', members: [354] }] },
    ])
  })

  it('judges lots behind a late one anew', () => {
    const late = lotState({ charts: [diameterChart(above)] })
    const plan = planned(
      { ...late, lot: { ...late.lot, madeAt: Date.UTC(2026, 10, 20, 12) } },
      fiveOf('0.2544'),
    )
    expect(plan.signals[0]?.raised).toMatchObject([{ lotId: 8, members: [1, 2, 3, 4, 354, 5, 6, 7, 8] }])
  })

  it('lets a signal no longer hold when a correction takes its lot away', () => {
    const beyond = fiveOf('0.2580')
    const chart = diameterChart(calm)
    const first = planned(lotState({ charts: [chart] }), beyond)
    const [raised] = first.signals[0]?.raised ?? []
    if (!raised) throw new Error('no signal was raised')
    const signal = { ...raised, id: 9, state: 'answered', answered: true, evidenceChanged: false } as const
    let state = stored(lotState({ charts: [{ ...chart, signals: [signal] }] }), beyond, first)
    let last = first
    for (const number of [1, 2, 3, 4, 5]) {
      const entry = entryOf(
        number,
        {},
        {
          clientId: `c${number}`,
          kind: 'section',
          values: thick('0.2541'),
          supersedes: `r${number}`,
          reason: 'Zero of the micrometer.',
        },
      )
      last = planned(state, [entry], 6000 + number)
      state = stored(state, [entry], last)
    }
    expect(last.signals[0]?.changed).toMatchObject([
      { id: 9, state: 'no-longer-holds', evidenceChanged: true },
    ])
  })
})

describe('live and stored results', () => {
  it('are equal to the last bit for 1,000 random specimens', () => {
    const random = seededUniform(254)
    const facts = steelFacts()
    for (let count = 0; count < 1000; count += 1) {
      const sheet = randomSheet(random)
      const live = evaluateSpecimen(sheet, contextFor(facts, { sheet, equipment: steelEquipment }))
      const entry = entryOf(1, {}, { values: sheet })
      const [evaluation] = planned(lotState(), [entry]).evaluations
      const body = JSON.parse(JSON.stringify(evaluation?.result))
      expect(body).toStrictEqual(resultRow(live.results))
      expect(resultsOf(body)).toStrictEqual(live.results)
    }
  })

  it('differ when one typed digit differs', () => {
    const one = planned(lotState(), [entryOf(1)]).evaluations[0]
    const other = planned(lotState(), [entryOf(1, { frequencies: [typedHertz('331.1')] })]).evaluations[0]
    expect(other?.result).not.toEqual(one?.result)
    expect(other?.inputHash).not.toBe(one?.inputHash)
  })
})
