import { type DemoSchedule, demoSchedule } from './schedule'
import { UNEVEN_WINDER } from './story-facts'

let uneven: ReadonlySet<string> | undefined

/** The first twelve lots that the winder makes from that day on. */
export function isUneven({ code }: Pick<DemoSchedule, 'code'>): boolean {
  uneven ??= new Set(
    demoSchedule()
      .filter((lot) => lot.machine === UNEVEN_WINDER.machine && lot.day >= UNEVEN_WINDER.fromDay)
      .slice(0, UNEVEN_WINDER.lots)
      .map((lot) => lot.code),
  )
  return uneven.has(code)
}
