import { describe, expect, it } from 'vitest'
import { productUncertainty } from '@/lib/domain/metrology/product-uncertainty'
import { seededNormal } from '@/test/support/seeded-random'

describe('productUncertainty(one, other)', () => {
  it('is 1.9209 to first order and 1.9442 exactly for 2 ± 0.5 times 3 ± 0.6', () => {
    const { exact, firstOrder } = productUncertainty({ value: 2, u: 0.5 }, { value: 3, u: 0.6 })
    // Source: JCGM 100:2008, 5.1.2 note, closed form.
    expect(firstOrder).toBeNear(1.9209372712298547, { relative: 1e-12 })
    expect(exact).toBeNear(1.944222209522358, { relative: 1e-12 })
  })

  it('tells the exact one of what is drawn', () => {
    const normal = seededNormal(13)
    const n = 100_000
    let squares = 0
    for (let count = 0; count < n; count += 1) squares += ((0.2 + normal()) * (0.1 + normal()) - 0.02) ** 2
    const { exact, firstOrder } = productUncertainty({ value: 0.2, u: 1 }, { value: 0.1, u: 1 })
    expect(Math.sqrt(squares / n)).toBeNear(exact, { relative: 0.02 })
    expect(firstOrder).toBeLessThan(exact / 4)
  })
})
