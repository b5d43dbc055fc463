import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import {
  hertz,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  newtons,
  pascals,
  perKelvin,
} from '@/lib/domain/units/quantity'

/** What an invented works knows of plain steel 0.254 mm and of the equipment that `sheets.ts` names. */
export const steelContext = (change: Partial<EvaluationContext> = {}): EvaluationContext => ({
  gravity: { value: 9.8143, u: 5e-4 },
  air: { celsius: 20, pascals: 101325, humidity: 0.5 },
  material: {
    kind: 'metal',
    density: {
      value: kilogramsPerCubicMetre(7850),
      low: kilogramsPerCubicMetre(7830),
      high: kilogramsPerCubicMetre(7870),
    },
    youngsModulus: { value: pascals(206e9), low: pascals(200e9), high: pascals(212e9) },
    poisson: 0.29,
    thermalExpansion: { value: perKelvin(11.5e-6), low: perKelvin(10.8e-6), high: perKelvin(12e-6) },
    tensileStrength: { low: pascals(2668e6), high: pascals(2951e6) },
  },
  specification: {
    diameter: { target: metres(254e-6), lower: metres(251e-6), upper: metres(257e-6) },
    massPerMetre: {
      target: kilogramsPerMetre(397.8e-6),
      lower: kilogramsPerMetre(389.8e-6),
      upper: kilogramsPerMetre(405.8e-6),
    },
    ovalityMax: metres(1.5e-6),
    effectiveDensity: {
      target: kilogramsPerCubicMetre(7850),
      lower: kilogramsPerCubicMetre(7750),
      upper: kilogramsPerCubicMetre(7950),
    },
    reference: { midi: 64, a4: hertz(440), length: metres(0.648) },
    tension: { target: newtons(72.1), lower: newtons(70.6), upper: newtons(73.6) },
    basis: 'unloaded-mass',
    guardFactors: {},
    plan: {
      specimens: 5,
      positions: 3,
      directions: 2,
      takenAt: ['head', 'head', 'head', 'tail', 'tail'],
      weighedState: 'slack',
      cutLength: metres(0.5),
      acceptanceConstant: 1.5,
      rigCode: 'RIG-2',
    },
  },
  rig: {
    code: 'RIG-2',
    arrangement: 'vertical',
    span: { value: 0.648, u: 6e-5 },
    endCondition: 'knife',
    frictionHalfWidth: 5e-4,
    hangingLength: 0.3,
    hangerCode: 'H-01',
    weightCodes: ['W-05', 'W-02'],
  },
  weights: [
    { code: 'H-01', kind: 'hanger', mass: { value: 0.4, u: 1e-5 } },
    { code: 'W-02', kind: 'slot', mass: { value: 2, u: 3e-5 } },
    { code: 'W-05', kind: 'slot', mass: { value: 5, u: 8e-5 } },
  ],
  micrometer: {
    code: 'M-14',
    resolution: 1e-7,
    uAbsolute: 6e-7,
    uRelative: 0,
    error: 0,
    mode: 'against-pin',
  },
  balance: { code: 'B-03', resolution: 1e-7, uAbsolute: 7e-8, uRelative: 0, error: 0, mode: 'direct' },
  rule: { code: 'R-01', resolution: 1e-4, uAbsolute: 1e-4, uRelative: 0, error: 0, mode: 'direct' },
  counter: { code: 'F-02', resolution: 0.01, uAbsolute: 0.01, uRelative: 2e-5, error: 0, mode: 'direct' },
  ...change,
})
