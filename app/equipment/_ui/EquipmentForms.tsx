import { dateFieldValue } from '@/app/_ui/format/dates'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { NumberField, TextAreaField, TextField } from '@/app/_ui/forms/TextField'
import type { GaugeKind } from '@/lib/input/equipment'
import { machineKinds, weightKinds } from '@/lib/input/equipment'
import type { WorksFacts } from '@/lib/services/get-works'
import type { EquipmentList } from '@/lib/services/list-equipment'
import { entryIn, gaugeUnit } from './shown'

type Row<Kind extends keyof EquipmentList> = EquipmentList[Kind][number]

interface FieldsProps<Kind extends keyof EquipmentList> {
  readonly works: WorksFacts
  /** Undefined for a new one, which gets a code. */
  readonly row: Row<Kind> | undefined
}

/** The code of a new piece of equipment, or the version of an old one. */
export function CodeField({ row }: { readonly row: { readonly version: number } | undefined }) {
  return row ? (
    <input type="hidden" name="version" value={row.version} />
  ) : (
    <TextField name="code" label="Code" hint="As on its label; it stays for good." maxLength={20} plain />
  )
}

const same = (texts: readonly string[]) => texts.map((text) => ({ value: text, label: text }))

export function GaugeFields({ works, row, kind }: FieldsProps<'gauges'> & { readonly kind: GaugeKind }) {
  const { numberFormat: decimal, timeZone } = works
  const unit = gaugeUnit(kind)
  const typed = (si: number | undefined) => (si === undefined ? '' : entryIn(si, unit, decimal))
  return (
    <div className="fields">
      <CodeField row={row} />
      <input type="hidden" name="kind" value={kind} />
      <TextField name="name" label="Name" value={row?.name} maxLength={80} />
      <NumberField
        name="resolution"
        label="Resolution"
        hint="One step of its display."
        unit={unit}
        value={typed(row?.resolution)}
      />
      <NumberField
        name="uAbsolute"
        label="Standard uncertainty"
        hint="k = 1, from its calibration: half of an expanded one."
        unit={unit}
        value={typed(row?.uAbsolute)}
      />
      <NumberField
        name="uRelative"
        label="Part in proportion"
        hint="Standard, of the reading."
        unit="%"
        optional
        value={row && row.uRelative !== 0 ? entryIn(row.uRelative, '%', decimal) : ''}
      />
      <NumberField
        name="error"
        label="Known error"
        hint="Shown − true; it is taken off every reading."
        unit={unit}
        optional
        value={row && row.error !== 0 ? typed(row.error) : ''}
      />
      <SelectField
        name="mode"
        label="Way of reading"
        value={row?.mode ?? 'direct'}
        options={[
          { value: 'direct', label: 'direct' },
          { value: 'against-pin', label: 'against a pin or setting gauge' },
        ]}
      />
      <TextField
        name="calibrationDue"
        label="Calibration due"
        hint="Good to the end of that day."
        type="date"
        optional
        value={
          row?.calibrationDueAt === undefined ? undefined : dateFieldValue(row.calibrationDueAt, timeZone)
        }
      />
      <TextAreaField name="note" label="Note" optional whole value={row?.note} maxLength={500} />
    </div>
  )
}

export function WeightFields({ works: { numberFormat: decimal }, row }: FieldsProps<'weights'>) {
  return (
    <div className="fields">
      <CodeField row={row} />
      <SelectField name="kind" label="Kind" value={row?.kind ?? 'slot'} options={same(weightKinds)} />
      <NumberField
        name="conventionalMass"
        label="Conventional mass"
        hint="As a certificate or a balance gives it."
        unit="kg"
        value={row ? entryIn(row.conventionalMass, 'kg', decimal) : ''}
      />
      <NumberField
        name="uMass"
        label="Standard uncertainty"
        hint="k = 1: half of an expanded one."
        unit="mg"
        value={row ? entryIn(row.uMass, 'mg', decimal) : ''}
      />
      <TextAreaField name="note" label="Note" optional whole value={row?.note} maxLength={500} />
    </div>
  )
}

export function MachineFields({ row }: FieldsProps<'machines'>) {
  return (
    <div className="fields">
      <CodeField row={row} />
      <TextField name="name" label="Name" value={row?.name} maxLength={80} />
      <SelectField name="kind" label="Kind" value={row?.kind} options={same(machineKinds)} />
    </div>
  )
}

export function DieFields({ works: { numberFormat: decimal, units }, row }: FieldsProps<'dies'>) {
  return (
    <div className="fields">
      <CodeField row={row} />
      <TextField name="name" label="Name" value={row?.name} maxLength={80} />
      <NumberField
        name="size"
        label="Bore"
        hint="As the maker of the die marks it, in mm unless a unit follows."
        unit="mm"
        value={row ? entryIn(row.sizeMetres, 'mm', decimal) : ''}
      />
      <p className="small whole">Diameters are shown in {units.diameter} elsewhere.</p>
    </div>
  )
}
