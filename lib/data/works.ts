import type { Tx } from './database'

/** The works itself; there is one. Units as ids of lib/domain/units/unit.ts. */
export interface WorksRow {
  readonly name: string
  readonly place: string
  readonly timeZone: string
  readonly latitudeDegrees: number
  readonly heightMetres: number
  /** A published local value, m/s². */
  readonly gravityTyped: number | undefined
  readonly airTemperatureCelsius: number
  readonly airPressurePascals: number
  /** 0 to 1. */
  readonly airHumidity: number
  readonly lengthUnit: string
  readonly diameterUnit: string
  readonly forceUnit: string
  readonly massUnit: string
  readonly numberFormat: string
  readonly a4: number
  readonly secondPersonPublishes: boolean
  readonly demo: boolean
  readonly version: number
}

export type WorksValues = Omit<WorksRow, 'version' | 'demo'>

const id = 1

const select = {
  name: true,
  place: true,
  timeZone: true,
  latitudeDegrees: true,
  heightMetres: true,
  gravityTyped: true,
  airTemperatureCelsius: true,
  airPressurePascals: true,
  airHumidity: true,
  lengthUnit: true,
  diameterUnit: true,
  forceUnit: true,
  massUnit: true,
  numberFormat: true,
  a4: true,
  secondPersonPublishes: true,
  demo: true,
  version: true,
} as const

export const getWorks = async (tx: Tx): Promise<WorksRow | undefined> => {
  const row = await tx.works.findUnique({ where: { id }, select })
  return row ? { ...row, gravityTyped: row.gravityTyped ?? undefined } : undefined
}

const data = ({ gravityTyped, ...values }: WorksValues) => ({ ...values, gravityTyped: gravityTyped ?? null })

export const insertWorks = async (
  tx: Tx,
  values: WorksValues,
  { demo, at }: { readonly demo: boolean; readonly at: number },
): Promise<void> => {
  await tx.works.create({
    data: { id, ...data(values), demo, createdAt: new Date(at) },
    select: { id: true },
  })
}

/** @returns false when the row has another version by now */
export const updateWorksRow = async (tx: Tx, version: number, values: WorksValues): Promise<boolean> => {
  const { count } = await tx.works.updateMany({
    where: { id, version },
    data: { ...data(values), version: { increment: 1 } },
  })
  return count > 0
}
