import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { getWorks as getWorksRow, type WorksRow } from '@/lib/data/works'
import { problem } from '@/lib/domain/errors'
import { isUnit, type UnitId } from '@/lib/domain/units/unit'
import { gravityOf, type WorksGravity } from './works-gravity'

export interface WorksFacts {
  readonly name: string
  readonly place: string
  readonly timeZone: string
  readonly latitudeDegrees: number
  readonly heightMetres: number
  readonly gravity: WorksGravity
  /** Usual room: °C, Pa, relative humidity 0 to 1. */
  readonly air: { readonly celsius: number; readonly pascals: number; readonly humidity: number }
  readonly units: {
    readonly length: UnitId
    readonly diameter: UnitId
    readonly force: UnitId
    readonly mass: UnitId
  }
  readonly numberFormat: 'point' | 'comma'
  readonly a4: number
  readonly secondPersonPublishes: boolean
  readonly demo: boolean
  readonly version: number
}

const unitOr = (text: string, other: UnitId): UnitId => (isUnit(text) ? text : other)

export const worksFactsOf = (row: WorksRow): WorksFacts => ({
  name: row.name,
  place: row.place,
  timeZone: row.timeZone,
  latitudeDegrees: row.latitudeDegrees,
  heightMetres: row.heightMetres,
  gravity: gravityOf(row),
  air: { celsius: row.airTemperatureCelsius, pascals: row.airPressurePascals, humidity: row.airHumidity },
  units: {
    length: unitOr(row.lengthUnit, 'mm'),
    diameter: unitOr(row.diameterUnit, 'mm'),
    force: unitOr(row.forceUnit, 'N'),
    mass: unitOr(row.massUnit, 'mg'),
  },
  numberFormat: row.numberFormat === 'comma' ? 'comma' : 'point',
  a4: row.a4,
  secondPersonPublishes: row.secondPersonPublishes,
  demo: row.demo,
  version: row.version,
})

/**
 * The works: place, gravity, units, number format.
 * @throws LedgerlineError not-signed-in; not-ready while the works is not set up
 */
export async function getWorks(actor: Actor | undefined): Promise<WorksFacts> {
  permit(actor, 'settings.read')
  const row = await getWorksRow(database().read)
  if (!row) {
    throw problem('not-ready', 'The works has no name and place yet.', {
      mend: 'An administrator gives them on the page that opens after signing in.',
    })
  }
  return worksFactsOf(row)
}
