import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { getPerson as getRow } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'
import { type PersonFacts, personFactsOf } from './list-people'

/** @throws LedgerlineError not-found */
export async function requirePerson(actor: Actor | undefined, id: number): Promise<PersonFacts> {
  permit(actor, 'people.read')
  const row = await getRow(database().read, id)
  if (!row) throw problem('not-found', `There is no person ${id}.`)
  return personFactsOf(row)
}
