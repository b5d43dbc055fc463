import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { parseCase } from '@/lib/domain/validation/check-case'
import { metrologyQuantities } from '@/lib/domain/validation/metrology'
import { runCase } from '@/lib/domain/validation/run-cases'

const casesOf = (file: string) => {
  const list: unknown = JSON.parse(readFileSync(`test/reference/${file}.json`, 'utf8'))
  if (!Array.isArray(list)) throw new TypeError(file)
  return list.map((entry, index) => {
    const one = parseCase(entry, `${file}[${index}]`)
    if (!one.ok) throw new TypeError(one.problems.map((problem) => problem.message).join(' '))
    return one.value
  })
}

const physics = casesOf('physics')
const uncertainty = casesOf('statistics-uncertainty')
const conformity = casesOf('statistics-conformity')
const own = [
  ...physics.filter(({ quantity }) => Object.hasOwn(metrologyQuantities, quantity)),
  ...uncertainty,
  ...conformity,
]

describe('metrologyQuantities', () => {
  it('covers 13 physics cases, all 15 of uncertainty and all 6 of conformity', () => {
    const missing = own.filter(({ quantity }) => !Object.hasOwn(metrologyQuantities, quantity))
    expect(missing.map(({ id }) => id)).toEqual([])
    expect([own.length, uncertainty.length, conformity.length]).toEqual([34, 15, 6])
  })

  it('has no quantity without a case', () => {
    const asked = new Set(own.map(({ quantity }) => quantity))
    expect(Object.keys(metrologyQuantities).filter((name) => !asked.has(name))).toEqual([])
  })

  it.each(own.map((one) => [one.id, one.quantity, one.source, one] as const))(
    '%s: %s (%s)',
    (_, __, ___, one) => {
      const result = runCase(one, metrologyQuantities)
      expect(result.error).toBeUndefined()
      expect(result.comparisons.filter((comparison) => !comparison.passed)).toEqual([])
      expect(result.comparisons.length).toBeGreaterThan(0)
      expect(result.status).toBe('passed')
    },
  )
})
