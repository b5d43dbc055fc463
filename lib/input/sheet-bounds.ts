import type { ValueRules } from './typed-value'

/** Bounds of what can be measured on a string at all, SI. What is doubtful within them is asked at the bench. */
export const sheetBounds = {
  diameter: { name: 'Diameter', dimension: 'length', min: 1e-5, max: 0.02 },
  cutLength: { name: 'Cut length', dimension: 'length', min: 1e-3, max: 20 },
  cutMass: { name: 'Cut mass', dimension: 'mass', min: 1e-7, max: 2 },
  span: { name: 'Span', dimension: 'length', min: 0.01, max: 10 },
  frequency: { name: 'Frequency', dimension: 'frequency', min: 5, max: 20_000 },
  loadMass: { name: 'Load', dimension: 'mass', min: 1e-3, max: 500 },
  loadForce: { name: 'Load', dimension: 'force', min: 0.01, max: 5_000 },
  temperature: { name: 'Temperature', dimension: 'temperature', min: -20, max: 60 },
  pressure: { name: 'Air pressure', dimension: 'pressure', min: 50_000, max: 115_000 },
  takenAt: { min: 0, max: 1_000_000 },
} as const satisfies Record<string, Partial<ValueRules>>
