import type { Metadata } from 'next'
import { roomPage } from '@/app/_page'
import { may } from '@/lib/access/permit'
import { getDatasheet } from '@/lib/services/get-datasheet'
import { getWorks } from '@/lib/services/get-works'
import { PublishedDatasheet } from '../_ui/PublishedDatasheet'
import '@/app/_ui/charts/charts.css'
import '../datasheets.css'

export const metadata: Metadata = { title: 'Datasheet' }

/** The newest revision. */
export default roomPage(async (actor, { params }) => {
  const view = await getDatasheet(actor, params.code ?? '')
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
