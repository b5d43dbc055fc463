import type { Actor } from '@/lib/access/actor'
import { hashPassword } from '@/lib/access/password'
import { permit } from '@/lib/access/permit'
import { deleteSessions, updatePassword } from '@/lib/data/accounts'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { getPerson } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'

/**
 * Gives a person another password; everyone signed in with the old one is signed out.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function setPassword(
  actor: Actor | undefined,
  id: number,
  password: string,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'people.keep')
  const passwordHash = await hashPassword(password)
  await database().write(async (tx) => {
    const person = await getPerson(tx, id)
    if (person?.userId === undefined) throw problem('not-found', `There is no account of person ${id}.`)
    await updatePassword(tx, person.userId, passwordHash, at)
    await deleteSessions(tx, person.userId)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'set-password',
      subject: `person ${id}`,
      body: {},
    })
  })
}
