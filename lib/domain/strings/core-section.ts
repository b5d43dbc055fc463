import { positive } from '../units/positive'
import {
  type Metres,
  type MetresToTheFourth,
  metres,
  metresToTheFourth,
  type SquareMetres,
  squareMetres,
} from '../units/quantity'
import { roundArea, roundSecondMoment } from './round-section'

/** A core: `size` is the diameter of a round one, the distance across flats of a hexagonal one. */
export interface Core {
  readonly shape: 'round' | 'hex'
  readonly size: Metres
}

/** Area of the load-bearing core, m²: hexagon (√3/2) s². Source: geometry. */
export const coreArea = ({ shape, size }: Core): SquareMetres =>
  shape === 'round' ? roundArea(size) : squareMetres((Math.sqrt(3) / 2) * positive('s', size) * size)

/** Second moment of area, m⁴: hexagon (5√3/144) s⁴, the same about every axis. Source: geometry. */
export function coreSecondMoment({ shape, size }: Core): MetresToTheFourth {
  if (shape === 'round') return roundSecondMoment(size)
  const square = positive('s', size) * size
  return metresToTheFourth(((5 * Math.sqrt(3)) / 144) * square * square)
}

/** Across corners of the core, m: hexagon 2 s/√3; the diameter itself when round. Source: geometry. */
export const coreAcrossCorners = ({ shape, size }: Core): Metres =>
  shape === 'round' ? size : metres((2 * positive('s', size)) / Math.sqrt(3))
