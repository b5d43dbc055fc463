import type { GaugeFacts } from '@/lib/domain/metrology/evaluation'
import type { Tx } from './database'
import { dateOrNull, type EquipmentStore, inListOrder, searchKeyOf } from './equipment-store'

/** SI by kind: metres, kilograms, hertz, degrees Celsius. */
export interface GaugeValues {
  readonly name: string
  readonly kind: string
  readonly resolution: number
  readonly uAbsolute: number
  readonly uRelative: number
  readonly error: number
  readonly mode: string
  readonly calibrationDueAt: number | undefined
  readonly note: string
}

export interface GaugeRow extends GaugeValues {
  readonly id: number
  readonly code: string
  readonly active: boolean
  readonly version: number
}

const select = {
  id: true,
  code: true,
  name: true,
  kind: true,
  resolution: true,
  uAbsolute: true,
  uRelative: true,
  error: true,
  mode: true,
  calibrationDueAt: true,
  active: true,
  note: true,
  version: true,
} as const

const rowOf = ({
  calibrationDueAt,
  ...row
}: Omit<GaugeRow, 'calibrationDueAt'> & { calibrationDueAt: Date | null }): GaugeRow => ({
  ...row,
  calibrationDueAt: calibrationDueAt?.getTime(),
})

const data = (code: string, { calibrationDueAt, ...values }: GaugeValues) => ({
  ...values,
  calibrationDueAt: dateOrNull(calibrationDueAt),
  searchKey: searchKeyOf(code, values.name),
})

export const gauges: EquipmentStore<GaugeRow, GaugeValues> = {
  list: async (tx) => (await tx.gauge.findMany({ select, orderBy: [...inListOrder] })).map(rowOf),
  get: async (tx, code) => {
    const row = await tx.gauge.findUnique({ where: { code }, select })
    return row ? rowOf(row) : undefined
  },
  insert: async (tx, code, values, at) =>
    rowOf(await tx.gauge.create({ data: { code, ...data(code, values), createdAt: new Date(at) }, select })),
  update: async (tx, code, version, values) =>
    (
      await tx.gauge.updateMany({
        where: { code, version },
        data: { ...data(code, values), version: { increment: 1 } },
      })
    ).count > 0,
  setActive: async (tx, code, version, active) =>
    (await tx.gauge.updateMany({ where: { code, version }, data: { active, version: { increment: 1 } } }))
      .count > 0,
}

export const findGaugeByCode = (tx: Tx, code: string): Promise<GaugeRow | undefined> => gauges.get(tx, code)

export const findGaugesByCodes = async (tx: Tx, codes: readonly string[]): Promise<readonly GaugeRow[]> =>
  (await tx.gauge.findMany({ where: { code: { in: [...codes] } }, select, orderBy: { code: 'asc' } })).map(
    rowOf,
  )

/** Gauges in use whose calibration falls due before a moment. */
export const listGaugesDueBefore = async (tx: Tx, at: number): Promise<readonly GaugeRow[]> =>
  (
    await tx.gauge.findMany({
      where: { active: true, calibrationDueAt: { lt: new Date(at) } },
      select,
      orderBy: [{ calibrationDueAt: 'asc' }, { code: 'asc' }],
    })
  ).map(rowOf)

/** A gauge as a budget sees it. */
export const gaugeFactsOf = ({
  code,
  resolution,
  uAbsolute,
  uRelative,
  error,
  mode,
}: GaugeRow): GaugeFacts => ({
  code,
  resolution,
  uAbsolute,
  uRelative,
  error,
  mode: mode === 'against-pin' ? 'against-pin' : 'direct',
})
