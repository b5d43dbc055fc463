import { describe, expect, it } from 'vitest'
import { darkTheme, type Ink, inks, lightTheme, printTheme } from '@/lib/domain/charts/ink'

/** Relative luminance and contrast as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(hex.slice(at, at + 2), 16) / 255
    return part <= 0.03928 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

const contrast = (a: string, b: string): number => {
  const [light, dark] = [Math.max(luminance(a), luminance(b)), Math.min(luminance(a), luminance(b))]
  return (light + 0.05) / (dark + 0.05)
}

describe('themes', () => {
  it('name a colour for every ink', () => {
    for (const theme of [lightTheme, darkTheme, printTheme])
      for (const ink of inks) expect(theme[ink]).toMatch(/^#[0-9A-F]{6}$/)
  })

  it('keep letters readable (4.5 : 1) on paper and on the lit row, and outlines visible (3 : 1)', () => {
    const letters: readonly Ink[] = ['ink', 'slate', 'brass', 'verdigris', 'vermilion']
    for (const theme of [lightTheme, darkTheme, printTheme]) {
      for (const ink of letters)
        for (const ground of [theme.paper, theme.lit])
          expect(contrast(theme[ink], ground), `${ink} on ${ground}`).toBeGreaterThanOrEqual(4.5)
      expect(contrast(theme.edge, theme.paper)).toBeGreaterThanOrEqual(3)
    }
  })

  it('print on white', () => {
    expect(printTheme.paper).toBe('#FFFFFF')
    expect(printTheme.ink).toBe(lightTheme.ink)
  })
})
