import { describe, expect, it, vi } from 'vitest'
import { LedgerlineError, problem } from '@/lib/domain/errors'

describe('LedgerlineError', () => {
  it('is known whichever copy of its module made it: a server bundles several', async () => {
    vi.resetModules()
    const other = await import('@/lib/domain/errors')
    expect(other.LedgerlineError).not.toBe(LedgerlineError)
    expect(other.problem('busy', 'Wait a moment.')).toBeInstanceOf(LedgerlineError)
    expect(problem('busy', 'Wait a moment.')).toBeInstanceOf(other.LedgerlineError)
  })

  it('is no other error, and nothing that only looks like one', () => {
    for (const value of [new Error('busy'), { problem: { code: 'busy' } }, 'busy', null, undefined])
      expect(value instanceof LedgerlineError).toBe(false)
  })
})
