import { ActionForm } from '@/app/_ui/forms/ActionForm'
import type { FormAction } from '@/app/_ui/forms/form-state'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextField } from '@/app/_ui/forms/TextField'
import type { Ranged } from '@/lib/domain/strings/material'
import { fromSi, type UnitId } from '@/lib/domain/units/unit'
import { materialKinds } from '@/lib/input/catalogue'
import type { WorksFacts } from '@/lib/services/get-works'
import type { MaterialFacts } from '@/lib/services/list-materials'
import { entryOf } from './shown'

interface RangedFieldsProps {
  readonly name: string
  readonly label: string
  readonly unit: UnitId
  readonly range: Ranged<number> | undefined
  readonly decimal: WorksFacts['numberFormat']
  readonly optional?: boolean
}

/** Value, low and high of one property. */
function RangedFields({ name, label, unit, range, decimal, optional }: RangedFieldsProps) {
  const text = (value: number | undefined) =>
    value === undefined ? '' : entryOf(fromSi(value, unit), decimal)
  return (
    <>
      <NumberField name={name} label={label} unit={unit} value={text(range?.value)} optional={optional} />
      <NumberField name={`${name}Low`} label="Low" unit={unit} value={text(range?.low)} optional={optional} />
      <NumberField
        name={`${name}High`}
        label="High"
        unit={unit}
        value={text(range?.high)}
        optional={optional}
      />
    </>
  )
}

interface MaterialFormProps {
  readonly action: FormAction
  readonly decimal: WorksFacts['numberFormat']
  /** Undefined for a new one. */
  readonly material?: MaterialFacts
}

export function MaterialForm({ action, decimal, material }: MaterialFormProps) {
  const body = material?.body
  const megapascals = (value: number | undefined) =>
    value === undefined ? '' : entryOf(fromSi(value, 'MPa'), decimal)
  return (
    <ActionForm action={action} label="Material">
      {material ? <input type="hidden" name="version" value={material.version} /> : null}
      <fieldset>
        <legend>Name and standing</legend>
        <div className="fields">
          {material ? null : (
            <TextField name="code" label="Code" hint="It stays for good." maxLength={40} plain />
          )}
          <TextField name="name" label="Name" value={material?.name} maxLength={80} />
          <SelectField
            name="kind"
            label="Kind"
            value={body?.kind ?? 'metal'}
            options={materialKinds.map((kind) => ({ value: kind, label: kind }))}
          />
          <TextField
            name="standing"
            label="Standing"
            hint="How sure the values are: measured here, mill certificate, handbook, from memory."
            value={material?.standing}
            maxLength={200}
          />
          <TextField name="source" label="Source" optional whole value={material?.source} maxLength={300} />
        </div>
      </fieldset>
      <fieldset>
        <legend>Properties, each with the range met in practice</legend>
        <div className="fields thirds">
          <RangedFields name="density" label="Density" unit="kg/m³" range={body?.density} decimal={decimal} />
          <RangedFields
            name="modulus"
            label="Young’s modulus"
            unit="GPa"
            range={body?.youngsModulus}
            decimal={decimal}
          />
          <RangedFields
            name="expansion"
            label="Expansion"
            unit="µm/(m·K)"
            range={body?.thermalExpansion}
            decimal={decimal}
            optional
          />
          <NumberField
            name="poisson"
            label="Poisson’s ratio"
            value={body ? entryOf(body.poisson, decimal) : ''}
          />
          <NumberField
            name="strengthLow"
            label="Tensile strength, low"
            unit="MPa"
            value={megapascals(body?.tensileStrength?.low)}
            optional
          />
          <NumberField
            name="strengthHigh"
            label="Tensile strength, high"
            unit="MPa"
            value={megapascals(body?.tensileStrength?.high)}
            optional
          />
        </div>
      </fieldset>
      <div className="actions">
        <Submit>{material ? `Save ${material.name}` : 'Add this material'}</Submit>
        {material ? (
          <span className="small">Results and specifications already there keep what they rest on.</span>
        ) : null}
      </div>
    </ActionForm>
  )
}
