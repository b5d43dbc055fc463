import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart, clampWindow, newestWindow } from '@/lib/domain/charts/build-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { panReach, panWindow, zoomWindow } from '@/lib/domain/charts/pan-zoom'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

const anyCount = fc.integer({ min: 1, max: 50_000 })
const layoutOf = (lots: number, window?: { from: number; to: number }, width = 964) =>
  layoutStaffChart(buildStaffChart({ ...sampleChart({ lots }), window: window ?? newestWindow(lots) }), width)

describe('zoomWindow', () => {
  it('keeps the lot at the anchor in its place, between eight lots and all', () => {
    fc.assert(
      fc.property(
        anyCount,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0.01, max: 100, noNaN: true }),
        (count, a, b, c, factor) => {
          const window = clampWindow({ from: a * count, to: b * count }, count)
          const anchor = window.from + c * (window.to - window.from)
          const next = zoomWindow(window, factor, anchor, count)
          expect(next.from).toBeGreaterThanOrEqual(-1e-9)
          expect(next.to).toBeLessThanOrEqual(count - 1 + 1e-6)
          const rounded = clampWindow(next, count)
          expect(rounded.to - rounded.from + 1).toBeGreaterThanOrEqual(Math.min(8, count))
          const share = (of: { from: number; to: number }) => (anchor - of.from) / (of.to - of.from)
          // Where neither end of all lots is met, the anchor keeps its share of the width.
          if (window.to > window.from && next.from > 1e-6 && next.to < count - 1 - 1e-6)
            expect(share(next)).toBeNear(share(window), { absolute: 1e-6 })
        },
      ),
      { numRuns: 400, seed: 1 },
    )
  })

  it('goes there and back, and bears factors that are none', () => {
    const there = zoomWindow({ from: 100, to: 199 }, 0.5, 130, 1000)
    expect(there.to - there.from).toBeNear(49.5, { absolute: 1e-9 })
    expect(zoomWindow(there, 2, 130, 1000)).toEqual({ from: 100, to: 199 })
    for (const factor of [0, -1, Number.NaN, Number.POSITIVE_INFINITY])
      expect(zoomWindow({ from: 100, to: 199 }, factor, 130, 1000)).toEqual({ from: 100, to: 199 })
  })
})

describe('panWindow', () => {
  it('moves as many lots as the hand moves steps, never off the lots', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 300 }),
        fc.nat({ max: 300 }),
        fc.nat({ max: 300 }),
        fc.integer({ min: -3000, max: 3000 }),
        (lots, a, b, dx) => {
          const layout = layoutOf(lots, { from: Math.min(a, b), to: Math.max(a, b) })
          const { from, to } = layout.chart.window
          const next = panWindow(layout, dx)
          expect(next.from).toBeGreaterThanOrEqual(0)
          expect(next.to).toBeLessThan(lots)
          expect(next.to - next.from).toBeGreaterThanOrEqual(to - from)
          if (layout.frame.future === undefined) expect(next.to - next.from).toBe(to - from)
          const { older, newer } = panReach(layout)
          if (dx >= 0 && dx <= older) expect(from - next.from).toBe(Math.round(dx / layout.frame.step))
          if (dx <= 0 && -dx <= newer && layout.frame.future === undefined)
            expect(from - next.from).toBeNear(dx / layout.frame.step, { absolute: 0.51 })
        },
      ),
      { numRuns: 150, seed: 2 },
    )
  })

  it('stays where it is without a movement', () => {
    const layout = layoutOf(300, { from: 100, to: 151 })
    expect(panWindow(layout, 0)).toEqual({ from: 100, to: 151 })
    expect(panWindow(layout, layout.frame.step * 0.4)).toEqual({ from: 100, to: 151 })
  })

  it('fills the part still to be made with older lots at the same step', () => {
    const layout = layoutOf(300, undefined, 1200)
    expect(layout.frame.future).toBeDefined()
    const next = panWindow(layout, 30 * layout.frame.step)
    expect(next.from).toBe(218)
    const after = layoutOf(300, next, 1200)
    expect(Math.abs(after.frame.step - layout.frame.step)).toBeLessThan(0.3)
  })

  it('finds a window for charts of all sorts', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, fc.integer({ min: -2000, max: 2000 }), (input, width, dx) => {
        const layout = layoutStaffChart(buildStaffChart(input), width)
        const { from, to } = panWindow(layout, dx)
        expect(Number.isInteger(from) && Number.isInteger(to)).toBe(true)
        expect(to).toBeLessThan(Math.max(1, input.lots.length))
      }),
      { numRuns: 100, seed: 3 },
    )
  })
})
