import type { Actor } from '@/lib/access/actor'
import { beginAttempt } from '@/lib/access/attempts'
import { askedOnLoopback, clientAddress, isLoopback } from '@/lib/access/client-address'
import {
  isFirstAccountCode,
  issueFirstAccountCode,
  spendFirstAccountCode,
} from '@/lib/access/first-account-code'
import { hashPassword } from '@/lib/access/password'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { appendLedger } from '@/lib/data/ledger'
import { countPeople } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'
import type { FirstAccountInput } from '@/lib/input/person'
import { addPerson } from './create-person'

/** Whether nobody has an account yet. */
export const isFirstAccountMissing = async (): Promise<boolean> => (await countPeople(database().read)) === 0

/**
 * Whether the browser has to bring the code that the start printed. Only a server that listens on loopback,
 * without a proxy in front, asked for by a name of this computer, is reached by nobody else.
 */
export const isCodeNeeded = (headers: Headers): boolean => {
  const { host, trustProxy } = requireEnvironment()
  return trustProxy || !isLoopback(host) || !askedOnLoopback(headers)
}

/**
 * For the start: a fresh code to print when the first account is missing and others can reach the server.
 * The address to type it at is `/set-up`.
 */
export const announceFirstAccount = async (): Promise<string | undefined> => {
  const { host, trustProxy, dataDir } = requireEnvironment()
  if (!(await isFirstAccountMissing())) return undefined
  return trustProxy || !isLoopback(host) ? issueFirstAccountCode(dataDir) : undefined
}

/**
 * Makes the first account, an administrator with whatever further roles were chosen.
 * @throws LedgerlineError conflict when there is an account; not-permitted for a wrong code; busy after many
 */
export async function createFirstAccount(
  { code, ...input }: FirstAccountInput,
  headers: Headers,
  at: number = Date.now(),
): Promise<Actor> {
  const { dataDir } = requireEnvironment()
  if (isCodeNeeded(headers)) {
    await beginAttempt('first account', clientAddress(headers), at)
    if (!isFirstAccountCode(dataDir, code)) {
      throw problem('not-permitted', 'That is not the code that the last start printed.', {
        where: 'code',
        mend: 'Look at the terminal in which Ledgerline was started; each start prints a new one.',
      })
    }
  }
  const passwordHash = await hashPassword(input.password)
  const person = await database().write(async (tx) => {
    if ((await countPeople(tx)) > 0) throw taken()
    const roles = [...new Set(['administrator' as const, ...input.roles])]
    const added = await addPerson(tx, { ...input, roles, passwordHash, demo: false, at })
    await appendLedger(tx, {
      at,
      personId: added.id,
      verb: 'create',
      subject: `person ${added.id}`,
      body: { name: added.name, username: added.username, roles: added.roles, first: true },
    })
    // The ledger's head is locked now: of two at once the second sees the first.
    if ((await countPeople(tx)) > 1) throw taken()
    return added
  })
  spendFirstAccountCode(dataDir)
  return { personId: person.id, name: person.name, roles: person.roles }
}

const taken = () => problem('conflict', 'The first account exists already.', { mend: 'Sign in.' })
