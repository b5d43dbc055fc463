/**
 * Noise is failure: whatever a test prints that it did not announce fails that test. A test that means to
 * see a message says so first: `expectNoise(/database is locked/)`; a message announced and never printed
 * fails it, too.
 */
import { afterEach, beforeEach } from 'vitest'
import { NoiseMeter } from './noise-meter'

const meter = new NoiseMeter()

/** Announces one printed message, by a part of its text; it must come before the test ends. */
export function expectNoise(pattern: RegExp): void {
  meter.announce(pattern)
}

for (const method of ['log', 'info', 'warn', 'error', 'debug', 'trace'] as const) {
  console[method] = (...parts: unknown[]) => meter.hear(method, parts)
}

beforeEach(() => meter.reset())

afterEach(() => {
  const complaint = meter.complaint()
  meter.reset()
  if (complaint !== undefined) throw new Error(complaint)
})
