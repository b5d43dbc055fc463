import type { Tx } from './database'

/** What every kind of equipment has in common. */
export interface EquipmentBase {
  readonly id: number
  readonly code: string
  readonly active: boolean
  readonly version: number
}

/** One table of equipment; rows are found by their code, changed at their version, never deleted. */
export interface EquipmentStore<Row extends EquipmentBase, Values> {
  /** By code; those no longer in use last. */
  list(tx: Tx): Promise<readonly Row[]>
  get(tx: Tx, code: string): Promise<Row | undefined>
  insert(tx: Tx, code: string, values: Values, at: number): Promise<Row>
  /** @returns false when the row has another version by now, or is not there */
  update(tx: Tx, code: string, version: number, values: Values): Promise<boolean>
  setActive(tx: Tx, code: string, version: number, active: boolean): Promise<boolean>
}

/** Lower-cased, so that search is the same on both engines. */
export const searchKeyOf = (...parts: readonly string[]): string => parts.join(' ').toLowerCase().trim()

export const inListOrder = [{ active: 'desc' }, { code: 'asc' }] as const

export const dateOrNull = (at: number | undefined): Date | null => (at === undefined ? null : new Date(at))
