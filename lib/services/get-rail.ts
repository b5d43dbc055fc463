import type { Actor } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { countGaugesDueBefore, countLotsInState, countOpenSignals } from '@/lib/data/room-counts'
import { getWorks } from '@/lib/data/works'

export interface Waiting {
  readonly count: number
  readonly meaning: string
}

export interface RailFacts {
  readonly worksName: string
  /** By the room's address. */
  readonly waiting: Readonly<Record<string, Waiting | undefined>>
}

const week_ms = 7 * 24 * 3600_000

const counted = (count: number, one: string, several: string): Waiting => ({
  count,
  meaning: `${count} ${count === 1 ? one : several}`,
})

/** What stands in the rail: the works' name and what waits in each room; undefined while the works is not set up. */
export async function getRail(
  actor: Actor | undefined,
  at: number = Date.now(),
): Promise<RailFacts | undefined> {
  permit(actor, 'settings.read')
  const { read } = database()
  const works = await getWorks(read)
  if (!works) return undefined
  if (!may(actor, 'lots.read')) return { worksName: works.name, waiting: {} }
  const [measuring, toDecide, signals, due] = await Promise.all([
    countLotsInState(read, 'measuring'),
    countLotsInState(read, 'to-decide'),
    countOpenSignals(read),
    countGaugesDueBefore(read, at + week_ms),
  ])
  return {
    worksName: works.name,
    waiting: {
      '/bench': counted(measuring, 'lot to measure', 'lots to measure'),
      '/lots': counted(toDecide, 'lot to decide', 'lots to decide'),
      '/drift': counted(signals, 'open signal', 'open signals'),
      '/equipment': counted(due, 'gauge due within a week', 'gauges due within a week'),
    },
  }
}
