import { diameterAt20 } from '../strings/diameter-at-20'
import { effectiveDensity } from '../strings/effective-density'
import { lobedAreaError } from '../strings/lobed-section'
import { lumpShift } from '../strings/lump-shift'
import { centsBetween } from '../strings/pitch'
import { massSpreadOfDiameterTolerance, solidWireMassPerMetre } from '../strings/round-section'
import { sectionFromPairs } from '../strings/section'
import { plainWireAxialStiffness } from '../strings/stiffness'
import { thermalPitchUnderDeadWeight, thermalTensionChange } from '../strings/thermal'
import { cosineProfile, taperProfile, unevenPartialShift } from '../strings/uneven-string'
import { woundLayersMass, woundMass } from '../strings/wound-construction'
import {
  degreesCelsius,
  hertz,
  kilograms,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  newtons,
  pascals,
  perKelvin,
} from '../units/quantity'
import {
  numberOf,
  numbersOf,
  optionalNumberOf,
  pairsOf,
  type QuantityTable,
  recordsOf,
  textOf,
} from './inputs'

/** Temperature, cross-section, unevenness, winding, density. */
export const constructionQuantities: QuantityTable = {
  'diameter-at-20-c': (inputs) => ({
    d_20: diameterAt20(
      metres(numberOf(inputs, 'd_meas')),
      degreesCelsius(numberOf(inputs, 't_C')),
      perKelvin(numberOf(inputs, 'alpha')),
    ),
  }),
  'thermal-tension-change': (inputs) => {
    textOf(inputs, 'mode', ['fixed length'])
    const T = newtons(numberOf(inputs, 'T'))
    const change = thermalTensionChange(
      plainWireAxialStiffness(pascals(numberOf(inputs, 'E')), metres(numberOf(inputs, 'd'))),
      perKelvin(numberOf(inputs, 'alpha_string')),
      perKelvin(numberOf(inputs, 'alpha_frame')),
      numberOf(inputs, 'delta_t'),
    )
    return {
      delta_T: change,
      cents: centsBetween(hertz(Math.sqrt((T + change) / T)), hertz(1)),
    }
  },
  'thermal-pitch-dead-weight': (inputs) => {
    textOf(inputs, 'mode', ['dead weight'])
    const ratio = thermalPitchUnderDeadWeight(
      perKelvin(numberOf(inputs, 'alpha_string')),
      perKelvin(numberOf(inputs, 'alpha_frame')),
      numberOf(inputs, 'delta_t'),
    )
    return { f_ratio: ratio, cents: centsBetween(hertz(ratio), hertz(1)) }
  },
  'section-from-diameters': (inputs) => {
    const section = sectionFromPairs(pairsOf(inputs, 'pairs').map(([a, b]) => [metres(a), metres(b)]))
    return {
      d_mean: section?.meanDiameter,
      d_area_geometric: section?.areaDiameter,
      d_area_quadratic: section?.quadraticDiameter,
      A: section?.area,
      ovality_max: section?.ovality,
      ovality_max_rel: section?.ovalityRelative,
    }
  },
  'lobed-section-area-error': (inputs) => ({
    area_rel_error: lobedAreaError(
      metres(numberOf(inputs, 'd')),
      metres(numberOf(inputs, 'lobe_amplitude_e')),
      numberOf(inputs, 'lobes'),
    ),
  }),
  'lump-partial-shift': (inputs) => ({
    df_rel: numbersOf(inputs, 'n').map((n) =>
      lumpShift(
        kilograms(numberOf(inputs, 'lump_mass')),
        metres(numberOf(inputs, 'x')),
        kilogramsPerMetre(numberOf(inputs, 'mu')),
        metres(numberOf(inputs, 'L')),
        n,
      ),
    ),
  }),
  'taper-partial-shift': (inputs) => {
    const profile = taperProfile(numberOf(inputs, 'taper_end_to_end'))
    return { df_rel: numbersOf(inputs, 'n').map((n) => unevenPartialShift(profile, n)) }
  },
  'periodic-partial-shift': (inputs) => {
    const profile = cosineProfile(numberOf(inputs, 'cosine_amplitude'), numberOf(inputs, 'half_waves'))
    return { df_rel: numbersOf(inputs, 'n').map((n) => unevenPartialShift(profile, n)) }
  },
  'wound-construction': (inputs) => {
    const core = textOf(inputs, 'core', ['round', 'hex_circle', 'hex_tight'])
    const lay = optionalNumberOf(inputs, 'pitch')
    const wound = woundMass(
      {
        shape: core === 'round' ? 'round' : 'hex',
        size: metres(numberOf(inputs, 'd_core')),
        density: kilogramsPerCubicMetre(numberOf(inputs, 'rho_core')),
      },
      {
        density: kilogramsPerCubicMetre(numberOf(inputs, 'rho_wrap')),
        diameter: metres(numberOf(inputs, 'd_wrap')),
        ...(lay === undefined ? {} : { lay: metres(lay) }),
      },
      core === 'hex_tight' ? 'tight' : 'circle',
    )
    return {
      mu_core: wound.core,
      mu_wrap: wound.wrap,
      mu: wound.total,
      D: wound.outerDiameter,
      rho_eff: effectiveDensity(wound.total, wound.outerDiameter),
      wrap_len_per_m: wound.wrapLength,
    }
  },
  'wound-layers': (inputs) => {
    const wound = woundLayersMass(
      {
        shape: 'round',
        size: metres(numberOf(inputs, 'd_core')),
        density: kilogramsPerCubicMetre(numberOf(inputs, 'rho_core')),
      },
      recordsOf(inputs, 'layers').map((layer) => ({
        density: kilogramsPerCubicMetre(numberOf(layer, 'rho')),
        diameter: metres(numberOf(layer, 'd')),
      })),
    )
    return {
      mu: wound.total,
      D: wound.outerDiameter,
      rho_eff: effectiveDensity(wound.total, wound.outerDiameter),
    }
  },
  'effective-density': (inputs) => ({
    rho_eff: effectiveDensity(kilogramsPerMetre(numberOf(inputs, 'mu')), metres(numberOf(inputs, 'd'))),
  }),
  'solid-wire-mass-per-1000-m': (inputs) => ({
    mass_per_1000m_kg:
      1000 *
      solidWireMassPerMetre(metres(numberOf(inputs, 'd')), kilogramsPerCubicMetre(numberOf(inputs, 'rho'))),
  }),
  'diameter-tolerance-as-mass': (inputs) => {
    const spread = massSpreadOfDiameterTolerance(
      metres(numberOf(inputs, 'd')),
      metres(numberOf(inputs, 'tol')),
    )
    return { mu_rel_plus: spread.plus, mu_rel_minus: spread.minus }
  },
}
