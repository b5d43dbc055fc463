import { beyondTheLimits } from './beyond-the-limits'
import { nineOnOneSide } from './nine-on-one-side'
import type { RuleEvent, RulePoint } from './rule-point'

/** Rules in force, by what they say. */
export const controlRules = {
  'beyond-the-limits': { find: beyondTheLimits, sentence: 'beyond the limits' },
  'nine-on-one-side': { find: nineOnOneSide, sentence: 'nine lots on one side' },
} as const satisfies Record<
  string,
  { find: (points: readonly RulePoint[]) => readonly RuleEvent[]; sentence: string }
>

export type ControlRule = keyof typeof controlRules

export interface FoundSignal extends RuleEvent {
  readonly rule: ControlRule
  /** Mean distance of the members from the centre, in the unit of the values. */
  readonly departure: number
}

/**
 * Every event of every rule on one chart, in the order in which the events were completed. Pure: the same
 * points give the same signals however often they are asked for.
 */
export function findSignals(
  points: readonly RulePoint[],
  rules: readonly ControlRule[] = Object.keys(controlRules) as ControlRule[],
): readonly FoundSignal[] {
  const order = new Map(rules.map((rule, index) => [rule, index]))
  return rules
    .flatMap((rule) =>
      controlRules[rule]
        .find(points)
        .map((event) => ({ ...event, rule, departure: meanDeparture(points, event) })),
    )
    .sort((a, b) => a.completedAt - b.completedAt || (order.get(a.rule) ?? 0) - (order.get(b.rule) ?? 0))
}

function meanDeparture(points: readonly RulePoint[], { members }: RuleEvent): number {
  let sum = 0
  for (const index of members) {
    const point = points[index]
    sum += (point?.value ?? 0) - (point?.limits?.centre ?? 0)
  }
  return sum / members.length
}
