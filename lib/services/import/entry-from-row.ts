import type { LotRow } from '@/lib/data/lots'
import type { RigRow } from '@/lib/data/rigs'
import { LedgerlineError, type Problem } from '@/lib/domain/errors'
import type { LoadReading } from '@/lib/domain/metrology/sheet'
import type { InspectionPlan } from '@/lib/domain/metrology/specification'
import type { EquipmentCodes, SheetPart } from '@/lib/domain/record/reading'
import type { SpecimenEntry } from '@/lib/domain/record/write-state'
import { ok, type Result, refused } from '@/lib/domain/result'
import type { BenchRow } from '@/lib/input/bench-file/bench-row'
import { checkEquipment } from '../check-equipment'
import type { ImportLookups } from './lookups'

/** How far a clock at the bench may run ahead. */
const CLOCK_SLACK = 5 * 60_000

export interface EntryIds {
  readonly specimen: string
  readonly reading: string
}

/**
 * A row as an entry of its lot. What it leaves open is taken from the set-up: the plan's rig with its usual load and
 * equipment, the person importing, the time the lot was made. Refused when it names what is not registered, or a time
 * to come.
 */
export function entryFromRow(
  row: BenchRow,
  lot: Pick<LotRow, 'madeAt'>,
  plan: InspectionPlan,
  lookups: ImportLookups,
  ids: EntryIds,
  at: number,
): Result<SpecimenEntry> {
  const problems: Problem[] = []
  const rig = lookups.equipment.rigs.find((one) => one.code === (row.equipment.rig ?? plan.rigCode))
  const measurer = row.measurer === undefined ? undefined : lookups.people.find(row.measurer)
  if (row.measurer !== undefined && !measurer)
    problems.push({
      code: 'not-found',
      message: `There is nobody called “${row.measurer}” here.`,
      where: 'measurer',
      mend: 'Write the name or user name as it stands in Settings, People.',
    })
  const measuredAt = row.measuredAt ?? row.opening.madeAt ?? lot.madeAt
  if (measuredAt > at + CLOCK_SLACK)
    problems.push({
      code: 'bad-input',
      message: 'A specimen can’t have been measured in the future.',
      where: 'measured_at',
      mend: 'Check the date.',
    })
  const load = loadOf(row, rig, lookups)
  const values: SheetPart = load === undefined ? row.values : { ...row.values, load }
  const entry: SpecimenEntry = {
    specimen: { clientId: ids.specimen, number: row.specimen },
    reading: {
      clientId: ids.reading,
      kind: 'sheet',
      values: { ...values, weighedState: values.weighedState ?? plan.weighedState },
      equipment: equipmentOf(row.equipment, rig),
      measuredAt,
      ...(measurer ? { personId: measurer.id } : {}),
    },
  }
  try {
    checkEquipment(lookups.equipment, [entry])
  } catch (error) {
    if (!(error instanceof LedgerlineError)) throw error
    problems.push(error.problem)
  }
  return problems.length > 0 ? refused(...problems) : ok(entry)
}

/** What hangs: as the row says, by codes or by value, else the rig's usual load where the string was sounded. */
function loadOf(
  row: BenchRow,
  rig: RigRow | undefined,
  { equipment }: ImportLookups,
): LoadReading | undefined {
  if (row.values.load) return row.values.load
  if (row.weights) {
    const hanger = row.weights.find(
      (code) => equipment.weights.find((one) => one.code === code)?.kind === 'hanger',
    )
    return {
      kind: 'weights',
      hanger: hanger ?? '',
      weights: row.weights.filter((code) => code !== hanger),
    }
  }
  if (!rig || (row.values.frequencies?.length ?? 0) === 0) return undefined
  return rig.hangerCode === '' && rig.weightCodes.length === 0
    ? undefined
    : { kind: 'weights', hanger: rig.hangerCode, weights: rig.weightCodes }
}

const equipmentOf = (named: EquipmentCodes, rig: RigRow | undefined): EquipmentCodes => {
  const usual = rig
    ? {
        rig: rig.code,
        micrometer: rig.micrometerCode,
        balance: rig.balanceCode,
        rule: rig.ruleCode,
        counter: rig.counterCode,
      }
    : {}
  return Object.fromEntries(Object.entries({ ...usual, ...named }).filter(([, code]) => code))
}
