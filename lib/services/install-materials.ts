import type { Tx } from '@/lib/data/database'
import { findMaterialByCode, insertMaterial } from '@/lib/data/materials'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { handbookMaterials } from '@/lib/domain/strings/materials-table'

/**
 * Puts the handbook's materials into the catalogue, those that are not there yet; the caller writes the ledger
 * entry. What the works has changed is left as it is.
 * @returns how many were added
 */
export async function installMaterials(tx: Tx, at: number): Promise<number> {
  let added = 0
  for (const { code, name, body, standing, source } of handbookMaterials) {
    if (await findMaterialByCode(tx, code)) continue
    const values = { name, kind: body.kind, body: canonicalJson(body), standing, source }
    await insertMaterial(tx, code, values, { builtIn: true, at })
    added += 1
  }
  return added
}
