import type { KilogramsPerCubicMetre, Pascals, PerKelvin } from '../units/quantity'

/** A value with the range met in practice; the standard uncertainty used is range/√12. */
export interface Ranged<Q extends number> {
  readonly value: Q
  readonly low: Q
  readonly high: Q
}

/** What the works knows of a material. `strength` by diameter is interpolated linearly between its rows. */
export interface MaterialBody {
  readonly kind: 'metal' | 'polymer' | 'gut'
  readonly density: Ranged<KilogramsPerCubicMetre>
  readonly youngsModulus: Ranged<Pascals>
  readonly poisson: number
  readonly thermalExpansion?: Ranged<PerKelvin>
  /** Tensile strength of any size. */
  readonly tensileStrength?: { readonly low: Pascals; readonly high: Pascals }
  /** Minimum and maximum tensile strength by diameter in metres, ascending. */
  readonly strengthByDiameter?: readonly {
    readonly diameter: number
    readonly low: Pascals
    readonly high: Pascals
  }[]
}
