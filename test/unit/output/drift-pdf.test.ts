import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { type DriftPaper, driftPdf } from '@/lib/output/drift-pdf'
import { pdfText } from '@/test/support/pdf-text'
import { sampleChart } from '@/test/support/staff-chart-sample'

const days = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  timeZone: 'UTC',
})

const paper: DriftPaper = {
  works: 'Tarnbeck String Works',
  products: ['Larch 254'],
  signals: [{ stave: 'Diameter', sentence: 'LA-360 lies +4.3 σ from the centre, A♯3 or B♭3.' }],
  printedAt: Date.UTC(2026, 10, 2, 9),
  day: (instant) => days.format(instant),
}

const printed = async (input: StaffChartInput, more: Partial<DriftPaper> = {}): Promise<string> =>
  pdfText(await driftPdf(buildStaffChart(input), { ...paper, ...more }))

describe('driftPdf', () => {
  it('says title, period, product, staves, limits, open signals and the page', async () => {
    const text = await printed(sampleChart({ window: { from: 8, to: 59 } }))
    expect(text).toContain('Larch 254 on drawing machine 1')
    expect(text).toMatch(/52 lots, LA-309 to LA-360, made \d+ Jul 2026 to \d+ Oct 2026; product Larch 254/)
    for (const label of ['Diameter', 'Closure', 'Spread within the lot']) expect(text).toContain(label)
    // Limit set 5 of the sample: 253.92 ± 3 · 0.42 µm, tolerance 251 to 257.
    expect(text).toMatch(
      /Diameter [µμ]m, individuals 5 LA-310 to LA-360 252\.66 253\.92 255\.18 0\.420 at least 251\.00, at most 257\.00/,
    )
    expect(text).toMatch(/Diameter [µμ]m, individuals 4, provisional LA-309 /)
    expect(text).toContain('Signals that wait for an answer: 1')
    expect(text.replace(/\s+/g, ' ')).toContain('LA-360 lies +4.3 σ from the centre')
    expect(text).toMatch(/page 1 of [2-5]/)
    expect(text).toContain('Printed 2 Nov 2026')
  })

  it('is a drawing of lines with its fonts in it, and no picture; the same bytes every time', async () => {
    const chart = buildStaffChart(sampleChart({}))
    const bytes = await driftPdf(chart, paper)
    const raw = Buffer.from(bytes).toString('latin1')
    expect(raw.startsWith('%PDF-')).toBe(true)
    expect(raw).toContain('/FontFile2')
    expect(raw).not.toContain('/Subtype /Image')
    expect(raw).not.toContain('/URI')
    // A4 on its side, in points.
    expect(raw).toMatch(/\/MediaBox \[0 0 841\.89 595\.28\]/)
    expect(Buffer.from(await driftPdf(chart, paper)).equals(Buffer.from(bytes))).toBe(true)
  })

  it('speaks decimal commas, and of several products', async () => {
    const text = await printed(
      { ...sampleChart({}), decimal: 'comma' },
      { products: ['Larch 254', 'Elm 279'] },
    )
    expect(text).toContain('252,66')
    expect(text).toContain('products Larch 254, Elm 279')
  })

  it('prints charts without lots, without limits and without signals in sentences', async () => {
    const none = await printed(sampleChart({ lots: 0 }), { signals: [] })
    expect(none).toContain('no lots yet')
    expect(none).toContain('No signal among these lots waits for an answer.')
    expect(await printed(sampleChart({ lots: 12 }))).toContain('no limits before 20 lots: 12 so far')
  })

  it('names the newest of very many signals and counts the rest', async () => {
    const signals = Array.from({ length: 300 }, (_, index) => ({
      stave: 'Diameter',
      sentence: `Lot ${index} is beyond its limit.`,
    }))
    const text = await printed(sampleChart({}), { signals })
    expect(text).toContain('The newest 120 of them; 180 more on the screen.')
    expect(text).toContain('Lot 299 is beyond its limit.')
    expect(text).not.toContain('Lot 179 is beyond its limit.')
  })
})
