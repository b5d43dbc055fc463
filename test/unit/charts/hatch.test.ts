import { describe, expect, it } from 'vitest'
import { hatchDisc, hatchRect } from '@/lib/domain/charts/hatch'

describe('hatchRect', () => {
  it('draws lines at 45° within the rectangle, a step apart', () => {
    const lines = hatchRect(10, 20, 60, 14, 4)
    expect(lines.length).toBe(Math.ceil((60 + 14) / (4 * Math.SQRT2) - 0.5))
    for (const [x1, y1, x2, y2] of lines) {
      expect(x2 - x1).toBeNear(y1 - y2, { absolute: 1e-9 })
      for (const x of [x1, x2]) expect(x >= 10 - 1e-9 && x <= 70 + 1e-9).toBe(true)
      for (const y of [y1, y2]) expect(y >= 20 - 1e-9 && y <= 34 + 1e-9).toBe(true)
    }
    const offsets = lines.map(([x, y]) => (x + y) / Math.SQRT2)
    for (const [index, offset] of offsets.slice(1).entries())
      expect(offset - (offsets[index] ?? 0)).toBeNear(4, { absolute: 1e-9 })
  })

  it('falls when told to', () => {
    for (const [x1, y1, x2, y2] of hatchRect(0, 0, 30, 30, 5, true))
      expect(x2 - x1).toBeNear(y2 - y1, { absolute: 1e-9 })
  })

  it('has nothing to draw in a rectangle without area, or with sizes that are no numbers', () => {
    expect(hatchRect(0, 0, 0, 10, 4)).toEqual([])
    expect(hatchRect(0, 0, 10, -1, 4)).toEqual([])
    expect(hatchRect(0, 0, Number.NaN, 10, 4)).toEqual([])
  })
})

describe('hatchDisc', () => {
  it('ends every line on the circle', () => {
    const lines = hatchDisc(100, 50, 40, 5)
    expect(lines.length).toBe(16)
    for (const [x1, y1, x2, y2] of lines) {
      expect(Math.hypot(x1 - 100, y1 - 50)).toBeNear(40, { absolute: 1e-9 })
      expect(Math.hypot(x2 - 100, y2 - 50)).toBeNear(40, { absolute: 1e-9 })
    }
  })

  it('draws nothing in a disc without radius', () => {
    expect(hatchDisc(0, 0, 0, 5)).toEqual([])
  })
})
