import { runWords } from './run-words'
import {
  type ChartLimitSet,
  type ChartLot,
  type ChartNote,
  type ChartSignal,
  type ChartSlur,
  LOTS_FOR_LIMITS,
  type LotWindow,
  type StaffSegment,
  type StaveInput,
  type StaveModel,
  type ToleranceLine,
} from './staff-chart'
import { staveScale } from './stave-scale'

const ALL: LotWindow = { from: Number.NEGATIVE_INFINITY, to: Number.POSITIVE_INFINITY }

const NONE: readonly string[] = []

const idOf = (signal: ChartSignal): string => String(signal.id)

/** Frozen limits as lines. Without a spread there is nothing to draw but the centre. */
function segmentOf(set: ChartLimitSet, oneSided: boolean, window: LotWindow): StaffSegment {
  const { centre, sigma } = set
  const hasSpread = sigma > 0 && Number.isFinite(sigma)
  const steps = oneSided ? [1, 2] : [-2, -1, 1, 2]
  return {
    fromIndex: Math.max(set.fromIndex, window.from),
    toIndex: Math.min(set.toIndex, window.to),
    number: set.number,
    provisional: set.provisional,
    centre,
    sigma,
    upper: hasSpread ? (set.upper ?? centre + 3 * sigma) : undefined,
    lower: hasSpread && !oneSided ? (set.lower ?? centre - 3 * sigma) : undefined,
    inner: hasSpread ? steps.map((step) => centre + step * sigma) : [],
  }
}

/** What is asked of every lot, looked up once: the limits in force and the signals it is part of. */
interface StaveFacts {
  readonly setAt: (index: number) => { readonly set: ChartLimitSet; readonly lines: StaffSegment } | undefined
  readonly leftOut: ReadonlySet<number>
  readonly signalsAt: ReadonlyMap<number, readonly ChartSignal[]>
}

function factsOf(input: StaveInput): StaveFacts {
  const sets = input.limitSets.map((set) => ({ set, lines: segmentOf(set, input.oneSided, ALL) }))
  const signalsAt = new Map<number, ChartSignal[]>()
  for (const signal of input.signals)
    for (const index of signal.members) {
      const own = signalsAt.get(index)
      if (own) own.push(signal)
      else signalsAt.set(index, [signal])
    }
  return {
    // Sets are in order of lots without overlap: the last one that begins at or before the lot, if it reaches it.
    setAt: (index) => {
      let [low, high] = [0, sets.length]
      while (low < high) {
        const middle = (low + high) >> 1
        if ((sets[middle]?.set.fromIndex ?? 0) <= index) low = middle + 1
        else high = middle
      }
      const found = sets[low - 1]
      return found && index <= found.set.toIndex ? found : undefined
    },
    leftOut: new Set(input.leftOut),
    signalsAt,
  }
}

function noteOf(facts: StaveFacts, lot: ChartLot, index: number, value: number): ChartNote {
  const { set, lines } = facts.setAt(index) ?? {}
  const own = facts.signalsAt.get(index)
  const { upper, lower } = lines ?? {}
  return {
    index,
    lotId: lot.lotId,
    code: lot.code,
    value,
    sigmas: set && set.sigma > 0 ? (value - set.centre) / set.sigma : undefined,
    leftOut: facts.leftOut.has(index),
    beyond:
      upper !== undefined && value > upper
        ? 'above'
        : lower !== undefined && value < lower
          ? 'below'
          : undefined,
    open: own?.some(({ rule, state }) => rule === 'beyond-the-limits' && state === 'open') ?? false,
    signals: own?.map(idOf) ?? NONE,
  }
}

function slursOf(input: StaveInput, notes: readonly ChartNote[]): ChartSlur[] {
  const drawn = new Set(notes.map(({ index }) => index))
  return input.signals
    .filter(({ rule }) => rule === 'nine-on-one-side')
    .map((signal) => ({
      signal: idOf(signal),
      side: signal.side,
      state: signal.state,
      members: signal.members.filter((index) => drawn.has(index)),
      words: runWords(signal),
      sentence: signal.sentence,
    }))
    .filter(({ members }) => members.length > 1)
}

function tolerancesOf({ tolerance }: StaveInput): ToleranceLine[] {
  if (!tolerance) return []
  const line = (side: 'above' | 'below', word: string, value: number | undefined): ToleranceLine[] =>
    value === undefined ? [] : [{ side, value, label: `${word} tolerance, ${tolerance.label}` }]
  return [...line('above', 'upper', tolerance.upper), ...line('below', 'lower', tolerance.lower)]
}

/** Why a stave has no limits over its newest lots, in words; undefined when it has. */
function withoutLimits(input: StaveInput, segments: readonly StaffSegment[]): string | undefined {
  const newest = segments.at(-1)
  if (newest) return newest.sigma > 0 ? undefined : 'no spread in the baseline, so no limits'
  const count = input.values.filter((value) => value !== undefined).length
  return count < LOTS_FOR_LIMITS
    ? `no limits before ${LOTS_FOR_LIMITS} lots: ${count} so far`
    : `no limits frozen yet: ${count} lots`
}

/** One characteristic of a staff chart in the stave's own unit, for the lots of the window. */
export function buildStave(input: StaveInput, lots: readonly ChartLot[], window: LotWindow): StaveModel {
  const segments = input.limitSets
    .filter((set) => set.toIndex >= window.from && set.fromIndex <= window.to)
    .map((set) => segmentOf(set, input.oneSided, window))
  const facts = factsOf(input)
  const notes: ChartNote[] = []
  for (let index = window.from; index <= window.to; index += 1) {
    const [lot, value] = [lots[index], input.values[index]]
    if (lot && value !== undefined && Number.isFinite(value)) notes.push(noteOf(facts, lot, index, value))
  }
  const tolerances = tolerancesOf(input)
  const values = notes.map(({ value }) => value)
  return {
    key: input.key,
    label: input.label,
    unitLabel: input.unitLabel,
    decimals: input.decimals,
    signed: input.signed ?? false,
    oneSided: input.oneSided,
    notes,
    segments,
    slurs: slursOf(input, notes),
    tolerances,
    withoutLimits: withoutLimits(input, segments),
    scale: staveScale(segments, values, tolerances, input.decimals),
  }
}
