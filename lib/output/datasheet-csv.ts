import type { DatasheetBody } from '@/lib/domain/datasheets/datasheet'
import { cellInWords, forceUnitNames, lawInWords } from '@/lib/domain/datasheets/datasheet-words'
import { type CsvCell, csvText } from './csv'

export interface DatasheetName {
  readonly code: string
  readonly number: number
}

const head = [
  'datasheet',
  'revision',
  'product',
  'basis',
  'law',
  'mass_per_metre_kg_per_m',
  'axial_stiffness_n',
  'a4_hz',
  'note',
  'frequency_hz',
  'length_m',
  'tension_n',
  'tension_shown',
  'unit_shown',
  'share_of_breaking_load',
  'state',
] as const

/**
 * The tension table of a revision, one row a note and length: unrounded SI beside what is printed, and with every
 * row what it rests on, so that a row cut out of the file can still be reckoned again. Tensions that are not
 * offered (“over”) stay empty.
 */
export function datasheetCsv({ code, number }: DatasheetName, body: DatasheetBody): string {
  const mass = body.basis === 'loaded-mass' ? body.loadedMassPerMetre : body.massPerMetre.value
  const { law } = lawInWords(body, 'point')
  const rows = body.rows.flatMap((row) =>
    row.cells.map((cell, index): readonly CsvCell[] => {
      const offered = cell.state !== 'over'
      return [
        code,
        number,
        body.product.name,
        body.basis,
        law,
        mass,
        body.basis === 'unloaded-mass' ? body.axialStiffness : undefined,
        body.a4,
        row.note,
        row.frequency,
        body.lengths[index],
        offered ? cell.tension : undefined,
        offered ? cellInWords(cell, body, 'point').tension : undefined,
        forceUnitNames[body.forceUnit],
        cell.fraction,
        offered ? cell.state : 'not offered',
      ]
    }),
  )
  return csvText([head, ...rows])
}
