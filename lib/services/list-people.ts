import { type Actor, type Role, roles } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { listPeople as listRows, type PersonRow } from '@/lib/data/people'

export interface PersonFacts {
  readonly id: number
  readonly name: string
  readonly username: string
  readonly active: boolean
  readonly roles: readonly Role[]
  readonly version: number
  readonly createdAt: number
}

export const personFactsOf = ({ userId: _, roles: held, ...row }: PersonRow): PersonFacts => ({
  ...row,
  roles: roles.filter((role) => held.includes(role)),
})

/** Everyone who ever had an account, by name. */
export async function listPeople(actor: Actor | undefined): Promise<readonly PersonFacts[]> {
  permit(actor, 'people.read')
  return (await listRows(database().read)).map(personFactsOf)
}
