import { describe, expect, it } from 'vitest'
import { completeSpecification, type SpecificationDraft } from '@/lib/domain/metrology/complete-specification'
import { handbookMaterials } from '@/lib/domain/strings/materials-table'
import { hertz, kilogramsPerMetre, metres } from '@/lib/domain/units/quantity'

const steel = handbookMaterials.find(({ code }) => code === 'MUSIC-WIRE')?.body
if (!steel) throw new Error('the table of materials has no music wire')

const draft: SpecificationDraft = {
  diameter: { target: metres(0.254e-3), tolerance: metres(3e-6) },
  massPerMetre: { tolerance: 0.02 },
  densityTolerance: 0.01,
  ovalityMax: metres(2e-6),
  reference: { midi: 64, a4: hertz(440), length: metres(0.648) },
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
}

/** E4 over A4 = 440 Hz in equal temperament: 440 × 2^(−5/12). */
const frequency = 329.6275569128699

describe('completeSpecification', () => {
  it('takes mass per metre from diameter and density: µ = ρπd²/4', () => {
    const { massPerMetre, effectiveDensity } = completeSpecification(draft, steel)
    const density = steel.density.value
    expect(effectiveDensity?.target).toBe(density)
    expect(massPerMetre?.target).toBeCloseTo((density * Math.PI * 0.254e-3 ** 2) / 4, 14)
    expect((massPerMetre?.upper ?? 0) / (massPerMetre?.target ?? 1)).toBeCloseTo(1.02, 12)
    expect((massPerMetre?.lower ?? 0) / (massPerMetre?.target ?? 1)).toBeCloseTo(0.98, 12)
  })

  it('keeps a mass per metre that a person typed', () => {
    const typed = kilogramsPerMetre(4.1e-4)
    const body = completeSpecification({ ...draft, massPerMetre: { target: typed, tolerance: 0.02 } }, steel)
    expect(body.massPerMetre?.target).toBe(typed)
  })

  it('puts limits a half-width about the target of diameter and density', () => {
    const { diameter, effectiveDensity } = completeSpecification(draft, steel)
    expect(diameter?.lower).toBeCloseTo(0.251e-3, 15)
    expect(diameter?.upper).toBeCloseTo(0.257e-3, 15)
    expect((effectiveDensity?.lower ?? 0) / steel.density.value).toBeCloseTo(0.99, 12)
  })

  it('reckons the tension of target and mass limits by the plain formula T = µ(2Lf)², when that is the basis', () => {
    const { massPerMetre, tension } = completeSpecification({ ...draft, basis: 'plain-formula' }, steel)
    for (const end of ['target', 'lower', 'upper'] as const)
      expect((tension?.[end] ?? 0) / ((massPerMetre?.[end] ?? 0) * (2 * 0.648 * frequency) ** 2)).toBeCloseTo(
        1,
        12,
      )
  })

  it('solves for the stretch on the basis of the unloaded mass: T (1 + T/EA) = µ(2Lf)²', () => {
    const { massPerMetre, tension } = completeSpecification(draft, steel)
    const stiffness = steel.youngsModulus.value * (Math.PI / 4) * 0.254e-3 ** 2
    for (const end of ['target', 'lower', 'upper'] as const) {
      const T = tension?.[end] ?? 0
      const unloaded = massPerMetre?.[end] ?? 0
      expect((T * (1 + T / stiffness)) / (unloaded * (2 * 0.648 * frequency) ** 2)).toBeCloseTo(1, 9)
    }
  })

  it('stretches a wound string by its core, and expects the density of core and wraps together', () => {
    // Core 0.40 mm, wrap 0.33 mm of 8860 kg/m³: 6.307058 g/m, D 1.06 mm, 7147.02 kg/m³ (physics of strings §8).
    const wound = completeSpecification(
      {
        ...draft,
        core: { shape: 'round', size: metres(0.4e-3) },
        diameter: { target: metres(1.06e-3), tolerance: metres(15e-6) },
        massPerMetre: { target: kilogramsPerMetre(6.307058e-3), tolerance: 0.025 },
      },
      steel,
    )
    expect(wound.core).toEqual({ shape: 'round', size: 0.4e-3 })
    expect(wound.effectiveDensity.target).toBeCloseTo(7147.02, 2)
    const stiffness = steel.youngsModulus.value * (Math.PI / 4) * 0.4e-3 ** 2
    const T = wound.tension.target
    expect((T * (1 + T / stiffness)) / (6.307058e-3 * (2 * 0.648 * frequency) ** 2)).toBeCloseTo(1, 9)
  })

  it('does not reckon the mass of wraps', () => {
    const core = { shape: 'round', size: metres(0.1e-3) } as const
    expect(() => completeSpecification({ ...draft, core }, steel)).toThrow(RangeError)
  })
})
