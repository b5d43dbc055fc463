import type { Tx } from './database'

/** A request that carried an id, and the reply it got. */
export interface RequestRow {
  readonly personId: number
  readonly bodyHash: string
  readonly status: number
  /** JSON. */
  readonly response: string
}

export const findRequest = async (tx: Tx, clientId: string): Promise<RequestRow | undefined> =>
  (await tx.request.findUnique({
    where: { clientId },
    select: { personId: true, bodyHash: true, status: true, response: true },
  })) ?? undefined

/** Stored in the transaction of the request itself: reply and deed are there together, or neither. */
export const insertRequest = async (
  tx: Tx,
  { at, ...request }: RequestRow & { readonly clientId: string; readonly at: number },
): Promise<void> => {
  await tx.request.create({ data: { ...request, at: new Date(at) }, select: { id: true } })
}
