/**
 * The sign-in library's own client: it issues plain writes whenever it likes, which on the shared connection
 * would land inside another request's transaction. On a connection of its own they can't. It waits for the
 * file only briefly, since that wait stops the whole server, and tries again (`sqlite-transactions.ts`).
 */
import { connectionFactory } from './connections'
import { requireEnvironment } from './env'
import { PrismaClient as PostgresqlClient } from './generated/postgresql/client'
import { PrismaClient } from './generated/sqlite/client'
import { sharedState } from './shared-state'

/** The sign-in library's few transactions wait as long for the file as its statements do. */
const transactionOptions = { maxWait: 16_000, timeout: 10_000 }

const open = () => {
  const environment = requireEnvironment()
  const options = {
    adapter: connectionFactory(environment, 'sign-in'),
    errorFormat: 'minimal',
    transactionOptions,
  } as const
  const client =
    environment.engine === 'sqlite'
      ? new PrismaClient(options)
      : (new PostgresqlClient(options) as unknown as PrismaClient)
  const { inside } = sharedState()
  return client.$extends({
    query: {
      $allOperations: async ({ model, operation, args, query }) => {
        // It would wait for the transaction that waits for it.
        if (inside.getStore()?.open)
          throw new Error(
            `Sign-in (${model ?? ''}.${operation}) inside database().write: end the transaction first.`,
          )
        return query(args)
      },
    },
  })
}

export type SignInClient = ReturnType<typeof open>

/** The client for the sign-in library, once a process, opened at its first use. */
export const signInClient = (): SignInClient => {
  const shared = sharedState()
  shared.signIn ??= open()
  return shared.signIn
}

/** Ends its connections; the next `signInClient()` opens new ones. */
export const closeSignInClient = async (): Promise<void> => {
  const shared = sharedState()
  const client = shared.signIn
  shared.signIn = undefined
  await client?.$disconnect()
}
