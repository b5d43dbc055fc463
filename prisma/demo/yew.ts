import { type Core, coreArea } from '@/lib/domain/strings/core-section'
import { effectiveDensity } from '@/lib/domain/strings/effective-density'
import { axialStiffness } from '@/lib/domain/strings/stiffness'
import { kilogramsPerMetre, metres, pascals } from '@/lib/domain/units/quantity'
import { type DemoProduct, specificationOf } from './product'
import { yewVariation } from './variation'

const MODULUS = pascals(206e9)

/** How full of metal a ribbon wrap is, and what it is made of. */
const FILL = 0.9
const RIBBON = 7730

/** Ribbon on a steel core: ±20 µm in diameter, ±2.5 % in mass per metre. µ = ρ_c A_c + φ ρ_w π(D² − d_c²)/4. */
function flatWound(
  place: number,
  micrometres: number,
  prefix: string,
  midi: number,
  coreMillimetres: number,
  load: readonly string[],
): DemoProduct {
  const d = metres(micrometres / 1e6)
  const core: Core = { shape: 'round', size: metres(coreMillimetres / 1e3) }
  const ring = (Math.PI / 4) * (d * d - core.size * core.size)
  const mass = 7850 * coreArea(core) + FILL * RIBBON * ring
  return {
    code: `YEW-${micrometres}`,
    name: `Yew ${micrometres}`,
    family: 'Yew',
    construction: 'wound',
    prefix,
    place,
    micrometres,
    lots: 25,
    baseline: 20,
    machine: 'RW-1',
    materialCode: 'MUSIC-WIRE',
    load,
    modulus: MODULUS,
    expansion: 11.5e-6,
    variation: yewVariation(d),
    specification: specificationOf({
      core,
      diameter: d,
      diameterTolerance: 20e-6,
      mass,
      massTolerance: 0.025,
      density: effectiveDensity(kilogramsPerMetre(mass), d),
      densityTolerance: 0.035,
      ovalityMax: 20e-6,
      midi,
      length: 0.8636,
      basis: 'unloaded-mass',
      axialStiffness: axialStiffness(MODULUS, coreArea(core)),
      plan: { weighedState: 'slack', cutLength: metres(0.5), acceptanceConstant: 1.5, rigCode: 'RIG-3' },
    }),
  }
}

/** C2 and G1 on the long scale of a bass, 863.6 mm. */
export const yew: readonly DemoProduct[] = [
  flatWound(0, 1400, 'YA', 36, 0.6, ['H-02', 'W-15', 'W-16', 'W-12', 'W-11']),
  flatWound(1, 1900, 'YB', 31, 0.64, ['H-02', 'W-15', 'W-16', 'W-12', 'W-13']),
]
