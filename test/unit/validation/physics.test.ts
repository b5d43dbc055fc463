import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { physicsQuantities } from '@/lib/domain/validation/physics'

interface Limit {
  readonly rel?: number
  readonly abs?: number
  readonly cents?: number
}

interface Case {
  readonly id: string
  readonly quantity: string
  readonly source: string
  readonly inputs: Readonly<Record<string, unknown>>
  readonly expected: Readonly<Record<string, unknown>>
  readonly tolerance: Readonly<Record<string, Limit>>
}

const cases = JSON.parse(readFileSync('test/reference/physics.json', 'utf8')) as readonly Case[]

/** Quantities of sound recordings and of metrology, which are checked beside their own code. */
const elsewhere = new Set([
  'frequency-bound-stationary',
  'frequency-bound-decaying',
  'frequency-from-recording',
  'route-consistency',
  'budget-mass-per-metre-sounded',
  'budget-mass-per-metre-weighed',
  'budget-effective-density',
  'mean-with-common-uncertainty',
  'standard-uncertainty-type-b',
  'effective-degrees-of-freedom',
  'fault-residuals',
])

function compare(got: unknown, expected: unknown, limit: Limit, path: string): void {
  if (Array.isArray(expected)) {
    const list: readonly unknown[] = Array.isArray(got) ? got : []
    expect(list.length, path).toBe(expected.length)
    for (const [index, value] of expected.entries()) compare(list[index], value, limit, `${path}[${index}]`)
    return
  }
  if (typeof expected !== 'number') {
    expect(got, path).toBe(expected)
    return
  }
  expect(limit.cents, `${path}: no case here is in cents`).toBeUndefined()
  expect(got, path).toBeNear(expected, {
    ...(limit.rel === undefined ? {} : { relative: limit.rel }),
    ...(limit.abs === undefined ? {} : { absolute: limit.abs }),
  })
}

const mapped = cases.filter(({ quantity }) => Object.hasOwn(physicsQuantities, quantity))

describe('physicsQuantities', () => {
  it('covers every case but those of other parts: 98 of them', () => {
    const missing = cases.filter(({ quantity }) => !Object.hasOwn(physicsQuantities, quantity))
    expect(new Set(missing.map(({ quantity }) => quantity))).toEqual(elsewhere)
    expect(mapped.length).toBe(cases.length - missing.length)
    expect(mapped.length).toBe(98)
  })

  it('has no quantity without a case', () => {
    const known = new Set(cases.map(({ quantity }) => quantity))
    expect(Object.keys(physicsQuantities).filter((quantity) => !known.has(quantity))).toEqual([])
  })

  it.each(mapped.map((entry) => [entry.id, entry.quantity, entry.source, entry] as const))(
    '%s, %s (%s)',
    (_id, quantity, _source, { inputs, expected, tolerance }) => {
      const got = physicsQuantities[quantity]?.(inputs) ?? {}
      expect(Object.keys(expected).length).toBeGreaterThan(0)
      for (const [name, value] of Object.entries(expected)) {
        const limit = tolerance[name] ?? tolerance['*']
        expect(limit, `a tolerance for ${name}`).toBeDefined()
        compare(got[name], value, limit ?? {}, name)
      }
    },
  )

  it('names an input that does not fit', () => {
    const waveSpeed = physicsQuantities['wave-speed-and-fundamental']
    expect(() => waveSpeed?.({ T: '72', mu: 0.0004, L: 0.65 })).toThrow(
      'input “T” has to be a finite number, not "72"',
    )
  })
})
