import { ActionForm } from '@/app/_ui/forms/ActionForm'
import type { FormAction } from '@/app/_ui/forms/form-state'
import { type Option, SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextAreaField, TextField } from '@/app/_ui/forms/TextField'
import type { UnitId } from '@/lib/domain/units/unit'
import type { WorksFacts } from '@/lib/services/get-works'
import type { EquipmentList } from '@/lib/services/list-equipment'
import { CodeField } from './EquipmentForms'
import { entryIn } from './shown'

interface RigFormProps {
  readonly action: FormAction
  readonly works: WorksFacts
  readonly list: EquipmentList
  readonly rig?: EquipmentList['rigs'][number]
  readonly keeps: boolean
}

export function RigForm({ action, works, list, rig, keeps }: RigFormProps) {
  const decimal = works.numberFormat
  const typed = (si: number | undefined, unit: UnitId, otherwise = '') =>
    si === undefined ? otherwise : entryIn(si, unit, decimal)
  const gaugesOf = (kind: string): readonly Option[] =>
    list.gauges
      .filter((gauge) => gauge.kind === kind && gauge.active)
      .map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))
  const hangers = list.weights
    .filter(({ active, kind }) => active && (kind === 'hanger' || kind === 'hook'))
    .map(({ code, kind }) => ({ value: code, label: `${code}, ${kind}` }))
  return (
    <ActionForm action={action} label="Rig">
      <fieldset disabled={!keeps}>
        <legend>Rig</legend>
        <div className="fields">
          <CodeField row={rig} />
          <TextField name="name" label="Name" value={rig?.name} maxLength={80} />
          <SelectField
            name="arrangement"
            label="Arrangement"
            value={rig?.arrangement ?? 'vertical'}
            options={[
              { value: 'vertical', label: 'vertical: the load hangs straight below' },
              { value: 'horizontal', label: 'horizontal: over an edge or pulley' },
            ]}
          />
          <SelectField
            name="endCondition"
            label="Ends"
            value={rig?.endCondition ?? 'knife'}
            options={[
              { value: 'knife', label: 'knife edges' },
              { value: 'pinned', label: 'pinned: free to turn' },
              { value: 'clamped', label: 'clamped' },
            ]}
          />
        </div>
      </fieldset>
      <fieldset disabled={!keeps}>
        <legend>Measures</legend>
        <div className="fields">
          <NumberField
            name="span"
            label="Span"
            hint="From edge to edge."
            unit="mm"
            value={typed(rig?.spanMetres, 'mm')}
          />
          <NumberField
            name="uSpan"
            label="Standard uncertainty of the span"
            unit="mm"
            value={typed(rig?.uSpanMetres, 'mm', '0.1')}
          />
          <NumberField
            name="uEndRelative"
            label="Uncertainty of the end correction"
            hint="Standard, of the mass per metre, from two spacings. Empty: anything between pinned and clamped."
            unit="%"
            optional
            value={typed(rig?.uEndRelative, '%')}
          />
          <NumberField
            name="frictionHalfWidth"
            label="Friction at the edges"
            hint="At most this share of the tension, either way: from adding and lifting the load."
            unit="%"
            value={typed(rig?.frictionHalfWidth, '%', '0.05')}
          />
          <NumberField
            name="hangingLength"
            label="Length hanging below"
            unit="mm"
            value={typed(rig?.hangingLengthMetres, 'mm', '300')}
          />
        </div>
      </fieldset>
      <fieldset disabled={!keeps}>
        <legend>Usual set-up</legend>
        <div className="fields">
          <SelectField
            name="hangerCode"
            label="Hanger"
            none="none"
            optional
            value={rig?.hangerCode}
            options={hangers}
          />
          <TextField
            name="weightCodes"
            label="Weights"
            hint="Codes apart by spaces."
            optional
            plain
            value={rig?.weightCodes.join(' ')}
          />
          <SelectField
            name="micrometerCode"
            label="Micrometer"
            none="none"
            optional
            value={rig?.micrometerCode}
            options={gaugesOf('micrometer')}
          />
          <SelectField
            name="balanceCode"
            label="Balance"
            none="none"
            optional
            value={rig?.balanceCode}
            options={gaugesOf('balance')}
          />
          <SelectField
            name="ruleCode"
            label="Rule"
            none="none"
            optional
            value={rig?.ruleCode}
            options={gaugesOf('rule')}
          />
          <SelectField
            name="counterCode"
            label="Counter"
            none="none"
            optional
            value={rig?.counterCode}
            options={gaugesOf('counter')}
          />
          <TextAreaField name="note" label="Note" optional whole value={rig?.note} maxLength={500} />
        </div>
      </fieldset>
      {keeps ? (
        <div className="actions">
          <Submit>{rig ? `Save ${rig.code}` : 'Add this rig'}</Submit>
        </div>
      ) : (
        <p className="small">Quality keeps the equipment list.</p>
      )}
    </ActionForm>
  )
}
