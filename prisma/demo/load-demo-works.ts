import { database } from '@/lib/data/database'
import { isWorksMissing } from '@/lib/services/works-missing'
import { demoPeople } from './equipment'
import { type DemoActors, demoPassword, foundDemoWorks, reviseBefore } from './found-works'
import { measureLot } from './measure-lots'
import { demoDatasheets, publishDemoDatasheet } from './papers'
import { receiveMaterials } from './receive-materials'
import { type DemoSchedule, demoSchedule, WIDE_DIE } from './schedule'
import { hasWrongAlloy } from './story-answers'
import { answerClosure, decideAsQualityWould, settleHeld } from './tell-story'
import { workingDay } from './working-days'

const DAY = 86_400_000
const EVENING = 17 * 3_600_000

/** The newest lots stay as a Friday evening leaves them: some to decide, one half measured, one untouched. */
const UNDECIDED = 6
const HELD_DAYS = 5
const HALF_MEASURED = 'LC-060'
const UNTOUCHED = 'LD-060'

/** Lots off the new die, and those of the light spool, wait for somebody to look at them, too. */
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

/** Lots that have been on hold for a week by this day. */
async function settleUntil(day: number, actors: DemoActors, held: DemoSchedule[]): Promise<void> {
  for (let first = held[0]; first && first.day + HELD_DAYS < day; first = held[0]) {
    held.shift()
    await settleHeld(actors.orrin, first, workingDay(first.day + HELD_DAYS) + EVENING)
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
  const held: DemoSchedule[] = []
  for (const [index, lot] of lots.entries()) {
    const left = lots.length - 1 - index
    const specimens = specimensOf(lot)
    await settleUntil(lot.day, actors, held)
    await publishUntil(lot.day, actors, published)
    await reviseBefore(actors.orrin, lot)
    await receiveMaterials(actors.orrin, lot, received)
    await measureLot(actors[lot.maker], lot, specimens, true)
    if (left >= UNDECIDED && specimens === 5 && !waitsForDie(lot)) {
      if (hasWrongAlloy(lot)) await answerClosure(actors.orrin, lot)
      else if ((await decideAsQualityWould(actors.orrin, lot)) === 'hold') held.push(lot)
    }
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
