import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { describeStaffChart } from '@/lib/domain/charts/describe-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { staffBrush } from '@/lib/domain/charts/staff-brush'
import type { ChartSignal, StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { allShapes, textsIn } from '@/test/support/drawing'
import { seeded } from '@/test/support/staff-chart-sample'

interface Years {
  readonly lots: number
  readonly staves?: number
  readonly seed?: number
  /** Share of lots beyond their limits, each an open signal. */
  readonly beyond?: number
  /** Every ninth lot begins a run. */
  readonly runs?: boolean
  /** A spool is changed every so many lots. */
  readonly spools?: number
}

/** Many years of a works: as many lots, signals, runs and changes of spools as asked for. */
function years({
  lots: count,
  staves = 1,
  seed = 1,
  beyond = 0.003,
  runs = false,
  spools = 40,
}: Years): StaffChartInput {
  const next = seeded(seed)
  return {
    title: 'Larch 254',
    lots: Array.from({ length: count }, (_, index) => ({
      lotId: index,
      code: `LA-${index}`,
      madeAt: index * 43_200_000,
      label: `${(index % 28) + 1} Jan`,
      ...(index % 60 === 0 ? { monthLabel: `Jan ${1970 + Math.floor(index / 730)}` } : {}),
    })),
    staves: Array.from({ length: staves }, (_, place) => {
      const values = Array.from({ length: count }, () =>
        next() < beyond ? (next() < 0.5 ? -1 : 1) * (3.1 + 2 * next()) : 4 * next() - 2,
      )
      const signals = values.flatMap((value, index): ChartSignal[] =>
        Math.abs(value) > 3
          ? [
              {
                id: `${place}-${index}`,
                rule: 'beyond-the-limits',
                side: value > 0 ? 'above' : 'below',
                members: [index],
                state: next() < 0.7 ? 'open' : 'answered',
                sentence: `LA-${index} is beyond its limit.`,
              },
            ]
          : [],
      )
      const runSignals = runs
        ? Array.from(
            { length: Math.floor(count / 9) },
            (_, run): ChartSignal => ({
              id: `${place}-run-${run}`,
              rule: 'nine-on-one-side',
              side: run % 2 === 0 ? 'above' : 'below',
              members: Array.from({ length: 9 }, (_, member) => 9 * run + member),
              state: run % 3 === 0 ? 'open' : 'answered',
              sentence: `Nine lots from LA-${9 * run}.`,
            }),
          )
        : []
      return {
        key: `stave-${place}`,
        label: 'Diameter',
        unitLabel: 'µm, individuals',
        decimals: 2,
        oneSided: false,
        values,
        leftOut: [],
        limitSets: [{ fromIndex: 0, toIndex: count - 1, number: 1, centre: 0, sigma: 1, provisional: false }],
        signals: [...signals, ...runSignals],
      }
    }),
    barLines: Array.from({ length: Math.floor(count / spools) }, (_, place) => ({
      atIndex: place * spools,
      kind: 'spool' as const,
      reason: `spool S-${place}`,
      detail: '2 Aug, T. Aldous',
    })),
  }
}

const draw = (input: StaffChartInput, window: { from: number; to: number }, width: number) => {
  const layout = layoutStaffChart(buildStaffChart({ ...input, window }), width)
  return { layout, shapes: allShapes(drawStaffChart(layout).shapes) }
}

const worst: Years = { lots: 50_000, staves: 5, beyond: 0.4, runs: true, spools: 2 }

/** Fifty thousand lots take their time where many tests run at once. */
const PATIENCE = 120_000

describe('the number of drawn marks', { timeout: PATIENCE }, () => {
  it('depends on the width only: 50,000 lots on five staves, thousands of signals, runs and changes', () => {
    const input = years(worst)
    for (const width of [390, 964]) {
      const { layout, shapes } = draw(input, { from: 0, to: 49_999 }, width)
      // Four shapes a note and two a slur, once for each px of width, and what a sixth of it of bar lines brings.
      expect(shapes.length).toBeLessThan(5 * 10 * layout.frame.w + 500)
      expect(shapes.length).toBeGreaterThan(5 * layout.frame.w)
      expect(JSON.stringify(staffBrush(input, layout.frame, width).shapes).length).toBeLessThan(200 * width)
    }
  })

  it('is small where signals are as rare as chance makes them', () => {
    const quiet = years({ lots: 50_000, staves: 5, beyond: 0.0027 })
    const { layout, shapes } = draw(quiet, { from: 0, to: 49_999 }, 964)
    expect(layout.hidden).toBe(0)
    const signals = quiet.staves.reduce((sum, stave) => sum + stave.signals.length, 0)
    expect(shapes.length).toBeLessThan(4 * signals + 5 * 764 * 2)
  })

  it('says under the chart how many signals are not drawn, on a desk and on a phone', () => {
    const input = years({ lots: 20_000, beyond: 0.4 })
    const { layout, shapes } = draw(input, { from: 0, to: 19_999 }, 964)
    const drawn = layout.staves[0]?.notes.filter(({ note }) => note.signals.length > 0).length ?? 0
    expect(layout.hidden).toBe((input.staves[0]?.signals.length ?? 0) - drawn)
    const told = textsIn(shapes).find(({ text }) => text.startsWith(`${layout.hidden} signals not drawn`))
    expect(told?.y).toBeLessThan(layout.height - 2)
    expect(told?.y).toBeGreaterThan(layout.axis.y + 30)
    expect(textsIn(draw(input, { from: 0, to: 19_999 }, 360).shapes).map(({ text }) => text)).toContain(
      `${draw(input, { from: 0, to: 19_999 }, 360).layout.hidden} signals not drawn.`,
    )
    expect(
      textsIn(draw(input, { from: 0, to: 51 }, 964).shapes)
        .map(({ text }) => text)
        .join(),
    ).not.toContain('not drawn')
  })

  it('describes thousands of signals in words that can be listened to', () => {
    const chart = buildStaffChart({ ...years({ ...worst, lots: 9000 }), window: undefined })
    expect(describeStaffChart(chart).length).toBeLessThan(6000)
    expect(describeStaffChart(chart)).toMatch(/\d+ earlier lots, LA-/)
  })
})

const anyYears: fc.Arbitrary<Years> = fc.record({
  lots: fc.integer({ min: 1, max: 2000 }),
  seed: fc.nat(),
  beyond: fc.constantFrom(0, 0.003, 0.05, 0.5),
  runs: fc.boolean(),
  spools: fc.constantFrom(1, 3, 40),
})
const anyPart = fc.tuple(
  fc.double({ min: 0, max: 1, noNaN: true }),
  fc.double({ min: 0, max: 1, noNaN: true }),
)
const anyView = fc.tuple(anyYears, anyPart, fc.constantFrom<number>(360, 700, 964, 1400))

/** Where chance alone seldom leads: far more signals and runs than px. */
const crowded: [Years, [number, number], number] = [
  { lots: 9000, seed: 3, beyond: 0.5, runs: true, spools: 3 },
  [0, 1],
  700,
]

const viewed = ([facts, [a, b], width]: [Years, [number, number], number]) => {
  const input = years(facts)
  const [from, to] = [a, b].map((part) => Math.round(part * (facts.lots - 1))).sort((x, y) => x - y)
  return { input, ...draw(input, { from: from ?? 0, to: to ?? 0 }, width) }
}

describe('any window', { timeout: PATIENCE }, () => {
  it('keeps the highest and the lowest of each column of 12 px', () => {
    fc.assert(
      fc.property(anyView, (view) => {
        const { layout } = viewed(view)
        const perColumn = Math.max(1, Math.ceil(12 / layout.frame.step - 1e-9))
        for (const { stave, notes, yAt } of layout.staves) {
          const drawn = new Map<number, number[]>()
          for (const { note } of notes) {
            const column = Math.floor(note.index / perColumn)
            drawn.set(column, [...(drawn.get(column) ?? []), yAt(note.value)])
          }
          const all = new Map<number, number[]>()
          for (const { index, value } of stave.notes) {
            const column = Math.floor(index / perColumn)
            all.set(column, [...(all.get(column) ?? []), yAt(value)])
          }
          for (const [column, heights] of all) {
            const own = drawn.get(column) ?? []
            // Less than a head's height may lie between an extreme and the drawn note that hides it.
            expect(Math.min(...own) - Math.min(...heights)).toBeLessThan(8.4)
            expect(Math.max(...heights) - Math.max(...own)).toBeLessThan(8.4)
          }
        }
      }),
      { numRuns: 25, seed: 11 },
    )
  })

  it('has a mark for every open signal: its own, or in its column of pixels one at least as far out', () => {
    fc.assert(
      fc.property(anyView, (view) => {
        const { layout } = viewed(view)
        for (const { stave, notes, slurs } of layout.staves) {
          const own = new Set(notes.map(({ note }) => note.index))
          const columns = new Map<number, number>()
          for (const { note } of notes)
            if (note.open) {
              const column = Math.floor(note.index * layout.frame.step)
              columns.set(column, Math.max(columns.get(column) ?? 0, Math.abs(note.value)))
            }
          const hiddenNotes = stave.notes.filter(
            ({ index, open, beyond }) => (open || beyond) && !own.has(index),
          )
          if (hiddenNotes.length > 0)
            expect(stave.notes.filter(({ open }) => open).length).toBeGreaterThan(60)
          for (const { index, value, open } of hiddenNotes)
            if (open)
              expect(columns.get(Math.floor(index * layout.frame.step))).toBeGreaterThanOrEqual(
                Math.abs(value),
              )
          const drawnRuns = new Set(slurs.map(({ slur }) => slur.signal))
          const openAt = slurs
            .filter(({ slur }) => slur.state === 'open')
            .map(({ slur }) =>
              [slur.side, Math.floor(((slur.members[0] ?? 0) * layout.frame.step) / 4)].join(),
            )
          for (const { signal, state, members, side } of stave.slurs)
            if (state === 'open' && !drawnRuns.has(signal))
              expect(openAt).toContain([side, Math.floor(((members[0] ?? 0) * layout.frame.step) / 4)].join())
        }
      }),
      { numRuns: 25, seed: 12, examples: [[crowded]] },
    )
  })

  it('draws the ends of every run that is drawn, and bar lines no nearer than 6 px', () => {
    fc.assert(
      fc.property(anyView, (view) => {
        const { layout } = viewed(view)
        for (const { notes, slurs } of layout.staves) {
          const own = new Set(notes.map(({ note }) => note.index))
          for (const { slur } of slurs)
            for (const end of [slur.members[0], slur.members.at(-1)]) expect(own).toContain(end)
        }
        const xs = layout.bars.placed.map(({ x }) => x)
        for (const [index, x] of xs.slice(1).entries())
          expect(x - (xs[index] ?? 0)).toBeGreaterThanOrEqual(6 - 1e-6)
        const told = layout.bars.placed.reduce((sum, { near }) => sum + 1 + near, 0)
        expect(told).toBe(layout.chart.barLines.length)
      }),
      { numRuns: 25, seed: 13 },
    )
  })
})
