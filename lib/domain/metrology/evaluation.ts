import type { MaterialBody } from '../strings/material'
import type { CharacteristicId } from './characteristics'
import type { SpecificationBody } from './specification'

/** Value with standard uncertainty, SI. */
export interface Known {
  readonly value: number
  readonly u: number
}

/** A result with its combined standard uncertainty and the part of it that the specimens of a lot share. */
export interface Estimate extends Known {
  readonly uCommon: number
}

/** A piece of measuring equipment as a budget sees it: SI, by kind. */
export interface GaugeFacts {
  readonly code: string
  readonly resolution: number
  readonly uAbsolute: number
  readonly uRelative: number
  /** Known error, sign = shown − true; taken off the reading. */
  readonly error: number
  readonly mode: 'direct' | 'against-pin'
}

export interface RigFacts {
  readonly code: string
  readonly arrangement: 'vertical' | 'horizontal'
  readonly span: Known
  readonly endCondition: 'pinned' | 'knife' | 'clamped'
  /** Relative standard uncertainty of the end correction on mass per metre, from two spacings; without it
   * rectangular from pinned to clamped. */
  readonly uEndRelative?: number
  /** Half-width of edge friction relative to the tension, rectangular. */
  readonly frictionHalfWidth: number
  /** Length of string that hangs below the lower edge, metres. */
  readonly hangingLength: number
  readonly hangerCode: string
  readonly weightCodes: readonly string[]
}

export interface WeightFacts {
  readonly code: string
  readonly kind: string
  /** Conventional mass, kilograms. */
  readonly mass: Known
}

/**
 * Everything an evaluation rests on besides the sheet. Kept once per distinct content (InputSnapshot) as
 * canonical JSON, so that every evaluation can be computed again to the last bit.
 */
export interface EvaluationContext {
  readonly gravity: Known
  /** Room conditions used where the sheet says none. */
  readonly air: { readonly celsius: number; readonly pascals: number; readonly humidity: number }
  readonly material: MaterialBody
  readonly specification: SpecificationBody
  readonly rig?: RigFacts
  /** Those that hang, by code. */
  readonly weights: readonly WeightFacts[]
  readonly micrometer?: GaugeFacts
  readonly balance?: GaugeFacts
  readonly rule?: GaugeFacts
  readonly counter?: GaugeFacts
}

/** One correction as a person looks at it. */
export interface Correction {
  readonly id: string
  readonly name: string
  /** Which result it acts on. */
  readonly on: 'diameter' | 'massPerMetreWeighed' | 'massPerMetreSounded' | 'force'
  /** Relative change it makes to that result; its sign is the sign of the change. */
  readonly relative: number
  /** The same in the result's SI unit. */
  readonly amount: number
  /** The same as cents of the fundamental, where that has a meaning. */
  readonly cents?: number
  readonly formula: string
  readonly source: string
  /** A sentence when the value is outside the range the formula is good for. */
  readonly outside?: string
}

export interface BudgetLine {
  readonly input: string
  readonly value: number
  readonly unit: string
  /** Standard uncertainty of the input, in its unit. */
  readonly u: number
  /** Contribution to the result's standard uncertainty, in the result's SI unit, never negative. */
  readonly contribution: number
  readonly type: 'A' | 'B'
  readonly distribution: 'normal' | 'rectangular' | 'observed'
  /** Shared by the specimens of a lot, so that the mean of the lot does not lessen it. */
  readonly common: boolean
  readonly note?: string
}

export interface SpecimenEvaluation {
  readonly modelVersion: string
  readonly results: Readonly<Partial<Record<CharacteristicId, Estimate>>>
  readonly budgets: Readonly<Partial<Record<CharacteristicId, readonly BudgetLine[]>>>
  readonly corrections: readonly Correction[]
  /** Named steps in between that a screen shows: force in newtons, strain, inharmonicity, working fraction … */
  readonly steps: Readonly<Record<string, number>>
  /** Sentences: what is missing before a result can be had. */
  readonly missing: readonly string[]
}
