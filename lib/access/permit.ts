import { problem } from '@/lib/domain/errors'
import type { Actor, Role } from './actor'
import { rights, roleNames, type Verb } from './rights'

/** Whether the actor may; for leaving out a button. The service asks `permit` all the same. */
export const may = (actor: Actor | undefined, verb: Verb): boolean =>
  actor !== undefined && rights[verb].roles.some((role) => actor.roles.includes(role))

/**
 * Lets the actor pass or throws.
 * @throws LedgerlineError not-signed-in without an actor, not-permitted when none of the actor's roles may
 */
export function permit(actor: Actor | undefined, verb: Verb): asserts actor is Actor {
  if (actor === undefined) {
    throw problem('not-signed-in', 'You are not signed in.', { mend: 'Sign in and try again.' })
  }
  if (may(actor, verb)) return
  const { doing, roles } = rights[verb]
  throw problem('not-permitted', `${doing} is for ${listed(roles, 'and')}; ${standing(actor)}.`, {
    mend: 'Ask someone with that role, or an administrator for the role.',
  })
}

const standing = ({ name, roles }: Actor): string =>
  roles.length === 0 ? `${name} has no role yet` : `${name} is signed in for ${listed(roles, 'and')}`

const listed = (roles: readonly Role[], last: string): string => {
  const names = roles.map((role) => roleNames[role])
  const tail = names.at(-1)
  if (tail === undefined) return 'nobody'
  return names.length === 1 ? tail : `${names.slice(0, -1).join(', ')} ${last} ${tail}`
}
