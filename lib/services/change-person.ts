import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { deleteSessions } from '@/lib/data/accounts'
import { database } from '@/lib/data/database'
import { searchKeyOf } from '@/lib/data/equipment-store'
import { appendLedger } from '@/lib/data/ledger'
import { lockRow } from '@/lib/data/locks'
import { countOthersWithRole, getPerson, updatePerson } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'
import type { ChangePersonInput } from '@/lib/input/person'
import { changedMeanwhile } from './changed-meanwhile'

/**
 * Changes name, roles or standing of a person. It counts from the person's next click on; who is no longer
 * active is signed out everywhere. Nobody is ever deleted: the record names them.
 * @throws LedgerlineError not-permitted, not-found, conflict (changed in the meantime, or the last administrator)
 */
export async function changePerson(
  actor: Actor | undefined,
  id: number,
  { version, name, roles, active }: ChangePersonInput,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'people.keep')
  await database().write(async (tx) => {
    // Two administrators who take the role from each other at once must not both succeed.
    await lockRow(tx, 'Works', 1)
    const before = await getPerson(tx, id)
    if (!before) throw problem('not-found', `There is no person ${id}.`)
    const staysAdministrator = active && roles.includes('administrator')
    if (!staysAdministrator && (await countOthersWithRole(tx, 'administrator', id)) === 0) {
      throw problem('conflict', `${before.name} is the last administrator.`, {
        where: 'roles',
        mend: 'Make someone else administrator first.',
      })
    }
    const change = { name, searchKey: searchKeyOf(name, before.username), active, roles }
    if (!(await updatePerson(tx, id, version, change))) throw changedMeanwhile(before.name)
    if (!active && before.userId !== undefined) await deleteSessions(tx, before.userId)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: active === before.active ? 'change' : active ? 'activate' : 'deactivate',
      subject: `person ${id}`,
      body: { name, roles, active },
    })
  })
}
