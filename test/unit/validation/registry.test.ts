import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { parseCase } from '@/lib/domain/validation/check-case'
import { mergeQuantities, quantities } from '@/lib/domain/validation/registry'
import { runCase } from '@/lib/domain/validation/run-cases'

const cases = readdirSync('test/reference').flatMap((file) =>
  (JSON.parse(readFileSync(`test/reference/${file}`, 'utf8')) as unknown[]).map((entry, index) => {
    const one = parseCase(entry, `${file}[${index}]`)
    if (!one.ok) throw new TypeError(one.problems.map(({ message }) => message).join(' '))
    return one.value
  }),
)
const known = cases.filter(({ quantity }) => Object.hasOwn(quantities, quantity))

describe('quantities', () => {
  it('answer 187 of the check cases, charts with their factors and all distributions among them', () => {
    expect(known).toHaveLength(187)
    for (const quantity of ['chart-constants', 'individuals-chart', 'mean-charts', 'mean-charts-unequal'])
      expect(Object.keys(quantities)).toContain(quantity)
  })

  it('are each asked for by a case', () => {
    const asked = new Set(known.map(({ quantity }) => quantity))
    expect(Object.keys(quantities).filter((name) => !asked.has(name))).toEqual([])
  })

  it.each(known.map((one) => [one.id, one.quantity, one.source, one] as const))(
    'agree with %s: %s (%s)',
    (_, __, ___, one) => {
      const result = runCase(one, quantities)
      expect(result.error).toBeUndefined()
      expect(result.comparisons.filter(({ passed }) => !passed)).toEqual([])
      expect(result.status).toBe('passed')
    },
  )

  it('have one function for each name', () => {
    const one = () => ({})
    expect(() => mergeQuantities({ mass: one }, { mass: one })).toThrow('“mass”')
  })
})
