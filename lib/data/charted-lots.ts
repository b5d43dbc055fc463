import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { LotSummaryBody } from '@/lib/domain/quality/lot-summary'
import type { Tx } from './database'

/** A lot as a chart sees it. */
export interface ChartedLotRow {
  readonly id: number
  readonly code: string
  readonly madeAt: number
  /** When the first of its readings was taken. */
  readonly measuredAt: number | undefined
  readonly product: { readonly id: number; readonly code: string; readonly name: string }
  readonly specificationRevisionId: number
  /** What went into it, code by role: `{ 'wrap-1': 'S-112' }`; several of a role joined by +. */
  readonly materials: Readonly<Record<string, string>>
  readonly setting: string
  readonly makerId: number | undefined
  readonly dieName: string | undefined
  readonly machineName: string | undefined
  readonly specificationNumber: number
  readonly summaries: readonly (LotSummaryBody & { readonly characteristic: string })[]
}

/** Charted lots of a product, or of a machine over its products, with their summaries, in chart order. */
export const listChartedLots = async (
  tx: Tx,
  of: { readonly productId: number } | { readonly machineId: number },
  characteristicNames: readonly string[],
): Promise<readonly ChartedLotRow[]> =>
  (
    await tx.lot.findMany({
      where: { ...of, state: { not: 'measuring' } },
      orderBy: [{ madeAt: 'asc' }, { code: 'asc' }],
      select: {
        id: true,
        code: true,
        madeAt: true,
        measuredAt: true,
        product: { select: { id: true, code: true, name: true } },
        specificationRevisionId: true,
        materials: {
          select: { role: true, materialIn: { select: { code: true } } },
          orderBy: [{ role: 'asc' }, { place: 'asc' }],
        },
        setting: true,
        makerId: true,
        die: { select: { name: true } },
        machine: { select: { name: true } },
        specificationRevision: { select: { number: true } },
        summaries: {
          where: { modelVersion: MODEL_VERSION, characteristic: { in: [...characteristicNames] } },
          select: {
            characteristic: true,
            n: true,
            mean: true,
            m2: true,
            min: true,
            max: true,
            uCommon: true,
            uMean: true,
          },
        },
      },
    })
  ).map(({ madeAt, measuredAt, makerId, die, machine, materials, specificationRevision, ...row }) => ({
    ...row,
    madeAt: madeAt.getTime(),
    measuredAt: measuredAt?.getTime(),
    materials: codesByRole(materials),
    makerId: makerId ?? undefined,
    dieName: die?.name,
    machineName: machine?.name,
    specificationNumber: specificationRevision.number,
  }))

function codesByRole(
  links: readonly { readonly role: string; readonly materialIn: { readonly code: string } }[],
): Readonly<Record<string, string>> {
  const codes: Record<string, string> = {}
  for (const { materialIn, role } of links)
    codes[role] = codes[role] === undefined ? materialIn.code : `${codes[role]} + ${materialIn.code}`
  return codes
}

/** Machines with how many lots are charted, and how many signals of their own charts are unanswered. */
export async function listDriftMachines(tx: Tx) {
  const machines = await tx.machine.findMany({
    orderBy: [{ active: 'desc' }, { code: 'asc' }],
    select: { id: true, code: true, name: true, active: true },
  })
  const lots = await tx.lot.groupBy({
    by: ['machineId'],
    where: { state: { not: 'measuring' }, machineId: { not: null } },
    _count: { _all: true },
    _max: { madeAt: true },
  })
  const signals = await tx.signal.groupBy({
    by: ['machineId'],
    where: { state: 'open', machineId: { not: null } },
    _count: { _all: true },
  })
  const beyond = await tx.signal.findMany({
    where: { state: 'open', machineId: null, lot: { machineId: { not: null } } },
    select: { lot: { select: { machineId: true } } },
  })
  return machines.map((machine) => {
    const charted = lots.find((one) => one.machineId === machine.id)
    const own = signals.find((one) => one.machineId === machine.id)?._count._all ?? 0
    return {
      ...machine,
      lots: charted?._count._all ?? 0,
      lastMadeAt: charted?._max.madeAt?.getTime(),
      openSignals: own + beyond.filter((one) => one.lot.machineId === machine.id).length,
    }
  })
}

/** Products with how many lots are charted and how many signals are unanswered. */
export async function listDriftRows(tx: Tx) {
  const products = await tx.product.findMany({
    orderBy: [{ active: 'desc' }, { family: 'asc' }, { code: 'asc' }],
    select: { id: true, code: true, name: true, family: true, active: true },
  })
  const lots = await tx.lot.groupBy({
    by: ['productId'],
    where: { state: { not: 'measuring' } },
    _count: { _all: true },
    _max: { madeAt: true },
  })
  const signals = await tx.signal.groupBy({
    by: ['productId'],
    where: { state: 'open' },
    _count: { _all: true },
  })
  const sets = await tx.limitSet.groupBy({
    by: ['productId'],
    where: { supersededAt: null },
    _count: { _all: true },
  })
  return products.map((product) => {
    const charted = lots.find((one) => one.productId === product.id)
    return {
      ...product,
      lots: charted?._count._all ?? 0,
      lastMadeAt: charted?._max.madeAt?.getTime(),
      openSignals: signals.find((one) => one.productId === product.id)?._count._all ?? 0,
      limitSets: sets.find((one) => one.productId === product.id)?._count._all ?? 0,
    }
  })
}
