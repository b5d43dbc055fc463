import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextAreaField } from '@/app/_ui/forms/TextField'
import { type LotMaterialRole, lotMaterialRoles, lotMaterialWords } from '@/lib/domain/record/material-in'
import { MOST_MATERIAL_ROWS } from '@/lib/input/lot-materials-form'
import type { LotMaterialView } from '@/lib/services/get-lot'
import type { WorksFacts } from '@/lib/services/get-works'
import type { MaterialInChoice } from '@/lib/services/list-materials-in'
import { changeLotMaterialsAction } from '../materials-actions'

interface Props {
  readonly lotCode: string
  readonly lotVersion: number
  readonly decimal: WorksFacts['numberFormat']
  readonly materials: readonly LotMaterialView[]
  /** What is in use. */
  readonly choices: readonly MaterialInChoice[]
}

const BLANK_ROWS = 2

/** A row for each link, and blank ones for more; an emptied row takes its link away. */
export function LotMaterialsForm({ lotCode, lotVersion, decimal, materials, choices }: Props) {
  const rows = Array.from(
    { length: Math.min(materials.length + BLANK_ROWS, MOST_MATERIAL_ROWS) },
    (_, index) => ({ name: `material-${index + 1}`, number: index + 1, link: materials[index] }),
  )
  const named = materials.filter(({ code }) => !choices.some((choice) => choice.code === code))
  const options = [
    ...choices,
    ...named.filter((one, index) => named.findIndex((other) => other.code === one.code) === index),
  ].map(({ code, name, heat }) => ({
    value: code,
    label: `${code} · ${name}${heat ? `, heat ${heat}` : ''}`,
  }))
  const typed = (metres: number | undefined): string => {
    const text = metres === undefined ? '' : String(metres)
    return decimal === 'comma' ? text.replace('.', ',') : text
  }
  return (
    <ActionForm
      action={changeLotMaterialsAction.bind(null, lotCode)}
      label={`What ${lotCode} is made of`}
      className="form lot-materials-form"
    >
      <input type="hidden" name="lotVersion" value={lotVersion} />
      <p className="small">
        In the order along the lot; from and to where there was a splice. A row without a code counts for
        nothing.
      </p>
      {rows.map(({ name, number, link }) => (
        <fieldset key={name} className="lot-materials-row">
          <legend className="visually-hidden">Material {number}</legend>
          <SelectField
            name={`${name}.role`}
            label="As"
            value={link?.role ?? usualRole(materials)}
            options={lotMaterialRoles.map((role) => ({ value: role, label: lotMaterialWords[role] }))}
          />
          <SelectField
            name={`${name}.code`}
            label="Coil, spool or batch"
            optional
            none="none"
            value={link?.code}
            options={options}
          />
          <NumberField
            name={`${name}.fromMetre`}
            label="From"
            unit="m"
            optional
            value={typed(link?.fromMetre)}
          />
          <NumberField name={`${name}.toMetre`} label="To" unit="m" optional value={typed(link?.toMetre)} />
        </fieldset>
      ))}
      <TextAreaField
        name="reason"
        label="Why"
        hint="It goes into the ledger with what was said before."
        maxLength={500}
      />
      <div className="actions">
        <Submit>Keep what {lotCode} is made of</Submit>
      </div>
    </ActionForm>
  )
}

/** The next one is most often of the role of the last. */
const usualRole = (materials: readonly LotMaterialView[]): LotMaterialRole => materials.at(-1)?.role ?? 'core'
