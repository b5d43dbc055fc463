import { describe, expect, test } from 'vitest'
import { type Attempts, attemptKeys, countTry, slowingRules, waitFor, window_ms } from '@/lib/access/slowing'

const tries = (count: number, rule = slowingRules.pair, now = 1_000_000): Attempts | undefined => {
  let attempts: Attempts | undefined
  for (let n = 0; n < count; n += 1) attempts = countTry(attempts, rule, now)
  return attempts
}

describe('countTry', () => {
  test('lets the free tries pass without a wait', () => {
    expect(waitFor(tries(slowingRules.pair.free - 1), 1_000_000)).toBe(0)
  })

  test('blocks from the last free try on, doubling up to the longest wait', () => {
    const waits = [0, 1, 2, 3].map((more) => waitFor(tries(slowingRules.pair.free + more), 1_000_000))
    expect(waits).toEqual([5_000, 10_000, 20_000, 40_000])
    expect(waitFor(tries(60), 1_000_000)).toBe(slowingRules.pair.longestWait_ms)
  })

  test('begins anew after the window', () => {
    const old = tries(20)
    const fresh = countTry(old, slowingRules.pair, 1_000_000 + window_ms)
    expect(fresh).toEqual({ failures: 1, windowStart: 1_000_000 + window_ms, blockedUntil: undefined })
  })

  test('keeps the beginning of the window while it counts', () => {
    expect(countTry(tries(3), slowingRules.pair, 1_000_500)).toMatchObject({
      failures: 4,
      windowStart: 1_000_000,
    })
  })
})

describe('waitFor', () => {
  test('is over when the time has come, and for nobody before', () => {
    const attempts = tries(slowingRules.pair.free)
    expect(waitFor(attempts, 1_004_999)).toBe(1)
    expect(waitFor(attempts, 1_005_000)).toBe(0)
    expect(waitFor(undefined, 1_000_000)).toBe(0)
  })
})

describe('slowingRules', () => {
  test('never let a stranger keep a person out for more than a minute from elsewhere', () => {
    expect(slowingRules.account.longestWait_ms).toBeLessThanOrEqual(60_000)
  })

  test('count one account from two addresses apart and together', () => {
    const here = attemptKeys('aldous', '10.0.0.1')
    const there = attemptKeys('aldous', '10.0.0.2')
    expect(here.pair).not.toBe(there.pair)
    expect(here.account).toBe(there.account)
    expect(here.address).not.toBe(there.address)
  })
})
