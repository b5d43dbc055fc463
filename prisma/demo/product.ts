import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import type { Core } from '@/lib/domain/strings/core-section'
import { frequencyOfNote } from '@/lib/domain/strings/pitch'
import { tensionAtPitch } from '@/lib/domain/strings/tension-at-pitch'
import { tensionWithStretch } from '@/lib/domain/strings/tension-with-stretch'
import {
  hertz,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  type Newtons,
} from '@/lib/domain/units/quantity'
import type { DemoMachine } from './equipment'
import type { Variation } from './variation'

export interface DemoProduct {
  readonly code: string
  readonly name: string
  readonly family: 'Larch' | 'Rowan' | 'Alder' | 'Yew'
  readonly construction: 'plain' | 'wound'
  readonly prefix: string
  /** From 0 within the family. */
  readonly place: number
  readonly micrometres: number
  readonly lots: number
  /** Lots from which quality freezes the first limits. */
  readonly baseline: number
  readonly machine: DemoMachine
  readonly materialCode: string
  /** What hangs when it is sounded: the hanger first. */
  readonly load: readonly string[]
  /** Of what bears the load; no expansion along a polymer. */
  readonly modulus: number
  readonly expansion?: number
  readonly variation: Variation
  /** How it takes up water with the season: share of mass, and of that how much the diameter swells. */
  readonly season?: { readonly share: number; readonly swells: number }
  /** Which luck its lots have; 0 when not said. */
  readonly stream?: number
  readonly specification: SpecificationBody
  /** A later revision, in force from a lot on. */
  readonly revised?: {
    readonly from: number
    readonly note: string
    readonly specification: SpecificationBody
  }
}

/** The specification that a lot of the product is made to. */
export const specificationFor = (
  { revised, specification }: DemoProduct,
  index: number,
): SpecificationBody => (revised && index >= revised.from ? revised.specification : specification)

export interface SpecificationSizes {
  readonly core?: Core
  /** Metres, half-width. */
  readonly diameter: number
  readonly diameterTolerance: number
  /** Kilograms a metre, relative half-width. */
  readonly mass: number
  readonly massTolerance: number
  readonly density: number
  readonly densityTolerance: number
  readonly ovalityMax: number
  readonly midi: number
  readonly length: number
  readonly basis: SpecificationBody['basis']
  /** EA of what bears the load, N. */
  readonly axialStiffness: Newtons
  /** Share by which the string is stretched when it is marked. */
  readonly markedStretch?: number
  readonly plan: Pick<
    SpecificationBody['plan'],
    'weighedState' | 'cutLength' | 'acceptanceConstant' | 'rigCode'
  >
}

/** A specification from its sizes: limits about the targets, and the tension that the mass comes to. */
export function specificationOf(sizes: SpecificationSizes): SpecificationBody {
  const frequency = frequencyOfNote(sizes.midi, hertz(440))
  const length = metres(sizes.length)
  const massTimes = (share: number) => kilogramsPerMetre(sizes.mass * share)
  const tensionOf = (share: number): Newtons =>
    sizes.basis === 'loaded-mass'
      ? tensionAtPitch(
          kilogramsPerMetre(massTimes(share) / (1 + (sizes.markedStretch ?? 0))),
          frequency,
          length,
        )
      : tensionWithStretch(massTimes(share), frequency, length, sizes.axialStiffness)
  const [light, heavy] = [1 - sizes.massTolerance, 1 + sizes.massTolerance]
  const densityTimes = (share: number) => kilogramsPerCubicMetre(sizes.density * share)
  return {
    ...(sizes.core ? { core: sizes.core } : {}),
    diameter: {
      target: metres(sizes.diameter),
      lower: metres(sizes.diameter - sizes.diameterTolerance),
      upper: metres(sizes.diameter + sizes.diameterTolerance),
    },
    massPerMetre: { target: massTimes(1), lower: massTimes(light), upper: massTimes(heavy) },
    ovalityMax: metres(sizes.ovalityMax),
    effectiveDensity: {
      target: densityTimes(1),
      lower: densityTimes(1 - sizes.densityTolerance),
      upper: densityTimes(1 + sizes.densityTolerance),
    },
    reference: { midi: sizes.midi, a4: hertz(440), length },
    tension: { target: tensionOf(1), lower: tensionOf(light), upper: tensionOf(heavy) },
    basis: sizes.basis,
    guardFactors: {},
    plan: {
      specimens: 5,
      positions: 3,
      directions: 2,
      takenAt: ['head', 'head', 'head', 'tail', 'tail'],
      ...sizes.plan,
    },
  }
}
