import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { columnText, labelColumn, readingBelow } from '@/lib/domain/charts/label-column'
import { plotFrame } from '@/lib/domain/charts/plot-frame'
import { staveParts } from '@/lib/domain/charts/stave-layout'
import { textWidth } from '@/lib/domain/charts/text-width'
import { sampleChart } from '@/test/support/staff-chart-sample'

function columnOf(
  width: number,
  more: { readonly label?: string; readonly lower?: number; readonly upper?: number } = {},
) {
  const input = sampleChart({})
  const [first] = input.staves
  if (!first) throw new Error('the sample has staves')
  const { label = first.label, lower, upper } = more
  const chart = buildStaffChart({
    ...input,
    window: { from: 8, to: 59 },
    staves: [{ ...first, label, tolerance: { lower, upper, label: 'specification revision 6' } }],
  })
  const frame = plotFrame(width, chart.window, 60)
  const [stave] = chart.staves
  if (!stave) throw new Error('one stave went in')
  const part = staveParts(stave, frame, chart.window, false)
  const text = columnText(part, frame, { decimal: 'point' })
  return { text, part, frame, ...labelColumn(part, 300, frame, text) }
}

describe('columnText', () => {
  it('says name and unit, and tolerances too far off to be drawn', () => {
    const said = (more: Parameters<typeof columnOf>[1]) => columnOf(964, more).text.map(({ text }) => text)
    expect(said({})).toEqual(['Diameter', 'µm, individuals'])
    expect(said({ lower: 200, upper: 300.5 })).toEqual([
      'Diameter',
      'µm, individuals',
      'tolerance 200 – 300.50',
    ])
    expect(said({ upper: 300 })).toEqual(['Diameter', 'µm, individuals', 'at most 300'])
    expect(said({ lower: 200 })).toEqual(['Diameter', 'µm, individuals', 'at least 200'])
  })

  it('fits its column, or the page beside the reading', () => {
    const label = 'Spread within the lot, mass per metre, weighed'
    for (const [width, most] of [
      [964, 128],
      [358, 306 - 76],
    ] as const)
      for (const { text, kind } of columnOf(width, { label, lower: 200, upper: 300 }).text)
        if (kind === 'name') expect(textWidth(text, 13, 'strong')).toBeLessThanOrEqual(most)
        else expect(textWidth(text, 11)).toBeLessThanOrEqual(Math.max(most, 306))
  })
})

describe('labelColumn', () => {
  it('stands beside the staff, its reading below the lines', () => {
    const { column, readout, part } = columnOf(964)
    expect(column.map(({ x }) => x)).toEqual([0, 0])
    expect(column[0]?.y).toBe(300 + part.top + 10)
    expect(readout.y).toBe(300 + part.top + 82)
  })

  it('moves the reading down where the lines need the room', () => {
    const label = 'Spread within the lot, mass per metre, weighed and sounded, one by one'
    const { column, readout, part, text } = columnOf(964, { label, lower: 200, upper: 300 })
    expect(readout.y - 17).toBeGreaterThanOrEqual((column.at(-1)?.y ?? 0) - 2)
    expect(readout.y).toBe(300 + part.top + readingBelow(part, text))
  })

  it('stands above the stave on a narrow page, in the room above its marks', () => {
    const { column, part, frame, readout } = columnOf(358, {
      label: 'Spread within the lot, mass per metre, weighed',
    })
    expect(column).toHaveLength(3)
    for (const { y } of column) expect(y).toBeLessThanOrEqual(300 + part.top - part.above + part.freeAbove)
    expect(readout).toMatchObject({ valueX: frame.x + frame.w, y: column[0]?.y })
  })
})
