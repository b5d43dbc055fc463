import { describe, expect, it } from 'vitest'
import { compareOutputs, toleranceOf } from '@/lib/domain/validation/compare'

const passes = (expected: unknown, got: unknown, tolerance: Parameters<typeof compareOutputs>[2]) =>
  compareOutputs({ it: expected }, { it: got }, tolerance).every(({ passed }) => passed)

describe('compareOutputs(expected, got, tolerance)', () => {
  it.each([
    ['rel met', 100, 100.9, { '*': { rel: 0.01 } }, true],
    ['rel missed', 100, 101.1, { '*': { rel: 0.01 } }, false],
    ['rel of a negative value', -100, -100.9, { '*': { rel: 0.01 } }, true],
    ['abs met though rel is missed', 0.001, 0.0019, { '*': { rel: 1e-6, abs: 0.001 } }, true],
    ['rel met though abs is missed', 1000, 1001, { '*': { rel: 0.01, abs: 0.001 } }, true],
    ['nothing said: equal', 5, 5, {}, true],
    ['nothing said: not equal', 5, 5.000000001, {}, false],
    ['expected zero with rel only', 0, 1e-300, { '*': { rel: 0.5 } }, false],
    ['cents met', 440, 440.2, { '*': { cents: 1 } }, true],
    ['cents missed', 440, 440.3, { '*': { cents: 1 } }, false],
    ['not a number', 5, Number.NaN, { '*': { abs: 10 } }, false],
    ['infinite', 5, Number.POSITIVE_INFINITY, { '*': { rel: 10 } }, false],
    ['a text where a number is due', 5, '5', { '*': { abs: 10 } }, false],
    ['missing', 5, undefined, { '*': { abs: 10 } }, false],
    ['text', 'E2', 'E2', {}, true],
    ['other text', 'E2', 'e2', { '*': { abs: 9 } }, false],
    ['truth value', false, false, {}, true],
    ['truth value as number', true, 1, { '*': { abs: 9 } }, false],
    ['null', null, null, {}, true],
    ['null is not missing', null, undefined, {}, false],
    ['list', [1, 2], [1, 2], {}, true],
    ['shorter list', [1, 2], [1], { '*': { abs: 9 } }, false],
    ['longer list', [1, 2], [1, 2, 3], { '*': { abs: 9 } }, false],
    ['empty list', [], [], {}, true],
    ['empty list expected, one got', [], [1], { '*': { abs: 9 } }, false],
    ['empty list expected, nothing got', [], undefined, {}, false],
    ['nested lists', [[1], [2, 3]], [[1], [2, 3]], {}, true],
    ['nested object', { a: { b: 1 } }, { a: { b: 1, c: 7 }, d: 8 }, {}, true],
    ['nested object, one missing', { a: { b: 1, c: 2 } }, { a: { b: 1 } }, { '*': { abs: 9 } }, false],
  ])('%s', (_what, expected, got, tolerance, outcome) => {
    expect(passes(expected, got, tolerance)).toBe(outcome)
  })

  it('ignores outputs that are not expected', () => {
    expect(compareOutputs({ a: 1 }, { a: 1, b: 2 }, {})).toHaveLength(1)
  })

  it('does not take inherited names for outputs', () => {
    expect(compareOutputs({ toString: 1 }, {}, { '*': { abs: 9 } })[0]?.passed).toBe(false)
  })

  it('names the path, the deviation and what was allowed', () => {
    expect(compareOutputs({ a: { b: [10, 20] } }, { a: { b: [10, 21] } }, { '*': { rel: 0.1 } })[1]).toEqual({
      path: 'a.b.1',
      expected: 20,
      got: 21,
      tolerance: { rel: 0.1 },
      deviation: 1,
      allowed: 2,
      passed: true,
    })
  })
})

describe('toleranceOf(tolerance, path)', () => {
  const tolerance = { '*': { abs: 1 }, a: { abs: 2 }, 'a.b': { abs: 3 }, 'a.bc': { abs: 4 } }

  it.each([
    ['x', 1],
    ['a', 2],
    ['a.z', 2],
    ['a.b', 3],
    ['a.b.0', 3],
    ['a.bc', 4],
    ['a.bcd', 2],
    ['ab', 1],
  ])('%s takes the longest match', (path, abs) => {
    expect(toleranceOf(tolerance, path)).toEqual({ abs })
  })

  it('is undefined when nothing matches', () => {
    expect(toleranceOf({ a: { abs: 1 } }, 'b')).toBeUndefined()
  })
})
