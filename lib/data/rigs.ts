import type { RigFacts } from '@/lib/domain/metrology/evaluation'
import type { Tx } from './database'
import { type EquipmentStore, inListOrder, searchKeyOf } from './equipment-store'

export interface RigValues {
  readonly name: string
  readonly arrangement: string
  readonly spanMetres: number
  readonly uSpanMetres: number
  readonly endCondition: string
  /** Relative; undefined: rectangular from pinned to clamped. */
  readonly uEndRelative: number | undefined
  readonly frictionHalfWidth: number
  readonly hangingLengthMetres: number
  /** Empty for none. */
  readonly hangerCode: string
  readonly weightCodes: readonly string[]
  /** Usual equipment at this rig; empty for none. */
  readonly micrometerCode: string
  readonly balanceCode: string
  readonly ruleCode: string
  readonly counterCode: string
  readonly note: string
}

export interface RigRow extends RigValues {
  readonly id: number
  readonly code: string
  readonly active: boolean
  readonly version: number
}

const select = {
  id: true,
  code: true,
  name: true,
  arrangement: true,
  spanMetres: true,
  uSpanMetres: true,
  endCondition: true,
  uEndRelative: true,
  frictionHalfWidth: true,
  hangingLengthMetres: true,
  hangerCode: true,
  weightCodes: true,
  micrometerCode: true,
  balanceCode: true,
  ruleCode: true,
  counterCode: true,
  active: true,
  note: true,
  version: true,
} as const

interface Selected extends Omit<RigRow, 'uEndRelative' | 'weightCodes'> {
  readonly uEndRelative: number | null
  readonly weightCodes: string
}

const rowOf = ({ uEndRelative, weightCodes, ...row }: Selected): RigRow => ({
  ...row,
  uEndRelative: uEndRelative ?? undefined,
  weightCodes: weightCodes.split(' ').filter((code) => code !== ''),
})

const data = (code: string, { uEndRelative, weightCodes, ...values }: RigValues) => ({
  ...values,
  uEndRelative: uEndRelative ?? null,
  weightCodes: weightCodes.join(' '),
  searchKey: searchKeyOf(code, values.name),
})

export const rigs: EquipmentStore<RigRow, RigValues> = {
  list: async (tx) => (await tx.rig.findMany({ select, orderBy: [...inListOrder] })).map(rowOf),
  get: async (tx, code) => {
    const row = await tx.rig.findUnique({ where: { code }, select })
    return row ? rowOf(row) : undefined
  },
  insert: async (tx, code, values, at) =>
    rowOf(await tx.rig.create({ data: { code, ...data(code, values), createdAt: new Date(at) }, select })),
  update: async (tx, code, version, values) =>
    (
      await tx.rig.updateMany({
        where: { code, version },
        data: { ...data(code, values), version: { increment: 1 } },
      })
    ).count > 0,
  setActive: async (tx, code, version, active) =>
    (await tx.rig.updateMany({ where: { code, version }, data: { active, version: { increment: 1 } } }))
      .count > 0,
}

export const findRigByCode = (tx: Tx, code: string): Promise<RigRow | undefined> => rigs.get(tx, code)

/** A rig as a budget sees it. */
export const rigFactsOf = (rig: RigRow): RigFacts => ({
  code: rig.code,
  arrangement: rig.arrangement === 'horizontal' ? 'horizontal' : 'vertical',
  span: { value: rig.spanMetres, u: rig.uSpanMetres },
  endCondition: rig.endCondition === 'pinned' || rig.endCondition === 'clamped' ? rig.endCondition : 'knife',
  ...(rig.uEndRelative === undefined ? {} : { uEndRelative: rig.uEndRelative }),
  frictionHalfWidth: rig.frictionHalfWidth,
  hangingLength: rig.hangingLengthMetres,
  hangerCode: rig.hangerCode,
  weightCodes: rig.weightCodes,
})
