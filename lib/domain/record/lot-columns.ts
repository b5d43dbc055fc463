import type { CharacteristicId } from '../metrology/characteristics'
import { type LotSummaryBody, sampleStandardDeviationOf } from '../quality/lot-summary'
import { differenceFromSi, fromSi, type UnitId } from '../units/unit'
import { chartUnit, displayUnit, type ResultUnits } from './display-unit'
import type { LotState } from './lot-state'

/** What a lot in a list can be asked about, in the order of the columns. The lot’s code always comes first. */
export const lotColumnIds = [
  'product',
  'family',
  'made',
  'measured',
  'machine',
  'die',
  'materials',
  'maker',
  'length',
  'specimens',
  'diameter',
  'diameterSpread',
  'massWeighed',
  'massSpread',
  'massSounded',
  'closure',
  'state',
  'signals',
] as const

export type LotColumnId = (typeof lotColumnIds)[number]

export const lotSortKeys = ['made', 'measured', 'code', 'product', 'state', 'length'] as const
export type LotSortKey = (typeof lotSortKeys)[number]

/** Characteristics whose summaries a list shows. */
export const listedCharacteristics = [
  'diameter',
  'massPerMetreWeighed',
  'massPerMetreSounded',
  'closure',
] as const satisfies readonly CharacteristicId[]

/** A lot as a list shows it. Instants are epoch milliseconds, values SI. */
export interface LotListItem {
  readonly code: string
  readonly state: LotState
  readonly productCode: string
  readonly productName: string
  readonly family: string
  readonly machine: string | undefined
  readonly die: string | undefined
  /** Coils, spools and resin batches by role, along the lot. */
  readonly materials: readonly { readonly role: string; readonly code: string }[]
  readonly maker: string | undefined
  readonly madeAt: number
  readonly measuredAt: number | undefined
  readonly lengthMetres: number | undefined
  readonly specimens: number
  readonly evidenceChanged: boolean
  /** Unanswered signals whose pattern the lot belongs to. */
  readonly openSignals: number
  readonly summaries: Readonly<
    Partial<Record<(typeof listedCharacteristics)[number], Pick<LotSummaryBody, 'n' | 'mean' | 'm2'>>>
  >
}

/** Where lots stand, as it is read; in the order of a lot’s life. */
export const lotStateNames: Readonly<Record<LotState, string>> = {
  measuring: 'measuring',
  'to-decide': 'to decide',
  released: 'released',
  held: 'on hold',
  rework: 'in rework',
  regraded: 'regraded',
  concession: 'concession',
  scrapped: 'scrapped',
}

interface Measured {
  readonly characteristic: (typeof listedCharacteristics)[number]
  readonly statistic: 'mean' | 'within-lot-sd'
}

const measured: Readonly<Partial<Record<LotColumnId, Measured>>> = {
  diameter: { characteristic: 'diameter', statistic: 'mean' },
  diameterSpread: { characteristic: 'diameter', statistic: 'within-lot-sd' },
  massWeighed: { characteristic: 'massPerMetreWeighed', statistic: 'mean' },
  massSpread: { characteristic: 'massPerMetreWeighed', statistic: 'within-lot-sd' },
  massSounded: { characteristic: 'massPerMetreSounded', statistic: 'mean' },
  closure: { characteristic: 'closure', statistic: 'mean' },
}

const names: Readonly<Record<LotColumnId, string>> = {
  product: 'Product',
  family: 'Family',
  made: 'Made',
  measured: 'Measured',
  machine: 'Machine',
  die: 'Die',
  materials: 'Spool or coil',
  maker: 'Maker',
  length: 'Length',
  specimens: 'Specimens',
  diameter: 'Diameter',
  diameterSpread: 'Spread of diameter',
  massWeighed: 'Mass weighed',
  massSpread: 'Spread of mass',
  massSounded: 'Mass sounded',
  closure: 'Closure',
  state: 'State',
  signals: 'To answer',
}

const sorted = new Set<string>(lotSortKeys)

export interface LotColumn {
  readonly id: LotColumnId
  readonly name: string
  /** In which the column’s numbers are shown. */
  readonly unit: UnitId | undefined
  /** Of its numbers; undefined for texts and instants. */
  readonly decimals: number | undefined
  readonly signed: boolean
  readonly sort: LotSortKey | undefined
}

/** A column with the unit and the decimals that go with the works’ choice of units. */
export function lotColumn(id: LotColumnId, units: ResultUnits): LotColumn {
  const what = measured[id]
  const shown =
    what &&
    (what.statistic === 'mean'
      ? displayUnit(what.characteristic, units)
      : chartUnit(what.characteristic, what.statistic, units))
  return {
    id,
    name: names[id],
    unit: id === 'length' ? 'm' : shown?.unit,
    decimals: id === 'length' || id === 'specimens' ? 0 : shown?.decimals,
    signed: id === 'closure',
    sort: sorted.has(id) ? lotSortKeys.find((key) => key === id) : undefined,
  }
}

/** What stands in a cell; a number is in its column’s unit, unrounded. */
export type LotCell =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'number'; readonly value: number | undefined }
  | { readonly kind: 'instant'; readonly at: number | undefined }

/** The cell of a lot in a column. */
export function lotCell(column: Pick<LotColumn, 'id' | 'unit'>, lot: LotListItem): LotCell {
  const what = measured[column.id]
  if (what && column.unit) return { kind: 'number', value: measuredValue(what, column.unit, lot) }
  const text = (given: string | undefined): LotCell => ({ kind: 'text', text: given ?? '' })
  switch (column.id) {
    case 'product':
      return text(lot.productName)
    case 'family':
      return text(lot.family)
    case 'made':
      return { kind: 'instant', at: lot.madeAt }
    case 'measured':
      return { kind: 'instant', at: lot.measuredAt }
    case 'machine':
      return text(lot.machine)
    case 'die':
      return text(lot.die)
    case 'materials':
      return text(materialsInWords(lot.materials))
    case 'maker':
      return text(lot.maker)
    case 'length':
      return { kind: 'number', value: lot.lengthMetres }
    case 'specimens':
      return { kind: 'number', value: lot.specimens }
    case 'state':
      return text(lotStateNames[lot.state])
    default:
      return text(toAnswer(lot))
  }
}

function measuredValue({ characteristic, statistic }: Measured, unit: UnitId, lot: LotListItem) {
  const summary = lot.summaries[characteristic]
  if (!summary) return undefined
  if (statistic === 'mean') return fromSi(summary.mean, unit)
  const spread = sampleStandardDeviationOf({ ...summary, min: 0, max: 0, uCommon: 0, uMean: 0 })
  return spread === undefined ? undefined : differenceFromSi(spread, unit)
}

const roleNames: Readonly<Record<string, string>> = {
  core: 'core',
  'wrap-1': 'wrap',
  'wrap-2': 'second wrap',
  resin: 'resin',
}

/** `C-118`; with several roles `core C-118, wrap SP-22 + SP-23`: + where one follows the other along the lot. */
function materialsInWords(materials: LotListItem['materials']): string {
  const roles = [...new Set(materials.map(({ role }) => role))]
  return roles
    .map((role) => {
      const codes = materials.flatMap((one) => (one.role === role ? [one.code] : [])).join(' + ')
      return roles.length > 1 ? `${roleNames[role] ?? role} ${codes}` : codes
    })
    .join(', ')
}

const toAnswer = ({ evidenceChanged, openSignals }: LotListItem): string =>
  [
    evidenceChanged ? 'evidence changed' : '',
    openSignals > 0 ? `${openSignals} ${openSignals === 1 ? 'signal' : 'signals'}` : '',
  ]
    .filter((part) => part !== '')
    .join(', ')
