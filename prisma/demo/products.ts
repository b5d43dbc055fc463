import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import { frequencyOfNote } from '@/lib/domain/strings/pitch'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import { plainWireAxialStiffness } from '@/lib/domain/strings/stiffness'
import { tensionWithStretch } from '@/lib/domain/strings/tension-with-stretch'
import {
  hertz,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  newtons,
  pascals,
} from '@/lib/domain/units/quantity'

export interface DemoProduct {
  readonly code: string
  readonly name: string
  readonly family: string
  readonly prefix: string
  readonly micrometres: number
  readonly lots: number
  readonly specification: SpecificationBody
}

const DENSITY = kilogramsPerCubicMetre(7850)
const MODULUS = pascals(206e9)

/** Plain steel: ±3 µm in diameter, ±2 % in mass per metre; tension follows from the mass. */
function larch(micrometres: number, prefix: string, midi: number, lots: number): DemoProduct {
  const d = metres(micrometres / 1e6)
  const mass = solidWireMassPerMetre(d, DENSITY)
  const length = metres(0.648)
  const tensionOf = (share: number) =>
    tensionWithStretch(
      kilogramsPerMetre(mass * share),
      frequencyOfNote(midi, hertz(440)),
      length,
      plainWireAxialStiffness(MODULUS, d),
    )
  return {
    code: `LARCH-${micrometres}`,
    name: `Larch ${micrometres}`,
    family: 'Larch',
    prefix,
    micrometres,
    lots,
    specification: {
      diameter: { target: d, lower: metres(d - 3e-6), upper: metres(d + 3e-6) },
      massPerMetre: {
        target: mass,
        lower: kilogramsPerMetre(mass * 0.98),
        upper: kilogramsPerMetre(mass * 1.02),
      },
      ovalityMax: metres(3e-6),
      effectiveDensity: {
        target: DENSITY,
        lower: kilogramsPerCubicMetre(7730),
        upper: kilogramsPerCubicMetre(7970),
      },
      reference: { midi, a4: hertz(440), length },
      tension: {
        target: newtons(tensionOf(1)),
        lower: newtons(tensionOf(0.98)),
        upper: newtons(tensionOf(1.02)),
      },
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
  }
}

/** The Larch family: E4 on the two thinner, B3 and G3 on the thicker. */
export const demoProducts: readonly DemoProduct[] = [
  larch(254, 'LA', 64, 160),
  larch(229, 'LB', 64, 60),
  larch(279, 'LC', 59, 60),
  larch(330, 'LD', 55, 60),
]
