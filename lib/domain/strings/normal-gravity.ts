import { sin } from '../units/elementary'
import { type MetresPerSecondSquared, metresPerSecondSquared } from '../units/quantity'

interface ReferenceEllipsoid {
  readonly equatorial: number
  readonly k: number
  readonly eSquared: number
  readonly a: number
  readonly f: number
  readonly m: number
}

/** Source: Moritz, Geodetic Reference System 1980 (J. Geodesy 2000); NIMA TR8350.2 for WGS 84. */
const ellipsoids = {
  GRS80: {
    equatorial: 9.7803267715,
    k: 0.001931851353,
    eSquared: 0.0066943800229,
    a: 6378137,
    f: 1 / 298.257222101,
    m: 0.00344978600308,
  },
  WGS84: {
    equatorial: 9.7803253359,
    k: 0.00193185265241,
    eSquared: 0.00669437999014,
    a: 6378137,
    f: 1 / 298.257223563,
    m: 0.00344978650684,
  },
} as const satisfies Record<string, ReferenceEllipsoid>

export type GravitySystem = keyof typeof ellipsoids

/** Standard uncertainty of the formula against local anomalies, relative; up to 2e-4 in mountains. */
export const NORMAL_GRAVITY_RELATIVE_U = 5e-5

/** Bouguer slab of 2670 kg/m³ below a place on land: 2πGρ per metre of height, s⁻². */
const SLAB = 1.119e-6
const FREE_AIR = 3.086e-6

function sineSquared(latitude: number): number {
  if (!(Math.abs(latitude) <= 90)) throw new RangeError(`latitude has to be within ±90°, not ${latitude}`)
  const s = sin((latitude * Math.PI) / 180)
  return s * s
}

/**
 * Normal gravity on the ellipsoid: γ = γ_e (1 + k sin²φ)/√(1 − e² sin²φ).
 * φ latitude in degrees, γ m/s². Throws a RangeError beyond ±90°. Source: Somigliana's closed formula with
 * the constants of GRS 80 or WGS 84 (they differ by 1.4e-6 m/s²).
 */
export function normalGravity(latitude: number, system: GravitySystem = 'GRS80'): MetresPerSecondSquared {
  const { equatorial, k, eSquared } = ellipsoids[system]
  const s2 = sineSquared(latitude)
  return metresPerSecondSquared((equatorial * (1 + k * s2)) / Math.sqrt(1 - eSquared * s2))
}

/**
 * Normal gravity at a height in free air: γ [1 − (2/a)(1 + f + m − 2f sin²φ) h + 3h²/a²].
 * h m above the ellipsoid (sea level will do). Source: Moritz, GRS 80.
 */
export function gravityInFreeAir(
  latitude: number,
  height: number,
  system: GravitySystem = 'GRS80',
): MetresPerSecondSquared {
  const { a, f, m } = ellipsoids[system]
  const slope = (2 / a) * (1 + f + m - 2 * f * sineSquared(latitude))
  return metresPerSecondSquared(
    normalGravity(latitude, system) * (1 - slope * height + (3 * height * height) / (a * a)),
  )
}

/** The common linear form of it: γ − 3.086e-6 h. Source: textbook value of the free-air gradient. */
export const gravityInFreeAirLinear = (
  latitude: number,
  height: number,
  system: GravitySystem = 'GRS80',
): MetresPerSecondSquared => metresPerSecondSquared(normalGravity(latitude, system) - FREE_AIR * height)

/**
 * Gravity to use for a workshop that stands on land: free air, and the rock below it (Bouguer slab,
 * +1.119e-6 h, 2670 kg/m³), without which a high place comes out low. A published local value is better.
 * Using 9.80665 everywhere errs by up to 2.7e-3.
 */
export const localGravity = (latitude: number, height: number): MetresPerSecondSquared =>
  metresPerSecondSquared(gravityInFreeAir(latitude, height) + SLAB * height)
