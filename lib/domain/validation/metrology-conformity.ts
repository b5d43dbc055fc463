import { conformanceProbability } from '../quality/conformance-probability'
import { globalRisks } from '../quality/global-risks'
import { guardBand, guardBandForProbability, measurementCapability } from '../quality/guard-band'
import { type Inputs, numberOf, optionalNumberOf, type QuantityTable } from './inputs'

/** A limit that is null in the case is none. */
const limitsOf = (inputs: Inputs) => {
  const [lower, upper] = [optionalNumberOf(inputs, 'lower'), optionalNumberOf(inputs, 'upper')]
  return { ...(lower === undefined ? {} : { lower }), ...(upper === undefined ? {} : { upper }) }
}

/** Conformity with uncertainty (JCGM 106). */
export const conformityQuantities: QuantityTable = {
  'conformance-probability': (inputs) => ({
    p_conform: conformanceProbability(numberOf(inputs, 'y'), numberOf(inputs, 'u'), limitsOf(inputs)),
  }),
  'guard-band': (inputs) => {
    const limits = { lower: numberOf(inputs, 'lower'), upper: numberOf(inputs, 'upper') }
    const u = numberOf(inputs, 'u')
    const quantile = guardBandForProbability(limits, u, numberOf(inputs, 'p_min'))
    const full = guardBand(limits, u, 1)
    const justAccepted = quantile.accept.upper ?? Number.NaN
    return {
      w_quantile: quantile.width,
      accept_lower_q: quantile.accept.lower,
      accept_upper_q: quantile.accept.upper,
      w_U_k2: full.width,
      accept_lower_U: full.accept.lower,
      accept_upper_U: full.accept.upper,
      r_ratio: quantile.factor,
      p_conform_at_acceptance_limit_one_sided: conformanceProbability(justAccepted, u, {
        upper: limits.upper,
      }),
      p_conform_at_acceptance_limit_two_sided: conformanceProbability(justAccepted, u, limits),
      C_m: measurementCapability(limits, u),
    }
  },
  'global-risks': (inputs) => {
    const { accepted, conforming, consumer, producer } = globalRisks({
      mean: numberOf(inputs, 'mu0'),
      deviation: numberOf(inputs, 'u0'),
      u: numberOf(inputs, 'um'),
      tolerance: { lower: numberOf(inputs, 'TL'), upper: numberOf(inputs, 'TU') },
      accept: { lower: numberOf(inputs, 'AL'), upper: numberOf(inputs, 'AU') },
    })
    return { R_consumer: consumer, R_producer: producer, p_conforming: conforming, p_accepted: accepted }
  },
}
