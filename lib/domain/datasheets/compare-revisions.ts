import { formatNumber, formatQuantity } from '../units/format'
import type { DatasheetBody } from './datasheet'
import { basisNames } from './tension-by-basis'

/** What changed from one revision to the next, in short phrases; the first revision says so. */
export function compareRevisions(before: DatasheetBody | undefined, after: DatasheetBody): readonly string[] {
  if (!before) return ['first revision']
  const changes: string[] = []
  const mass = (body: DatasheetBody): string =>
    formatQuantity(body.massPerMetre.value, 'mg/m', { decimals: 1 })
  if (mass(before) !== mass(after)) changes.push(`mass per metre ${mass(before)} to ${mass(after)} mg/m`)
  if (before.basis !== after.basis)
    changes.push(`basis ${basisNames[before.basis]} to ${basisNames[after.basis]}`)
  if (before.specification !== after.specification)
    changes.push(`specification revision ${before.specification} to ${after.specification}`)
  if (before.a4 !== after.a4)
    changes.push(
      `A4 ${formatNumber(before.a4, { decimals: 0 })} to ${formatNumber(after.a4, { decimals: 0 })} Hz`,
    )
  if (before.forceUnit !== after.forceUnit) changes.push(`unit ${before.forceUnit} to ${after.forceUnit}`)
  if (before.spread.lots !== after.spread.lots)
    changes.push(`${before.spread.lots} to ${after.spread.lots} lots`)
  const lengths = (body: DatasheetBody): string =>
    body.lengths.map((one) => formatQuantity(one, 'mm', { decimals: 0 })).join(', ')
  if (lengths(before) !== lengths(after)) changes.push(`lengths ${lengths(after)} mm`)
  const notes = (body: DatasheetBody): string => body.rows.map((row) => row.midi).join()
  if (notes(before) !== notes(after)) changes.push('other notes')
  return changes.length > 0 ? changes : ['nothing but the date']
}
