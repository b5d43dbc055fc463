import type { MaterialBody } from '@/lib/domain/strings/material'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import { plainWireAxialStiffness } from '@/lib/domain/strings/stiffness'
import { kilogramsPerCubicMetre, metres, pascals } from '@/lib/domain/units/quantity'
import { massOfWeights, rigOf } from './equipment'
import { type DemoProduct, specificationOf } from './product'
import { NYLON_SEASON } from './story-facts'
import { alderVariation } from './variation'

const DENSITY = kilogramsPerCubicMetre(1140)
const MODULUS = pascals(5e9)

/** The works’ own nylon: its modulus under load was found from strings sounded at several loads. */
export const alderNylon: { readonly code: string; readonly name: string; readonly body: MaterialBody } = {
  code: 'ALDER-NYLON',
  name: 'Nylon as extruded for Alder',
  body: {
    kind: 'polymer',
    density: { value: DENSITY, low: kilogramsPerCubicMetre(1130), high: kilogramsPerCubicMetre(1150) },
    youngsModulus: { value: MODULUS, low: pascals(4.85e9), high: pascals(5.15e9) },
    poisson: 0.39,
    tensileStrength: { low: pascals(400e6), high: pascals(550e6) },
  },
}

/** Nylon, cut at marks made on the span under load: ±10 µm in diameter, ±3 % in mass per metre. */
function nylon(place: number, micrometres: number, prefix: string, midi: number): DemoProduct {
  const d = metres(micrometres / 1e6)
  const rig = rigOf('RIG-4')
  const load = [rig.hangerCode, ...rig.weightCodes]
  const stiffness = plainWireAxialStiffness(MODULUS, d)
  return {
    code: `ALDER-${micrometres}`,
    name: `Alder ${micrometres}`,
    family: 'Alder',
    construction: 'plain',
    prefix,
    place,
    micrometres,
    lots: 50,
    // Nylon follows the season: limits from winter alone would take the summer for a fault.
    baseline: 36,
    machine: 'EX-1',
    materialCode: alderNylon.code,
    load,
    modulus: MODULUS,
    variation: alderVariation(d),
    season: NYLON_SEASON,
    specification: specificationOf({
      diameter: d,
      diameterTolerance: 10e-6,
      mass: solidWireMassPerMetre(d, DENSITY),
      massTolerance: 0.03,
      density: DENSITY,
      densityTolerance: 0.03,
      ovalityMax: 22e-6,
      midi,
      length: 0.65,
      basis: 'loaded-mass',
      axialStiffness: stiffness,
      markedStretch: (massOfWeights(load) * 9.81) / stiffness,
      plan: {
        weighedState: 'marked',
        cutLength: metres(rig.spanMetres),
        // σ of 4 µm between lots and 3.5 µm within them leave no more room in ±10 µm.
        acceptanceConstant: 0.6,
        rigCode: rig.code,
      },
    }),
  }
}

/** D4, B3 and G3 on 650 mm. */
export const alder: readonly DemoProduct[] = [
  nylon(0, 710, 'AA', 62),
  nylon(1, 820, 'AB', 59),
  nylon(2, 1030, 'AC', 55),
]
