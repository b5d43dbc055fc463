import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type ImportFacts, listImportRows } from '@/lib/data/imports'
import { listPersonNames } from '@/lib/data/people-names'

export interface ImportListItem extends ImportFacts {
  readonly by: string | undefined
}

/** The newest imports. @throws LedgerlineError not-permitted */
export async function listImports(actor: Actor | undefined): Promise<readonly ImportListItem[]> {
  permit(actor, 'imports.read')
  const { read } = database()
  const rows = await listImportRows(read)
  const names = await listPersonNames(
    read,
    rows.map((row) => row.createdById),
  )
  return rows.map((row) => ({ ...row, by: names.get(row.createdById) }))
}
