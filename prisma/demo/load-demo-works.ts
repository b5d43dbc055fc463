import { database } from '@/lib/data/database'
import { isWorksMissing } from '@/lib/services/works-missing'
import { demoPeople } from './equipment'
import { demoPassword, foundDemoWorks } from './found-works'
import { measureLot } from './measure-lots'
import { type DemoSchedule, demoSchedule, WIDE_DIE } from './schedule'
import { decideAsQualityWould } from './tell-story'

const DAY = 86_400_000

/** The newest lots stay as a Friday evening leaves them: some to decide, one half measured, one untouched. */
const UNDECIDED = 6
const HALF_MEASURED = 2
const UNTOUCHED = 1

/** Lots off the new die wait for somebody to look at it, too. */
const waitsForDie = (lot: DemoSchedule): boolean =>
  lot.dieCode === WIDE_DIE.code && lot.index >= WIDE_DIE.from + 6

/**
 * Fills an empty works with the demo: readings only; results, summaries and signals come through the services,
 * as they would have day by day. Calls `tell` with a line of progress now and then.
 */
export async function loadDemoWorks(tell: (line: string) => void): Promise<'loaded' | 'there already'> {
  if (!(await isWorksMissing())) return 'there already'
  const lots = demoSchedule()
  const first = lots[0]
  if (!first) throw new Error('The demo has no lots.')
  tell('Founding the works')
  const actors = await foundDemoWorks(first.madeAt - 7 * DAY)
  for (const [index, lot] of lots.entries()) {
    const left = lots.length - 1 - index
    const specimens = left < UNTOUCHED ? 0 : left < HALF_MEASURED ? 2 : 5
    await measureLot(actors[lot.maker], lot, specimens)
    if (left >= UNDECIDED && !waitsForDie(lot)) await decideAsQualityWould(actors.orrin, lot)
    if ((index + 1) % 10 === 0 || left === 0) tell(`Measured lot ${lot.code}, ${index + 1} of ${lots.length}`)
  }
  tell('The demo works is loaded')
  return 'loaded'
}

/** One account for each role, for the terminal. */
export const demoAccounts = (): readonly string[] =>
  demoPeople.map(
    ({ name, roles, username }) =>
      `${roles.join(' and ')}: ${username}, password ${demoPassword(username)}  (${name})`,
  )

export const closeDatabase = (): Promise<void> => database().close()
