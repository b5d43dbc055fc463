import { randomBytes } from 'node:crypto'
import type { Actor } from '@/lib/access/actor'
import { hashPassword } from '@/lib/access/password'
import { permit } from '@/lib/access/permit'
import { demoEmailDomain } from '@/lib/access/session'
import { insertAccount } from '@/lib/data/accounts'
import { database, type Tx } from '@/lib/data/database'
import { searchKeyOf } from '@/lib/data/equipment-store'
import { appendLedger } from '@/lib/data/ledger'
import { findPersonByUsername, insertPerson } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'
import type { NewPersonInput } from '@/lib/input/person'
import { type PersonFacts, personFactsOf } from './list-people'

/** The sign-in library wants an e-mail address of everyone; this domain can't exist (RFC 2606). */
const emailDomain = '@works.invalid'

export interface PersonOptions {
  /** The password is known to everyone who reads the terminal: good on this computer only. */
  readonly demo?: boolean
  readonly at?: number
}

/**
 * Adds a person with roles and a first password.
 * @throws LedgerlineError not-permitted; conflict when the sign-in name is taken
 */
export async function createPerson(
  actor: Actor | undefined,
  input: NewPersonInput,
  { demo = false, at = Date.now() }: PersonOptions = {},
): Promise<PersonFacts> {
  permit(actor, 'people.keep')
  const passwordHash = await hashPassword(input.password)
  return database().write(async (tx) => {
    const person = await addPerson(tx, { ...input, passwordHash, demo, at })
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'create',
      subject: `person ${person.id}`,
      body: { name: person.name, username: person.username, roles: person.roles, demo },
    })
    return person
  })
}

interface Addition extends Pick<NewPersonInput, 'name' | 'username' | 'roles'> {
  readonly passwordHash: string
  readonly demo: boolean
  readonly at: number
}

/** Person and sign-in account in one; the caller writes the ledger entry. */
export const addPerson = async (
  tx: Tx,
  { name, username, roles, passwordHash, demo, at }: Addition,
): Promise<PersonFacts> => {
  if (await findPersonByUsername(tx, username)) {
    throw problem('conflict', `The sign-in name ${username} is taken.`, {
      where: 'username',
      mend: 'Choose another one.',
    })
  }
  const userId = randomBytes(16).toString('base64url')
  const email = `${username}${demo ? demoEmailDomain : emailDomain}`
  await insertAccount(tx, { userId, name, username, email, passwordHash, at })
  const row = await insertPerson(tx, {
    name,
    username,
    searchKey: searchKeyOf(name, username),
    roles,
    userId,
    at,
  })
  return personFactsOf(row)
}
