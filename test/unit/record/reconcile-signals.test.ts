import { describe, expect, it } from 'vitest'
import type { StoredSignal } from '@/lib/domain/record/chart-history'
import { type RaisedSignal, reconcileSignals } from '@/lib/domain/record/reconcile-signals'

const run: RaisedSignal = {
  limitSetId: 5,
  rule: 'nine-on-one-side',
  side: 'above',
  lotId: 9,
  members: [1, 2, 3, 4, 5, 6, 7, 8, 9],
  departure: 1e-7,
  raisedAt: 1000,
}

const kept = (change: Partial<StoredSignal> = {}): StoredSignal => ({
  ...run,
  id: 77,
  state: 'open',
  answered: false,
  evidenceChanged: false,
  ...change,
})

const longer: RaisedSignal = { ...run, members: [...run.members, 10], departure: 1.1e-7, raisedAt: 2000 }

describe('reconcileSignals', () => {
  it('raises what is found for the first time', () => {
    expect(reconcileSignals([run], [])).toEqual({ raised: [run], changed: [] })
  })

  it('raises nothing a second time', () => {
    expect(reconcileSignals([run], [kept()])).toEqual({ raised: [], changed: [] })
  })

  it('takes another rule, side, limit set or completing lot as another signal', () => {
    const others: RaisedSignal[] = [
      { ...run, rule: 'beyond-the-limits' },
      { ...run, side: 'below' },
      { ...run, limitSetId: 6 },
      { ...run, lotId: 10 },
    ]
    expect(reconcileSignals([run, ...others], [kept()]).raised).toEqual(others)
  })

  it('lets an open signal follow its growing pattern', () => {
    expect(reconcileSignals([longer], [kept()]).changed).toEqual([
      {
        id: 77,
        state: 'open',
        evidenceChanged: false,
        members: longer.members,
        departure: longer.departure,
        raisedAt: 2000,
      },
    ])
  })

  it('keeps an answered signal answered while its pattern grows', () => {
    expect(reconcileSignals([longer], [kept({ state: 'answered', answered: true })]).changed).toMatchObject([
      { state: 'answered', evidenceChanged: false, members: longer.members, raisedAt: 1000 },
    ])
  })

  it('marks an answered signal when a lot of its pattern has other results', () => {
    const [change] = reconcileSignals(
      [{ ...run, departure: 2e-7 }],
      [kept({ state: 'answered', answered: true })],
      4,
    ).changed
    expect(change).toMatchObject({ state: 'answered', evidenceChanged: true })
  })

  it('marks an answered signal when a late lot is put into its pattern', () => {
    const late = { ...run, members: [1, 2, 3, 44, 4, 5, 6, 7, 8, 9] }
    const [change] = reconcileSignals([late], [kept({ state: 'answered', answered: true })], 44).changed
    expect(change).toMatchObject({ state: 'answered', evidenceChanged: true })
  })

  it('keeps what is no longer found, and says so', () => {
    expect(reconcileSignals([], [kept()]).changed).toMatchObject([
      { id: 77, state: 'no-longer-holds', evidenceChanged: false, members: run.members },
    ])
    expect(reconcileSignals([], [kept({ state: 'answered', answered: true })]).changed).toMatchObject([
      { id: 77, state: 'no-longer-holds', evidenceChanged: true },
    ])
  })

  it('says it once', () => {
    expect(reconcileSignals([], [kept({ state: 'no-longer-holds' })]).changed).toEqual([])
  })

  it('brings a signal back as it was when it is found again', () => {
    expect(reconcileSignals([run], [kept({ state: 'no-longer-holds' })]).changed).toMatchObject([
      { state: 'open' },
    ])
    expect(
      reconcileSignals([run], [kept({ state: 'no-longer-holds', answered: true, evidenceChanged: true })])
        .changed,
    ).toMatchObject([{ state: 'answered', evidenceChanged: true }])
  })
})
