import { dateFieldValue } from '@/app/_ui/format/dates'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import type { FormAction } from '@/app/_ui/forms/form-state'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextAreaField, TextField } from '@/app/_ui/forms/TextField'
import { type MaterialInKind, materialInKinds } from '@/lib/domain/record/material-in'
import { fromSi, type UnitId } from '@/lib/domain/units/unit'
import type { MaterialInView } from '@/lib/services/get-material-in'
import type { WorksFacts } from '@/lib/services/get-works'
import { kindNames } from './paths'

interface Named {
  readonly code: string
  readonly name: string
}

interface MaterialInFormProps {
  readonly action: FormAction
  readonly works: Pick<WorksFacts, 'numberFormat' | 'timeZone'>
  /** Undefined for a new one, which gets a code. */
  readonly row?: MaterialInView['row']
  /** For a new one: what was asked for. */
  readonly kind?: MaterialInKind
  readonly parentCode?: string
  /** Of the catalogue. */
  readonly materials: readonly Named[]
  readonly coils: readonly Named[]
}

/** The old one stays to choose, also when it was put away since. */
const withOld = (list: readonly Named[], old: Named | undefined): readonly Named[] =>
  old && !list.some(({ code }) => code === old.code) ? [...list, old] : list

const asOptions = (list: readonly Named[]) =>
  list.map(({ code, name }) => ({ value: code, label: `${code} · ${name}` }))

/** What is known of a coil, spool or resin batch. */
export function MaterialInForm(props: MaterialInFormProps) {
  const { action, works, row, materials, coils } = props
  const typed = (si: number | undefined, unit: UnitId): string => {
    if (si === undefined) return ''
    const text = String(Number(fromSi(si, unit).toPrecision(10)))
    return works.numberFormat === 'comma' ? text.replace('.', ',') : text
  }
  return (
    <ActionForm action={action} label={row ? row.code : 'What came in'}>
      <div className="fields">
        {row ? (
          <input type="hidden" name="version" value={row.version} />
        ) : (
          <TextField
            name="code"
            label="Code"
            hint="As on its label; it stays for good."
            maxLength={40}
            plain
          />
        )}
        <SelectField
          name="kind"
          label="Kind"
          value={row?.kind ?? props.kind ?? 'coil'}
          options={materialInKinds.map((kind) => ({ value: kind, label: kindNames[kind] }))}
        />
        <TextField name="name" label="Name" hint="What is written on it." value={row?.name} maxLength={80} />
        <SelectField
          name="materialCode"
          label="Material"
          hint="What it is said to be."
          optional
          none="not said"
          value={row?.material?.code}
          options={asOptions(withOld(materials, row?.material))}
        />
        <TextField
          name="heat"
          label="Heat"
          hint="The melt on the mill’s certificate, or the maker’s batch."
          optional
          plain
          value={row?.heat}
          maxLength={80}
        />
        <TextField name="supplier" label="Supplier" optional value={row?.supplier} maxLength={120} />
        <SelectField
          name="parentCode"
          label="Wound from"
          hint="For a spool: the coil."
          optional
          none="no coil"
          value={row?.parent?.code ?? props.parentCode}
          options={asOptions(withOld(coils, row?.parent))}
        />
        <TextField
          name="received"
          label="Came in"
          type="date"
          optional
          value={row?.receivedAt === undefined ? undefined : dateFieldValue(row.receivedAt, works.timeZone)}
        />
        <NumberField
          name="size"
          label="Size"
          hint="Diameter of the wire, in mm unless a unit follows."
          unit="mm"
          optional
          value={typed(row?.sizeMetres, 'mm')}
        />
        <NumberField name="length" label="Length" unit="m" optional value={typed(row?.lengthMetres, 'm')} />
        <NumberField name="mass" label="Mass" unit="kg" optional value={typed(row?.massKilograms, 'kg')} />
        <TextAreaField name="note" label="Note" optional whole value={row?.note} maxLength={500} />
      </div>
      <div className="actions">
        <Submit>{row ? `Save ${row.code}` : 'Add it'}</Submit>
      </div>
    </ActionForm>
  )
}
