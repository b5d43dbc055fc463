import type { Tx } from '@/lib/data/database'
import type { NewLotMaterial } from '@/lib/data/lot-materials'
import { findMaterialsIn } from '@/lib/data/materials-in'
import { problem } from '@/lib/domain/errors'
import { fitsRole, lotMaterialWords, materialInWords, placed } from '@/lib/domain/record/material-in'
import type { LotMaterialInput } from '@/lib/input/lot'

interface Lot {
  readonly lengthMetres: number | undefined
  /** Codes that the lot names already: they may have been put away since. */
  readonly named?: ReadonlySet<string>
}

/**
 * What a lot is made of, as it is stored.
 * @throws LedgerlineError not-found; bad-input when one is put away, does not fit its role, or ends behind the lot
 */
export async function lotMaterialLinks(
  tx: Tx,
  materials: readonly LotMaterialInput[],
  { lengthMetres, named = new Set() }: Lot,
): Promise<readonly NewLotMaterial[]> {
  const rows = await findMaterialsIn(tx, [...new Set(materials.map(({ code }) => code))])
  return placed(materials).map(({ code, role, place, fromMetre, toMetre }, index) => {
    const where = `materials.${index}.code`
    const row = rows.find((one) => one.code === code)
    if (!row)
      throw problem('not-found', `There is no coil, spool or resin batch ${code}.`, {
        where,
        mend: 'Register it in Materials in, or choose another one.',
      })
    if (!row.active && !named.has(code))
      throw problem('bad-input', `The ${materialInWords[row.kind]} ${code} is put away.`, {
        where,
        mend: 'Take it back into use in Materials in, or choose another one.',
      })
    if (!fitsRole(row.kind, role))
      throw problem(
        'bad-input',
        `${code} is a ${materialInWords[row.kind]} and can’t be the ${lotMaterialWords[role]} of a lot.`,
        { where, mend: role === 'resin' ? 'Choose a resin batch.' : 'Choose a coil or a spool.' },
      )
    const furthest = toMetre ?? fromMetre
    if (furthest !== undefined && lengthMetres !== undefined && furthest > lengthMetres)
      throw problem('bad-input', `${code} goes to ${furthest} m, but the lot is ${lengthMetres} m long.`, {
        where: `materials.${index}.${toMetre === undefined ? 'fromMetre' : 'toMetre'}`,
        mend: 'Check the places along the lot and its length.',
      })
    return { role, place, materialInId: row.id, fromMetre, toMetre }
  })
}
