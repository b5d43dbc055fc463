// @vitest-environment jsdom
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { darkTheme, inks, lightTheme, printTheme } from '@/lib/domain/charts/ink'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import type { Drawing, Shape } from '@/lib/domain/charts/shape'
import { escapeXml, svgText } from '@/lib/domain/charts/svg'
import { allShapes } from '@/test/support/drawing'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

/** Reads SVG text as XML; a text that is not well-formed is refused. */
function parsed(svg: string): Element {
  const root = new DOMParser().parseFromString(svg, 'image/svg+xml').documentElement
  if (root.nodeName !== 'svg') throw new Error(`not well-formed: ${root.textContent}`)
  return root
}

const drawing = (shapes: readonly Shape[], more: Partial<Drawing> = {}): Drawing => ({
  width: 100,
  height: 50,
  label: 'A drawing',
  shapes,
  ...more,
})

const chartOf = (...[input, width]: [Parameters<typeof buildStaffChart>[0], number?]): Drawing =>
  drawStaffChart(layoutStaffChart(buildStaffChart(input), width))

describe('svgText', () => {
  it('is well-formed XML without ids, styles, scripts, patterns or outside references, whatever the names and values', () => {
    fc.assert(
      fc.property(anyChart(40), anyWidth, fc.boolean(), (input, width, ground) => {
        const svg = svgText(chartOf(input, width), { ground })
        const root = parsed(svg)
        expect(svg).not.toMatch(/NaN|Infinity|undefined/)
        for (const element of [root, ...root.querySelectorAll('*')]) {
          expect(['svg', 'g', 'a', 'path', 'ellipse', 'rect', 'text', 'tspan', 'title', 'desc']).toContain(
            element.nodeName,
          )
          for (const { name, value } of element.attributes) {
            expect(name).not.toMatch(/^(id|style|class|on.*|xlink:.*|src)$/)
            if (name === 'href') expect(value).toMatch(/^\/lots\//)
            if (name !== 'xmlns' && name !== 'aria-label') expect(value).not.toMatch(/url\(|http/)
          }
        }
      }),
      { numRuns: 120, seed: 1 },
    )
  })

  it('refuses, in this test, what is not well-formed', () => {
    expect(() => parsed('<svg xmlns="http://www.w3.org/2000/svg"><g></svg>')).toThrow()
  })

  it('says names as they are, though they hold markup', () => {
    const name = '<script>alert("1")</script> & \'B♭\''
    const root = parsed(
      svgText(
        drawing(
          [
            {
              kind: 'group',
              title: name,
              shapes: [{ kind: 'text', x: 1, y: 2, text: name }],
              href: '/lots/a&b',
            },
          ],
          {
            label: name,
            description: name,
          },
        ),
      ),
    )
    expect(root.getAttribute('aria-label')).toBe(name)
    expect(root.querySelector(':scope > title')?.textContent).toBe(name)
    expect(root.querySelector('desc')?.textContent).toBe(name)
    expect(root.querySelector('text')?.textContent).toBe(name)
    expect(root.querySelector('a')?.getAttribute('href')).toBe('/lots/a&b')
    expect(root.querySelector('script')).toBeNull()
  })

  it('writes every shape of the drawing in order, none left out', () => {
    const made = chartOf(sampleChart({}))
    const written = [...parsed(svgText(made)).querySelectorAll('*')].filter(
      (element) =>
        ['path', 'ellipse', 'rect', 'g', 'a', 'text'].includes(element.nodeName) &&
        element.getAttribute('aria-hidden') !== 'true',
    )
    const tags = { path: 'path', ellipse: 'ellipse', rect: 'rect', text: 'text' } as const
    expect(written.map(({ nodeName }) => nodeName)).toEqual(
      allShapes(made.shapes).map((shape) =>
        shape.kind === 'group' ? (shape.href === undefined ? 'g' : 'a') : tags[shape.kind],
      ),
    )
  })

  it('gives marks their roles as data', () => {
    const root = parsed(svgText(chartOf(sampleChart({}))))
    const note = root.querySelector('ellipse[data-mark="note"][data-lot="LA-340"][data-stave="mass"]')
    expect(note).not.toBeNull()
    expect(note?.parentElement?.getAttribute('href')).toBe('/lots/LA-340')
    expect(root.querySelectorAll('[data-mark="slur"][data-state="open"]').length).toBeGreaterThan(0)
  })

  it('takes its colours from the theme and from nowhere else', () => {
    for (const theme of [lightTheme, darkTheme, printTheme]) {
      const colours =
        svgText(chartOf(sampleChart({})), { theme, ground: true }).match(/#[0-9A-Fa-f]{6}/g) ?? []
      expect(colours.length).toBeGreaterThan(100)
      for (const colour of new Set(colours)) expect(inks.map((ink) => theme[ink])).toContain(colour)
    }
  })

  it('fills the ground when asked', () => {
    expect(svgText(drawing([]), { ground: true })).toContain(
      '<rect width="100%" height="100%" fill="#FBFAF6"/>',
    )
    expect(svgText(drawing([]))).not.toContain('<rect')
  })

  it('sets sharps and flats in the face that has them, and draws halos under the letters', () => {
    const svg = svgText(drawing([{ kind: 'text', x: 1, y: 2, text: 'F♯3', halo: true }]))
    expect(svg).toContain('F<tspan font-family="Noto Sans Math">♯</tspan>3')
    const texts = [...parsed(svg).querySelectorAll('text')]
    expect(texts).toHaveLength(2)
    expect(texts[0]?.getAttribute('aria-hidden')).toBe('true')
    expect(texts[0]?.getAttribute('stroke-width')).toBe('3')
    expect(texts[1]?.hasAttribute('stroke')).toBe(false)
  })

  it('has the size of the drawing in two decimals', () => {
    const root = parsed(svgText(drawing([], { width: 964, height: 765.4321 })))
    expect(root.getAttribute('viewBox')).toBe('0 0 964 765.43')
    expect(root.getAttribute('role')).toBe('img')
  })
})

describe('escapeXml', () => {
  it('escapes the five characters that mean something and drops what XML cannot hold', () => {
    expect(escapeXml('a<b>&"\'c')).toBe('a&lt;b&gt;&amp;&quot;&#39;c')
    expect(escapeXml('a\u0000b\u001fc\ufffed\te\n')).toBe('abcd\te\n')
  })
})
