import { describe, expect, it } from 'vitest'
import { type CheckCase, parseCase } from '@/lib/domain/validation/check-case'
import { mergeQuantities } from '@/lib/domain/validation/registry'
import { decisiveComparison, runCase, runCases } from '@/lib/domain/validation/run-cases'

const table = {
  doubled: ({ x }: Readonly<Record<string, unknown>>) => ({ y: 2 * Number(x), z: 'text' }),
  broken: () => {
    throw new TypeError('input “x” has to be a finite number')
  },
}

const one = (change: Partial<CheckCase> = {}): CheckCase => ({
  id: 'd-1',
  quantity: 'doubled',
  source: 'by hand',
  kind: 'computed',
  inputs: { x: 4 },
  expected: { y: 8 },
  tolerance: { '*': { rel: 1e-12 } },
  ...change,
})

describe('runCase(case, quantities)', () => {
  it('passes a right value and fails a wrong one', () => {
    expect(runCase(one(), table).status).toBe('passed')
    expect(runCase(one({ expected: { y: 8.001 } }), table).status).toBe('failed')
    expect(runCase(one({ expected: { y: 8, z: 'other' } }), table).status).toBe('failed')
  })

  it('never passes a quantity that nothing computes, inherited names included', () => {
    expect(runCase(one({ quantity: 'tripled' }), table)).toMatchObject({
      status: 'not-known',
      error: 'no function computes “tripled”',
    })
    expect(runCase(one({ quantity: 'toString' }), table).status).toBe('not-known')
  })

  it('fails a case whose function throws, with its message', () => {
    expect(runCase(one({ quantity: 'broken' }), table)).toMatchObject({
      status: 'failed',
      error: 'input “x” has to be a finite number',
    })
  })

  it('never passes when nothing was compared', () => {
    expect(runCase(one({ expected: {} }), table).status).toBe('failed')
  })
})

describe('runCases(cases, quantities)', () => {
  it('keeps the order', () => {
    const results = runCases([one(), one({ id: 'd-2', expected: { y: 9 } })], table)
    expect(results.map(({ id, status }) => [id, status])).toEqual([
      ['d-1', 'passed'],
      ['d-2', 'failed'],
    ])
  })
})

describe('decisiveComparison(result)', () => {
  it('is the first that failed, else the one that used most of its tolerance', () => {
    const wide = { '*': { abs: 1 } }
    const list = { lists: () => ({ a: [1, 2.9, 3.1] }) }
    const run = (a: number[]) => runCase(one({ quantity: 'lists', expected: { a }, tolerance: wide }), list)
    expect(decisiveComparison(run([1, 2, 3]))?.path).toBe('a.1')
    expect(decisiveComparison(run([1, 2, 9]))?.path).toBe('a.2')
  })
})

describe('parseCase(value, where)', () => {
  it('reads a case and keeps its kind and source', () => {
    expect(parseCase({ ...one(), note: 'x' }, 'file')).toEqual({ ok: true, value: one() })
  })

  it.each([
    ['not an object', 7],
    ['no id', { ...one(), id: undefined }],
    ['no quantity', { ...one(), quantity: '' }],
    ['no inputs', { ...one(), inputs: [] }],
    ['expects nothing', { ...one(), expected: {} }],
    ['no tolerance', { ...one(), tolerance: undefined }],
    ['a negative tolerance', { ...one(), tolerance: { '*': { rel: -1 } } }],
    ['an unknown kind of tolerance', { ...one(), tolerance: { '*': { percent: 1 } } }],
  ])('refuses: %s', (_what, value) => {
    expect(parseCase(value, 'file')).toMatchObject({ ok: false, problems: [{ where: 'file' }] })
  })
})

describe('mergeQuantities(...tables)', () => {
  it('refuses two functions for one quantity', () => {
    expect(() => mergeQuantities(table, { doubled: () => ({}) })).toThrow('two functions compute “doubled”')
  })
})
