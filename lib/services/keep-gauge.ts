import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type GaugeRow, type GaugeValues, gauges } from '@/lib/data/gauges'
import { getWorks } from '@/lib/data/works'
import type { GaugeInput } from '@/lib/input/equipment'
import { endOfDay } from './calendar-day'
import { createEquipment, type Kind, missing, setEquipmentActive, updateEquipment } from './keep-equipment'

const kind: Kind<GaugeRow, GaugeValues> = { word: 'gauge', store: gauges }

/** A gauge may be used to the end of the day its calibration falls due, by the works' clock. */
const valuesOf = async ({ calibrationDue, ...values }: GaugeInput): Promise<GaugeValues> => {
  const works = await getWorks(database().read)
  const timeZone = works?.timeZone ?? 'UTC'
  return {
    ...values,
    calibrationDueAt: calibrationDue === undefined ? undefined : endOfDay(calibrationDue, timeZone),
  }
}

/** Adds measuring equipment. @throws LedgerlineError not-permitted; conflict when the code is taken */
export const createGauge = async (
  actor: Actor | undefined,
  code: string,
  input: GaugeInput,
  at: number = Date.now(),
): Promise<GaugeRow> => {
  permit(actor, 'equipment.keep')
  return createEquipment(kind, actor, code, await valuesOf(input), at)
}

/** Results already computed keep what they rest on. @throws LedgerlineError not-permitted, not-found, conflict */
export const updateGauge = async (
  actor: Actor | undefined,
  code: string,
  version: number,
  input: GaugeInput,
  at: number = Date.now(),
): Promise<void> => {
  permit(actor, 'equipment.keep')
  return updateEquipment(kind, actor, code, version, await valuesOf(input), at)
}

/** Puts a gauge away, or back into use. @throws LedgerlineError not-permitted, not-found, conflict */
export const setGaugeActive = (
  actor: Actor | undefined,
  code: string,
  version: number,
  active: boolean,
  at: number = Date.now(),
): Promise<void> => setEquipmentActive(kind, actor, code, version, active, at)

/** @throws LedgerlineError not-permitted, not-found */
export async function requireGauge(actor: Actor | undefined, code: string): Promise<GaugeRow> {
  permit(actor, 'equipment.read')
  const row = await gauges.get(database().read, code)
  if (!row) throw missing('gauge', code)
  return row
}
