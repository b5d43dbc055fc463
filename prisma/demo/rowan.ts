import { type Core, coreArea } from '@/lib/domain/strings/core-section'
import { effectiveDensity } from '@/lib/domain/strings/effective-density'
import { axialStiffness } from '@/lib/domain/strings/stiffness'
import { woundMass } from '@/lib/domain/strings/wound-construction'
import { kilogramsPerCubicMetre, kilogramsPerMetre, metres, pascals } from '@/lib/domain/units/quantity'
import { type DemoProduct, type SpecificationSizes, specificationOf } from './product'
import { MOVED_TARGET } from './story-facts'
import { rowanVariation } from './variation'

const STEEL = kilogramsPerCubicMetre(7850)
const BRONZE = kilogramsPerCubicMetre(8860)
const MODULUS = pascals(206e9)

/** Bronze on a steel core, close wound: ±15 µm in diameter, ±2.5 % in mass per metre. */
function bronzeWound(
  place: number,
  micrometres: number,
  prefix: string,
  midi: number,
  core: Core,
  wrap: number,
  load: readonly string[],
): DemoProduct {
  const wound = woundMass({ ...core, density: STEEL }, { density: BRONZE, diameter: metres(wrap) })
  // As it is wound: the nominal size of the product; wraps bite into a hexagonal core.
  const diameter = metres(micrometres / 1e6)
  const sizesFor = (d: number, mass: number): SpecificationSizes => ({
    core,
    diameter: d,
    diameterTolerance: 15e-6,
    mass,
    massTolerance: 0.025,
    density: effectiveDensity(kilogramsPerMetre(mass), metres(d)),
    densityTolerance: 0.03,
    ovalityMax: 16e-6,
    midi,
    length: 0.648,
    basis: 'unloaded-mass',
    axialStiffness: axialStiffness(MODULUS, coreArea(core)),
    plan: { weighedState: 'slack', cutLength: metres(0.5), acceptanceConstant: 1.5, rigCode: 'RIG-3' },
  })
  const product: DemoProduct = {
    code: `ROWAN-${micrometres}`,
    name: `Rowan ${micrometres}`,
    family: 'Rowan',
    construction: 'wound',
    prefix,
    place,
    micrometres,
    lots: 50,
    baseline: 25,
    machine: 'BW-1',
    materialCode: 'MUSIC-WIRE',
    load,
    modulus: MODULUS,
    expansion: 11.5e-6,
    variation: rowanVariation(diameter),
    specification: specificationOf(sizesFor(diameter, wound.total)),
  }
  if (product.code !== MOVED_TARGET.productCode) return product
  return {
    ...product,
    revised: {
      from: MOVED_TARGET.from,
      note: 'A little thicker and heavier, for the customers who asked for more tension.',
      specification: specificationOf(
        sizesFor(diameter + MOVED_TARGET.diameter, wound.total * (1 + MOVED_TARGET.mass)),
      ),
    },
  }
}

const round = (millimetres: number): Core => ({ shape: 'round', size: metres(millimetres / 1e3) })
const hex = (millimetres: number): Core => ({ shape: 'hex', size: metres(millimetres / 1e3) })

/** C♯3, A2, E2 and C♯2 on 648 mm. */
export const rowan: readonly DemoProduct[] = [
  bronzeWound(0, 660, 'RA', 49, round(0.33), 0.165e-3, ['H-02', 'W-15', 'W-12', 'W-11']),
  bronzeWound(1, 810, 'RB', 45, round(0.36), 0.225e-3, ['H-02', 'W-15', 'W-12']),
  bronzeWound(2, 1060, 'RC', 40, round(0.4), 0.33e-3, ['H-02', 'W-15', 'W-12']),
  bronzeWound(3, 1330, 'RD', 37, hex(0.46), 0.4e-3, ['H-02', 'W-15', 'W-12', 'W-11']),
]
