import type { Actor } from '@/lib/access/actor'
import { hashPassword } from '@/lib/access/password'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { countPeople, listPeople } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'
import type { NewPersonInput } from '@/lib/input/person'
import { addPerson } from './create-person'

/**
 * For the script that fills an empty works with the demo: the administrator in whose name it is founded. In a
 * works whose first account exists already it is that account. Demo accounts can sign in on this computer only.
 * @throws LedgerlineError conflict when there are people and none of them is an administrator
 */
export async function createDemoAdministrator(input: NewPersonInput, at: number): Promise<Actor> {
  const { read } = database()
  const administrator = (await listPeople(read)).find(
    ({ active, roles }) => active && roles.includes('administrator'),
  )
  if (administrator)
    return { personId: administrator.id, name: administrator.name, roles: ['administrator', 'quality'] }
  const passwordHash = await hashPassword(input.password)
  const person = await database().write(async (tx) => {
    if ((await countPeople(tx)) > 0) throw problem('conflict', 'Somebody made an account in the meantime.')
    const added = await addPerson(tx, { ...input, passwordHash, demo: true, at })
    await appendLedger(tx, {
      at,
      personId: added.id,
      verb: 'create',
      subject: `person ${added.id}`,
      body: { name: added.name, username: added.username, roles: added.roles, demo: true },
    })
    return added
  })
  return { personId: person.id, name: person.name, roles: person.roles }
}
