import type { Actor } from '@/lib/access/actor'
import { beginAttempt, forgetFailures } from '@/lib/access/attempts'
import { hashPassword, isPassword } from '@/lib/access/password'
import { permit } from '@/lib/access/permit'
import { deleteSessions, getPasswordHash, updatePassword } from '@/lib/data/accounts'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { getPerson } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'

/**
 * Changes one's own password, which ends all one's sessions: a stranger who sat at an open terminal can't.
 * @throws LedgerlineError not-permitted when the present password is wrong; busy after several wrong ones
 */
export async function changeOwnPassword(
  actor: Actor | undefined,
  { current, password }: { readonly current: string; readonly password: string },
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'settings.read')
  const { read } = database()
  const person = await getPerson(read, actor.personId)
  if (person?.userId === undefined) throw problem('not-found', 'You have no account of your own.')
  const { userId, username } = person
  await beginAttempt(username, 'own password', at)
  const stored = await getPasswordHash(read, userId)
  if (stored === undefined || !(await isPassword({ hash: stored, password: current }))) {
    throw problem('not-permitted', 'That is not your present password.', {
      where: 'current',
      mend: 'Try again.',
    })
  }
  await forgetFailures(username, 'own password')
  const passwordHash = await hashPassword(password)
  await database().write(async (tx) => {
    await updatePassword(tx, userId, passwordHash, at)
    await deleteSessions(tx, userId)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'set-password',
      subject: `person ${actor.personId}`,
      body: {},
    })
  })
}
