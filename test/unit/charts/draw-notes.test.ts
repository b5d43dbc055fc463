import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { ledgerShapes, lotHref, noteShapes, slurShapes } from '@/lib/domain/charts/draw-notes'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import type { ChartSignalState, StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { allShapes, marksIn } from '@/test/support/drawing'
import { sampleChart } from '@/test/support/staff-chart-sample'

function staveOf(input: StaffChartInput, key: string) {
  const layout = layoutStaffChart(buildStaffChart(input))
  const stave = layout.staves.find((one) => one.stave.key === key)
  if (!stave) throw new Error(`no stave ${key}`)
  return { layout, stave }
}

describe('lotHref', () => {
  it('leads to the lot’s page, whatever its code', () => {
    expect(lotHref('LA-354')).toBe('/lots/LA-354')
    expect(lotHref('a/b c?')).toBe('/lots/a%2Fb%20c%3F')
  })
})

describe('noteShapes', () => {
  const { layout, stave } = staveOf(sampleChart({}), 'mass')
  const shapes = noteShapes(stave, layout)

  it('draws one note a lot, each a way to it, with its reading as a title', () => {
    expect(shapes).toHaveLength(60)
    for (const shape of shapes) {
      if (shape.kind !== 'group') throw new Error('a note is a group')
      const [head] = marksIn([shape], 'note')
      expect(shape.href).toBe(`/lots/${head?.role?.lot}`)
      expect(shape.title).toMatch(
        new RegExp(`^${head?.role?.lot}: Mass per metre, weighed \\d+\\.\\d, [+\\u2212]?\\d+\\.\\d\\u00a0σ`),
      )
    }
  })

  it('leaves the heads of lots left out open', () => {
    const open = marksIn(shapes, 'note').filter((head) => head.kind === 'ellipse' && head.fill === 'paper')
    expect(open.map(({ role }) => role?.lot)).toEqual(['LA-301', 'LA-302', 'LA-303', 'LA-304'])
    expect(open.every(({ role }) => role?.state?.includes('left-out'))).toBe(true)
  })

  it('is vermilion while its own signal is unanswered, ink after, and says so', () => {
    for (const { note } of stave.notes) {
      const head = marksIn(shapes, 'note').find(({ role }) => role?.lot === note.code)
      const ink = head?.kind === 'ellipse' ? (head.stroke ?? head.fill) : undefined
      expect(ink).toBe(note.open ? 'vermilion' : 'ink')
      expect(head?.role?.state?.includes('open') ?? false).toBe(note.open)
    }
    expect(stave.notes.some(({ note }) => note.open)).toBe(true)
  })

  it('points on from the edge to a note that is too far off', () => {
    const input = sampleChart({})
    const far = {
      ...input,
      staves: input.staves.map((one) => ({
        ...one,
        values: one.values.map((value, index) => (index === 40 ? 9e9 : value)),
      })),
    }
    const drawn = staveOf(far, 'mass')
    const group = noteShapes(drawn.stave, drawn.layout).find(
      (shape) => shape.kind === 'group' && shape.href === '/lots/LA-341',
    )
    if (group?.kind !== 'group') throw new Error('a note is a group')
    expect(group.shapes).toHaveLength(2)
    const [arrow, head] = group.shapes
    const tip = arrow?.kind === 'path' ? arrow.segments[1] : undefined
    expect(tip?.[2]).toBeLessThan(head?.kind === 'ellipse' ? head.cy - 4.2 : Number.NaN)
  })
})

describe('ledgerShapes', () => {
  it('draws a line of 20 px through every note beyond its limits and no other', () => {
    const { stave } = staveOf(sampleChart({}), 'mass')
    const ledgers = ledgerShapes(stave)
    const beyond = stave.notes.filter(({ note }) => note.beyond)
    expect(beyond.length).toBeGreaterThan(0)
    expect(ledgers.map(({ role }) => role?.lot)).toEqual(beyond.map(({ note }) => note.code))
    ledgers.forEach((ledger, index) => {
      const { x = 0, y = 0 } = beyond[index] ?? {}
      expect(ledger).toMatchObject({
        width: 1.4,
        segments: [
          ['M', x - 10, stave.y + y],
          ['L', x + 10, stave.y + y],
        ],
      })
    })
  })
})

describe('slurShapes', () => {
  const drawnAs = (state: ChartSignalState) => {
    const input = sampleChart({})
    const changed = {
      ...input,
      staves: input.staves.map((one) => ({
        ...one,
        signals: one.signals.map((signal) => ({ ...signal, state })),
      })),
    }
    const { stave } = staveOf(changed, 'diameter')
    const [slur] = slurShapes(stave)
    return { group: slur, path: allShapes(slur ? [slur] : []).find(({ kind }) => kind === 'path') }
  }

  it('is vermilion while open, slate when answered, a broken outline when it no longer holds', () => {
    expect(drawnAs('open').path).toMatchObject({ fill: 'vermilion', stroke: 'vermilion', width: 0.7 })
    expect(drawnAs('answered').path).toMatchObject({ fill: 'slate', stroke: 'slate' })
    const old = drawnAs('no-longer-holds').path
    expect(old).toMatchObject({ stroke: 'slate', dash: [3, 3] })
    expect(old?.kind === 'path' ? old.fill : 'none').toBeUndefined()
  })

  it('names its signal and says its sentence', () => {
    const { group, path } = drawnAs('open')
    expect(path?.role).toMatchObject({
      mark: 'slur',
      stave: 'diameter',
      signal: 'diameter-run-35',
      state: 'open',
    })
    expect(group?.kind === 'group' ? group.title : '').toBe('25 lots above the centre, LA-336 to LA-360.')
  })
})
