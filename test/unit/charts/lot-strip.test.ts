import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lotStrip, type StripInput } from '@/lib/domain/charts/lot-strip'
import type { Shape } from '@/lib/domain/charts/shape'
import { allShapes, marksIn, numbersIn } from '@/test/support/drawing'

const strip = (more: Partial<StripInput>): StripInput => ({
  label: 'Diameter',
  unit: 'µm',
  decimals: 2,
  specimens: [],
  ...more,
})

const xOf = (shape: Shape | undefined): number =>
  shape?.kind === 'ellipse' ? shape.cx : shape?.kind === 'path' ? Number(shape.segments[0]?.[1]) : Number.NaN

describe('lotStrip', () => {
  const whole = strip({
    mean: 255.02,
    expanded: 0.5,
    specimens: [254.9, 255.1, 255.06],
    lower: 252,
    upper: 256,
    guard: 0.4,
    controlLower: 252.66,
    controlUpper: 255.18,
  })

  it('places mean, specimens and control limits between the tolerance limits in proportion', () => {
    const { shapes } = lotStrip(whole)
    const [lower, upper] = marksIn(shapes, 'tolerance-line').map(xOf)
    const at = (value: number) => (lower ?? 0) + ((value - 252) / 4) * ((upper ?? 0) - (lower ?? 0))
    expect(xOf(marksIn(shapes, 'mean')[0])).toBeNear(at(255.02), { absolute: 1e-6 })
    for (const [index, mark] of marksIn(shapes, 'specimen').entries())
      expect(xOf(mark)).toBeNear(at(whole.specimens[index] ?? 0), { absolute: 1e-6 })
    expect(marksIn(shapes, 'limit-line').map(xOf)).toEqual(
      [at(252.66), at(255.18)].map((x) => expect.closeTo(x, 6)),
    )
  })

  it('hatches the guard band inside each limit', () => {
    const { shapes } = lotStrip(whole)
    const hatched = allShapes(shapes).filter((shape) => shape.kind === 'path' && shape.stroke === 'edge')
    const [lower, upper] = marksIn(shapes, 'tolerance-line').map(xOf)
    const perUnit = ((upper ?? 0) - (lower ?? 0)) / 4
    const xs = hatched.map((shape) => (shape.kind === 'path' ? shape.segments.map(([, x]) => Number(x)) : []))
    expect(Math.min(...(xs[0] ?? []))).toBeGreaterThanOrEqual((lower ?? 0) - 1e-6)
    expect(Math.max(...(xs[0] ?? []))).toBeLessThanOrEqual((lower ?? 0) + 0.4 * perUnit + 1e-6)
    expect(Math.max(...(xs[1] ?? []))).toBeLessThanOrEqual((upper ?? 0) + 1e-6)
  })

  it('is vermilion when the lot has left its limits', () => {
    const [mean] = marksIn(lotStrip({ ...whole, beyond: true }).shapes, 'mean')
    expect(mean).toMatchObject({ fill: 'vermilion' })
    expect(marksIn(lotStrip(whole).shapes, 'mean')[0]).toMatchObject({ fill: 'ink' })
  })

  it('points at what lies off the strip, and draws no bar of which there is nothing to see', () => {
    const { shapes } = lotStrip({ ...whole, mean: 270, specimens: [270, 255] })
    expect(marksIn(shapes, 'mean')).toHaveLength(0)
    expect(marksIn(shapes, 'specimen')).toHaveLength(1)
    const black = allShapes(shapes).filter(
      (shape) => shape.kind === 'path' && shape.stroke === 'ink' && shape.role === undefined,
    )
    expect(black).toHaveLength(1)
    expect(xOf(black[0])).toBeGreaterThan(265)
  })

  it('keeps values beyond the only limit beyond it', () => {
    const low = lotStrip(strip({ lower: 5, mean: 3, specimens: [2, 3] })).shapes
    expect(xOf(marksIn(low, 'mean')[0])).toBeLessThan(xOf(marksIn(low, 'tolerance-line')[0]) - 4)
    const high = lotStrip(strip({ upper: -5, mean: -3, specimens: [-3, -2] })).shapes
    expect(xOf(marksIn(high, 'mean')[0])).toBeGreaterThan(xOf(marksIn(high, 'tolerance-line')[0]) + 4)
  })

  it('begins a bounded quantity at zero', () => {
    const { shapes } = lotStrip(strip({ upper: 3, mean: 1.5, specimens: [1.2, 1.8] }))
    expect(xOf(marksIn(shapes, 'mean')[0])).toBeNear((36.5 + 239.5) / 2, { absolute: 1e-6 })
  })

  it('is finite and within its 276 × 36 px for any values', () => {
    const any = fc.option(fc.double({ min: -1e9, max: 1e9, noNaN: true }), { nil: undefined })
    fc.assert(
      fc.property(
        fc.record({ mean: any, expanded: any, lower: any, upper: any, controlLower: any, controlUpper: any }),
        fc.array(fc.double({ min: -1e9, max: 1e9, noNaN: true }), { maxLength: 6 }),
        fc.double({ min: 0, max: 1e6, noNaN: true }),
        (part, specimens, guard) => {
          const { shapes, width } = lotStrip(
            strip({ ...part, specimens, guard, expanded: part.expanded && Math.abs(part.expanded) }),
          )
          for (const number of numbersIn(shapes)) expect(Number.isFinite(number)).toBe(true)
          for (const mark of [
            ...marksIn(shapes, 'mean'),
            ...marksIn(shapes, 'specimen'),
            ...marksIn(shapes, 'limit-line'),
          ])
            expect(xOf(mark) >= 0 && xOf(mark) <= width).toBe(true)
        },
      ),
      { numRuns: 300, seed: 1 },
    )
  })

  it('says in words what it shows', () => {
    expect(lotStrip(whole).label).toBe(
      'Diameter: mean 255.02 ± 0.50 µm, tolerance 252.00 to 256.00; 3 specimens',
    )
    expect(lotStrip(strip({ upper: 3, decimal: 'comma', specimens: [1] })).label).toBe(
      'Diameter: no mean yet, at most 3,00; 1 specimen',
    )
    expect(lotStrip(strip({ lower: 3, mean: 0.06, expanded: 0.19, signed: true, unit: '%' })).label).toBe(
      'Diameter: mean +0.06 ± 0.19 %, at least +3.00; 0 specimens',
    )
  })
})
