import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { newestBackup } from '@/lib/data/newest-backup'
import { listPeopleWithoutRole } from '@/lib/data/today-desks'
import {
  type AskedToday,
  agoOf,
  DAY,
  type FoundToday,
  nothingFound,
  SHOWN,
  totalOf,
  type WaitingItem,
} from './today-item'

/** A works that is backed up less often loses more readings than it can take again. */
const BACKED_UP_WITHIN_DAYS = 7

/** People who can sign in and do nothing yet. */
export async function peopleOfToday({ at, tx }: AskedToday): Promise<FoundToday> {
  const { count, people } = await listPeopleWithoutRole(tx, SHOWN)
  const items = people.map(
    (person): WaitingItem => ({
      kind: 'person-without-role',
      key: `person ${person.id}`,
      since: person.at,
      mark: 'waiting',
      title: `${person.name} has no role`,
      text: 'With no role a person signs in and finds no room. Give one, or end the account.',
      stake: 'one account',
      waiting: agoOf(person.at, at),
      href: `/settings/people/${person.id}`,
      deed: 'Give a role',
    }),
  )
  return { items, totals: totalOf('person-without-role', count, '/settings/people') }
}

/** Whether the data folder holds a fresh back-up. PostgreSQL is backed up by its own tools, of which nothing is known here. */
export async function backupOfToday({ at }: AskedToday): Promise<FoundToday> {
  if (database().engine !== 'sqlite') return nothingFound
  const newest = await newestBackup(requireEnvironment().dataDir)
  if (newest !== undefined && newest > at - BACKED_UP_WITHIN_DAYS * DAY) return nothingFound
  return {
    items: [
      {
        kind: 'backup-old',
        key: 'backup',
        since: newest,
        mark: 'near',
        title:
          newest === undefined ? 'There is no back-up yet' : 'The newest back-up is more than a week old',
        text: 'Run npm run backup on the computer that serves this page, and keep a copy on another one.',
        stake: newest === undefined ? 'everything stored so far' : 'everything since then',
        waiting: newest === undefined ? '' : agoOf(newest, at),
        href: '/settings',
        deed: 'Settings',
      },
    ],
    totals: [],
  }
}
