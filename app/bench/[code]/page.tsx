import type { Metadata } from 'next'
import { roomPage } from '@/app/_page'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { getBench } from '@/lib/services/get-bench'
import { BenchSheet } from '../_ui/BenchSheet'
import { benchViewOf } from '../_ui/bench-view-of'
import { ScanLot } from '../_ui/ScanLot'
import '@/app/_ui/charts/charts.css'
import '../bench.css'

export const metadata: Metadata = { title: 'Bench' }

/** The sheet of one lot. A decided lot shows what is stored and takes no more. */
export default roomPage(async (actor, { params }) => {
  const facts = await getBench(actor, params.code ?? '')
  const view = benchViewOf(facts, actor.personId, Date.now())
  return (
    <>
      <PageHead
        title={
          <>
            {view.lot.productName} <span>lot {view.lot.code}</span>
          </>
        }
        under={view.lot.line}
        actions={<ScanLot />}
      />
      <BenchSheet key={view.lot.code} view={view} />
    </>
  )
})
