/**
 * What is buried in the demo for charts to find, and what must not be named a fault (DESIGN §8): each with its
 * place and size. Lot numbers count from 0 within the product, days are working days from 0. SI, shares relative.
 */

/** The die that wears on Larch 254, and the one that follows it: 3.5 µm back at once. */
export const WORN_DIE = {
  code: 'D-07',
  productCode: 'LARCH-254',
  from: 80,
  lots: 70,
  perLot: 0.05e-6,
} as const
export const NEXT_DIE = 'D-08'

/** A new die on Larch 279 that draws a little wide from its first lot on: nobody has looked into it yet. */
export const WIDE_DIE = {
  code: 'D-279B',
  productCode: 'LARCH-279',
  micrometres: 279,
  from: 50,
  wider: 1.2e-6,
} as const

/** Six working days on which the zero of a micrometer stood 1.5 µm high, for everything measured with it. */
export const ZERO_WEEK = { micrometer: 'M-14', from: 123, days: 6, error: 1.5e-6 } as const

export const inZeroWeek = (day: number): boolean =>
  day >= ZERO_WEEK.from && day < ZERO_WEEK.from + ZERO_WEEK.days

/** A wrap spool of brass with 20 % zinc (8670 kg/m³) sold as bronze (8860): 84.4 % of the mass is wrap. */
export const WRONG_ALLOY = { productCode: 'ROWAN-1060', from: 44, lots: 6, share: -0.0181 } as const

/** A heat drawn too hard, on all spools of the bronze winder for 36 days: its turns lie a little apart. */
export const HARD_TWIN = { machine: 'BW-1', heat: '7731', from: 165, days: 36, share: -0.0057 } as const

export const inHardTwin = (machine: string, day: number): boolean =>
  machine === HARD_TWIN.machine && day >= HARD_TWIN.from && day < HARD_TWIN.from + HARD_TWIN.days

/** The bronze winder’s brake sticks: specimens of a lot differ half as much again, for twelve lots. */
export const UNEVEN_WINDER = { machine: 'BW-1', fromDay: 210, lots: 12, times: 1.5 } as const

/** The octave heard for the fundamental, on one specimen. */
export const OCTAVE = { productCode: 'ROWAN-660', index: 27, specimen: 3, times: 2 } as const

/** Two neighbouring digits of a frequency that changed places on the way to the keypad (329.7 to 327.9). */
export const SWAPPED_DIGITS = { productCode: 'LARCH-330', index: 44, specimen: 2 } as const

/** For one shift a slot weight is named that lies on the bench. */
export const MISSING_SLOT = { rig: 'RIG-4', weight: 'W-27', day: 225, mass: -0.1 } as const

/** From a day on a hook hangs on the rig that nobody counts: 20 g in 7.5 to 14.5 kg. */
export const UNCOUNTED_HOOK = { rig: 'RIG-3', weight: 'K-20', from: 272, mass: 0.02 } as const

/** Decoy: nylon takes up water with the season; the mass follows, the diameter by two fifths of it. */
export const NYLON_SEASON = { family: 'Alder', share: 0.005, swells: 0.4 } as const

/** Decoy: a specification revision moves diameter and mass, and the lots follow it. */
export const MOVED_TARGET = { productCode: 'ROWAN-810', from: 34, diameter: 6e-6, mass: 0.012 } as const

/** Decoy: a die changed in time, for one as good. */
export const CHANGED_DIE = { productCode: 'LARCH-330', from: 35, before: 'D-330', code: 'D-330B' } as const

/** Decoy: a lot that lay on a shelf and was entered when later ones were on the charts already. */
export const LATE_LOT = { productCode: 'LARCH-229', index: 44, workingDays: 8 } as const

/** Decoy: while M-14 is away, a micrometer with steps of 1 µm measures what the drawing machine makes. */
export const COARSE_MICROMETER = { machine: 'DM-1', micrometer: 'M-11', from: 141, days: 7 } as const

export const inCoarseDays = (machine: string, day: number): boolean =>
  machine === COARSE_MICROMETER.machine &&
  day >= COARSE_MICROMETER.from &&
  day < COARSE_MICROMETER.from + COARSE_MICROMETER.days
