import type { Metadata } from 'next'
import { roomPage } from '@/app/_page'
import { may } from '@/lib/access/permit'
import { problem } from '@/lib/domain/errors'
import { getDatasheet } from '@/lib/services/get-datasheet'
import { getWorks } from '@/lib/services/get-works'
import { PublishedDatasheet } from '../../_ui/PublishedDatasheet'
import '@/app/_ui/charts/charts.css'
import '../../datasheets.css'

export const metadata: Metadata = { title: 'Datasheet revision' }

/** One revision as it was published, whatever came later. */
export default roomPage(async (actor, { params }) => {
  const number = Number(params.revision)
  if (!Number.isInteger(number)) throw problem('not-found', 'Revisions have whole numbers.')
  const view = await getDatasheet(actor, params.code ?? '', number)
  const works = await getWorks(actor)
  return (
    <PublishedDatasheet
      view={view}
      decimal={works.numberFormat}
      timeZone={works.timeZone}
      mayOpenLots={may(actor, 'lots.read-released')}
    />
  )
})
