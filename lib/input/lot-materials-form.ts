import { LedgerlineError, type Problem } from '@/lib/domain/errors'
import type { LotMaterialRole } from '@/lib/domain/record/material-in'
import { ok, type Result } from '@/lib/domain/result'
import { type FormFields, optionalQuantityField } from './form-fields'
import { MOST_LOT_METRES } from './lot'

/** One row of a form about what a lot is made of; its fields are called `row.code`, `row.fromMetre`, `row.toMetre`. */
export interface MaterialRow {
  readonly row: string
  readonly role: string
}

/** Rows of the form that changes what a lot is made of. */
export const MOST_MATERIAL_ROWS = 20

const rowNames = Array.from({ length: MOST_MATERIAL_ROWS }, (_, index) => `material-${index + 1}`)

/** The rows that were sent, each with its role chosen in the form. */
export const sentRows = (fields: FormFields): readonly MaterialRow[] =>
  rowNames.flatMap((row) => {
    const role = fields[`${row}.role`]
    return role === undefined ? [] : [{ row, role }]
  })

/** Where a lot is opened each role has a row of its own. */
export const roleRow = (role: LotMaterialRole): MaterialRow => ({ row: `material-${role}`, role })

interface ReadMaterials {
  /** As the schema takes it. */
  readonly materials: readonly Readonly<Record<string, unknown>>[]
  /** Problems of the schema or a service, moved to the fields of the rows that they are about. */
  readonly at: (problem: Problem) => Problem
}

/** What was filled in of the rows, in their order; rows without a code are passed over. */
export function readMaterialRows(fields: FormFields, rows: readonly MaterialRow[]): Result<ReadMaterials> {
  const filled = rows.filter(({ row }) => (fields[`${row}.code`] ?? '').trim() !== '')
  const materials: Readonly<Record<string, unknown>>[] = []
  const problems: Problem[] = []
  for (const { row, role } of filled) {
    const metre = (end: 'fromMetre' | 'toMetre', name: string): number | undefined => {
      const read = optionalQuantityField(fields, `${row}.${end}`, {
        name,
        dimension: 'length',
        unit: 'm',
        min: 0,
        max: MOST_LOT_METRES,
      })
      if (read.ok) return read.value
      problems.push(...read.problems)
      return undefined
    }
    const code = (fields[`${row}.code`] ?? '').trim()
    materials.push({ role, code, fromMetre: metre('fromMetre', 'From'), toMetre: metre('toMetre', 'To') })
  }
  if (problems.length > 0) return { ok: false, problems }
  const at = (problem: Problem): Problem => {
    const [, index, field] = /^materials\.(\d+)\.(\w+)$/.exec(problem.where ?? '') ?? []
    const row = index === undefined ? undefined : filled[Number(index)]?.row
    return row === undefined ? problem : { ...problem, where: `${row}.${field}` }
  }
  return ok({ materials, at })
}

/** Problems of a parsed form, at their rows. */
export const atRows = <Value>(result: Result<Value>, at: ReadMaterials['at']): Result<Value> =>
  result.ok ? result : { ok: false, problems: result.problems.map(at) }

/** A service's refusal, at its row. */
export async function refusedAtRows<Value>(
  work: () => Promise<Value>,
  at: ReadMaterials['at'],
): Promise<Value> {
  try {
    return await work()
  } catch (error) {
    throw error instanceof LedgerlineError ? new LedgerlineError(at(error.problem)) : error
  }
}
