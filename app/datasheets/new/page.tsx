import type { Metadata } from 'next'
import { roomPage } from '@/app/_page'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { Submit } from '@/app/_ui/forms/Submit'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { LedgerlineError, type Problem } from '@/lib/domain/errors'
import { buildDatasheetSchema } from '@/lib/input/datasheet'
import { parseInput } from '@/lib/input/parse-input'
import { buildDatasheet, type DatasheetPreview } from '@/lib/services/build-datasheet'
import { getWorks } from '@/lib/services/get-works'
import { listProducts } from '@/lib/services/list-products'
import { DatasheetPaper } from '../_ui/DatasheetPaper'
import { publishDatasheetAction } from '../actions'
import '@/app/_ui/charts/charts.css'
import '../datasheets.css'

export const metadata: Metadata = { title: 'Build a datasheet' }

const start = {
  notes: 'B3–B4',
  lengths: '610 628 648 660',
  basis: 'unloaded-mass',
} as const

/** The form sends by GET: the address holds what was asked for, and can be kept or sent on. */
export default roomPage(async (actor, { query }) => {
  const works = await getWorks(actor)
  const products = await listProducts(actor)
  if (products.length === 0)
    return (
      <>
        <PageHead over="Datasheets" title="Build a datasheet" />
        <EmptyState title="There is no product yet.">
          Quality adds products in the Catalogue; a datasheet is built from the released lots of one.
        </EmptyState>
      </>
    )
  const asked = {
    productCode: query.productCode ?? products[0]?.code ?? '',
    notes: query.notes ?? start.notes,
    lengths: query.lengths ?? start.lengths,
    a4: query.a4 ?? String(works.a4),
    basis: query.basis ?? start.basis,
    forceUnit: query.forceUnit ?? works.units.force,
  }
  const parsed = parseInput(buildDatasheetSchema, asked)
  let preview: DatasheetPreview | undefined
  let problems: readonly Problem[] = parsed.ok ? [] : parsed.problems
  if (parsed.ok) {
    try {
      preview = await buildDatasheet(actor, parsed.value)
    } catch (error) {
      if (!(error instanceof LedgerlineError) || error.problem.code === 'not-permitted') throw error
      problems = [error.problem]
    }
  }
  const field = (name: keyof typeof asked, label: string, hint?: string) => (
    <div className="field">
      <label htmlFor={`ask-${name}`}>{label}</label>
      <input
        id={`ask-${name}`}
        name={name}
        className="input"
        defaultValue={asked[name]}
        autoComplete="off"
        aria-describedby={hint ? `ask-${name}-hint` : undefined}
      />
      {hint ? (
        <p className="hint" id={`ask-${name}-hint`}>
          {hint}
        </p>
      ) : null}
    </div>
  )
  const choice = (
    name: keyof typeof asked,
    label: string,
    options: readonly { readonly value: string; readonly label: string }[],
  ) => (
    <div className="field">
      <label htmlFor={`ask-${name}`}>{label}</label>
      <select id={`ask-${name}`} name={name} className="input" defaultValue={asked[name]}>
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </div>
  )
  return (
    <>
      <PageHead
        over="Datasheets"
        title="Build a datasheet"
        under="From the lots that are released now. Nothing is published before you say so."
      />
      <div className="datasheet-desk">
        <div>
          {problems.map((one) => (
            <Notice key={one.message} tone="alarm">
              {one.message} {one.mend}
            </Notice>
          ))}
          {preview ? (
            <DatasheetPaper body={preview.body} decimal={works.numberFormat} timeZone={works.timeZone} />
          ) : null}
        </div>
        <aside>
          <form method="get" className="form" aria-label="What the table shows">
            {choice(
              'productCode',
              'Product',
              products.map(({ code, name }) => ({ value: code, label: name })),
            )}
            {field('notes', 'Notes', 'E4 F#4 G4, or a range such as B3–B4')}
            {field('lengths', 'Lengths', 'Millimetres, or 25.5 in; apart by spaces')}
            {field('a4', 'A4', 'Hz')}
            {choice('basis', 'Basis', [
              { value: 'unloaded-mass', label: 'unloaded mass, stretch solved' },
              { value: 'loaded-mass', label: 'loaded mass' },
              { value: 'plain-formula', label: 'plain formula, for comparison' },
            ])}
            {choice('forceUnit', 'Unit', [
              { value: 'N', label: 'newtons' },
              { value: 'kgf', label: 'kilograms-force' },
              { value: 'lbf', label: 'pounds-force' },
            ])}
            <div className="actions">
              <button type="submit" className="button">
                Show the table
              </button>
            </div>
          </form>
          {preview ? (
            <section className="section">
              <h2>Publish</h2>
              <p>
                {preview.newest
                  ? `Revision ${preview.newest.number + 1} of ${preview.datasheet?.code}: ${preview.changes.join(', ')}.`
                  : 'The first revision of this product.'}{' '}
                It rests on {preview.body.spread.lots} released{' '}
                {preview.body.spread.lots === 1 ? 'lot' : 'lots'} and can’t be changed afterwards.
              </p>
              <ActionForm action={publishDatasheetAction} label="Publish">
                {Object.entries(asked).map(([name, value]) => (
                  <input key={name} type="hidden" name={name} value={value} />
                ))}
                <input type="hidden" name="supersedes" value={preview.newest?.number ?? 0} />
                <Submit>Publish revision {(preview.newest?.number ?? 0) + 1}</Submit>
              </ActionForm>
            </section>
          ) : null}
        </aside>
      </div>
    </>
  )
})
