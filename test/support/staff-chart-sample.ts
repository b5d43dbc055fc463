import type { ChartSignal, StaffChartInput, StaveInput } from '@/lib/domain/charts/staff-chart'

/** A small seeded generator (mulberry32): the same invented lots in every run. */
export function seeded(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
}

const DAY = 86_400_000
const START = Date.UTC(2026, 6, 6, 5, 40)
const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec']

const day = (at: number): string => `${new Date(at).getUTCDate()} ${months[new Date(at).getUTCMonth()]}`

/** Gaussian enough for a picture: the sum of twelve uniform numbers. */
const normal = (next: () => number): number =>
  Array.from({ length: 12 }, next).reduce((sum, one) => sum + one, -6)

export interface SampleOptions {
  readonly lots?: number
  readonly seed?: number
  readonly window?: { readonly from: number; readonly to: number }
  /** Every lot has the same values. */
  readonly equal?: boolean
}

/**
 * Invented lots of one wire: a die that wears from lot 34 on until it is changed, a change of limit sets, four
 * lots left out of the baseline, one light load answered. Signals are those that the values really show.
 */
export function sampleChart({
  lots: count = 60,
  seed = 7,
  window,
  equal = false,
}: SampleOptions = {}): StaffChartInput {
  const random = seeded(seed)
  const next = equal ? () => 0.5 : random
  const lots = Array.from({ length: count }, (_, index) => {
    const madeAt = START + Math.floor(index * 1.9) * DAY + Math.floor(next() * 6) * 3_600_000
    return {
      lotId: 900 + index,
      code: `LA-${301 + index}`,
      madeAt,
      label: day(madeAt),
      monthLabel: `${months[new Date(madeAt).getUTCMonth()]} ${new Date(madeAt).getUTCFullYear()}`,
    }
  })
  const wear = (index: number): number => (equal || index < 34 ? 0 : Math.min(1.6, 0.062 * (index - 34)))
  const diameter = lots.map((_, index) =>
    index < 4 ? 254.9 + 0.4 * normal(next) : 253.92 + wear(index) + 0.33 * normal(next),
  )
  const density = lots.map(
    (_, index) => 7849 + (!equal && index > 17 && index < 28 ? -11 : 0) + 9 * normal(next),
  )
  const mass = diameter.map((d, index) => ((density[index] ?? 0) * Math.PI * (d / 1000) ** 2) / 4)
  const closure = lots.map((_, index) => (!equal && index === 22 ? 0.18 : 0.042 * normal(next)))
  const spread = lots.map(() => Math.abs(0.21 + 0.075 * normal(next)))
  const leftOut = [0, 1, 2, 3].filter((index) => index < count)
  const sets = (centre: number, sigma: number, oneSided = false) => {
    const of = (
      fromIndex: number,
      toIndex: number,
      number: number,
      c: number,
      s: number,
      provisional: boolean,
    ) => ({
      fromIndex,
      toIndex,
      number,
      centre: c,
      sigma: s,
      upper: c + 3 * s,
      lower: oneSided ? undefined : c - 3 * s,
      provisional,
    })
    // Before 20 lots no limits are frozen.
    return count < 20
      ? []
      : [of(0, 8, 4, centre - 0.2 * sigma, sigma * 1.12, true), of(9, count - 1, 5, centre, sigma, false)]
  }
  const stave = (
    part: Pick<StaveInput, 'key' | 'label' | 'unitLabel' | 'decimals' | 'values' | 'oneSided'> &
      Partial<StaveInput>,
    centre: number,
    sigma: number,
  ): StaveInput => {
    const limitSets = sets(centre, sigma, part.oneSided)
    const bare: StaveInput = { leftOut, limitSets, signals: [], ...part }
    return {
      ...bare,
      signals: signalsOf(
        bare,
        lots.map(({ code }) => code),
      ),
    }
  }
  return {
    title: 'Larch 254 on drawing machine 1',
    lots,
    staves: [
      stave(
        {
          key: 'diameter',
          label: 'Diameter',
          unitLabel: 'µm, individuals',
          decimals: 2,
          oneSided: false,
          values: diameter.map((value, index) => (index === 30 ? undefined : value)),
          tolerance: { lower: 251, upper: 257, label: 'specification revision 6' },
        },
        253.92,
        0.42,
      ),
      stave(
        {
          key: 'mass',
          label: 'Mass per metre, weighed',
          unitLabel: 'mg/m, individuals',
          decimals: 1,
          oneSided: false,
          values: mass,
          tolerance: { lower: 389.8, upper: 405.8, label: 'specification revision 6' },
        },
        397.5,
        1.27,
      ),
      stave(
        {
          key: 'closure',
          label: 'Closure',
          unitLabel: '%, individuals',
          decimals: 2,
          signed: true,
          oneSided: false,
          values: closure,
        },
        0,
        0.047,
      ),
      stave(
        {
          key: 'spread',
          label: 'Spread within the lot',
          unitLabel: '%, standard deviation',
          decimals: 2,
          oneSided: true,
          values: spread,
        },
        0.21,
        0.075,
      ),
    ],
    barLines: [
      { atIndex: 9, kind: 'limit-set' as const, reason: 'limit set 5', detail: '2 Aug, M. Orrin' },
      { atIndex: 18, kind: 'machine' as const, reason: 'coil C-118', detail: '18 Aug' },
      { atIndex: 33, kind: 'die' as const, reason: 'die 7 in', detail: '6 Sep, T. Aldous' },
      { atIndex: 36, kind: 'setting' as const, reason: 'oil 41 °C', detail: '12 Sep, T. Aldous' },
    ].filter(({ atIndex, kind }) => atIndex < count && (count >= 20 || kind !== 'limit-set')),
    window,
  }
}

/** Signals by the plain meaning of the two rules; answered ones are the older half. */
function signalsOf(stave: StaveInput, codes: readonly string[]): ChartSignal[] {
  const found: ChartSignal[] = []
  let run: number[] = []
  let side = 0
  const close = (): void => {
    if (run.length >= 9)
      found.push({
        id: `${stave.key}-run-${run[0]}`,
        rule: 'nine-on-one-side',
        side: side > 0 ? 'above' : 'below',
        members: run,
        state: (run[0] ?? 0) < 30 ? 'answered' : 'open',
        sentence: `${run.length} lots ${side > 0 ? 'above' : 'below'} the centre, ${codes[run[0] ?? 0]} to ${codes[run.at(-1) ?? 0]}.`,
      })
    run = []
  }
  stave.values.forEach((value, index) => {
    const set = stave.limitSets.find(({ fromIndex, toIndex }) => index >= fromIndex && index <= toIndex)
    if (value === undefined || !set || stave.leftOut.includes(index)) return
    const now = Math.sign(value - set.centre)
    if (now !== side) close()
    side = now
    run.push(index)
    const isAbove = set.upper !== undefined && value > set.upper
    const isBelow = set.lower !== undefined && value < set.lower
    if (isAbove || isBelow)
      found.push({
        id: `${stave.key}-${index}`,
        rule: 'beyond-the-limits',
        side: isAbove ? 'above' : 'below',
        members: [index],
        state: index < 30 ? 'answered' : 'open',
        sentence: `${stave.label} of ${codes[index]} is beyond its limit.`,
      })
  })
  close()
  return found
}
