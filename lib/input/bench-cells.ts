import type { InspectionPlan } from '../domain/metrology/specification'

/** Where a person stands while typing: all specimens at one station, then all at the next. */
export type Station = 'micrometer' | 'balance' | 'rig'

export interface BenchField {
  readonly id: string
  readonly station: Station
  readonly label: string
  readonly dimension: 'length' | 'mass' | 'frequency' | 'temperature'
  /** Typed once for all specimens; kept beside the specimens as prefilled values. */
  readonly setUp: boolean
}

/** One cell of the sheet. Specimens count from 1. */
export interface BenchCell {
  readonly specimen: number
  readonly field: BenchField
  readonly key: string
}

export const cellKey = (specimen: number, fieldId: string): string => `${specimen}.${fieldId}`

/** The rows of the sheet in the order of the stations, from the inspection plan. */
export function benchFields(plan: InspectionPlan): readonly BenchField[] {
  const directions = plan.directions === 2 ? (['a', 'b'] as const) : (['a'] as const)
  const diameters = Array.from({ length: plan.positions }, (_, index) => index + 1).flatMap((position) =>
    directions.map(
      (direction): BenchField => ({
        id: `d${position}${direction}`,
        station: 'micrometer',
        label: `Diameter, place ${position} ${direction}`,
        dimension: 'length',
        setUp: false,
      }),
    ),
  )
  return [
    ...diameters,
    { id: 'cutLength', station: 'balance', label: 'Cut length', dimension: 'length', setUp: true },
    { id: 'cutMass', station: 'balance', label: 'Cut mass', dimension: 'mass', setUp: false },
    { id: 'span', station: 'rig', label: 'Span', dimension: 'length', setUp: true },
    { id: 'temperature', station: 'rig', label: 'Temperature', dimension: 'temperature', setUp: true },
    { id: 'frequency', station: 'rig', label: 'Frequency', dimension: 'frequency', setUp: false },
  ]
}

/** The path that Enter follows: station by station, specimen by specimen, leaving out set-up values. */
export function cellOrder(plan: InspectionPlan): readonly BenchCell[] {
  const fields = benchFields(plan).filter((field) => !field.setUp)
  const specimens = Array.from({ length: plan.specimens }, (_, index) => index + 1)
  return (['micrometer', 'balance', 'rig'] as const).flatMap((station) =>
    specimens.flatMap((specimen) =>
      fields
        .filter((field) => field.station === station)
        .map((field) => ({ specimen, field, key: cellKey(specimen, field.id) })),
    ),
  )
}

/** The first cell after `key` that has no value, else the one after it, else undefined at the end. */
export function nextCell(
  order: readonly BenchCell[],
  key: string,
  filled: (key: string) => boolean,
): BenchCell | undefined {
  const at = order.findIndex((cell) => cell.key === key)
  const after = order.slice(at + 1)
  return after.find((cell) => !filled(cell.key)) ?? order.find((cell) => !filled(cell.key))
}

/**
 * "I skipped one": from this cell on, the values of its station move one cell further, and the cell
 * itself becomes empty. Stops at the first cell that is empty or locked; refused (undefined) when the
 * last value of the station has nowhere to go.
 */
export function shiftFrom<Value>(
  order: readonly BenchCell[],
  key: string,
  values: Readonly<Record<string, Value>>,
  locked: (specimen: number) => boolean,
): Readonly<Record<string, Value>> | undefined {
  const start = order.find((cell) => cell.key === key)
  if (!start) return undefined
  const lane = order.filter((cell) => cell.field.station === start.field.station && !locked(cell.specimen))
  const from = lane.findIndex((cell) => cell.key === key)
  if (from < 0) return undefined
  const gap = lane.findIndex((cell, index) => index >= from && values[cell.key] === undefined)
  if (gap < 0) return undefined
  const moved: Record<string, Value> = { ...values }
  for (let index = gap; index > from; index -= 1) {
    const target = lane[index]
    const source = lane[index - 1]
    if (!target || !source) return undefined
    const value = values[source.key]
    if (value !== undefined) moved[target.key] = value
  }
  delete moved[key]
  return moved
}
