import type { Tx } from './database'

/** What waits for someone, for the rail. */
export const countLotsInState = (tx: Tx, state: string): Promise<number> => tx.lot.count({ where: { state } })

export const countOpenSignals = (tx: Tx): Promise<number> => tx.signal.count({ where: { state: 'open' } })

export const countGaugesDueBefore = (tx: Tx, at: number): Promise<number> =>
  tx.gauge.count({ where: { active: true, calibrationDueAt: { lt: new Date(at) } } })
