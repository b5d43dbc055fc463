import { roundArea } from '../strings/round-section'
import { plainWireAxialStiffness } from '../strings/stiffness'
import {
  breakingLoad,
  breakingPitch,
  dropEnergy,
  pascalsFromKsi,
  storedEnergy,
  tensileStress,
  workingFraction,
} from '../strings/strength'
import {
  kilograms,
  kilogramsPerCubicMetre,
  metres,
  metresPerSecondSquared,
  newtons,
  pascals,
} from '../units/quantity'
import { fromSi, toSi } from '../units/unit'
import { numberOf, type QuantityTable } from './inputs'

/** Strength, working fraction, energies. */
export const safetyQuantities: QuantityTable = {
  'wire-strength-from-ksi': (inputs) => {
    const d = metres(toSi(numberOf(inputs, 'd_in'), 'in'))
    const low = pascalsFromKsi(numberOf(inputs, 'Rm_min_ksi'))
    return {
      d_m: d,
      Rm_min_MPa: fromSi(low, 'MPa'),
      Rm_max_MPa: fromSi(pascalsFromKsi(numberOf(inputs, 'Rm_max_ksi')), 'MPa'),
      F_break_min: breakingLoad(low, roundArea(d)),
    }
  },
  'working-fraction': (inputs) => {
    const d = metres(numberOf(inputs, 'd'))
    const T = newtons(numberOf(inputs, 'T'))
    const breaking = breakingLoad(pascals(numberOf(inputs, 'Rm')), roundArea(d))
    return {
      F_break: breaking,
      working_fraction: workingFraction(T, breaking),
      stress: tensileStress(T, roundArea(d)),
      energy: storedEnergy(
        T,
        metres(numberOf(inputs, 'L')),
        plainWireAxialStiffness(pascals(numberOf(inputs, 'E')), d),
      ),
    }
  },
  'breaking-pitch': (inputs) => ({
    f_break: breakingPitch(
      pascals(numberOf(inputs, 'Rm')),
      kilogramsPerCubicMetre(numberOf(inputs, 'rho')),
      metres(numberOf(inputs, 'L')),
    ),
  }),
  'drop-energy': (inputs) => ({
    E: dropEnergy(
      kilograms(numberOf(inputs, 'm')),
      metres(numberOf(inputs, 'h')),
      metresPerSecondSquared(numberOf(inputs, 'g')),
    ),
  }),
}
