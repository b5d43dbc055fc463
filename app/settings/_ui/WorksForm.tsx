import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextField } from '@/app/_ui/forms/TextField'
import { fromSi, type UnitId } from '@/lib/domain/units/unit'
import { diameterUnits, forceUnits, lengthUnits, massUnits } from '@/lib/input/works'
import type { WorksFacts } from '@/lib/services/get-works'
import { updateWorksAction } from '../actions'
import { TimeZoneField } from './TimeZoneField'
import { numberFormatOptions, unitOptions } from './works-words'

/** As it was typed once: no more digits than the number has. */
const entry = (si: number, unit: UnitId, decimal: WorksFacts['numberFormat']): string => {
  const text = String(Number(fromSi(si, unit).toPrecision(12)))
  return decimal === 'comma' ? text.replace('.', ',') : text
}

export function WorksForm({ works }: { readonly works: WorksFacts }) {
  const { numberFormat, gravity, air, units } = works
  const shown = (si: number, unit: UnitId) => entry(si, unit, numberFormat)
  const plain = (value: number) =>
    numberFormat === 'comma' ? String(value).replace('.', ',') : String(value)
  return (
    <ActionForm action={updateWorksAction} label="The works">
      <input type="hidden" name="version" value={works.version} />
      <fieldset>
        <legend>Place</legend>
        <div className="fields">
          <TextField name="name" label="Name" value={works.name} maxLength={120} />
          <TextField name="place" label="Place" value={works.place} optional maxLength={120} />
          <TimeZoneField value={works.timeZone} zones={Intl.supportedValuesOf('timeZone')} />
          <NumberField
            name="latitudeDegrees"
            label="Latitude"
            hint="Degrees, south negative."
            unit="°"
            value={plain(works.latitudeDegrees)}
          />
          <NumberField
            name="heightMetres"
            label="Height above sea level"
            unit="m"
            value={shown(works.heightMetres, 'm')}
          />
          <NumberField
            name="gravityTyped"
            label="Local gravity"
            optional
            hint="A published local value is better than the formula’s."
            unit="m/s²"
            value={gravity.typed ? shown(gravity.value, 'm/s²') : ''}
          />
        </div>
      </fieldset>
      <fieldset>
        <legend>The usual room</legend>
        <p className="hint slate">Used where a sheet says nothing of its own.</p>
        <div className="fields">
          <NumberField
            name="airTemperatureCelsius"
            label="Temperature"
            unit="°C"
            value={shown(air.celsius, '°C')}
          />
          <NumberField
            name="airPressurePascals"
            label="Air pressure"
            unit="hPa"
            value={shown(air.pascals, 'hPa')}
          />
          <NumberField name="airHumidity" label="Humidity" unit="%" value={shown(air.humidity, '%')} />
        </div>
      </fieldset>
      <fieldset>
        <legend>Numbers and units</legend>
        <div className="fields">
          <SelectField
            name="lengthUnit"
            label="Lengths"
            options={unitOptions(lengthUnits)}
            value={units.length}
          />
          <SelectField
            name="diameterUnit"
            label="Diameters"
            options={unitOptions(diameterUnits)}
            value={units.diameter}
          />
          <SelectField
            name="forceUnit"
            label="Forces"
            options={unitOptions(forceUnits)}
            value={units.force}
          />
          <SelectField name="massUnit" label="Masses" options={unitOptions(massUnits)} value={units.mass} />
          <SelectField
            name="numberFormat"
            label="Decimal sign shown"
            options={numberFormatOptions}
            value={numberFormat}
          />
          <NumberField name="a4" label="Concert A" unit="Hz" value={shown(works.a4, 'Hz')} />
        </div>
      </fieldset>
      <div className="actions">
        <Submit>Save the works</Submit>
      </div>
    </ActionForm>
  )
}
