/**
 * How much readings of a family vary, one standard deviation each (DESIGN §8). Micrometres as metres, masses
 * and densities relative.
 */
export interface Variation {
  /** Between lots. */
  readonly diameter: number
  /** Correlation of a lot’s diameter with the one before it. */
  readonly follows: number
  /** Between lots, besides what follows from the diameter. */
  readonly mass: number
  /** Share of a diameter’s change that the mass follows: 1 for a solid string. */
  readonly massFollows: number
  readonly diameterWithin: number
  readonly massWithin: number
  readonly massFollowsWithin: number
  /** Tail − head, lowest and highest, metres. */
  readonly taper: readonly [number, number]
  readonly ovality: readonly [number, number]
  /** Of one reading of the micrometer, and of its zero from lot to lot. */
  readonly reading: number
  readonly zero: number
  /** Of the load from lot to lot, and the half-width of what friction adds from specimen to specimen. */
  readonly pull: number
  readonly pullCut: number
  readonly friction: number
  /** Of the length of a cut, and of the balance. */
  readonly cut: number
  readonly weighing: number
}

/** Standard deviation of a standard normal cut at ± 2.5 and at ± 1.8: √(1 − 2cφ(c)/(2Φ(c) − 1)). */
const CUT_AT_2_5 = 0.9546
const CUT_AT_1_8 = 0.8329

/** The draws of the first family are cut where they always were: its readings stay what they are. */
export const larchVariation: Variation = {
  diameter: 0.6e-6,
  follows: 0,
  mass: 0.001,
  massFollows: 1,
  diameterWithin: 0.35e-6,
  massWithin: 0,
  massFollowsWithin: 1,
  taper: [0.5e-6, 0.8e-6],
  ovality: [0, 0.6e-6],
  reading: 0.5e-6,
  zero: 0.4e-6,
  pull: 0.0008,
  pullCut: 1.8,
  friction: 0.0004,
  cut: 0.05e-3,
  weighing: 1e-8,
}

interface WoundSizes {
  readonly target: number
  readonly diameter: number
  readonly mass: number
  readonly density: number
  readonly diameterWithin: number
  readonly massWithin: number
}

/**
 * Shares for a wound string: so much of the mass follows the diameter that mass and density vary as designed.
 * With v = (2σ_d/d)²: σ_µ² = b²v + ε², σ_ρ² = (b − 1)²v + ε², so b = (1 + (σ_µ² − σ_ρ²)/v)/2.
 */
function woundShares({ target, diameter, mass, density, diameterWithin, massWithin }: WoundSizes) {
  const v = ((2 * diameter) / target) ** 2
  const massFollows = (1 + (mass * mass - density * density) / v) / 2
  const within = ((2 * diameterWithin) / target) ** 2
  const massFollowsWithin = 0.3
  return {
    massFollows,
    mass: Math.sqrt(mass * mass - massFollows * massFollows * v),
    massFollowsWithin,
    massWithin: Math.sqrt(massWithin * massWithin - massFollowsWithin * massFollowsWithin * within),
  }
}

export const rowanVariation = (target: number): Variation => ({
  diameter: 3e-6 / CUT_AT_2_5,
  follows: 0,
  ...woundShares({
    target,
    diameter: 3e-6,
    mass: 0.005,
    density: 0.005,
    diameterWithin: 3e-6,
    massWithin: 0.0035,
  }),
  diameterWithin: 3e-6 / CUT_AT_2_5,
  taper: [0, 2e-6],
  ovality: [0, 4e-6],
  reading: 1.5e-6,
  zero: 0,
  pull: 0.001 / CUT_AT_1_8,
  pullCut: 1.8,
  friction: 0.0004,
  cut: 0.05e-3,
  weighing: 1e-7,
})

export const yewVariation = (target: number): Variation => ({
  diameter: 5e-6 / CUT_AT_2_5,
  follows: 0,
  ...woundShares({
    target,
    diameter: 5e-6,
    mass: 0.006,
    density: 0.007,
    diameterWithin: 4e-6,
    massWithin: 0.004,
  }),
  diameterWithin: 4e-6 / CUT_AT_2_5,
  taper: [0, 3e-6],
  ovality: [0, 6e-6],
  reading: 2e-6,
  zero: 0,
  pull: 0.0015 / CUT_AT_1_8,
  pullCut: 1.8,
  friction: 0.0004,
  cut: 0.05e-3,
  weighing: 1e-7,
})

/** The density of nylon moves by 0.4 %, and the zero of a low-force micrometer by as much again of 0.6 %. */
export const alderVariation = (target: number): Variation => ({
  diameter: 4e-6 / CUT_AT_2_5,
  follows: 0.4,
  mass: 0.004,
  massFollows: 1,
  diameterWithin: 3.5e-6 / CUT_AT_2_5,
  massWithin: 0.0005,
  massFollowsWithin: 1,
  taper: [0, 2e-6],
  ovality: [5e-6, 10e-6],
  reading: 2e-6,
  zero: (Math.sqrt(0.006 ** 2 - 0.004 ** 2) * target) / 2,
  pull: 0.0015 / CUT_AT_1_8,
  pullCut: 1.8,
  friction: 0.0003,
  cut: 0.05e-3,
  weighing: 1e-7,
})
