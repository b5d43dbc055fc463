import 'server-only'
import type { z } from 'zod'
import type { Actor } from '@/lib/access/actor'
import { actorFromHeaders } from '@/lib/access/session'
import { LedgerlineError, problem } from '@/lib/domain/errors'
import { parseInput } from '@/lib/input/parse-input'
import { isFromOurPages } from './_origin'
import { replyError, replyJson, replyProblems } from './_reply'

/** Largest body of a request, bytes: two hundred specimens with room to spare. */
const MOST_BYTES = 2_000_000

/** The built server hands nothing to a route whose address has no variable part. */
interface Context {
  readonly params?: Promise<Readonly<Record<string, string>> | undefined>
}

export type Params = Readonly<Record<string, string>>

const decodedParams = async ({ params }: Context): Promise<Params> => {
  const entries = Object.entries((await params) ?? {})
  return Object.fromEntries(entries.map(([name, value]) => [name, decoded(value)]))
}

/** A stray per cent sign is a character like any other. */
const decoded = (value: string): string => {
  try {
    return decodeURIComponent(value)
  } catch {
    return value
  }
}

const unread = (message: string) =>
  new LedgerlineError({ code: 'bad-input', message, mend: 'Send one JSON object as UTF-8.' })

async function readJson(request: Request): Promise<unknown> {
  const reader = request.body?.getReader()
  const chunks: Uint8Array[] = []
  let size = 0
  for (let part = await reader?.read(); part && !part.done; part = await reader?.read()) {
    size += part.value.byteLength
    if (size > MOST_BYTES) {
      await reader?.cancel()
      throw unread(`The request is larger than ${MOST_BYTES / 1e6} MB.`)
    }
    chunks.push(part.value)
  }
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks)))
  } catch {
    throw unread('The request holds no JSON that can be read.')
  }
}

/**
 * A route that changes something: from our own pages, JSON only, signed in by the cookie. Fixed order: origin,
 * actor, parse, service (which permits), reply.
 */
export const changing = <Schema extends z.ZodType>(
  schema: Schema,
  serve: (actor: Actor | undefined, input: z.output<Schema>, params: Params) => Promise<unknown>,
  status = 200,
) =>
  async function route(request: Request, context: Context): Promise<Response> {
    try {
      if (!isFromOurPages(request.headers))
        throw problem('not-permitted', 'This request does not come from a page of this server.', {
          mend: 'Open Ledgerline at its own address and try again.',
        })
      if (!/^application\/json(?:\s*;|$)/i.test(request.headers.get('content-type') ?? ''))
        throw unread('The content type has to be application/json.')
      const actor = await actorFromHeaders(request.headers)
      if (actor === undefined)
        throw problem('not-signed-in', 'You are not signed in.', { mend: 'Sign in and try again.' })
      const input = parseInput(schema, await readJson(request))
      if (!input.ok) return replyProblems(input.problems)
      return replyJson(await serve(actor, input.value, await decodedParams(context)), status)
    } catch (error) {
      return replyError(error)
    }
  }

interface Received {
  /** What stands behind the question mark, the first of each name. */
  readonly query: Params
  /** The body, piece by piece: whoever takes it sets its bounds. */
  readonly body: AsyncIterable<Uint8Array>
}

/** A route that takes a file as the body of the request, from our own pages, signed in by the cookie. */
export const receiving = (serve: (actor: Actor | undefined, received: Received) => Promise<unknown>) =>
  async function route(request: Request): Promise<Response> {
    try {
      if (!isFromOurPages(request.headers))
        throw problem('not-permitted', 'This request does not come from a page of this server.', {
          mend: 'Open Ledgerline at its own address and try again.',
        })
      const actor = await actorFromHeaders(request.headers)
      if (actor === undefined)
        throw problem('not-signed-in', 'You are not signed in.', { mend: 'Sign in and try again.' })
      const query = Object.fromEntries([...new URL(request.url).searchParams].reverse())
      return replyJson(await serve(actor, { query, body: piecesOf(request.body) }), 201)
    } catch (error) {
      return replyError(error)
    }
  }

async function* piecesOf(body: ReadableStream<Uint8Array> | null): AsyncGenerator<Uint8Array> {
  const reader = body?.getReader()
  if (!reader) return
  try {
    for (;;) {
      const { done, value } = await reader.read()
      if (done) return
      yield value
    }
  } finally {
    // Whoever stops reading, because it is too much, ends the request.
    await reader.cancel().catch(() => undefined)
  }
}

/** A route that only reads. `query` is what stands behind the question mark, the first of each name. */
export const reading = (
  serve: (actor: Actor | undefined, query: Params, params: Params) => Promise<unknown>,
) =>
  async function route(request: Request, context: Context): Promise<Response> {
    try {
      const actor = await actorFromHeaders(request.headers)
      const query = Object.fromEntries([...new URL(request.url).searchParams].reverse())
      const reply = await serve(actor, query, await decodedParams(context))
      return reply instanceof Response ? reply : replyJson(reply)
    } catch (error) {
      return replyError(error)
    }
  }

/** Parses a part of a request, or ends it with its problems. */
export function parsedOrThrow<Schema extends z.ZodType>(schema: Schema, input: unknown): z.output<Schema> {
  const parsed = parseInput(schema, input)
  if (parsed.ok) return parsed.value
  const [first] = parsed.problems
  throw first ? new LedgerlineError(first) : unread('The request is not understood.')
}
