import { database } from '@/lib/data/database'
import { isWorksMissing } from '@/lib/services/works-missing'
import { demoPeople } from './equipment'
import { type DemoActors, demoPassword, foundDemoWorks, reviseBefore } from './found-works'
import { measureLot } from './measure-lots'
import { demoDatasheets, publishDemoDatasheet } from './papers'
import { receiveMaterials } from './receive-materials'
import { type DemoSchedule, demoSchedule, WIDE_DIE } from './schedule'
import { decideAsQualityWould } from './tell-story'
import { workingDay } from './working-days'

const DAY = 86_400_000
const EVENING = 17 * 3_600_000

/** The newest lots stay as a Friday evening leaves them: some to decide, one half measured, one untouched. */
const UNDECIDED = 6
const HALF_MEASURED = 'LC-060'
const UNTOUCHED = 'LD-060'

/** Lots off the new die wait for somebody to look at it, too. */
const waitsForDie = (lot: DemoSchedule): boolean =>
  lot.dieCode === WIDE_DIE.code && lot.index >= WIDE_DIE.from + 6

const specimensOf = ({ code }: DemoSchedule): number =>
  code === UNTOUCHED ? 0 : code === HALF_MEASURED ? 2 : 5

/** In the order in which travellers reached the bench: not always that in which lots were made. */
const asOpened = (): readonly DemoSchedule[] =>
  [...demoSchedule()].sort((a, b) => a.openedAt - b.openedAt || (a.code < b.code ? -1 : 1))

/** Tension tables of days that are over. */
async function publishUntil(day: number, actors: DemoActors, published: Set<number>): Promise<void> {
  for (const sheet of demoDatasheets) {
    if (sheet.day >= day || published.has(sheet.day)) continue
    published.add(sheet.day)
    await publishDemoDatasheet(actors.pell, sheet, workingDay(sheet.day) + EVENING)
  }
}

/**
 * Fills an empty works with the demo: readings only; results, summaries and signals come through the services,
 * as they would have day by day. Calls `tell` with a line of progress now and then.
 */
export async function loadDemoWorks(tell: (line: string) => void): Promise<'loaded' | 'there already'> {
  if (!(await isWorksMissing())) return 'there already'
  const lots = asOpened()
  const first = lots[0]
  if (!first) throw new Error('The demo has no lots.')
  tell('Founding the works')
  const actors = await foundDemoWorks(first.madeAt - 7 * DAY)
  const received = new Set<string>()
  const published = new Set<number>()
  for (const [index, lot] of lots.entries()) {
    const left = lots.length - 1 - index
    const specimens = specimensOf(lot)
    await publishUntil(lot.day, actors, published)
    await reviseBefore(actors.orrin, lot)
    await receiveMaterials(actors.orrin, lot, received)
    await measureLot(actors[lot.maker], lot, specimens, true)
    if (left >= UNDECIDED && specimens === 5 && !waitsForDie(lot))
      await decideAsQualityWould(actors.orrin, lot)
    if ((index + 1) % 20 === 0 || left === 0) tell(`Measured lot ${lot.code}, ${index + 1} of ${lots.length}`)
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
