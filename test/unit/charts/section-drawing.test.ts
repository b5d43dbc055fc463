import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type SectionInput, sectionDrawing } from '@/lib/domain/charts/section-drawing'
import { allShapes, marksIn, numbersIn, textsIn } from '@/test/support/drawing'

const section = (more: Partial<SectionInput> = {}): SectionInput => ({
  title: 'Specimen 1',
  unit: 'µm',
  decimals: 1,
  nominal: 254,
  lower: 252,
  upper: 256,
  places: [
    { label: '1', a: 255, b: 254.4 },
    { label: '2', a: 254.2, b: 253.6 },
  ],
  ...more,
})

describe('sectionDrawing', () => {
  it('enlarges departures by a round factor, the same in every direction, and says so', () => {
    const { drawing, factor, caption } = sectionDrawing(section())
    // 28 px of ring for 2 µm of 254, at 86 px a radius: at most 41 times.
    expect(factor).toBe(40)
    const [thin, thick] = marksIn(drawing.shapes, 'specimen')
    const enlarged = (value: number) => 86 + ((value - 254) * 40 * 86) / 254
    expect(thick).toMatchObject({
      rx: expect.closeTo(enlarged(255), 9),
      ry: expect.closeTo(enlarged(254.4), 9),
      width: 2.2,
    })
    expect(thin).toMatchObject({ rx: expect.closeTo(enlarged(254.2), 9), width: 1 })
    expect(caption).toBe(
      'Thick line place 1, thin line place 2. Broken ring nominal, shaded ring tolerance; departures × 40.',
    )
  })

  it('is vermilion where a place is outside tolerance, verdigris where it is not', () => {
    const inks = marksIn(
      sectionDrawing(
        section({
          places: [
            { label: '1', a: 256.1, b: 254 },
            { label: '2', a: 254, b: 254 },
          ],
        }),
      ).drawing.shapes,
      'specimen',
    ).map((shape) => (shape.kind === 'ellipse' ? shape.stroke : ''))
    expect(inks).toEqual(['verdigris', 'vermilion'])
  })

  it('says values of both directions, of the rings and the mean', () => {
    const texts = textsIn(sectionDrawing(section()).drawing.shapes).map(
      ({ text, strong = '' }) => `${text}${strong}`,
    )
    expect(texts).toEqual(
      expect.arrayContaining(['a', '255.0', 'b 254.4', '256.0', '254.0', '252.0', 'Ø 254.3', '50 µm']),
    )
  })

  it('draws what there is: nothing measured, one direction, no tolerance, a core', () => {
    const none = sectionDrawing(section({ places: [{ label: '1' }] }))
    expect(none.drawing.label).toBe('Specimen 1, not measured yet')
    expect(none.caption).toMatch(/^Nothing measured yet\./)
    expect(marksIn(none.drawing.shapes, 'specimen')).toHaveLength(0)
    const one = sectionDrawing(
      section({ places: [{ label: '1', b: 254.4 }], lower: undefined, upper: undefined }),
    )
    expect(marksIn(one.drawing.shapes, 'specimen')).toHaveLength(1)
    expect(one.drawing.label).toBe('Specimen 1: 254.4 µm at place 1')
    expect(one.caption).not.toContain('tolerance')
    const wound = sectionDrawing(section({ core: 127 })).drawing.shapes
    expect(allShapes(wound).some((shape) => shape.kind === 'ellipse' && shape.rx === 43)).toBe(true)
  })

  it('stays within 340 × 276 px with finite numbers for any departures', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-3, max: 1e4, noNaN: true }),
        fc.array(fc.double({ min: 0, max: 3, noNaN: true }), { minLength: 2, maxLength: 6 }),
        fc.double({ min: 0, max: 0.9, noNaN: true }),
        (nominal, shares, reach) => {
          const { drawing } = sectionDrawing(
            section({
              nominal,
              lower: nominal * (1 - reach),
              upper: nominal * (1 + reach),
              places: [
                { label: '1', a: nominal * (shares[0] ?? 1), b: nominal * (shares[1] ?? 1) },
                { label: '2', a: nominal * (shares[2] ?? 1) },
              ],
            }),
          )
          for (const number of numbersIn(drawing.shapes)) expect(Number.isFinite(number)).toBe(true)
          for (const shape of marksIn(drawing.shapes, 'specimen'))
            if (shape.kind === 'ellipse') {
              expect(shape.rx).toBeGreaterThan(0)
              expect(shape.cx + shape.rx).toBeLessThanOrEqual(340)
              expect(shape.cy + shape.ry).toBeLessThanOrEqual(276)
            }
        },
      ),
      { numRuns: 200, seed: 1 },
    )
  })
})
