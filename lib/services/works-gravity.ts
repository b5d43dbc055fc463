import type { WorksRow } from '@/lib/data/works'
import { localGravity, NORMAL_GRAVITY_RELATIVE_U } from '@/lib/domain/strings/normal-gravity'

/** A published local value is taken as good to 2 mGal: interpolated between stations of a national net (from memory). */
const typedStandardUncertainty = 2e-5

export interface WorksGravity {
  /** m/s². */
  readonly value: number
  /** Standard uncertainty, m/s². */
  readonly u: number
  /** A published local value was typed, rather than computed from latitude and height. */
  readonly typed: boolean
}

/** Gravity at the works: typed, or by the formula for its latitude and height with the formula's uncertainty. */
export const gravityOf = ({
  gravityTyped,
  latitudeDegrees,
  heightMetres,
}: Pick<WorksRow, 'gravityTyped' | 'latitudeDegrees' | 'heightMetres'>): WorksGravity => {
  if (gravityTyped !== undefined) return { value: gravityTyped, u: typedStandardUncertainty, typed: true }
  const value = localGravity(latitudeDegrees, heightMetres)
  return { value, u: value * NORMAL_GRAVITY_RELATIVE_U, typed: false }
}
