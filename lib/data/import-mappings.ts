import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { Tx } from './database'

export interface ImportMappingFacts {
  readonly id: number
  readonly name: string
  /** Header of a file → name of a column of the bench file. */
  readonly columns: Readonly<Record<string, string>>
}

/** By name. */
export const listMappings = async (tx: Tx): Promise<readonly ImportMappingFacts[]> =>
  (
    await tx.importMapping.findMany({
      select: { id: true, name: true, body: true },
      orderBy: { name: 'asc' },
    })
  ).map(({ body, ...row }) => ({ ...row, columns: JSON.parse(body) as ImportMappingFacts['columns'] }))

/** Keeps a mapping under a name; one of that name is replaced. */
export const keepMapping = async (
  tx: Tx,
  name: string,
  columns: ImportMappingFacts['columns'],
  by: { readonly at: number; readonly personId: number },
): Promise<void> => {
  await tx.importMapping.upsert({
    where: { name },
    create: { name, body: canonicalJson(columns), createdAt: new Date(by.at), createdById: by.personId },
    update: { body: canonicalJson(columns), version: { increment: 1 } },
    select: { id: true },
  })
}
