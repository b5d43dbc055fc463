import 'server-only'
import { LedgerlineError, type Problem, type ProblemCode } from '@/lib/domain/errors'

const statuses: Readonly<Record<ProblemCode, number>> = {
  'bad-input': 400,
  'not-found': 404,
  'not-signed-in': 401,
  'not-permitted': 403,
  conflict: 409,
  'already-decided': 409,
  'not-ready': 409,
  busy: 503,
  storage: 500,
}

/** Seconds after which a caller may try again what was busy. */
const RETRY_AFTER = '2'

/** Success: what the service gave, as plain JSON. */
export const replyJson = (value: unknown, status = 200): Response => Response.json(value, { status })

/** Failure: what, where, how to mend; all problems of a request when there are several. */
export function replyProblems(problems: readonly Problem[]): Response {
  const [first] = problems
  if (first === undefined) return unforeseen()
  return Response.json(problems.length === 1 ? first : { ...first, problems }, {
    status: statuses[first.code],
    ...(first.code === 'busy' ? { headers: { 'retry-after': RETRY_AFTER } } : {}),
  })
}

/** A service's refusal as a reply. Anything else is written to the log and told without its inside. */
export function replyError(error: unknown): Response {
  if (error instanceof LedgerlineError) return replyProblems([error.problem])
  console.error(error)
  return unforeseen()
}

const unforeseen = (): Response =>
  Response.json(
    {
      code: 'storage',
      message: 'Something went wrong here; what was sent may not be stored.',
      mend: 'Try again; the server’s log says more.',
    } satisfies Problem,
    { status: 500 },
  )

/** A file to take along. Its name goes out in plain letters and, for those that have others, in UTF-8. */
export function replyFile(file: {
  readonly name: string
  readonly type: string
  readonly content: Uint8Array | string
}): Response {
  const plain = file.name.replace(/[^\w.-]/g, '_')
  // A copy of its own: the response wants a buffer that nobody else writes to.
  const content = typeof file.content === 'string' ? file.content : Uint8Array.from(file.content)
  return new Response(content, {
    headers: {
      'content-type': file.type,
      'content-disposition': `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(file.name)}`,
    },
  })
}
