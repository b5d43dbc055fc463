import type { GaugeFacts } from './evaluation'
import type { ModelInput } from './propagate'

type Partly = Omit<ModelInput, 'type' | 'distribution' | 'value'> &
  Partial<Pick<ModelInput, 'type' | 'distribution' | 'value'>>

/** An input of type B, normal and zero at its centre unless said otherwise. */
export const modelInput = (one: Partly): ModelInput => ({
  type: 'B',
  distribution: 'normal',
  value: 0,
  ...one,
})

/** Calibration uncertainty of a gauge at a reading: absolute and proportional part in quadrature. */
export function gaugeUncertainty(gauge: GaugeFacts, reading: number): number {
  const proportional = gauge.uRelative * reading
  return Math.sqrt(gauge.uAbsolute * gauge.uAbsolute + proportional * proportional)
}
