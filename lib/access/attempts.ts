import { database } from '@/lib/data/database'
import { lockSignIn } from '@/lib/data/locks'
import { deleteAttempts, forgetAttempts, getAttempts, putAttempt } from '@/lib/data/sign-in-attempts'
import { problem } from '@/lib/domain/errors'
import { attemptKeys, countTry, type SlowingKind, slowingRules, waitFor, window_ms } from './slowing'

const kinds = Object.keys(slowingRules) as SlowingKind[]

/**
 * Counts a try before it is looked at, so that many at once can't slip through together.
 * @throws LedgerlineError busy while the account or the address has to wait
 */
export const beginAttempt = (account: string, address: string, now: number): Promise<void> => {
  const keys = attemptKeys(account, address)
  return database().write(async (tx) => {
    await lockSignIn(tx)
    await forgetAttempts(tx, now - window_ms, now)
    const rows = new Map((await getAttempts(tx, Object.values(keys))).map((row) => [row.key, row]))
    const wait = Math.max(...kinds.map((kind) => waitFor(rows.get(keys[kind]), now)))
    if (wait > 0) {
      throw problem('busy', 'Too many tries to sign in.', {
        mend: `Wait ${inWords(wait)}, then try again.`,
        details: { waitMilliseconds: wait },
      })
    }
    for (const kind of kinds) {
      const key = keys[kind]
      await putAttempt(tx, { key, ...countTry(rows.get(key), slowingRules[kind], now) })
    }
  })
}

/** The try was right: it and the failures before it from this address no longer count. */
export const forgetFailures = (account: string, address: string): Promise<void> => {
  const keys = attemptKeys(account, address)
  return database().write(async (tx) => {
    await lockSignIn(tx)
    await deleteAttempts(tx, [keys.pair])
    for (const row of await getAttempts(tx, [keys.address, keys.account])) {
      await putAttempt(tx, { ...row, failures: Math.max(0, row.failures - 1), blockedUntil: undefined })
    }
  })
}

const inWords = (wait_ms: number): string => {
  const seconds = Math.ceil(wait_ms / 1000)
  if (seconds < 90) return seconds === 1 ? 'a second' : `${seconds} seconds`
  return `${Math.ceil(seconds / 60)} minutes`
}
