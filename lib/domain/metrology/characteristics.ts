/** What a specimen is judged by. The order is the order of every table and of the wide result row. */
export const characteristicIds = [
  'diameter',
  'ovality',
  'massPerMetreWeighed',
  'massPerMetreSounded',
  'closure',
  'densityCheckWeighed',
  'densityCheckSounded',
  'effectiveDensity',
  'tension',
  'pitchError',
] as const

export type CharacteristicId = (typeof characteristicIds)[number]

export interface Characteristic {
  readonly id: CharacteristicId
  /** As a person reads it, sentence case. */
  readonly name: string
  /** SI dimension of the stored value; `ratio` is a natural logarithm of a ratio. */
  readonly dimension: 'length' | 'massPerLength' | 'density' | 'force' | 'ratio' | 'cents'
  /** One-sided characteristics have no lower limit and no lower lines on a stave. */
  readonly oneSided: boolean
  readonly meaning: string
}

export const characteristics: Readonly<Record<CharacteristicId, Characteristic>> = {
  diameter: {
    id: 'diameter',
    name: 'Diameter',
    dimension: 'length',
    oneSided: false,
    meaning: 'Diameter of the circle with the specimen’s mean section, at 20 °C.',
  },
  ovality: {
    id: 'ovality',
    name: 'Ovality',
    dimension: 'length',
    oneSided: true,
    meaning: 'Largest difference between the two directions at one position.',
  },
  massPerMetreWeighed: {
    id: 'massPerMetreWeighed',
    name: 'Mass per metre, weighed',
    dimension: 'massPerLength',
    oneSided: false,
    meaning: 'Unloaded mass per metre from a balance and a rule.',
  },
  massPerMetreSounded: {
    id: 'massPerMetreSounded',
    name: 'Mass per metre, sounded',
    dimension: 'massPerLength',
    oneSided: false,
    meaning: 'Unloaded mass per metre from load, span and frequency.',
  },
  closure: {
    id: 'closure',
    name: 'Closure',
    dimension: 'ratio',
    oneSided: false,
    meaning: 'ln(weighed / sounded mass per metre): positive when the weighed one is heavier.',
  },
  densityCheckWeighed: {
    id: 'densityCheckWeighed',
    name: 'Density check, weighed',
    dimension: 'ratio',
    oneSided: false,
    meaning: 'ln(effective density by weighing / expected density).',
  },
  densityCheckSounded: {
    id: 'densityCheckSounded',
    name: 'Density check, sounded',
    dimension: 'ratio',
    oneSided: false,
    meaning: 'ln(effective density by sounding / expected density).',
  },
  effectiveDensity: {
    id: 'effectiveDensity',
    name: 'Effective density',
    dimension: 'density',
    oneSided: false,
    meaning: 'Weighed mass per metre over the area of the measured circle.',
  },
  tension: {
    id: 'tension',
    name: 'Tension at the reference note',
    dimension: 'force',
    oneSided: false,
    meaning: 'Tension at the reference note and length on the basis of the specification.',
  },
  pitchError: {
    id: 'pitchError',
    name: 'Pitch error at the reference tension',
    dimension: 'cents',
    oneSided: false,
    meaning: 'How far the note is off when the string hangs at the reference tension.',
  },
}
