import type { Metadata } from 'next'
import { roomPage } from '@/app/_page'
import { formatLongDate } from '@/app/_ui/format/dates'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { getToday } from '@/lib/services/get-today'
import { getWorks } from '@/lib/services/get-works'
import { DayFigures } from './_ui/DayFigures'
import { NothingWaits } from './_ui/NothingWaits'
import { WaitingBand } from './_ui/WaitingBand'
import './today.css'

export const metadata: Metadata = { title: 'Today' }

/** What waits for the person, in order of consequence. */
export default roomPage(async (actor) => {
  const at = Date.now()
  const works = await getWorks(actor)
  const { bands, figures, headline } = await getToday(actor, at)
  return (
    <>
      <PageHead over={formatLongDate(at, works.timeZone)} title={headline} />
      <div className="columns">
        <div>
          {bands.length === 0 ? (
            <NothingWaits actor={actor} />
          ) : (
            bands.map((band) => <WaitingBand key={band.urgency} {...band} />)
          )}
        </div>
        <aside>{figures ? <DayFigures {...figures} /> : null}</aside>
      </div>
    </>
  )
})
