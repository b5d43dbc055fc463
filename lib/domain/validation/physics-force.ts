import { airDensity, airDensitySimple } from '../strings/air-density'
import { conventionalMassExcess, trueMass } from '../strings/conventional-mass'
import { deadWeightForce } from '../strings/dead-weight-force'
import { edgeFrictionBounds } from '../strings/edge-friction'
import { gravityInFreeAir, gravityInFreeAirLinear, normalGravity } from '../strings/normal-gravity'
import { weighedMass } from '../strings/weighed-mass'
import {
  degrees,
  degreesCelsius,
  kilograms,
  kilogramsPerCubicMetre,
  metresPerSecondSquared,
  newtons,
  pascals,
} from '../units/quantity'
import { numberOf, type QuantityTable, textOf } from './inputs'

/** Gravity, air, weights and balances. */
export const forceQuantities: QuantityTable = {
  'normal-gravity': (inputs) => {
    const latitude = numberOf(inputs, 'lat_deg')
    const height = numberOf(inputs, 'height_m')
    const system = textOf(inputs, 'system', ['GRS80', 'WGS84'])
    return {
      gamma_0: normalGravity(latitude, system),
      g_second_order: gravityInFreeAir(latitude, height, system),
      g_freeair_linear: gravityInFreeAirLinear(latitude, height, system),
    }
  },
  'air-density': (inputs) => {
    const state = {
      temperature: degreesCelsius(numberOf(inputs, 't_C')),
      pressure: pascals(numberOf(inputs, 'p_Pa')),
      humidity: numberOf(inputs, 'rh'),
    }
    return {
      rho_CIPM2007: airDensity(state, numberOf(inputs, 'x_CO2')),
      rho_OIML_simplified: airDensitySimple(state),
    }
  },
  'dead-weight-force': (inputs) => {
    const mass = kilograms(numberOf(inputs, 'm_conventional'))
    const density = kilogramsPerCubicMetre(numberOf(inputs, 'rho_mass'))
    return {
      m_true: trueMass(mass, density),
      F: deadWeightForce(
        mass,
        metresPerSecondSquared(numberOf(inputs, 'g')),
        kilogramsPerCubicMetre(numberOf(inputs, 'rho_air')),
        density,
      ),
    }
  },
  'conventional-mass-excess': (inputs) => ({
    mc_over_m_minus_1: conventionalMassExcess(kilogramsPerCubicMetre(numberOf(inputs, 'rho_mass'))),
  }),
  'weighed-mass': (inputs) => ({
    m: weighedMass(
      kilograms(numberOf(inputs, 'balance_reading')),
      kilogramsPerCubicMetre(numberOf(inputs, 'rho_air')),
      kilogramsPerCubicMetre(numberOf(inputs, 'rho_sample')),
      kilogramsPerCubicMetre(numberOf(inputs, 'rho_ref')),
    ),
  }),
  'edge-friction-bounds': (inputs) => {
    const { lowest, highest } = edgeFrictionBounds(
      newtons(numberOf(inputs, 'T_load_side')),
      numberOf(inputs, 'mu_friction'),
      degrees(numberOf(inputs, 'break_angle_deg')),
    )
    return { T_max: highest, T_min: lowest }
  },
}
