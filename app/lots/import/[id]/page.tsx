import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDateTime } from '@/app/_ui/format/dates'
import { ConfirmForm } from '@/app/_ui/forms/ConfirmForm'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { importIdOf } from '@/lib/input/import'
import { getImport, type ImportView } from '@/lib/services/get-import'
import { getWorks } from '@/lib/services/get-works'
import { ImportDraft } from '../_ui/ImportDraft'
import { ImportWatch } from '../_ui/ImportWatch'
import { importStateWords } from '../_ui/import-words'
import { DifferingRows, RefusedRows } from '../_ui/SetAside'
import { cancelImportAction } from '../actions'
import '../import.css'

export const metadata: Metadata = { title: 'Import of a file' }

/** One import from the preview to what became of its rows. */
export default roomPage(async (actor, { params }) => {
  const view = await getImport(actor, importIdOf(params.id))
  const { timeZone } = await getWorks(actor)
  const goesOn = view.state === 'queued' || view.state === 'running'
  return (
    <>
      <PageHead
        over={<Link href="/lots/import">Import</Link>}
        title={
          <>
            {view.fileName} <span>{importStateWords[view.state]}</span>
          </>
        }
        under={[
          `sent ${formatDateTime(view.createdAt, timeZone)}${view.by ? ` by ${view.by}` : ''}`,
          `SHA-256 ${view.sha256.slice(0, 12)}…`,
          ...(view.endedAt === undefined ? [] : [`ended ${formatDateTime(view.endedAt, timeZone)}`]),
        ].join(' · ')}
        actions={
          view.mayRun && (goesOn || view.state === 'draft') ? (
            <ConfirmForm
              action={cancelImportAction.bind(null, view.id)}
              label={goesOn ? 'End it' : 'Put it away'}
              title={goesOn ? 'End this import?' : 'Put this file away?'}
              confirm={goesOn ? 'End it' : 'Put it away'}
            >
              <p>
                {goesOn
                  ? `${view.stored} specimens are in and stay in. The rest of the file can be imported later: what is in is passed over then.`
                  : 'Nothing of it was imported.'}
              </p>
            </ConfirmForm>
          ) : undefined
        }
      />
      {view.earlier.length > 0 ? (
        <Notice>
          This very file was sent before:{' '}
          {view.earlier.map((one, index) => (
            <span key={one.id}>
              {index > 0 ? ', ' : null}
              <Link href={`/lots/import/${one.id}`}>{formatDateTime(one.createdAt, timeZone)}</Link>
            </span>
          ))}
          . Rows that are in already are passed over.
        </Notice>
      ) : null}
      {view.message ? <Notice tone="alarm">{view.message}</Notice> : null}
      {view.preview && view.mayRun ? (
        <ImportDraft id={view.id} version={view.version} preview={view.preview} />
      ) : null}
      {goesOn ? (
        <ImportWatch
          id={view.id}
          first={{
            state: view.state,
            rowsDone: view.rowsDone,
            ...(view.rowCount === undefined ? {} : { rowCount: view.rowCount }),
            ...(view.rowsPerSecond === undefined ? {} : { rowsPerSecond: view.rowsPerSecond }),
          }}
        />
      ) : null}
      {view.state === 'draft' || view.state === 'queued' ? null : <Figures view={view} />}
      <DifferingRows view={view} />
      <RefusedRows view={view} />
    </>
  )
})

function Figures({ view }: { readonly view: ImportView }) {
  const figures: readonly (readonly [string, number, string?])[] = [
    ['rows dealt with', view.rowsDone],
    ['specimens stored', view.stored],
    ['lots opened', view.lotsOpened],
    ['already there', view.alreadyThere],
    ['different from what is stored', view.differing, 'brass'],
    ['refused', view.refused, 'vermilion'],
  ]
  return (
    <dl className="import-figures">
      {figures.map(([name, count, tone]) => (
        <div key={name} data-none={count === 0 || undefined}>
          <dt>{name}</dt>
          <dd className={count > 0 ? tone : undefined}>{count}</dd>
        </div>
      ))}
    </dl>
  )
}
