import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { may } from '@/lib/access/permit'
import { isFinal } from '@/lib/domain/record/lot-state'
import { signalHref } from '@/lib/domain/record/signal-href'
import { getLot } from '@/lib/services/get-lot'
import { listMaterialsInUse } from '@/lib/services/list-materials-in'
import { History } from '../_ui/History'
import { LotHead } from '../_ui/LotHead'
import { LotMaterials } from '../_ui/LotMaterials'
import { ResultsTable } from '../_ui/ResultsTable'
import { Specimens } from '../_ui/Specimens'
import '@/app/_ui/charts/charts.css'
import '../lots.css'

export const metadata: Metadata = { title: 'Lot' }

export default roomPage(async (actor, { params }) => {
  const view = await getLot(actor, params.code ?? '')
  const { assessment, lot, signals } = view
  const maySeeMaterials = may(actor, 'materials-in.read')
  const changes = may(actor, isFinal(lot.state) ? 'readings.supersede-any' : 'lots.open')
  const choices = maySeeMaterials && changes ? await listMaterialsInUse(actor) : undefined
  const open = signals.filter((one) => one.state === 'open')
  return (
    <>
      <LotHead
        view={view}
        tab="lot"
        mayMeasure={may(actor, 'readings.record') && !isFinal(lot.state)}
        maySeeDrift={may(actor, 'drift.read')}
      />
      <p className="lots-verdict">
        {assessment.proposal.headline}{' '}
        {open.length > 0 ? <span className="vermilion">The process has signalled.</span> : null}
      </p>
      {signals.length > 0 ? (
        <ul className="rows">
          {signals.map((signal) => (
            <li key={signal.id}>
              <Link href={signalHref({ ...signal, machineCode: signal.machine?.code })}>
                {signal.sentence}
              </Link>
              <em className={signal.state === 'open' ? 'vermilion' : 'slate'}>
                {signal.state === 'open'
                  ? 'open'
                  : signal.state === 'answered'
                    ? `answered: ${signal.cause}`
                    : 'no longer holds'}
              </em>
            </li>
          ))}
        </ul>
      ) : null}
      {view.specimens.length === 0 ? (
        <EmptyState title="Nothing measured yet.">
          The plan asks for {view.specification.body.plan.specimens} specimens; they are measured at the
          bench.
        </EmptyState>
      ) : (
        <>
          <section className="section">
            <h2>
              Results{' '}
              <small>note = lot mean ± U (k = 2), open notes = specimens, hatching = guard band</small>
            </h2>
            <ResultsTable view={view} />
          </section>
          <Specimens view={view} />
        </>
      )}
      <LotMaterials view={view} maySeeMaterials={maySeeMaterials} choices={choices} />
      <History view={view} />
    </>
  )
})
