import { GUARD, type RuleEvent, type RulePoint, type Side } from './rule-point'

/** How many lots in a row make the pattern. */
export const RUN_ON_ONE_SIDE = 9

const sideOf = ({ limits, value }: RulePoint): Side | undefined => {
  if (!limits || value === undefined) return undefined
  const departure = value - limits.centre
  const slack = GUARD * limits.sigma
  if (departure > slack) return 'above'
  return departure < -slack ? 'below' : undefined
}

/**
 * Nine lots on one side of the centre line. A lot on the centre line ends the run, as do a lot that is left
 * out and a change of limit set; a lot without a value does not. A run that goes on after its ninth lot is
 * the same event with more members.
 *
 * False alarms: 1 in 2⁸ starts of a run of nine on either side, for a centre line known exactly.
 * Source: L. S. Nelson, J. Quality Technology 16 (1984) 237.
 */
export function nineOnOneSide(points: readonly RulePoint[]): readonly RuleEvent[] {
  const events: RuleEvent[] = []
  let side: Side | undefined
  let limitsId: number | undefined
  let members: number[] = []
  const close = () => {
    const completedAt = members[RUN_ON_ONE_SIDE - 1]
    if (side !== undefined && completedAt !== undefined) events.push({ side, members, completedAt })
    members = []
    side = undefined
  }
  points.forEach((point, index) => {
    if (point.leftOut || !point.limits) {
      close()
      return
    }
    if (point.value === undefined) return
    const now = sideOf(point)
    if (now === undefined) {
      close()
      return
    }
    if (now !== side || point.limits.id !== limitsId) close()
    side = now
    limitsId = point.limits.id
    members.push(index)
  })
  close()
  return events
}
