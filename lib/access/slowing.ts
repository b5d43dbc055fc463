/**
 * How guessing is slowed: every try counts until it has proved right, for the account from one address, for
 * the address, and for the account from anywhere. The first is strict, the others stop a spread attack without
 * letting a stranger lock a person out for long.
 */
export interface Attempts {
  readonly failures: number
  /** Epoch milliseconds. */
  readonly windowStart: number
  readonly blockedUntil: number | undefined
}

export interface SlowingRule {
  /** Tries without a wait. */
  readonly free: number
  /** Wait after the first try beyond, doubled with each further one. */
  readonly firstWait_ms: number
  readonly longestWait_ms: number
}

/** Tries older than this are forgotten. */
export const window_ms = 15 * 60_000

export const slowingRules = {
  pair: { free: 5, firstWait_ms: 5_000, longestWait_ms: 15 * 60_000 },
  address: { free: 30, firstWait_ms: 10_000, longestWait_ms: 5 * 60_000 },
  account: { free: 40, firstWait_ms: 5_000, longestWait_ms: 60_000 },
} as const satisfies Record<string, SlowingRule>

export type SlowingKind = keyof typeof slowingRules

/** The keys a try counts under. */
export const attemptKeys = (account: string, address: string): Readonly<Record<SlowingKind, string>> => ({
  pair: `pair ${account} ${address}`,
  address: `address ${address}`,
  account: `account ${account}`,
})

/** Milliseconds to wait before another try is looked at, 0 for none. */
export const waitFor = (attempts: Attempts | undefined, now: number): number =>
  Math.max(0, (attempts?.blockedUntil ?? 0) - now)

/** The counter after one more try. */
export const countTry = (before: Attempts | undefined, rule: SlowingRule, now: number): Attempts => {
  const fresh = before === undefined || now - before.windowStart >= window_ms
  const failures = fresh ? 1 : before.failures + 1
  const over = failures - rule.free
  const wait = over < 0 ? 0 : Math.min(rule.longestWait_ms, rule.firstWait_ms * 2 ** Math.min(over, 30))
  return {
    failures,
    windowStart: fresh ? now : before.windowStart,
    blockedUntil: wait === 0 ? undefined : now + wait,
  }
}
