import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { LEAST_WINDOW, moveWindow, resizeWindow, staffBrush } from '@/lib/domain/charts/staff-brush'
import { textWidth } from '@/lib/domain/charts/text-width'
import { allShapes, numbersIn, textsIn } from '@/test/support/drawing'
import { anyChart } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

const frame = { x: 138, w: 764, compact: false }
const anyWindow = fc.record({
  from: fc.integer({ min: -10, max: 110 }),
  to: fc.integer({ min: -10, max: 110 }),
})
const anyCount = fc.integer({ min: 1, max: 100 })

describe('staffBrush', () => {
  it('ticks every value of the first stave once, and bars its signals', () => {
    const input = sampleChart({})
    const { shapes } = staffBrush(input, frame, 964)
    const ticks = shapes.find((shape) => shape.kind === 'path' && shape.stroke === 'ink')
    expect(ticks?.kind === 'path' ? ticks.segments.filter(([letter]) => letter === 'M').length : 0).toBe(59)
    const bars = allShapes(shapes).filter((shape) => shape.kind === 'path' && shape.stroke === 'vermilion')
    expect(bars).toHaveLength(1)
  })

  it('counts lots and gaps, in one path a colour however many lots there are', () => {
    const texts = textsIn(staffBrush(sampleChart({}), frame, 964).shapes).map(({ text }) => text)
    expect(texts).toContain('60 lots, 1 gap')
    expect(staffBrush(sampleChart({ lots: 3000 }), frame, 964).shapes.length).toBeLessThan(80)
  })

  it('names months where they change, clear of each other, a year once', () => {
    const sample = sampleChart({ lots: 160 })
    const input = {
      ...sample,
      lots: sample.lots.map((lot) => ({
        ...lot,
        monthLabel: new Intl.DateTimeFormat('en', {
          month: 'short',
          year: 'numeric',
          timeZone: 'UTC',
        }).format(lot.madeAt),
      })),
    }
    const sparse = {
      ...input,
      lots: input.lots.map((lot, index) =>
        index > 0 && input.lots[index - 1]?.monthLabel === lot.monthLabel
          ? { ...lot, monthLabel: undefined }
          : lot,
      ),
    }
    for (const one of [input, sparse]) {
      const months = textsIn(staffBrush(one, frame, 964).shapes).filter(({ y }) => y > 50)
      expect(months.map(({ text }) => text)).toEqual(
        ['Jul 2026', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec', 'Jan 2027', 'Feb', 'Mar', 'Apr', 'May'].slice(
          0,
          months.length,
        ),
      )
      expect(months.length).toBeGreaterThan(8)
      for (const [index, { x }] of months.slice(1).entries())
        expect(x).toBeGreaterThan((months[index]?.x ?? 0) + textWidth(months[index]?.text ?? '', 11))
    }
  })

  it('says days where no lot names a month', () => {
    const input = sampleChart({ lots: 12 })
    const days = { ...input, lots: input.lots.map((lot) => ({ ...lot, monthLabel: undefined })) }
    expect(textsIn(staffBrush(days, frame, 964).shapes).map(({ text }) => text)).toContain('6 Jul')
  })

  it('leads from lot to place and back, and has only finite numbers', () => {
    fc.assert(
      fc.property(anyChart(), (input) => {
        const brush = staffBrush(input, frame, 964)
        for (const number of numbersIn(brush.shapes)) expect(Number.isFinite(number)).toBe(true)
        if (input.lots.length > 1)
          for (const index of [0, input.lots.length - 1])
            expect(brush.indexAt(brush.xAt(index))).toBeNear(index, { absolute: 1e-9 })
        else expect(brush.indexAt(500)).toBe(0)
      }),
      { numRuns: 100, seed: 1 },
    )
  })
})

describe('moveWindow', () => {
  it('keeps its width and stays within the lots', () => {
    fc.assert(
      fc.property(anyWindow, fc.integer({ min: -200, max: 200 }), anyCount, (window, by, count) => {
        const before = moveWindow(window, 0, count)
        const after = moveWindow(window, by, count)
        expect(after.to - after.from).toBe(before.to - before.from)
        expect(after.from).toBeGreaterThanOrEqual(0)
        expect(after.to).toBeLessThan(count)
      }),
      { numRuns: 200, seed: 2 },
    )
    expect(moveWindow({ from: 10, to: 19 }, 5, 60)).toEqual({ from: 15, to: 24 })
    expect(moveWindow({ from: 10, to: 19 }, -99, 60)).toEqual({ from: 0, to: 9 })
    expect(moveWindow({ from: 10, to: 19 }, 99, 60)).toEqual({ from: 50, to: 59 })
  })
})

describe('resizeWindow', () => {
  it('moves one end, never nearer than eight lots to the other, never off the lots', () => {
    fc.assert(
      fc.property(
        anyWindow,
        fc.constantFrom('from' as const, 'to' as const),
        fc.integer({ min: -50, max: 150 }),
        anyCount,
        (window, end, to, count) => {
          const before = moveWindow(window, 0, count)
          const after = resizeWindow(window, end, to, count)
          expect(after.from).toBeGreaterThanOrEqual(0)
          expect(after.to).toBeLessThan(count)
          const other = end === 'from' ? 'to' : 'from'
          const wide = before.to - before.from + 1 >= LEAST_WINDOW
          if (wide) {
            expect(after[other]).toBe(before[other])
            expect(after.to - after.from + 1).toBeGreaterThanOrEqual(LEAST_WINDOW)
          }
        },
      ),
      { numRuns: 300, seed: 3 },
    )
    expect(resizeWindow({ from: 10, to: 40 }, 'from', 39, 60)).toEqual({ from: 33, to: 40 })
    expect(resizeWindow({ from: 10, to: 40 }, 'to', 99, 60)).toEqual({ from: 10, to: 59 })
  })
})
