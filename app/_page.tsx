import 'server-only'
import { notFound, redirect } from 'next/navigation'
import type { ReactNode } from 'react'
import type { Actor } from '@/lib/access/actor'
import { LedgerlineError } from '@/lib/domain/errors'
import { requireActor } from './_session'
import { Refused } from './_ui/shell/Refused'

/** What the framework gives to a page. */
interface PageProps {
  readonly params: Promise<Record<string, string>>
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>
}

/** The same, awaited; of a repeated search parameter the first counts. */
export interface PageRequest {
  readonly params: Readonly<Record<string, string>>
  readonly query: Readonly<Record<string, string | undefined>>
}

const decoded = (params: Record<string, string>) =>
  Object.fromEntries(Object.entries(params).map(([name, value]) => [name, decode(value)]))

/** A stray per cent sign is a character like any other. */
const decode = (value: string): string => {
  try {
    return decodeURIComponent(value)
  } catch {
    return value
  }
}

type Render = (actor: Actor, request: PageRequest) => Promise<ReactNode>

/**
 * Every page of a room is made with this: finds the actor, calls `render`, and turns a service's refusal into
 * a page with its sentence. Call services in `render` itself, not in components below it: what those throw
 * is an unforeseen error.
 */
export const roomPage = (render: Render) => (props: PageProps) => answer(render, props)

const answer = async (render: Render, { params, searchParams }: PageProps): Promise<ReactNode> => {
  const actor = await requireActor()
  const query = Object.entries(await searchParams).map(([name, value]) => [
    name,
    Array.isArray(value) ? value[0] : value,
  ])
  try {
    return await render(actor, { params: decoded(await params), query: Object.fromEntries(query) })
  } catch (error) {
    if (!(error instanceof LedgerlineError)) throw error
    if (error.problem.code === 'not-found') notFound()
    if (error.problem.code === 'not-signed-in') redirect('/sign-in')
    return <Refused problem={error.problem} />
  }
}
