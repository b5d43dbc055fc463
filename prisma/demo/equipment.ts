/** The invented works of the demo: place, people, equipment. Nothing here is a real maker, brand or person. */
export const demoWorks = {
  name: 'Tarnbeck String Works',
  place: 'Tarnbeck',
  timeZone: 'Europe/London',
  latitudeDegrees: 54.4,
  heightMetres: 85,
  airTemperatureCelsius: 20,
} as const

export const demoPeople = [
  { username: 'aldous', name: 'T. Aldous', roles: ['bench'] },
  { username: 'imrie', name: 'S. Imrie', roles: ['bench'] },
  { username: 'orrin', name: 'M. Orrin', roles: ['quality'] },
  { username: 'pell', name: 'J. Pell', roles: ['sales'] },
  { username: 'falk', name: 'R. Falk', roles: ['administrator', 'quality'] },
] as const

export const demoMachine = { code: 'DM-1', name: 'Drawing machine 1', kind: 'drawing machine' } as const

export const demoGauges = [
  {
    code: 'M-14',
    name: 'Micrometer 14',
    kind: 'micrometer',
    resolution: 1e-7,
    uAbsolute: 6e-7,
    mode: 'against-pin',
    due: '2027-02-12',
  },
  {
    code: 'B-03',
    name: 'Balance 3',
    kind: 'balance',
    resolution: 1e-8,
    uAbsolute: 3e-8,
    mode: 'direct',
    due: '2027-01-20',
  },
  {
    code: 'R-02',
    name: 'Steel rule 2',
    kind: 'rule',
    resolution: 1e-4,
    uAbsolute: 1e-4,
    mode: 'direct',
    due: '2027-06-30',
  },
  {
    code: 'F-02',
    name: 'Counter 2',
    kind: 'counter',
    resolution: 0.01,
    uAbsolute: 0.01,
    uRelative: 2e-5,
    mode: 'direct',
    due: '2026-12-04',
  },
] as const

export const demoWeights = [
  { code: 'H-01', kind: 'hanger', conventionalMass: 0.4, uMass: 1e-5 },
  { code: 'W-05', kind: 'slot', conventionalMass: 5, uMass: 8e-5 },
  { code: 'W-02', kind: 'slot', conventionalMass: 2, uMass: 3e-5 },
  { code: 'W-01', kind: 'slot', conventionalMass: 1, uMass: 2e-5 },
  { code: 'W-07', kind: 'slot', conventionalMass: 0.1, uMass: 5e-6 },
] as const

export const demoRig = {
  code: 'RIG-2',
  name: 'Rig 2',
  arrangement: 'vertical',
  spanMetres: 0.648,
  uSpanMetres: 6e-5,
  endCondition: 'knife',
  // Found by two spacings.
  uEndRelative: 2e-4,
  // Half the difference between loading from above and from below, with room for the worst.
  frictionHalfWidth: 1.5e-3,
  hangingLengthMetres: 0.3,
  hangerCode: 'H-01',
  weightCodes: ['W-05', 'W-02'],
  micrometerCode: 'M-14',
  balanceCode: 'B-03',
  ruleCode: 'R-02',
  counterCode: 'F-02',
} as const
