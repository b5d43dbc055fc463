import type { Tx } from './database'

/** Names by person, for what was done by whom; people are never deleted. */
export const listPersonNames = async (
  tx: Tx,
  ids: readonly number[],
): Promise<ReadonlyMap<number, string>> => {
  const distinct = [...new Set(ids)]
  if (distinct.length === 0) return new Map()
  const rows = await tx.person.findMany({ where: { id: { in: distinct } }, select: { id: true, name: true } })
  return new Map(rows.map((row) => [row.id, row.name]))
}
