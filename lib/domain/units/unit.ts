/**
 * Units by dimension, with exact factors. The id of a unit is its symbol as a person reads it; other
 * spellings that a keyboard gives are understood by `findUnit`. Conversion is
 * si = (value − zero) · multiply / divide, with whole numbers as factors, so that 254 µm and 0.254 mm meet
 * within one rounding. The base of temperature is the degree Celsius (brand `DegreesCelsius`).
 *
 * Sources of the factors: inch, pound: international yard and pound agreement (1959), exact; kilogram-force:
 * standard gravity 9.80665 m/s² (3rd CGPM, 1901), exact; temperatures: ITS-90, exact by definition.
 */
export const dimensions = [
  'length',
  'mass',
  'massPerLength',
  'force',
  'frequency',
  'temperature',
  'pressure',
  'density',
  'time',
  'ratio',
  'fraction',
  'cents',
  'acceleration',
  'speed',
  'expansion',
] as const

export type Dimension = (typeof dimensions)[number]

interface UnitRow {
  readonly dimension: Dimension
  readonly name: string
  readonly multiply: number
  readonly divide: number
  /** What the unit shows at zero of the base unit; only temperatures have one. */
  readonly zero: number
  /** Decimals of a plain display, where no uncertainty says better. */
  readonly decimals: number
  readonly spellings: readonly string[]
}

const row = (
  dimension: Dimension,
  name: string,
  multiply: number,
  divide: number,
  decimals: number,
  spellings: readonly string[] = [],
  zero = 0,
): UnitRow => ({ dimension, name, multiply, divide, zero, decimals, spellings })

const table = {
  m: row('length', 'metre', 1, 1, 4),
  mm: row('length', 'millimetre', 1, 1e3, 4),
  µm: row('length', 'micrometre', 1, 1e6, 1, ['um', 'μm']),
  in: row('length', 'inch', 254, 1e4, 5, ['"', '″', 'inch', 'inches']),
  thou: row('length', 'thousandth of an inch', 254, 1e7, 2, ['mil', 'mils']),
  ft: row('length', 'foot', 3048, 1e4, 3),
  kg: row('mass', 'kilogram', 1, 1, 4),
  g: row('mass', 'gram', 1, 1e3, 4),
  mg: row('mass', 'milligram', 1, 1e6, 1),
  lb: row('mass', 'pound', 45359237, 1e8, 4, ['lbs']),
  oz: row('mass', 'ounce', 45359237, 16e8, 4),
  'kg/m': row('massPerLength', 'kilogram per metre', 1, 1, 7),
  'g/m': row('massPerLength', 'gram per metre', 1, 1e3, 4),
  'mg/m': row('massPerLength', 'milligram per metre', 1, 1e6, 1),
  N: row('force', 'newton', 1, 1, 2, ['n']),
  kgf: row('force', 'kilogram-force', 980665, 1e5, 3, ['kp']),
  lbf: row('force', 'pound-force', 44482216152605, 1e13, 2),
  Hz: row('frequency', 'hertz', 1, 1, 2, ['hz']),
  '°C': row('temperature', 'degree Celsius', 1, 1, 1, ['C', 'c', 'degC', 'ºC']),
  '°F': row('temperature', 'degree Fahrenheit', 5, 9, 1, ['F', 'f', 'degF', 'ºF'], 32),
  K: row('temperature', 'kelvin', 1, 1, 2, ['k'], 273.15),
  Pa: row('pressure', 'pascal', 1, 1, 0, ['pa']),
  hPa: row('pressure', 'hectopascal', 100, 1, 1, ['hpa', 'mbar']),
  MPa: row('pressure', 'megapascal', 1e6, 1, 0),
  GPa: row('pressure', 'gigapascal', 1e9, 1, 1),
  'kg/m³': row('density', 'kilogram per cubic metre', 1, 1, 0, ['kg/m3']),
  'g/cm³': row('density', 'gram per cubic centimetre', 1e3, 1, 3, ['g/cm3']),
  s: row('time', 'second', 1, 1, 3),
  ms: row('time', 'millisecond', 1, 1e3, 1),
  /** A natural logarithm of a ratio times 100, or a fraction times 100: for small ones the same thing. */
  '%': row('ratio', 'per cent', 1, 100, 2),
  ln: row('ratio', 'natural logarithm of the ratio', 1, 1, 5),
  cents: row('cents', 'cent', 1, 1, 1, ['cent', 'ct', 'c']),
  'm/s²': row('acceleration', 'metre per second squared', 1, 1, 5, ['m/s2']),
  'm/s': row('speed', 'metre per second', 1, 1, 1),
  '1/K': row('expansion', 'per kelvin', 1, 1, 7),
  'µm/(m·K)': row('expansion', 'micrometre per metre and kelvin', 1, 1e6, 1, ['ppm/K', 'um/mK']),
} as const satisfies Record<string, UnitRow>

export type UnitId = keyof typeof table

export interface Unit extends UnitRow {
  readonly id: UnitId
}

const units: ReadonlyMap<string, Unit> = new Map(
  (Object.keys(table) as UnitId[]).map((id) => [id, { ...table[id], id }]),
)

export const isUnit = (text: string): text is UnitId => units.has(text)

/** The row of a unit. Throws a RangeError for a text that is no unit. */
export function unit(id: string): Unit {
  const found = units.get(id)
  if (!found) throw new RangeError(`“${id}” is not a unit`)
  return found
}

/** Per cent measures both logarithms of ratios and plain fractions (humidity). */
const measures = (row: Unit, dimension: Dimension): boolean =>
  row.dimension === dimension || (row.id === '%' && dimension === 'fraction')

/** The units of a dimension, base unit first where there is one, in the order of the table. */
export const unitsOf = (dimension: Dimension): readonly UnitId[] =>
  [...units.values()].filter((row) => measures(row, dimension)).map((row) => row.id)

/** The unit of a dimension that a person means by this text, or undefined. */
export const findUnit = (dimension: Dimension, text: string): UnitId | undefined =>
  [...units.values()].find(
    (row) => measures(row, dimension) && (row.id === text || row.spellings.includes(text)),
  )?.id

const finite = (value: number, id: string): number => {
  if (!Number.isFinite(value)) throw new RangeError(`${value} ${id} is not a finite number`)
  return value
}

/** A value in `id` as SI (temperature: °C). Throws a RangeError for an unknown unit or a non-finite value. */
export function toSi(value: number, id: string): number {
  const { multiply, divide, zero } = unit(id)
  return ((finite(value, id) - zero) * multiply) / divide
}

/** An SI value (temperature: °C) in `id`. Throws a RangeError for an unknown unit or a non-finite value. */
export function fromSi(si: number, id: string): number {
  const { multiply, divide, zero } = unit(id)
  return (finite(si, id) * divide) / multiply + zero
}

/** A difference, tolerance or uncertainty in `id` as SI: without the unit's zero. */
export function differenceToSi(value: number, id: string): number {
  const { multiply, divide } = unit(id)
  return (finite(value, id) * multiply) / divide
}

/** An SI difference, tolerance or uncertainty in `id`: without the unit's zero. */
export function differenceFromSi(si: number, id: string): number {
  const { multiply, divide } = unit(id)
  return (finite(si, id) * divide) / multiply
}
