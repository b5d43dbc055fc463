import type { Tx } from './database'

/**
 * Rows of the sign-in library, written in the same transaction as the person they belong to. An account's id
 * is the user's, as the library looks it up.
 */
const provider = 'credential'

interface NewAccount {
  readonly userId: string
  readonly name: string
  readonly username: string
  /** The library wants one; these lead nowhere. */
  readonly email: string
  readonly passwordHash: string
  readonly at: number
}

export const insertAccount = async (
  tx: Tx,
  { userId, name, username, email, passwordHash, at }: NewAccount,
): Promise<void> => {
  const times = { createdAt: new Date(at), updatedAt: new Date(at) }
  await tx.user.create({
    data: { id: userId, name, email, emailVerified: true, username, displayUsername: username, ...times },
    select: { id: true },
  })
  await tx.account.create({
    data: {
      id: `${userId}-password`,
      accountId: userId,
      providerId: provider,
      userId,
      password: passwordHash,
      ...times,
    },
    select: { id: true },
  })
}

/** Sets another password. @returns false when the person has no account */
export const updatePassword = async (
  tx: Tx,
  userId: string,
  passwordHash: string,
  at: number,
): Promise<boolean> => {
  const { count } = await tx.account.updateMany({
    where: { userId, providerId: provider },
    data: { password: passwordHash, updatedAt: new Date(at) },
  })
  return count > 0
}

/** Signs a person out everywhere. */
export const deleteSessions = async (tx: Tx, userId: string): Promise<void> => {
  await tx.session.deleteMany({ where: { userId } })
}

export const getPasswordHash = async (tx: Tx, userId: string): Promise<string | undefined> => {
  const row = await tx.account.findFirst({
    where: { userId, providerId: provider },
    select: { password: true },
  })
  return row?.password ?? undefined
}
