import type { DegreesCelsius, Hertz, Kilograms, Metres, Newtons, Pascals } from '../units/quantity'

/** A value as a person typed it, with the unit it was understood in, beside the SI value. */
export interface TypedValue<Q extends number> {
  readonly typed: string
  readonly unit: string
  readonly si: Q
}

export type TakenAt = { readonly end: 'head' | 'tail' } | { readonly metres: Metres }

export interface DiameterReading {
  /** From 1. */
  readonly position: number
  readonly direction: 'a' | 'b'
  readonly value: TypedValue<Metres>
}

export type LoadReading =
  | { readonly kind: 'weights'; readonly hanger: string; readonly weights: readonly string[] }
  | { readonly kind: 'mass'; readonly value: TypedValue<Kilograms> }
  | { readonly kind: 'force'; readonly value: TypedValue<Newtons> }

/** A questioned entry that the measurer kept, with the reason given. */
export interface KeptDoubt {
  readonly field: string
  readonly question: string
  readonly reason: string
}

/** Everything read on one specimen. Anything may be missing while it is a draft. */
export interface SpecimenSheet {
  readonly takenAt?: TakenAt
  readonly diameters: readonly DiameterReading[]
  readonly weighedState: 'slack' | 'marked'
  readonly cutLength?: TypedValue<Metres>
  readonly cutMass?: TypedValue<Kilograms>
  readonly load?: LoadReading
  readonly span?: TypedValue<Metres>
  /** One or several plucks of the fundamental. */
  readonly frequencies: readonly TypedValue<Hertz>[]
  readonly temperature?: TypedValue<DegreesCelsius>
  readonly pressure?: TypedValue<Pascals>
  /** Relative humidity, 0 to 1. */
  readonly humidity?: number
  readonly keptDoubts: readonly KeptDoubt[]
  readonly note?: string
}
