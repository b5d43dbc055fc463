import { airDecay, airDrag, airFrequencyShift, airMassPerMetre, stokesNumber } from '../strings/air-loading'
import {
  circularAmplitudeShift,
  planeAmplitudeShift,
  planeAmplitudeShiftExact,
} from '../strings/amplitude-shift'
import { coreArea, coreSecondMoment } from '../strings/core-section'
import { endConditions, endShift, stiffPartialRatio } from '../strings/end-condition'
import { fitPartials } from '../strings/partials-fit'
import { centsBetween } from '../strings/pitch'
import { resonanceChain } from '../strings/resonance-chain'
import { roundArea, solidWireMassPerMetre } from '../strings/round-section'
import { clampedPartialRatioExact, knifePartialRatioExact } from '../strings/stiff-string-roots'
import {
  bendingLength,
  bendingStiffness,
  inharmonicity,
  plainWireAxialStiffness,
  plainWireBendingStiffness,
  stiffnessFirstOrder,
} from '../strings/stiffness'
import { stokesFactors, stokesFactorsAsymptotic } from '../strings/stokes-cylinder'
import { elasticStrain, loadedMassPerMetre, unloadedMassPerMetre } from '../strings/stretch'
import { tensionAtPitch } from '../strings/tension-at-pitch'
import { tensionWithStretch } from '../strings/tension-with-stretch'
import {
  hertz,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  newtons,
  pascals,
  squareMetresPerSecond,
} from '../units/quantity'
import { type Inputs, numberOf, numbersOf, type QuantityTable, textOf } from './inputs'

const length = (inputs: Inputs) => metres(numberOf(inputs, 'L'))
const diameter = (inputs: Inputs) => metres(numberOf(inputs, 'd'))
const tension = (inputs: Inputs) => newtons(numberOf(inputs, 'T'))
const modulus = (inputs: Inputs) => pascals(numberOf(inputs, 'E'))
const air = (inputs: Inputs) => ({
  density: kilogramsPerCubicMetre(numberOf(inputs, 'rho_air')),
  viscosity: squareMetresPerSecond(numberOf(inputs, 'nu_air')),
})

/** Stiffness, ends, air, amplitude, stretch, and the chain of them. */
export const soundingQuantities: QuantityTable = {
  'plain-wire-stiffness': (inputs) => {
    const stiffness = plainWireBendingStiffness(modulus(inputs), diameter(inputs))
    const B = inharmonicity(stiffness, tension(inputs), length(inputs))
    return {
      B,
      pinned_f1_rel: endShift('pinned', B),
      clamped_f1_rel_exact: clampedPartialRatioExact(B, 1) - 1,
      clamped_f1_rel_fletcher: endShift('clamped', B),
      lambda_m: bendingLength(stiffness, tension(inputs)),
    }
  },
  'stiff-partial-ratio': (inputs) => {
    const n = numberOf(inputs, 'n')
    const B = numberOf(inputs, 'B')
    return {
      fn_over_f0_pinned: n * stiffPartialRatio('pinned', B, n),
      fn_over_f0_clamped_exact: n * clampedPartialRatioExact(B, n),
      fn_over_f0_clamped_fletcher: n * stiffPartialRatio('clamped', B, n),
    }
  },
  'knife-edge-shift': (inputs) => {
    const n = numberOf(inputs, 'n')
    const B = numberOf(inputs, 'B')
    return {
      f1_rel_exact_3span: knifePartialRatioExact(B, n, numberOf(inputs, 'tail_over_L')) - 1,
      f1_rel_model: stiffPartialRatio('knife', B, n) - 1,
    }
  },
  'core-stiffness': (inputs) => {
    const core = {
      shape: textOf(inputs, 'core', ['hex', 'round']),
      size: metres(numberOf(inputs, 'across_flats')),
    }
    const I = coreSecondMoment(core)
    return {
      I,
      A: coreArea(core),
      B_core_only: inharmonicity(bendingStiffness(modulus(inputs), I), tension(inputs), length(inputs)),
    }
  },
  'stiffness-first-order': (inputs) => ({
    rel_first_order: stiffnessFirstOrder(
      modulus(inputs),
      roundArea(diameter(inputs)),
      kilogramsPerMetre(numberOf(inputs, 'mu')),
      hertz(numberOf(inputs, 'f')),
      tension(inputs),
    ),
  }),
  'partials-fit': (inputs) => {
    const frequencies = numbersOf(inputs, 'f')
    const u = numbersOf(inputs, 'u_f')
    const fit = fitPartials(
      numbersOf(inputs, 'n').map((n, index) => ({
        n,
        frequency: hertz(frequencies[index] ?? Number.NaN),
        u: u[index] ?? Number.NaN,
      })),
    )
    return {
      f0: fit?.f0,
      B: fit?.inharmonicity,
      u_f0: fit?.uF0,
      u_B: fit?.uInharmonicity,
      chi2: fit?.chiSquared,
      dof: fit?.degreesOfFreedom,
    }
  },
  'air-loading': (inputs) => {
    const d = diameter(inputs)
    const f = hertz(numberOf(inputs, 'f'))
    const around = air(inputs)
    const mass = solidWireMassPerMetre(d, kilogramsPerCubicMetre(numberOf(inputs, 'rho_string')))
    const M = stokesNumber(d, f, around.viscosity)
    const exact = stokesFactors(M)
    const large = stokesFactorsAsymptotic(M)
    const added = airMassPerMetre(d, f, around)
    const decay = airDecay(mass, f, airDrag(d, f, around))
    return {
      M,
      k_exact: exact.inertia,
      kprime_exact: exact.drag,
      k_asym: large.inertia,
      kprime_asym: large.drag,
      mu_added: added,
      df_rel: airFrequencyShift(mass, added),
      tau_amp: decay.amplitudeTime,
      Q: decay.quality,
    }
  },
  'amplitude-shift': (inputs) => {
    const swing = {
      axialStiffness: plainWireAxialStiffness(modulus(inputs), diameter(inputs)),
      tension: tension(inputs),
      length: length(inputs),
      amplitude: metres(numberOf(inputs, 'amplitude_mid')),
    }
    const plane = planeAmplitudeShift(swing)
    return {
      plane_rel: plane,
      plane_rel_exact_duffing: planeAmplitudeShiftExact(swing),
      circular_rel: circularAmplitudeShift(swing),
      cents_plane: centsBetween(hertz(1 + plane), hertz(1)),
    }
  },
  'tension-with-stretch': (inputs) => {
    const unloaded = kilogramsPerMetre(numberOf(inputs, 'mu_unloaded'))
    const f = hertz(numberOf(inputs, 'f'))
    const EA = plainWireAxialStiffness(modulus(inputs), diameter(inputs))
    const T = tensionWithStretch(unloaded, f, length(inputs), EA)
    const strain = elasticStrain(T, EA)
    return {
      EA,
      T_no_stretch: tensionAtPitch(unloaded, f, length(inputs)),
      T,
      strain,
      mu_loaded: loadedMassPerMetre(unloaded, strain),
    }
  },
  'unloaded-mass-per-metre': (inputs) => ({
    mu_unloaded: unloadedMassPerMetre(
      kilogramsPerMetre(numberOf(inputs, 'mu_resonance')),
      elasticStrain(tension(inputs), newtons(numberOf(inputs, 'EA'))),
    ),
  }),
  'resonance-chain': (inputs) => {
    const d = diameter(inputs)
    const chain = resonanceChain(
      {
        force: newtons(numberOf(inputs, 'F')),
        span: length(inputs),
        endCondition: textOf(inputs, 'end_model', endConditions),
        axialStiffness: plainWireAxialStiffness(modulus(inputs), d),
        bendingStiffness: plainWireBendingStiffness(modulus(inputs), d),
        outerDiameter: d,
        air: air(inputs),
      },
      hertz(numberOf(inputs, 'f1')),
    )
    return {
      mu_raw: chain.raw,
      e_end: chain.endShift,
      mu_added_air: chain.airMass,
      mu_loaded: chain.loaded,
      mu_unloaded: chain.unloaded,
    }
  },
}
