import { beforeAll, describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { darkTheme, type Ink, lightTheme, type Theme } from '@/lib/domain/charts/ink'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import type { Drawing } from '@/lib/domain/charts/shape'
import { svgText } from '@/lib/domain/charts/svg'
import { svgToPng } from '@/lib/output/svg-to-png'
import { marksIn } from '@/test/support/drawing'
import { type Picture, readPng } from '@/test/support/png'
import { sampleChart } from '@/test/support/staff-chart-sample'

const colourOf = (theme: Theme, ink: Ink): readonly number[] =>
  [1, 3, 5].map((at) => Number.parseInt(theme[ink].slice(at, at + 2), 16))

const near = (pixel: readonly number[], colour: readonly number[], apart = 40): boolean =>
  colour.every((part, place) => Math.abs(part - (pixel[place] ?? Number.NaN)) <= apart)

const chart = drawStaffChart(
  layoutStaffChart(buildStaffChart({ ...sampleChart({}), window: { from: 8, to: 59 } }), 964),
)

const pictureOf = (drawing: Drawing, theme: Theme, scale: number): Picture =>
  readPng(svgToPng(svgText(drawing, { theme, ground: true }), scale))

describe('svgToPng', () => {
  let light: Picture

  beforeAll(() => {
    light = pictureOf(chart, lightTheme, 2)
  })

  it('is the drawing’s size times the scale', () => {
    expect(light.width).toBe(2 * 964)
    expect(Math.abs(light.height - 2 * chart.height)).toBeLessThanOrEqual(1)
    expect(pictureOf(chart, lightTheme, 1).width).toBe(964)
  })

  it('has a head of the right ink at the centre of every note, and paper where nothing is drawn', () => {
    const notes = marksIn(chart.shapes, 'note')
    expect(notes.length).toBe(207)
    for (const theme of [lightTheme, darkTheme]) {
      const picture = theme === lightTheme ? light : pictureOf(chart, theme, 2)
      for (const note of notes) {
        if (note.kind !== 'ellipse') throw new Error('a head is an ellipse')
        const pixel = picture.at(2 * note.cx, 2 * note.cy)
        const ink = note.fill ?? 'ink'
        expect(near(pixel, colourOf(theme, ink)), `${note.role?.lot} ${note.role?.stave}: ${pixel}`).toBe(
          true,
        )
      }
      expect(near(picture.at(2, 2), colourOf(theme, 'paper'), 2)).toBe(true)
      expect(picture.at(2, 2)[3]).toBe(255)
    }
  })

  it('has the ledger lines of notes beyond their limits on both sides of the head', () => {
    const ledgers = marksIn(chart.shapes, 'ledger-line')
    expect(ledgers.length).toBeGreaterThan(5)
    for (const ledger of ledgers) {
      if (ledger.kind !== 'path') throw new Error('a ledger line is a line')
      const [from, to] = ledger.segments
      const y = Number(from?.[2])
      for (const x of [Number(from?.[1]) + 1.5, Number(to?.[1]) - 1.5])
        expect(near(light.at(2 * x, 2 * y), colourOf(lightTheme, ledger.stroke ?? 'ink'), 90)).toBe(true)
    }
  })

  it('sets letters, also ♯ and ♭, from the works’ own faces', () => {
    const inkOf = (text: string): number => {
      const picture = readPng(
        svgToPng(
          svgText(
            { width: 60, height: 24, label: '', shapes: [{ kind: 'text', x: 4, y: 18, text, size: 17 }] },
            { ground: true },
          ),
          2,
        ),
      )
      let dark = 0
      for (let y = 0; y < picture.height; y += 1)
        for (let x = 0; x < picture.width; x += 1)
          if (near(picture.at(x, y), colourOf(lightTheme, 'ink'), 60)) dark += 1
      return dark
    }
    expect(inkOf(' ')).toBe(0)
    for (const text of ['a', '♯', '♭', 'µ', '−', 'σ', '≤', '√']) expect(inkOf(text), text).toBeGreaterThan(10)
  })

  it('gives the same bytes for the same drawing', () => {
    const svg = svgText(chart)
    expect(Buffer.from(svgToPng(svg, 1)).equals(Buffer.from(svgToPng(svg, 1)))).toBe(true)
  })

  it('refuses a picture that would be unreasonably large', () => {
    const svg = svgText({ width: 8000, height: 8000, label: '', shapes: [] })
    expect(() => svgToPng(svg, 1)).toThrow(RangeError)
    expect(() => svgToPng(svgText({ width: 4000, height: 4000, label: '', shapes: [] }), 2)).toThrow(
      /too large/,
    )
  })
})
