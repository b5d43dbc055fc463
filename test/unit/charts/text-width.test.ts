import { describe, expect, it } from 'vitest'
import { textWidth, wrapWords } from '@/lib/domain/charts/text-width'

describe('textWidth', () => {
  it('adds the advances of the letters, in proportion to the size', () => {
    // All figures of Plex are 0.6 em wide.
    expect(textWidth('0123456789', 10)).toBeNear(60, { absolute: 1e-9 })
    expect(textWidth('0123456789', 20)).toBeNear(120, { absolute: 1e-9 })
    expect(textWidth('', 11)).toBe(0)
  })

  it('knows three faces: the strong one is wider, the italic narrower in figures', () => {
    expect(textWidth('Diameter', 11, 'strong')).toBeGreaterThan(textWidth('Diameter', 11, 'sans'))
    expect(textWidth('1234', 11, 'italic')).toBeLessThan(textWidth('1234', 11, 'sans'))
  })

  it('counts a letter beyond ASCII as a figure, a pair of surrogates as one', () => {
    expect(textWidth('µ', 10)).toBeNear(6, { absolute: 1e-9 })
    expect(textWidth('𝄞', 10)).toBeNear(6, { absolute: 1e-9 })
  })
})

describe('wrapWords', () => {
  it('breaks at spaces so that no line of several words is too wide', () => {
    const lines = wrapWords('Spread within the lot, mass per metre, weighed', 128, 13, 'strong')
    expect(lines.join(' ')).toBe('Spread within the lot, mass per metre, weighed')
    expect(lines.length).toBe(3)
    for (const line of lines) expect(textWidth(line, 13, 'strong')).toBeLessThanOrEqual(128)
  })

  it('gives a word that is too wide a line of its own', () => {
    expect(wrapWords('a Saitenspannungsmessung b', 40, 13)).toEqual(['a', 'Saitenspannungsmessung', 'b'])
  })

  it('leaves nothing as one empty line', () => {
    expect(wrapWords('', 100, 11)).toEqual([''])
  })
})
