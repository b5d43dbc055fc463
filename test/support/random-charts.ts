import fc from 'fast-check'
import type { ChartLimitSet, ChartSignal, StaffChartInput, StaveInput } from '@/lib/domain/charts/staff-chart'

const name = fc.oneof(
  { weight: 4, arbitrary: fc.constantFrom('Diameter', 'Mass per metre, weighed', 'limit set 5', '') },
  { weight: 1, arbitrary: fc.string({ unit: 'binary', maxLength: 12 }) },
  { weight: 1, arbitrary: fc.constantFrom('<b>&"\'</b>', ']]>', 'A♯3 & B♭', '\u0000\u0007') },
)

/** A value in σ of its limit set: mostly near, sometimes far off, sometimes no value at all. */
const deviation = fc.oneof(
  { weight: 8, arbitrary: fc.double({ min: -3.4, max: 3.4, noNaN: true }) },
  { weight: 1, arbitrary: fc.double({ min: -40, max: 40, noNaN: true }) },
  { weight: 1, arbitrary: fc.constantFrom(undefined, Number.NaN, Number.POSITIVE_INFINITY, 0, 1e12) },
)

const scale = fc.constantFrom(
  { centre: 253.92, sigma: 0.42 },
  { centre: 0, sigma: 0.047 },
  { centre: 1e-9, sigma: 1e-12 },
  { centre: -4e9, sigma: 1e6 },
  { centre: 10, sigma: 0 },
)

const staveOf = (count: number, key: string): fc.Arbitrary<StaveInput> =>
  fc
    .record({
      label: name,
      unitLabel: name,
      decimals: fc.integer({ min: 0, max: 4 }),
      signed: fc.boolean(),
      oneSided: fc.boolean(),
      scale,
      deviations: fc.array(deviation, { minLength: count, maxLength: count }),
      leftOut: fc.subarray(Array.from({ length: count }, (_, index) => index).slice(0, 4)),
      sets: fc.constantFrom(0, 1, 2),
      cut: fc.nat({ max: Math.max(0, count - 1) }),
      shift: fc.double({ min: -4, max: 4, noNaN: true }),
      reach: fc.option(fc.double({ min: 1, max: 12, noNaN: true }), { nil: undefined }),
      answered: fc.boolean(),
      // Every other stave has left its centre from some lot on: runs, and notes beyond limits within runs.
      lean: fc.constantFrom(-1, 0, 0, 1),
      leansFrom: fc.nat({ max: Math.max(0, count - 1) }),
    })
    .map((drawn): StaveInput => {
      const { centre, sigma } = drawn.scale
      const values = drawn.deviations.map((drawnZ, index) => {
        if (drawnZ === undefined) return undefined
        const z = drawn.lean !== 0 && index >= drawn.leansFrom ? drawn.lean * Math.abs(drawnZ) : drawnZ
        return centre + z * (sigma || Math.abs(centre) / 100)
      })
      const set = (fromIndex: number, toIndex: number, number: number, middle: number): ChartLimitSet => ({
        fromIndex,
        toIndex,
        number,
        centre: middle,
        sigma,
        upper: middle + 3 * sigma,
        lower: drawn.oneSided ? undefined : middle - 3 * sigma,
        provisional: number === 1,
      })
      const limitSets =
        count === 0 || drawn.sets === 0
          ? []
          : drawn.sets === 1 || drawn.cut === 0
            ? [set(0, count - 1, 1, centre)]
            : [set(0, drawn.cut - 1, 1, centre + drawn.shift * sigma), set(drawn.cut, count - 1, 2, centre)]
      return {
        key,
        label: drawn.label,
        unitLabel: drawn.unitLabel,
        decimals: drawn.decimals,
        signed: drawn.signed,
        oneSided: drawn.oneSided,
        values,
        leftOut: drawn.leftOut,
        limitSets,
        ...(drawn.reach === undefined
          ? {}
          : {
              tolerance: {
                upper: centre + drawn.reach * sigma,
                ...(drawn.oneSided ? {} : { lower: centre - drawn.reach * sigma }),
                label: 'specification revision 6',
              },
            }),
        signals: signalsOf(key, values, limitSets, drawn.leftOut, drawn.answered),
      }
    })

/** Signals by the plain meaning of both rules: beyond the limits, nine lots on one side. */
function signalsOf(
  key: string,
  values: readonly (number | undefined)[],
  sets: readonly ChartLimitSet[],
  leftOut: readonly number[],
  answered: boolean,
): ChartSignal[] {
  const state = answered ? 'answered' : 'open'
  const found: ChartSignal[] = []
  let run: number[] = []
  let side = 0
  const close = (): void => {
    if (run.length >= 9)
      found.push({
        id: `${key}-run-${run[0]}`,
        rule: 'nine-on-one-side',
        side: side > 0 ? 'above' : 'below',
        members: run,
        state,
        sentence: `${run.length} lots on one side.`,
      })
    run = []
  }
  values.forEach((value, index) => {
    const set = sets.find(({ fromIndex, toIndex }) => index >= fromIndex && index <= toIndex)
    if (value === undefined || !Number.isFinite(value) || !set || leftOut.includes(index)) return
    const now = Math.sign(value - set.centre)
    if (now !== side) close()
    side = now
    if (now !== 0) run.push(index)
    const isAbove = set.upper !== undefined && value > set.upper
    if (isAbove || (set.lower !== undefined && value < set.lower))
      found.push({
        id: `${key}-${index}`,
        rule: 'beyond-the-limits',
        side: isAbove ? 'above' : 'below',
        members: [index],
        state,
        sentence: `Lot ${index} is beyond its limit.`,
      })
  })
  close()
  return found
}

/** Staff charts of all sorts: none to many lots, wild values, wild names, limits or none, any window. */
export const anyChart = (mostLots = 70): fc.Arbitrary<StaffChartInput> =>
  fc.nat({ max: mostLots }).chain((count) =>
    fc.record(
      {
        title: name,
        decimal: fc.constantFrom('point' as const, 'comma' as const),
        lots: fc.constant(
          Array.from({ length: count }, (_, index) => ({
            lotId: 100 + index,
            code: `LA-${String(index + 1).padStart(3, '0')}`,
            madeAt: Date.UTC(2026, 0, 1) + index * 86_400_000,
            label: `${(index % 28) + 1} Jan`,
          })),
        ),
        staves: fc
          .integer({ min: 0, max: 3 })
          .chain((many) =>
            fc.tuple(...Array.from({ length: many }, (_, place) => staveOf(count, `stave-${place}`))),
          ),
        barLines: fc.array(
          fc.record({
            atIndex: fc.nat({ max: Math.max(1, count) }),
            kind: fc.constantFrom('die', 'machine', 'setting', 'specification', 'limit-set'),
            reason: name,
            detail: name,
          }),
          { maxLength: 5 },
        ),
        window: fc.record({
          from: fc.integer({ min: -5, max: count + 5 }),
          to: fc.integer({ min: -5, max: count + 5 }),
        }),
      },
      { requiredKeys: ['title', 'lots', 'staves', 'barLines'] },
    ),
  )

/** Widths of pages: a phone, a column, a desk. */
export const anyWidth = fc.constantFrom(320, 358, 599, 600, 700, 964, 1400)
