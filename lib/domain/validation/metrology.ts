import { effectiveDegreesOfFreedom } from '../metrology/effective-degrees-of-freedom'
import { faultResiduals } from '../metrology/fault-residuals'
import { correlationOfSpecimens, meanUncertainty } from '../metrology/mean-uncertainty'
import { type PowerFactor, powerProductUncertainty } from '../metrology/power-product-uncertainty'
import { routeConsistency } from '../metrology/route-consistency'
import { type BoundsDistribution, standardUncertaintyFromBounds } from '../metrology/type-b'
import { type Inputs, numberOf, numbersOf, optionalNumberOf, type QuantityTable, textOf } from './inputs'
import { conformityQuantities } from './metrology-conformity'
import { guideQuantities } from './metrology-guide'
import { degreesOf } from './series-inputs'

const factor = (inputs: Inputs, name: string, exponent: number): PowerFactor => ({
  value: numberOf(inputs, name),
  u: numberOf(inputs, `u_${name}`),
  exponent,
})

/** Budgets, consistency and diagnosis of the two routes. */
const routeQuantities: QuantityTable = {
  'route-consistency': (inputs) => {
    const { zeta, normalisedError } = routeConsistency(
      { value: numberOf(inputs, 'x1'), u: numberOf(inputs, 'u1') },
      { value: numberOf(inputs, 'x2'), u: numberOf(inputs, 'u2') },
      optionalNumberOf(inputs, 'r'),
    )
    return { zeta, En: normalisedError }
  },
  'budget-mass-per-metre-sounded': (inputs) => {
    const corrections = { value: 1, u: numberOf(inputs, 'u_rel_corr'), exponent: 1 }
    const { relative, u, value } = powerProductUncertainty(
      [factor(inputs, 'F', 1), factor(inputs, 'L', -2), factor(inputs, 'f', -2), corrections],
      { constant: 1 / 4 },
    )
    return { mu: value, u_rel: relative, u }
  },
  'budget-mass-per-metre-weighed': (inputs) => {
    const { relative, u, value } = powerProductUncertainty([factor(inputs, 'm', 1), factor(inputs, 'L', -1)])
    return { mu: value, u_rel: relative, u }
  },
  'budget-effective-density': (inputs) => {
    const { relative, value } = powerProductUncertainty([factor(inputs, 'mu', 1), factor(inputs, 'd', -2)], {
      constant: 4 / Math.PI,
    })
    return { rho_eff: value, u_rel: relative }
  },
  'mean-with-common-uncertainty': (inputs) => {
    const [common, random] = [numberOf(inputs, 'u_common'), numberOf(inputs, 'u_random')]
    return {
      u_mean: meanUncertainty(numberOf(inputs, 'n'), common, random),
      r_between: correlationOfSpecimens(common, random),
    }
  },
  'standard-uncertainty-type-b': (inputs) => ({
    u: standardUncertaintyFromBounds(
      numberOf(inputs, 'half_width'),
      textOf<BoundsDistribution>(inputs, 'distribution', [
        'rectangular',
        'triangular',
        'arcsine',
        'normal-95',
      ]),
    ),
  }),
  'effective-degrees-of-freedom': (inputs) => {
    const degrees = degreesOf(inputs, 'nu')
    const combined = effectiveDegreesOfFreedom(
      numbersOf(inputs, 'u').map((u, index) => ({ u, degrees: degrees[index] ?? Number.NaN })),
    )
    return { u_c: combined.u, nu_eff: combined.degrees }
  },
  'fault-residuals': (inputs) => {
    const found = faultResiduals({
      diameter: numberOf(inputs, 'd'),
      weighed: numberOf(inputs, 'mu_w'),
      sounded: numberOf(inputs, 'mu_r'),
      nominalDiameter: numberOf(inputs, 'd0'),
      nominalDensity: numberOf(inputs, 'rho0'),
      uDiameter: numberOf(inputs, 'u_rel_d'),
      uWeighed: numberOf(inputs, 'u_rel_mu_w'),
      uSounded: numberOf(inputs, 'u_rel_mu_r'),
    })
    return {
      delta_d: found.diameter,
      delta_w: found.weighed,
      delta_r: found.sounded,
      c1: found.routes,
      c2: found.densityWeighed,
      c3: found.densitySounded,
      z1: found.zRoutes,
      z2: found.zDensityWeighed,
      z3: found.zDensitySounded,
    }
  },
}

/** Each quantity of measuring, uncertainty and conformity with the function that computes it. */
export const metrologyQuantities: QuantityTable = {
  ...routeQuantities,
  ...guideQuantities,
  ...conformityQuantities,
}
