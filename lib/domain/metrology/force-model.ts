import { deadWeightForce, hangingStringForce } from '../strings/dead-weight-force'
import { kilograms, metres, metresPerSecondSquared, type Newtons, newtons } from '../units/quantity'
import { type InputValues, offset } from './input-values'
import type { ModelFacts } from './model-facts'

export interface ForceOutcome {
  /** Tension of the span, N. */
  readonly force?: Newtons
  /** Part of it that the string below the edge pulls, N. */
  readonly hangingForce?: Newtons
}

/**
 * Tension of the span: weights in air at local gravity (or the force as typed), the string that hangs below
 * the edge, friction at the edges. Nothing without a load above zero.
 * Inputs: `load` kg or N, `gravity` m/s² (its value), `friction` relative. Source: `dead-weight-force.ts`.
 */
export function forceOutcome({ airDensity, context, load }: ModelFacts, inputs: InputValues): ForceOutcome {
  if (!load) return {}
  const gravity = metresPerSecondSquared(inputs.gravity ?? context.gravity.value)
  const value = load.value + offset(inputs, 'load')
  const carried = load.kind === 'force' ? value : deadWeightForce(kilograms(value), gravity, airDensity)
  // Its own share of the load is below a per mille: the target stands for the mass that is looked for.
  const hangingForce = hangingStringForce(
    context.specification.massPerMetre.target,
    metres(context.rig?.hangingLength ?? 0),
    gravity,
  )
  const force = (carried + hangingForce) * (1 + offset(inputs, 'friction'))
  return force > 0 ? { force: newtons(force), hangingForce } : {}
}
