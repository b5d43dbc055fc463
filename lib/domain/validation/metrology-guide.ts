import { calibrationLine, correctionAt } from '../metrology/calibration-line'
import { coverageFactor, effectiveDegreesOfFreedom } from '../metrology/effective-degrees-of-freedom'
import { powerProductUncertainty } from '../metrology/power-product-uncertainty'
import { productUncertainty } from '../metrology/product-uncertainty'
import { propagateCovariance, simultaneousMeans } from '../metrology/simultaneous-readings'
import { halfWidthOfRectangularSum } from '../metrology/sum-of-rectangulars'
import { standardUncertaintyFromBounds } from '../metrology/type-b'
import { normalQuantile } from '../statistics/normal-quantile'
import { cos, sin } from '../units/elementary'
import { type Inputs, numberOf, numbersOf, type QuantityTable } from './inputs'
import { degreesOf, rowsOf } from './series-inputs'

/** The inputs by one list of values and one of standard uncertainties. */
const factors = (inputs: Inputs, exponents: readonly number[]) => {
  const u = numbersOf(inputs, 'u')
  return numbersOf(inputs, 'x').map((value, index) => ({
    value,
    u: u[index] ?? Number.NaN,
    exponent: exponents[index] ?? Number.NaN,
  }))
}

/** Examples of the guides to uncertainty (JCGM 100, JCGM 101), and of the law of propagation. */
export const guideQuantities: QuantityTable = {
  'combined-uncertainty': (inputs) => {
    const degrees = degreesOf(inputs, 'nu')
    const conf = numberOf(inputs, 'conf')
    const combined = effectiveDegreesOfFreedom(
      numbersOf(inputs, 'u').map((u, index) => ({ u, degrees: degrees[index] ?? Number.NaN })),
    )
    const truncated = coverageFactor(combined.degrees, conf)
    return {
      uc: combined.u,
      nu_eff: combined.degrees,
      nu_eff_truncated: Math.floor(combined.degrees),
      k_truncated: truncated,
      k_fractional: coverageFactor(combined.degrees, conf, false),
      U_truncated: truncated * combined.u,
    }
  },
  'propagated-power-product': (inputs) => {
    const correlation = rowsOf(inputs, 'correlation')
    const product = powerProductUncertainty(factors(inputs, numbersOf(inputs, 'exponents')), { correlation })
    return {
      y: product.value,
      u_y: product.u,
      rel_u: product.relative,
      contributions_c_u: product.contributions,
    }
  },
  'propagated-tension': (inputs) => {
    const [mu, L, f] = [numberOf(inputs, 'mu'), numberOf(inputs, 'L'), numberOf(inputs, 'f')]
    const product = powerProductUncertainty(factors({ ...inputs, x: [mu, L, f] }, [1, 2, 2]), { constant: 4 })
    return { T: product.value, u_T: product.u, contributions_c_u: product.contributions }
  },
  'gum-simultaneous-resistance': (inputs) => {
    const voltage = numbersOf(inputs, 'V')
    const current = numbersOf(inputs, 'I_mA').map((milliamperes) => milliamperes / 1000)
    const found = simultaneousMeans([voltage, current, numbersOf(inputs, 'phi')])
    if (!found) throw new TypeError('simultaneous readings need two of each')
    const [V = Number.NaN, I = Number.NaN, phi = Number.NaN] = found.means
    const Z = V / I
    const [R, X] = [Z * cos(phi), Z * sin(phi)]
    const { correlation, u } = propagateCovariance(
      [
        [R / V, -R / I, -X],
        [X / V, -X / I, R],
        [Z / V, -Z / I, 0],
      ],
      found.covariance,
    )
    const between = (i: number, j: number): number | undefined => {
      const c = found.covariance[i]?.[j]
      return c === undefined ? undefined : c / ((found.u[i] ?? Number.NaN) * (found.u[j] ?? Number.NaN))
    }
    return {
      mean: found.means,
      u_mean: found.u,
      r_VI: between(0, 1),
      r_VP: between(0, 2),
      r_IP: between(1, 2),
      y: [R, X, Z],
      u,
      r_RX: correlation[0]?.[1],
      r_RZ: correlation[0]?.[2],
      r_XZ: correlation[1]?.[2],
    }
  },
  'gum-thermometer-calibration': (inputs) => {
    const b = numbersOf(inputs, 'b')
    const t0 = numberOf(inputs, 't0')
    const points = numbersOf(inputs, 't').map((x, index) => ({ x, correction: b[index] ?? Number.NaN }))
    const line = calibrationLine(points, t0)
    if (!line) throw new TypeError('a calibration line needs three points')
    const predicted = correctionAt(line, t0, numberOf(inputs, 'predict_at'))
    return {
      y1: line.at,
      y2: line.slope,
      u_y1: line.uAt,
      u_y2: line.uSlope,
      r: line.correlation,
      s: line.residualDeviation,
      b30: predicted.value,
      u_b30: predicted.u,
      dof: line.degrees,
    }
  },
  'sum-of-equal-rectangulars': (inputs) => {
    const n = numberOf(inputs, 'n')
    const halfWidths = Array.from({ length: n }, () => Math.sqrt(3) * numberOf(inputs, 'sd_each'))
    return rectangularSum(halfWidths, numberOf(inputs, 'conf'))
  },
  'sum-of-rectangulars': (inputs) =>
    rectangularSum(numbersOf(inputs, 'half_widths'), numberOf(inputs, 'conf')),
  'second-order-product': (inputs) => {
    const [x1 = Number.NaN, x2 = Number.NaN] = numbersOf(inputs, 'x')
    const [u1 = Number.NaN, u2 = Number.NaN] = numbersOf(inputs, 'u')
    const { exact, firstOrder } = productUncertainty({ value: x1, u: u1 }, { value: x2, u: u2 })
    return { u_first_order: firstOrder, u_exact: exact }
  },
}

function rectangularSum(halfWidths: readonly number[], coverage: number) {
  const variance = halfWidths.reduce((sum, a) => {
    const u = standardUncertaintyFromBounds(a)
    return sum + u * u
  }, 0)
  const u = Math.sqrt(variance)
  return {
    u,
    half_width_exact: halfWidthOfRectangularSum(halfWidths, coverage),
    half_width_gaussian: normalQuantile((1 + coverage) / 2) * u,
  }
}
