import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { ConfirmForm } from '@/app/_ui/forms/ConfirmForm'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { materialInWords } from '@/lib/domain/record/material-in'
import { getMaterialIn } from '@/lib/services/get-material-in'
import { getWorks } from '@/lib/services/get-works'
import { listMaterials } from '@/lib/services/list-materials'
import { listMaterialsInUse } from '@/lib/services/list-materials-in'
import { MadeOf } from '../_ui/MadeOf'
import { MaterialInFacts } from '../_ui/MaterialInFacts'
import { MaterialInForm } from '../_ui/MaterialInForm'
import { kindNames } from '../_ui/paths'
import { SpoolsWound } from '../_ui/SpoolsWound'
import { setMaterialInActiveAction, updateMaterialInAction } from '../actions'
import '../materials-in.css'

export const metadata: Metadata = { title: 'Coil, spool or batch' }

export default roomPage(async (actor, { params }) => {
  const works = await getWorks(actor)
  const view = await getMaterialIn(actor, params.code ?? '')
  const keeps = may(actor, 'materials-in.keep')
  const materials = keeps ? await listMaterials(actor) : []
  const coils = keeps ? (await listMaterialsInUse(actor)).filter(({ kind }) => kind === 'coil') : []
  const { row } = view
  const word = materialInWords[row.kind]
  return (
    <>
      <PageHead
        over={<Link href="/materials-in">Materials in</Link>}
        title={
          <>
            {row.code} <span>{row.name}</span>
          </>
        }
        under={row.active ? kindNames[row.kind] : `${kindNames[row.kind]}, put away`}
        actions={
          keeps ? (
            <>
              {row.kind === 'coil' && row.active ? (
                <Link
                  className="button"
                  href={`/materials-in/new?kind=spool&parentCode=${encodeURIComponent(row.code)}`}
                >
                  Add a spool wound from it
                </Link>
              ) : null}
              <ConfirmForm
                action={setMaterialInActiveAction.bind(null, row.code, row.version, !row.active)}
                label={row.active ? 'Put away' : 'Back into use'}
                title={
                  row.active ? `Put the ${word} ${row.code} away?` : `Use the ${word} ${row.code} again?`
                }
                confirm={row.active ? `Put ${row.code} away` : `Use ${row.code} again`}
                tone={row.active ? 'alarm' : 'primary'}
              >
                <p>
                  {row.active
                    ? 'It is offered no more where lots are opened. Lots made of it stay as they are.'
                    : 'It is offered again where lots are opened.'}
                </p>
              </ConfirmForm>
            </>
          ) : undefined
        }
      />
      {row.kind === 'coil' ? (
        <div className="columns even">
          <MaterialInFacts row={row} works={works} />
          <SpoolsWound spools={view.spools} works={works} />
        </div>
      ) : (
        <MaterialInFacts row={row} works={works} />
      )}
      <MadeOf view={view} works={works} maySeeDrift={may(actor, 'drift.read')} />
      {keeps ? (
        <section className="section">
          <details className="materials-in-change">
            <summary>Change what is known of it</summary>
            <MaterialInForm
              action={updateMaterialInAction.bind(null, row.code)}
              works={works}
              row={row}
              materials={materials}
              coils={coils}
            />
          </details>
        </section>
      ) : (
        <p className="small materials-in-change">Quality keeps the list of materials in.</p>
      )}
    </>
  )
})
