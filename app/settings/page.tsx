import type { Metadata } from 'next'
import { roomPage } from '@/app/_page'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { formatNumber, formatQuantity } from '@/lib/domain/units/format'
import { getWorks, type WorksFacts } from '@/lib/services/get-works'
import { GravityFacts } from './_ui/GravityFacts'
import { SettingsTabs } from './_ui/SettingsTabs'
import { WorksForm } from './_ui/WorksForm'

export const metadata: Metadata = { title: 'Settings' }

export default roomPage(async (actor, { query }) => {
  const works = await getWorks(actor)
  const keeps = may(actor, 'settings.keep')
  return (
    <>
      <PageHead
        title="Settings"
        under={works.demo ? `${works.name}: a demo, all of it invented.` : works.name}
      />
      <SettingsTabs current="/settings" />
      {query.saved === 'yes' ? <Notice tone="good">The works is saved.</Notice> : null}
      <div className="columns">
        {keeps ? <WorksForm key={works.version} works={works} /> : <WorksReadOnly works={works} />}
        <aside>
          <GravityFacts works={works} />
        </aside>
      </div>
    </>
  )
})

function WorksReadOnly({ works }: { readonly works: WorksFacts }) {
  const { numberFormat: decimal, air, units } = works
  return (
    <section className="section">
      <h2>The works</h2>
      <dl className="facts">
        <dt>Name</dt>
        <dd>{works.name}</dd>
        <dt>Place</dt>
        <dd>{works.place || '–'}</dd>
        <dt>Time zone</dt>
        <dd>{works.timeZone}</dd>
        <dt>Latitude, height</dt>
        <dd>
          {formatNumber(works.latitudeDegrees, { decimals: 2, decimal })}°,{' '}
          {formatQuantity(works.heightMetres, 'm', { decimals: 0, decimal, withUnit: true })}
        </dd>
        <dt>Usual room</dt>
        <dd>
          {formatQuantity(air.celsius, '°C', { decimal, withUnit: true })},{' '}
          {formatQuantity(air.pascals, 'hPa', { decimal, withUnit: true })},{' '}
          {formatQuantity(air.humidity, '%', { decimals: 0, decimal, withUnit: true })}
        </dd>
        <dt>Units</dt>
        <dd>
          lengths {units.length}, diameters {units.diameter}, forces {units.force}, masses {units.mass}
        </dd>
        <dt>Concert A</dt>
        <dd>{formatQuantity(works.a4, 'Hz', { decimal, withUnit: true })}</dd>
      </dl>
      <p className="small">An administrator changes these.</p>
    </section>
  )
}
