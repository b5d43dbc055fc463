import { type CharacteristicId, characteristicIds } from '../metrology/characteristics'
import type { Estimate, SpecimenEvaluation } from '../metrology/evaluation'

/** One wide row: value, combined standard uncertainty and its common part, by characteristic. */
export type ResultRow = {
  readonly [Column in CharacteristicId as Column | `${Column}U` | `${Column}Uc`]: number | null
}

type Results = SpecimenEvaluation['results']

/** The wide row of an evaluation's results. A minus zero becomes 0: the engines do not keep its sign alike. */
export function resultRow(results: Results): ResultRow {
  const columns = characteristicIds.flatMap((id): [string, number | null][] => {
    const found = results[id]
    return [
      [id, column(found?.value)],
      [`${id}U`, column(found?.u)],
      [`${id}Uc`, column(found?.uCommon)],
    ]
  })
  return Object.fromEntries(columns) as ResultRow
}

/** The results of a stored wide row. */
export function resultsOf(row: ResultRow): Results {
  const found = characteristicIds.flatMap((id): [CharacteristicId, Estimate][] => {
    const [value, u, uCommon] = [row[id], row[`${id}U`], row[`${id}Uc`]]
    return value === null || u === null || uCommon === null ? [] : [[id, { value, u, uCommon }]]
  })
  return Object.fromEntries(found)
}

const column = (value: number | undefined): number | null =>
  value === undefined ? null : value === 0 ? 0 : value
