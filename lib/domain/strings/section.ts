import { type Metres, metres, type SquareMetres, squareMetres } from '../units/quantity'

/** Two diameters at right angles at one position. */
export type DiameterPair = readonly [Metres, Metres]

export interface Section {
  /** Arithmetic mean of all diameters. */
  readonly meanDiameter: Metres
  /** Diameter of the circle with the mean section: √ mean(d₁d₂). */
  readonly areaDiameter: Metres
  /** √ mean((d₁² + d₂²)/2): upper bound. */
  readonly quadraticDiameter: Metres
  readonly area: SquareMetres
  /** Largest |d₁ − d₂|, m and relative to the mean diameter. */
  readonly ovality: Metres
  readonly ovalityRelative: number
}

const mean = (values: readonly number[]): number =>
  values.reduce((sum, value) => sum + value, 0) / values.length

/**
 * Section of a round string from pairs of perpendicular diameters: A = (π/4) mean(d₁d₂).
 *
 * All m. For an ellipse a × b, ab ≤ d₁d₂ ≤ (a² + b²)/2 at every orientation; any mean will do below 2 %
 * ovality. A constant-width (lobed) wire shows nothing to two-point gauges: `lobed-section.ts`.
 * Undefined without a pair. Throws a RangeError for a diameter that is not above zero. Source: geometry;
 * ASTM A228/A228M limits |d₁ − d₂| to the figure of the diameter tolerance.
 */
export function sectionFromPairs(pairs: readonly DiameterPair[]): Section | undefined {
  if (pairs.length === 0) return undefined
  for (const [a, b] of pairs) {
    const lesser = Math.min(a, b)
    if (!(lesser > 0)) throw new RangeError(`d has to be above zero, not ${lesser}`)
  }
  const meanDiameter = mean(pairs.flat())
  const product = mean(pairs.map(([a, b]) => a * b))
  const ovality = Math.max(...pairs.map(([a, b]) => Math.abs(a - b)))
  return {
    meanDiameter: metres(meanDiameter),
    areaDiameter: metres(Math.sqrt(product)),
    quadraticDiameter: metres(Math.sqrt(mean(pairs.map(([a, b]) => (a * a + b * b) / 2)))),
    area: squareMetres((Math.PI / 4) * product),
    ovality: metres(ovality),
    ovalityRelative: ovality / meanDiameter,
  }
}
