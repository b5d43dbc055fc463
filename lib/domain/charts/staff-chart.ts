import type { ReadoutFormat } from './readout'

/** One lot of the shared axis, in chart order (time made, lot code). */
export interface ChartLot {
  readonly lotId: number
  readonly code: string
  /** Epoch milliseconds. */
  readonly madeAt: number
  /** The day as it is shown under the axis, in the works' zone and language. */
  readonly label: string
  /** Shown under the overview where the month changes; the day stands in when absent. */
  readonly monthLabel?: string
}

/** Frozen limits over the lots `fromIndex` to `toIndex`, both included; values in the stave's unit. */
export interface ChartLimitSet {
  readonly fromIndex: number
  readonly toIndex: number
  readonly number: number
  readonly centre: number
  readonly sigma: number
  readonly lower?: number
  readonly upper?: number
  readonly provisional: boolean
}

export interface ChartTolerance {
  readonly lower?: number
  readonly upper?: number
  /** Whose limits: "specification revision 6". */
  readonly label: string
}

export type ChartRule = 'beyond-the-limits' | 'nine-on-one-side'
export type ChartSignalState = 'open' | 'answered' | 'no-longer-holds'

export interface ChartSignal {
  readonly id: string | number
  readonly rule: ChartRule
  readonly side: 'above' | 'below'
  /** Lot indices of the pattern, rising. */
  readonly members: readonly number[]
  readonly state: ChartSignalState
  /** What happened, as a sentence. */
  readonly sentence: string
}

export interface StaveInput {
  readonly key: string
  readonly label: string
  /** Unit and kind of chart: "µm, individuals". */
  readonly unitLabel: string
  readonly decimals: number
  /** Deviations are written with their sign. */
  readonly signed?: boolean
  /** Bounded characteristics (ovality, spread) have no lower lines. */
  readonly oneSided: boolean
  /** One per lot, in the display unit; undefined where the lot has no value. */
  readonly values: readonly (number | undefined)[]
  /** Indices of lots that were left out of the baseline. */
  readonly leftOut: readonly number[]
  /** In order of lots, without overlap; empty before there are enough lots. */
  readonly limitSets: readonly ChartLimitSet[]
  readonly tolerance?: ChartTolerance
  readonly signals: readonly ChartSignal[]
}

/** What can change between two lots, in the order in which it is told when it changes together. */
export const barLineKinds = [
  'limit-set',
  'product',
  'specification',
  'die',
  'machine',
  'coil',
  'spool',
  'resin',
  'setting',
] as const

export type BarLineKind = (typeof barLineKinds)[number]

/** Something changed before the lot at `atIndex`. */
export interface BarLineInput {
  readonly atIndex: number
  readonly kind: BarLineKind
  readonly reason: string
  /** Date and person. */
  readonly detail: string
}

/** Lots shown, both ends included. */
export interface LotWindow {
  readonly from: number
  readonly to: number
}

export interface StaffChartInput extends ReadoutFormat {
  readonly title: string
  readonly lots: readonly ChartLot[]
  readonly staves: readonly StaveInput[]
  readonly barLines: readonly BarLineInput[]
  readonly window?: LotWindow
}

/** Lots that a chart opens with: as many as stand 14.2 px apart on the usual plot. */
export const NEWEST_LOTS = 52

/** Below this many lots no limits are frozen and none are drawn. */
export const LOTS_FOR_LIMITS = 20

export interface ChartNote {
  readonly index: number
  readonly lotId: number
  readonly code: string
  readonly value: number
  /** Distance from the centre of its limit set in σ; undefined without limits. */
  readonly sigmas?: number
  readonly leftOut: boolean
  readonly beyond?: 'above' | 'below'
  /** Its own signal is still unanswered. */
  readonly open: boolean
  /** Ids of the signals it is part of. */
  readonly signals: readonly string[]
}

/** The lines that a limit set draws, in the stave's unit. */
export interface StaffSegment {
  readonly fromIndex: number
  readonly toIndex: number
  readonly number: number
  readonly provisional: boolean
  readonly centre: number
  readonly sigma: number
  readonly upper?: number
  readonly lower?: number
  /** ±1 σ and ±2 σ, or only the upper ones. */
  readonly inner: readonly number[]
}

export interface ChartSlur {
  readonly signal: string
  readonly side: 'above' | 'below'
  readonly state: ChartSignalState
  /** Members with a value within the window. */
  readonly members: readonly number[]
  /** "nine above centre". */
  readonly words: string
  readonly sentence: string
}

export interface ToleranceLine {
  readonly side: 'above' | 'below'
  readonly value: number
  readonly label: string
}

export interface StaveModel {
  readonly key: string
  readonly label: string
  readonly unitLabel: string
  readonly decimals: number
  readonly signed: boolean
  readonly oneSided: boolean
  readonly notes: readonly ChartNote[]
  readonly segments: readonly StaffSegment[]
  readonly slurs: readonly ChartSlur[]
  readonly tolerances: readonly ToleranceLine[]
  /** Said on the stave when no limits are drawn over its newest lots. */
  readonly withoutLimits?: string
  /** Value in the middle of the stave and units per σ-space of 14 px. */
  readonly scale: { readonly middle: number; readonly perSpace: number }
}

export interface BarLine {
  readonly atIndex: number
  /** Two lines. */
  readonly double: boolean
  readonly kinds: readonly BarLineKind[]
  readonly reason: string
  readonly detail: string
}

export interface StaffChart extends ReadoutFormat {
  readonly title: string
  readonly lots: readonly ChartLot[]
  readonly window: LotWindow
  readonly staves: readonly StaveModel[]
  readonly barLines: readonly BarLine[]
}
