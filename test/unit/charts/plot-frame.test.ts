import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { plotFrame } from '@/lib/domain/charts/plot-frame'
import { anyWidth } from '@/test/support/random-charts'

describe('plotFrame', () => {
  it('keeps 14.2 px a lot up to the newest, the first 1.1 steps from the bar, the rest still to be made', () => {
    const frame = plotFrame(964, { from: 0, to: 29 }, 30)
    expect(frame).toMatchObject({ x: 138, w: 764, step: 14.2, compact: false })
    expect(frame.xAt(0)).toBeNear(138 + 1.1 * 14.2, { absolute: 1e-9 })
    expect(frame.xAt(1) - frame.xAt(0)).toBeNear(14.2, { absolute: 1e-9 })
    expect(frame.future).toBeNear(frame.xAt(29) + 7.1, { absolute: 1e-9 })
  })

  it('fills the plot with any other window, and has nothing still to be made there', () => {
    const frame = plotFrame(964, { from: 0, to: 29 }, 60)
    expect(frame.step).toBeGreaterThan(14.2)
    expect(frame.future).toBeUndefined()
    expect(frame.xAt(29)).toBeNear(138 + 764 - 1.1 * frame.step, { absolute: 1e-9 })
  })

  it('puts labels above the staves below 600 px', () => {
    expect(plotFrame(599, { from: 0, to: 9 }, 10).compact).toBe(true)
    expect(plotFrame(600, { from: 0, to: 9 }, 10).compact).toBe(false)
  })

  it('keeps every lot within the plot, clear of both ends, and leads back from x to the lot', () => {
    fc.assert(
      fc.property(
        anyWidth,
        fc.nat({ max: 400 }),
        fc.nat({ max: 400 }),
        fc.nat({ max: 50 }),
        (width, a, b, more) => {
          const window = { from: Math.min(a, b), to: Math.max(a, b) }
          const frame = plotFrame(width, window, window.to + 1 + more)
          expect(frame.step).toBeGreaterThan(0)
          expect(frame.xAt(window.from) - frame.x).toBeGreaterThanOrEqual(11 - 1e-9)
          expect(frame.x + frame.w - frame.xAt(window.to)).toBeGreaterThanOrEqual(11 - 1e-9)
          expect(frame.x + frame.w).toBeLessThanOrEqual(width)
          for (const index of [window.from, window.to, (window.from + window.to) / 2])
            expect(frame.indexAt(frame.xAt(index))).toBeNear(index, { absolute: 1e-6 })
          expect(frame.xAt(frame.domain[0])).toBeNear(frame.x, { absolute: 1e-6 })
          expect(frame.xAt(frame.domain[1])).toBeNear(frame.x + frame.w, { absolute: 1e-6 })
        },
      ),
      { numRuns: 300, seed: 1 },
    )
  })

  it('has a usual step where there are no lots', () => {
    const frame = plotFrame(964, { from: 0, to: -1 }, 0)
    expect(frame.step).toBe(14.2)
    expect(frame.future).toBeUndefined()
  })
})
