import { LedgerlineError, type Problem } from '@/lib/domain/errors'

/** The problem that a service refuses with; any other outcome fails the test. */
export async function refusalOf(work: Promise<unknown>): Promise<Problem> {
  let value: unknown
  try {
    value = await work
  } catch (error) {
    if (error instanceof LedgerlineError) return error.problem
    throw error
  }
  throw new Error(`it was not refused, but gave ${JSON.stringify(value)}`)
}
