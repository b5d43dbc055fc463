import { sectionFromPairs } from '../strings/section'
import type { ModelFacts } from './model-facts'
import { gaugeUncertainty, modelInput } from './model-input'
import type { ModelInput } from './propagate'
import { diameterPairs } from './sheet-readings'
import { resolutionUncertainty } from './type-b'

/**
 * Uncertain inputs of the section: the gauge's calibration, common to a lot; the scatter of the positions
 * with the resolution of the readings; the resolution of a difference of two readings, for ovality.
 */
export function sectionInputs({ sheet, context }: ModelFacts): readonly ModelInput[] {
  const gauge = context.micrometer
  const { pairs } = diameterPairs(sheet, -(gauge?.error ?? 0))
  if (pairs.some(([a, b]) => !(Math.min(a, b) > 0))) return []
  const diameter = sectionFromPairs(pairs)?.areaDiameter
  if (diameter === undefined) return []
  const step = gauge ? resolutionUncertainty(gauge.resolution) : 0
  const perPosition = pairs.map(([a, b]) => Math.sqrt(a * b))
  const n = perPosition.length
  const mean = perPosition.reduce((sum, value) => sum + value, 0) / n
  const squares = perPosition.reduce((sum, value) => sum + (value - mean) * (value - mean), 0)
  const scatter = n < 2 ? 0 : Math.sqrt(squares / (n - 1) / n)
  const rounding = step / Math.sqrt(sheet.diameters.length)
  return [
    ...(gauge
      ? [
          modelInput({
            id: 'micrometer',
            name: `Micrometer ${gauge.code}, calibration`,
            u: gaugeUncertainty(gauge, diameter),
            unit: 'm',
            common: true,
            note: gauge.mode === 'direct' ? 'Used directly.' : 'Compared with a pin of the nominal size.',
          }),
        ]
      : []),
    modelInput({
      id: 'section',
      name: 'Diameter along the specimen',
      u: Math.sqrt(scatter * scatter + rounding * rounding),
      unit: 'm',
      type: 'A',
      distribution: 'observed',
      common: false,
      note: `Scatter of ${n} ${n === 1 ? 'position' : 'positions'}, with the resolution of the readings.`,
    }),
    modelInput({
      id: 'ovality',
      name: 'Resolution of two readings',
      u: step * Math.SQRT2,
      unit: 'm',
      distribution: 'rectangular',
      common: false,
    }),
  ]
}
