import { ok, type Result, refused } from '@/lib/domain/result'
import { collect } from './collect'
import {
  checkField,
  choiceField,
  type FormFields,
  numberField,
  optionalQuantityField,
  quantityField,
  textField,
  versionField,
} from './form-fields'
import { plainText } from './plain-text'

/** What a works is founded with. */
export interface NewWorksInput {
  readonly name: string
  readonly place: string
  /** IANA. */
  readonly timeZone: string
  readonly latitudeDegrees: number
  readonly heightMetres: number
}

export interface WorksInput extends NewWorksInput {
  readonly version: number
  /** m/s²; without it gravity follows from latitude and height. */
  readonly gravityTyped: number | undefined
  readonly airTemperatureCelsius: number
  readonly airPressurePascals: number
  readonly airHumidity: number
  readonly lengthUnit: string
  readonly diameterUnit: string
  readonly forceUnit: string
  readonly massUnit: string
  readonly numberFormat: string
  readonly a4: number
  readonly secondPersonPublishes: boolean
}

/** Units that the works may show a quantity in. */
export const lengthUnits = ['mm', 'in'] as const
export const diameterUnits = ['mm', 'µm', 'thou', 'in'] as const
export const forceUnits = ['N', 'kgf', 'lbf'] as const
export const massUnits = ['mg', 'g'] as const
export const numberFormats = ['point', 'comma'] as const

const isTimeZone = (text: string): boolean => {
  try {
    // Offsets such as +01:00 are accepted by the engine, too, but know no summer time.
    return /^[A-Za-z]/.test(text) && new Intl.DateTimeFormat('en', { timeZone: text }) !== undefined
  } catch {
    return false
  }
}

const timeZoneField = (fields: FormFields): Result<string> => {
  const text = (fields.timeZone ?? '').trim()
  return isTimeZone(text)
    ? ok(text)
    : refused({
        code: 'bad-input',
        message: text === '' ? 'Time zone: nothing is chosen.' : `“${text}” is not a time zone.`,
        where: 'timeZone',
        mend: 'Give its name, such as Europe/Berlin or America/New_York.',
      })
}

const founding = (fields: FormFields) => ({
  name: textField(fields, 'name', plainText('Name of the works', { max: 120 })),
  place: textField(fields, 'place', plainText('Place', { min: 0, max: 120 })),
  timeZone: timeZoneField(fields),
  latitudeDegrees: numberField(fields, 'latitudeDegrees', { name: 'Latitude', min: -90, max: 90 }),
  heightMetres: quantityField(fields, 'heightMetres', {
    name: 'Height',
    dimension: 'length',
    unit: 'm',
    min: -430,
    max: 6000,
  }),
})

/** The form that founds a works. */
export const parseNewWorks = (fields: FormFields): Result<NewWorksInput> => collect(founding(fields))

/** The form in Settings. */
export const parseWorks = (fields: FormFields): Result<WorksInput> =>
  collect({
    ...founding(fields),
    version: versionField(fields),
    gravityTyped: optionalQuantityField(fields, 'gravityTyped', {
      name: 'Local gravity',
      dimension: 'acceleration',
      unit: 'm/s²',
      // From the equator on a high mountain to the poles.
      min: 9.76,
      max: 9.84,
    }),
    airTemperatureCelsius: quantityField(fields, 'airTemperatureCelsius', {
      name: 'Room temperature',
      dimension: 'temperature',
      unit: '°C',
      min: 5,
      max: 40,
    }),
    airPressurePascals: quantityField(fields, 'airPressurePascals', {
      name: 'Air pressure',
      dimension: 'pressure',
      unit: 'hPa',
      min: 50_000,
      max: 110_000,
    }),
    airHumidity: quantityField(fields, 'airHumidity', {
      name: 'Humidity',
      dimension: 'fraction',
      unit: '%',
      min: 0,
      max: 1,
    }),
    lengthUnit: choiceField(fields, 'lengthUnit', 'Lengths', lengthUnits),
    diameterUnit: choiceField(fields, 'diameterUnit', 'Diameters', diameterUnits),
    forceUnit: choiceField(fields, 'forceUnit', 'Forces', forceUnits),
    massUnit: choiceField(fields, 'massUnit', 'Masses', massUnits),
    numberFormat: choiceField(fields, 'numberFormat', 'Decimal sign', numberFormats),
    a4: quantityField(fields, 'a4', {
      name: 'Concert A',
      dimension: 'frequency',
      unit: 'Hz',
      min: 380,
      max: 480,
    }),
    secondPersonPublishes: checkField(fields, 'secondPersonPublishes'),
  })
