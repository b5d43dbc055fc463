import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextField } from '@/app/_ui/forms/TextField'
import { Notice } from '@/app/_ui/shell/Notice'
import { offeredNames } from '@/lib/input/bench-file/columns'
import { delimiters, nameOf } from '@/lib/input/bench-file/layout'
import type { ImportPreview } from '@/lib/services/get-import'
import { importOptionsAction } from '../actions'
import { PreviewTable } from './PreviewTable'

interface Props {
  readonly id: number
  readonly version: number
  readonly preview: ImportPreview
}

interface Column {
  readonly header: string
  readonly index: number
  readonly name: string
}

const keep = [
  { value: 'as-note', label: 'kept as a note' },
  { value: 'leave-out', label: 'left out' },
]

/** How the file is read: signs, columns, and the first rows as they would go in. */
export function ImportDraft({ id, preview, version }: Props) {
  const { headers, mappings, options, problems } = preview
  const names = offeredNames(6)
  const all = headers.map((header, index) => ({
    header,
    index,
    name: nameOf(options.columns, header) ?? 'as-note',
  }))
  const isKnown = ({ header, name }: Column) => header.toLowerCase() === name
  const known = all.filter(isKnown)
  const foreign = all.filter((one) => !isKnown(one))
  const field = ({ header, index, name }: Column) => {
    const offered = names.includes(name) || keep.some((one) => one.value === name)
    return (
      <SelectField
        // Two columns may have one name; that is refused above, not by the page.
        key={`${index} ${header}`}
        name={`column:${header}`}
        label={header === '' ? `column ${index + 1}, without a name` : header}
        value={name}
        options={[
          ...(offered ? [] : [{ value: name, label: name }]),
          ...keep,
          ...names.map((one) => ({ value: one, label: one })),
        ]}
      />
    )
  }
  return (
    <ActionForm
      action={importOptionsAction.bind(null, id)}
      label="How the file is read"
      className="form import-draft"
    >
      <input type="hidden" name="version" value={version} />
      {problems.length > 0 ? (
        <Notice tone="alarm">
          {problems.map(({ mend, message }) => (
            <span className="import-problem" key={message}>
              {message} {mend}
            </span>
          ))}
        </Notice>
      ) : null}
      <div className="fields">
        <SelectField
          name="delimiter"
          label="Between cells"
          value={options.delimiter === '\t' ? 'tab' : options.delimiter}
          options={Object.entries(delimiters).map(([sign, label]) => ({
            value: sign === '\t' ? 'tab' : sign,
            label,
          }))}
        />
        <SelectField
          name="decimal"
          label="Decimal sign"
          value={options.decimal}
          options={[
            { value: 'point', label: 'point: 0.254' },
            { value: 'comma', label: 'comma: 0,254' },
          ]}
        />
        {mappings.length > 0 ? (
          <SelectField
            name="mapping"
            label="Columns as kept under"
            none="none"
            options={mappings.map((name) => ({ value: name, label: name }))}
          />
        ) : null}
      </div>
      <fieldset className="import-columns">
        <legend className="label">What each column is</legend>
        {foreign.length === 0 ? <p>Every column has a name that the bench file knows.</p> : null}
        {foreign.map((one) => field(one))}
      </fieldset>
      {known.length > 0 ? (
        <details className="import-known">
          <summary>
            {known.length === 1 ? '1 column is' : `${known.length} columns are`} read as named
          </summary>
          <div className="import-columns">{known.map((one) => field(one))}</div>
        </details>
      ) : null}
      <PreviewTable preview={preview} />
      <div className="fields">
        <TextField
          name="keepAs"
          label="Keep these columns under a name"
          hint="for files of the same kind; leave empty to keep nothing"
          maxLength={80}
        />
      </div>
      <div className="actions">
        <Submit name="then" value="start">
          Begin the import
        </Submit>
        <Submit name="then" value="look" tone="plain">
          Look again
        </Submit>
      </div>
    </ActionForm>
  )
}
