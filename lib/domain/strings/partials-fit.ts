import { positive } from '../units/positive'
import { type Hertz, hertz } from '../units/quantity'

export interface Partial {
  /** Number from 1. */
  readonly n: number
  readonly frequency: Hertz
  /** Standard uncertainty, Hz. */
  readonly u: number
}

export interface PartialsFit {
  /** Limit of f_n/n for small n, still with the shortening by the ends in it. */
  readonly f0: Hertz
  readonly inharmonicity: number
  readonly uF0: number
  readonly uInharmonicity: number
  readonly chiSquared: number
  readonly degreesOfFreedom: number
}

/**
 * f₀ and B from partials: y_n = (f_n/n)² = a + b n², weights w = 1/(2 f_n u_n/n²)²; f₀ = √a, B = b/a;
 * u(f₀) = √C_aa/(2√a), u(B) = √(C_bb + B²C_aa − 2B C_ab)/a with C = (XᵀWX)⁻¹.
 *
 * f_n and u_n Hz. Mass per metre from f₀ needs the factor of the ends alone (`endFactor`), not √(1+B). With
 * χ²/dof above 1, widen u and look for falseness. Undefined with fewer than two different partials or when
 * the line gives no positive f₀². Throws a RangeError for values not above zero.
 * Source: weighted least squares; f_n = n f₀√(1 + Bn²) of H. Fletcher, J. Acoust. Soc. Am. 36 (1964) 203.
 */
export function fitPartials(partials: readonly Partial[]): PartialsFit | undefined {
  const rows = partials.map(({ n, frequency, u }) => {
    const x = positive('n', n) * n
    const y = (positive('f_n', frequency) * frequency) / x
    const uY = (2 * frequency * positive('u_n', u)) / x
    return { x, y, w: 1 / (uY * uY) }
  })
  if (new Set(rows.map(({ x }) => x)).size < 2) return undefined
  const sum = (part: (row: (typeof rows)[number]) => number): number =>
    rows.reduce((total, row) => total + part(row), 0)
  const weight = sum(({ w }) => w)
  const meanX = sum(({ w, x }) => w * x) / weight
  const meanY = sum(({ w, y }) => w * y) / weight
  const sxx = sum(({ w, x }) => w * (x - meanX) * (x - meanX))
  const b = sum(({ w, x, y }) => w * (x - meanX) * (y - meanY)) / sxx
  const a = meanY - b * meanX
  if (!(a > 0)) return undefined
  const cbb = 1 / sxx
  const caa = 1 / weight + meanX * meanX * cbb
  const cab = -meanX * cbb
  const B = b / a
  return {
    f0: hertz(Math.sqrt(a)),
    inharmonicity: B,
    uF0: Math.sqrt(caa) / (2 * Math.sqrt(a)),
    uInharmonicity: Math.sqrt(cbb + B * B * caa - 2 * B * cab) / a,
    chiSquared: sum(({ w, x, y }) => w * (y - a - b * x) * (y - a - b * x)),
    degreesOfFreedom: rows.length - 2,
  }
}
