import type { DatasheetBody } from '../datasheets/datasheet'
import { lengthInWords } from '../datasheets/datasheet-words'
import { WORKING_BOUNDS } from '../datasheets/working-state'
import { fromSi } from '../units/unit'
import type { LotMarksInput } from './lot-marks'
import type { TensionCurvesInput } from './tension-curves'

type Decimal = 'point' | 'comma'

/** At most so many lengths are drawn: the shortest, the longest and what lies evenly between. */
const MOST_CURVES = 4

const spread = <T>(all: readonly T[], most: number): readonly T[] =>
  all.length <= most
    ? all
    : Array.from(
        { length: most },
        (_, index) => all[Math.round((index * (all.length - 1)) / (most - 1))],
      ).filter((one): one is T => one !== undefined)

/** Tension against pitch from the table of a datasheet; undefined for fewer than two notes. */
export function datasheetCurves(body: DatasheetBody, decimal: Decimal): TensionCurvesInput | undefined {
  if (body.rows.length < 2) return undefined
  const show = (newtons: number): number => fromSi(newtons, body.forceUnit)
  const places = spread(
    body.lengths.map((length, index) => ({ length, index })).sort((a, b) => b.length - a.length),
    MOST_CURVES,
  )
  const breaking = body.breakingLoad && show(body.breakingLoad.value)
  return {
    unit: body.forceUnit,
    decimal,
    curves: places.map(({ length, index }) => ({
      label: lengthInWords(length, decimal),
      points: body.rows.flatMap(({ cells, midi }) => {
        const cell = cells[index]
        return cell ? [{ semitone: midi, tension: show(cell.tension) }] : []
      }),
    })),
    pitches: body.rows.map(({ midi, note }) => ({ semitone: midi, label: note })),
    ...(breaking === undefined
      ? {}
      : {
          breaking,
          working: {
            from: breaking * WORKING_BOUNDS.slack,
            to: breaking * WORKING_BOUNDS.working,
            upper: breaking * WORKING_BOUNDS.upper,
          },
        }),
  }
}

/** Every released lot on the rule of mass per metre, mg/m. */
export function datasheetLots(body: DatasheetBody, decimal: Decimal): LotMarksInput {
  const show = (value: number): number => fromSi(value, 'mg/m')
  return {
    unit: 'mg/m',
    decimals: 1,
    decimal,
    values: body.lots.map((lot) => show(lot.massPerMetre)),
    mean: show(body.massPerMetre.value),
    band: { from: show(body.spread.lowestLot), to: show(body.spread.highestLot) },
  }
}
