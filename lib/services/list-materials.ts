import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { findMaterialByCode, listMaterialRows, type MaterialRow, materialBodyOf } from '@/lib/data/materials'
import { problem } from '@/lib/domain/errors'
import type { MaterialBody } from '@/lib/domain/strings/material'

export interface MaterialFacts {
  readonly code: string
  readonly name: string
  readonly standing: string
  readonly source: string
  /** From the handbook's table, as installed with the works. */
  readonly builtIn: boolean
  readonly version: number
  readonly body: MaterialBody
}

export const materialFactsOf = (row: MaterialRow): MaterialFacts => ({
  code: row.code,
  name: row.name,
  standing: row.standing,
  source: row.source,
  builtIn: row.builtIn,
  version: row.version,
  body: materialBodyOf(row),
})

/** All materials, by kind and name. */
export async function listMaterials(actor: Actor | undefined): Promise<readonly MaterialFacts[]> {
  permit(actor, 'catalogue.read')
  return (await listMaterialRows(database().read)).map(materialFactsOf)
}

/** @throws LedgerlineError not-found */
export async function requireMaterial(actor: Actor | undefined, code: string): Promise<MaterialFacts> {
  permit(actor, 'catalogue.read')
  const row = await findMaterialByCode(database().read, code)
  if (!row) throw problem('not-found', `There is no material ${code}.`)
  return materialFactsOf(row)
}
