import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { labelShapes } from '@/lib/domain/charts/chart-labels'
import { layoutStaffChart, type StaffLayout } from '@/lib/domain/charts/layout-staff-chart'
import { boxesTouch, labelBox } from '@/lib/domain/charts/place-labels'
import type { TextShape } from '@/lib/domain/charts/shape'
import { slurPoint } from '@/lib/domain/charts/slur'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

const boxOf = ({ x, y, text, size, italic, weight, anchor = 'start' }: TextShape) =>
  labelBox(text, size ?? (italic ? 13 : 11), italic ? 'italic' : weight === 600 ? 'strong' : 'sans', {
    x,
    y,
    anchor,
  })

const layoutOf = (options: Parameters<typeof sampleChart>[0], width = 964): StaffLayout =>
  layoutStaffChart(buildStaffChart(sampleChart(options)), width)

const said = (layout: StaffLayout, mark: string, stave?: string) =>
  labelShapes(layout).filter(({ role }) => role?.mark === mark && (!stave || role.stave === stave))

/** A 60-lot diameter stave whose lots all lie on the centre but for these. */
function quietBut(off: Readonly<Record<number, number>>, width = 964): StaffLayout {
  const input = sampleChart({})
  const [first] = input.staves
  if (!first) throw new Error('the sample has staves')
  const values = first.values.map((_, index) => 253.92 + 0.42 * (off[index] ?? 0))
  return layoutStaffChart(
    buildStaffChart({
      ...input,
      barLines: [],
      staves: [{ ...first, values, signals: [], tolerance: undefined }],
    }),
    width,
  )
}

describe('labelShapes', () => {
  it('lets no label touch a note, a slur, a bar line, a staff with limits or another label', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        const layout = layoutStaffChart(buildStaffChart(input), width)
        const boxes = labelShapes(layout).map(boxOf)
        boxes.forEach((box, index) => {
          for (const other of boxes.slice(index + 1)) expect(boxesTouch(box, other)).toBe(false)
          for (const { notes, slurs, segments, y, top, bottom } of layout.staves) {
            for (const note of notes)
              expect(boxesTouch(box, { x: note.x - 5.8, y: y + note.y - 4.2, w: 11.6, h: 8.4 })).toBe(false)
            for (const { curve } of slurs)
              for (let step = 0; step <= 100; step += 1) {
                const [x, down] = slurPoint(curve, step / 100)
                expect(boxesTouch(box, { x, y: y + down, w: 0, h: 0 })).toBe(false)
              }
            if (segments.some(({ segment }) => segment.upper !== undefined))
              expect(
                boxesTouch(box, {
                  x: layout.frame.x,
                  y: y + top - 2.9,
                  w: layout.frame.w,
                  h: bottom - top + 5.8,
                }),
              ).toBe(false)
          }
          for (const x of layout.bars.placed.flatMap(({ xs }) => xs))
            expect(boxesTouch(box, { x, y: layout.bars.y1, w: 0, h: layout.bars.y2 - layout.bars.y1 })).toBe(
              false,
            )
        })
      }),
      { numRuns: 150, seed: 1 },
    )
  })

  it('writes the value of a note beyond its limits 9 px above its head, and below one that is below', () => {
    const layout = quietBut({ 20: 3.6, 40: -3.6 })
    const [stave] = layout.staves
    const labels = said(layout, 'value-label')
    expect(labels.map(({ text }) => text).sort()).toEqual(['252.41', '255.43'])
    for (const { role, text, x, y, weight } of labels) {
      const note = stave?.notes.find((one) => one.note.code === role?.lot)
      expect(text).toBe(note?.note.value.toFixed(2))
      expect(x).toBe(note?.x)
      expect(weight).toBe(600)
      const head = (stave?.y ?? 0) + (note?.y ?? 0)
      if (text === '255.43') expect(y).toBe(head - 9)
      else expect(y).toBe(head + 17)
    }
  })

  it('keeps the value of the one further out where two would touch', () => {
    const layout = quietBut({ 20: 3.6, 21: 4.4 })
    expect(said(layout, 'value-label').map(({ role }) => role?.lot)).toContain('LA-322')
    expect(
      said(quietBut({ 20: 3.5, 21: 3.6, 22: 3.7, 23: 3.5, 24: 3.6 }), 'value-label').length,
    ).toBeLessThan(5)
  })

  it('writes no more than eight values on a stave, the furthest', () => {
    const off = Object.fromEntries(
      Array.from({ length: 14 }, (_, place) => [4 + 4 * place, 3.3 + 0.1 * place]),
    )
    const labels = said(quietBut(off, 1400), 'value-label')
    expect(labels.map(({ role }) => role?.lot).sort()).toEqual(
      Array.from({ length: 8 }, (_, place) => `LA-${301 + 4 + 4 * (13 - place)}`).sort(),
    )
  })

  it('says a run outside its slur, vermilion while it is open and slate once answered', () => {
    const layout = layoutOf({})
    const [open] = said(layout, 'run-label', 'diameter')
    expect(open).toMatchObject({ text: '25 above centre', ink: 'vermilion', italic: true })
    const slur = layout.staves[0]?.slurs[0]
    expect(open?.y).toBeLessThan((layout.staves[0]?.y ?? 0) + (slur?.top ?? 0))
    const answered = sampleChart({ window: { from: 0, to: 30 } })
    const labels = labelShapes(layoutStaffChart(buildStaffChart(answered), 1400))
    expect(labels.find(({ role }) => role?.mark === 'run-label')?.ink ?? 'slate').toBe('slate')
  })

  it('names each tolerance at the left end of its line, in short where there is no room', () => {
    const named = (layout: StaffLayout) =>
      labelShapes(layout).filter(({ text }) => text.includes('tolerance'))
    const [upper] = named(layoutOf({}))
    expect(upper).toMatchObject({ text: 'upper tolerance, specification revision 6', ink: 'vermilion' })
    expect(upper?.x).toBeLessThan(138 + 6)
    // A crowd just below the line, all along it.
    const input = sampleChart({})
    const [first] = input.staves
    if (!first) throw new Error('the sample has staves')
    const crowded = {
      ...first,
      values: first.values.map((_, index) => (index % 15 < 9 ? 253.92 : 256.9 + 0.3 * (index % 2))),
      signals: [],
    }
    const layout = layoutStaffChart(buildStaffChart({ ...input, barLines: [], staves: [crowded] }), 964)
    expect(named(layout).map(({ text }) => text)).toContain('upper tolerance')
  })

  it('says where there are no limits', () => {
    const labels = labelShapes(layoutOf({ lots: 12 })).filter(({ role }) => role?.state === 'without-limits')
    expect(labels.map(({ text }) => text)).toEqual(Array(4).fill('no limits before 20 lots: 12 so far'))
  })
})
