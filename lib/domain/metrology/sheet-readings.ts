import type { DiameterPair } from '../strings/section'
import { type Hertz, hertz, metres } from '../units/quantity'
import type { EvaluationContext } from './evaluation'
import type { SpecimenSheet } from './sheet'

/** The diameters of a sheet position by position, each less the gauge's known error; a lone one counts twice. */
export function diameterPairs(
  sheet: Pick<SpecimenSheet, 'diameters'>,
  shift: number,
): { readonly pairs: readonly DiameterPair[]; readonly complete: readonly DiameterPair[] } {
  const positions = new Map<number, { a?: number; b?: number }>()
  for (const { position, direction, value } of sheet.diameters) {
    const at = positions.get(position) ?? {}
    at[direction] = value.si + shift
    positions.set(position, at)
  }
  const complete: DiameterPair[] = []
  const pairs: DiameterPair[] = []
  for (const [, { a, b }] of [...positions].sort(([one], [two]) => one - two)) {
    const first = a ?? b
    if (first === undefined) continue
    const pair: DiameterPair = [metres(first), metres((a === undefined ? undefined : b) ?? first)]
    pairs.push(pair)
    if (a !== undefined && b !== undefined) complete.push(pair)
  }
  return { pairs, complete }
}

export interface FrequencyReading {
  readonly value: Hertz
  readonly n: number
  /** Standard uncertainty from the scatter of the plucks; zero for a single one. */
  readonly scatter: number
}

/**
 * The fundamental of several plucks: the mean of two, the median of three or more, which one bad pluck does
 * not move; its standard uncertainty from their standard deviation s is s/√n, for a median 1.2533 s/√n
 * (efficiency of the median of normal values). Undefined without a pluck.
 */
export function fundamentalOfPlucks(sheet: Pick<SpecimenSheet, 'frequencies'>): FrequencyReading | undefined {
  const values = sheet.frequencies.map((one) => one.si as number).sort((a, b) => a - b)
  const n = values.length
  const low = values[Math.floor((n - 1) / 2)]
  const high = values[Math.floor(n / 2)]
  if (low === undefined || high === undefined) return undefined
  const mean = values.reduce((sum, value) => sum + value, 0) / n
  const squares = values.reduce((sum, value) => sum + (value - mean) * (value - mean), 0)
  const s = n < 2 ? 0 : Math.sqrt(squares / (n - 1))
  return {
    value: hertz(n < 3 ? mean : (low + high) / 2),
    n,
    scatter: ((n < 3 ? 1 : 1.2533141373155) * s) / Math.sqrt(Math.max(1, n)),
  }
}

export interface LoadFacts {
  /** Conventional mass that hangs, kg, or the force itself, N. */
  readonly kind: 'mass' | 'force'
  readonly value: number
  readonly u: number
  readonly note?: string
}

/** Assumed of a load that is typed and not registered: half a per mille. */
const TYPED_LOAD_RELATIVE_U = 5e-4

/** What hangs, from registered weights or as typed; undefined when nothing is said or a weight is unknown. */
export function loadOf(
  sheet: Pick<SpecimenSheet, 'load'>,
  context: Pick<EvaluationContext, 'weights'>,
): { readonly load?: LoadFacts; readonly unknown: readonly string[] } {
  const { load } = sheet
  if (!load) return { unknown: [] }
  if (load.kind !== 'weights') {
    const value: number = load.value.si
    return {
      unknown: [],
      load: {
        kind: load.kind,
        value,
        u: value * TYPED_LOAD_RELATIVE_U,
        note: 'Typed, not a registered weight: half a per mille is assumed.',
      },
    }
  }
  const codes = [load.hanger, ...load.weights].filter((code) => code !== '')
  const found = codes.map((code) => context.weights.find((weight) => weight.code === code))
  const unknown = codes.filter((_, index) => found[index] === undefined)
  if (unknown.length > 0 || codes.length === 0) return { unknown }
  const value = found.reduce((sum, weight) => sum + (weight?.mass.value ?? 0), 0)
  const variance = found.reduce((sum, weight) => sum + (weight?.mass.u ?? 0) * (weight?.mass.u ?? 0), 0)
  return { unknown, load: { kind: 'mass', value, u: Math.sqrt(variance) } }
}
