export interface CalibrationLine {
  /** Correction at the reference value, and its slope. */
  readonly at: number
  readonly slope: number
  readonly uAt: number
  readonly uSlope: number
  readonly correlation: number
  /** Standard deviation of the corrections about the line. */
  readonly residualDeviation: number
  readonly degrees: number
}

/**
 * Calibration line b = y₁ + y₂ (x − x₀) through observed corrections by least squares, with the uncertainties
 * and the correlation of both coefficients. Undefined with fewer than three points or without a spread in x.
 * Source: JCGM 100:2008, H.3.
 */
export function calibrationLine(
  points: readonly { readonly x: number; readonly correction: number }[],
  reference: number,
): CalibrationLine | undefined {
  const n = points.length
  if (n < 3) return undefined
  const mean = points.reduce((sum, { x }) => sum + x, 0) / n
  const meanCorrection = points.reduce((sum, { correction }) => sum + correction, 0) / n
  let spread = 0
  let product = 0
  for (const { x, correction } of points) {
    spread += (x - mean) * (x - mean)
    product += (x - mean) * (correction - meanCorrection)
  }
  if (!(spread > 0)) return undefined
  const slope = product / spread
  const lever = reference - mean
  const at = meanCorrection + slope * lever
  let residual = 0
  for (const { x, correction } of points) {
    const away = correction - at - slope * (x - reference)
    residual += away * away
  }
  const variance = residual / (n - 2)
  const atShare = 1 / n + (lever * lever) / spread
  return {
    at,
    slope,
    uAt: Math.sqrt(variance * atShare),
    uSlope: Math.sqrt(variance / spread),
    correlation: lever / spread / Math.sqrt(atShare / spread),
    residualDeviation: Math.sqrt(variance),
    degrees: n - 2,
  }
}

/** The correction predicted at x with its standard uncertainty, correlation of the coefficients included. */
export function correctionAt(
  line: CalibrationLine,
  reference: number,
  x: number,
): { readonly value: number; readonly u: number } {
  const away = x - reference
  const crossed = 2 * away * line.correlation * line.uAt * line.uSlope
  const variance = line.uAt * line.uAt + away * away * line.uSlope * line.uSlope + crossed
  return { value: line.at + line.slope * away, u: Math.sqrt(Math.max(0, variance)) }
}
