import Link from 'next/link'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { ChoiceField } from '@/app/_ui/forms/ChoiceField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextAreaField } from '@/app/_ui/forms/TextField'
import { Table } from '@/app/_ui/tables/Table'
import { lotHref } from '@/lib/domain/charts/draw-notes'
import type { ImportView, SetAsideRow } from '@/lib/services/get-import'
import { decideRowsAction } from '../actions'

const valueOfRow = (row: SetAsideRow): string =>
  row.problems.map(({ details }) => String(details?.value ?? '')).find((value) => value !== '') ?? '–'

const fieldWords: Readonly<Record<string, string>> = {
  cutMass: 'cut mass',
  cutLength: 'cut length',
  weighedState: 'weighed',
}

/** Both values of each reading that differs: "d1a: 0.2540 mm stored, 0.2552 mm in the file". */
const differencesOf = (row: SetAsideRow): string =>
  row.problems
    .flatMap(({ details = {} }) =>
      Object.entries(details).flatMap(([key, stored]) => {
        const field = /^(.+)\.stored$/.exec(key)?.[1]
        if (field === undefined) return []
        const word = fieldWords[field] ?? field
        return [`${word}: ${stored} stored, ${details[`${field}.entered`]} in the file`]
      }),
    )
    .join('; ')

/** Rows that could not be taken: where, what, how to mend; and all of them as a file. */
export function RefusedRows({ view }: { readonly view: ImportView }) {
  if (view.refused === 0) return null
  return (
    <section className="section" aria-labelledby="import-refused">
      <h2 id="import-refused">
        Refused <small>{view.refused} rows</small>
      </h2>
      <p>
        Mend them in the file and send it again: what is stored already is passed over.{' '}
        <a href={`/api/v1/imports/${view.id}/refused`} download>
          Take the refused rows along (CSV)
        </a>
      </p>
      <Table
        caption="Refused rows with their reasons"
        dense
        rows={view.refusedRows}
        keyOf={(row) => row.id}
        columns={[
          { head: 'Line', number: true, cell: (row) => row.line },
          { head: 'Column', cell: (row) => row.problems.map(({ where }) => where ?? 'row').join(', ') },
          { head: 'Value', cell: (row) => <span className="import-value">{valueOfRow(row)}</span> },
          { head: 'What is wrong', cell: (row) => row.problems.map(({ message }) => message).join(' ') },
          { head: 'How to mend', cell: (row) => row.problems.map(({ mend }) => mend ?? '').join(' ') },
        ]}
      />
      {view.refused > view.refusedRows.length ? (
        <p className="small">The first {view.refusedRows.length} of them; the file has them all.</p>
      ) : null}
    </section>
  )
}

/** Rows whose readings are stored with other values: a person says which one is right, and why. */
export function DifferingRows({ view }: { readonly view: ImportView }) {
  if (view.differing === 0) return null
  const open = view.differingRows.filter((row) => row.state === 'open')
  const answered = view.differingRows.filter((row) => row.state !== 'open')
  return (
    <section className="section" aria-labelledby="import-differs">
      <h2 id="import-differs">
        Different from what is stored <small>{view.openDifferences} to choose</small>
      </h2>
      {open.length > 0 ? (
        <ActionForm action={decideRowsAction.bind(null, view.id)} label="Rows that differ">
          <ChoiceField
            name="row"
            legend="Rows"
            several
            choices={open.map((row) => ({
              value: String(row.id),
              label: `line ${row.line}: specimen ${row.specimen ?? '?'} of ${row.lotCode}`,
              note: differencesOf(row),
            }))}
          />
          {view.mayChoose ? (
            <>
              <ChoiceField
                name="choice"
                legend="Which value is right"
                choices={[
                  { value: 'kept-stored', label: 'The stored one stays', note: 'The file’s is left aside.' },
                  {
                    value: 'took-file',
                    label: 'The file’s takes its place',
                    note: 'As a correction: the older reading stays readable, decisions that rest on it are marked.',
                  },
                ]}
              />
              <TextAreaField name="reason" label="Why" maxLength={1000} />
              <div className="actions">
                <Submit>Answer the chosen rows</Submit>
              </div>
            </>
          ) : (
            <p className="small">Quality chooses between the two.</p>
          )}
        </ActionForm>
      ) : null}
      {answered.length > 0 ? (
        <Table
          caption="Rows that were answered"
          dense
          rows={answered}
          keyOf={(row) => row.id}
          columns={[
            { head: 'Line', number: true, cell: (row) => row.line },
            { head: 'Lot', cell: (row) => <Link href={lotHref(row.lotCode)}>{row.lotCode}</Link> },
            { head: 'Specimen', number: true, cell: (row) => row.specimen ?? '–' },
            {
              head: 'Choice',
              cell: (row) => (row.state === 'took-file' ? 'the file’s value' : 'the stored value'),
            },
            { head: 'Why', cell: (row) => row.reason },
            { head: 'By', cell: (row) => row.decidedBy ?? '–' },
          ]}
        />
      ) : null}
    </section>
  )
}
