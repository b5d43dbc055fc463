import type { Tx } from './database'

export interface AttemptRow {
  readonly key: string
  readonly failures: number
  readonly windowStart: number
  readonly blockedUntil: number | undefined
}

/** The counters under these keys, as far as there are any. */
export const getAttempts = async (tx: Tx, keys: readonly string[]): Promise<readonly AttemptRow[]> => {
  const rows = await tx.signInAttempt.findMany({
    where: { key: { in: [...keys] } },
    select: { key: true, failures: true, windowStart: true, blockedUntil: true },
  })
  return rows.map(({ key, failures, windowStart, blockedUntil }) => ({
    key,
    failures,
    windowStart: windowStart.getTime(),
    blockedUntil: blockedUntil?.getTime(),
  }))
}

export const putAttempt = async (
  tx: Tx,
  { key, failures, windowStart, blockedUntil }: AttemptRow,
): Promise<void> => {
  const values = {
    failures,
    windowStart: new Date(windowStart),
    blockedUntil: blockedUntil === undefined ? null : new Date(blockedUntil),
  }
  await tx.signInAttempt.upsert({ where: { key }, create: { key, ...values }, update: values })
}

export const deleteAttempts = async (tx: Tx, keys: readonly string[]): Promise<void> => {
  await tx.signInAttempt.deleteMany({ where: { key: { in: [...keys] } } })
}

/** Forgets counters that began before `windowStart` and block nothing any more. */
export const forgetAttempts = async (tx: Tx, windowStart: number, now: number): Promise<void> => {
  await tx.signInAttempt.deleteMany({
    where: {
      windowStart: { lt: new Date(windowStart) },
      OR: [{ blockedUntil: null }, { blockedUntil: { lt: new Date(now) } }],
    },
  })
}
