import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { requireActor } from '@/app/_session'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextField } from '@/app/_ui/forms/TextField'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Refused } from '@/app/_ui/shell/Refused'
import { Wordmark } from '@/app/_ui/shell/Wordmark'
import { TimeZoneField } from '@/app/settings/_ui/TimeZoneField'
import { may } from '@/lib/access/permit'
import { demoProgress } from '@/lib/services/load-demo-works'
import { isWorksMissing } from '@/lib/services/works-missing'
import { createWorksAction, loadDemoAction } from '../actions'
import { DemoProgress } from './DemoProgress'

export const metadata: Metadata = { title: 'Your works' }

export default async function SetUpWorksPage() {
  const actor = await requireActor()
  const demo = demoProgress()
  if (!(await isWorksMissing()) && demo.state !== 'running') redirect('/today')
  if (!may(actor, 'settings.keep')) {
    return (
      <main className="alone">
        <Refused
          problem={{
            code: 'not-ready',
            message: 'The works has no name and place yet.',
            mend: 'An administrator gives them after signing in.',
          }}
        />
      </main>
    )
  }
  return (
    <main className="alone wide">
      <p className="wordmark">
        <Wordmark />
      </p>
      {demo.state === 'running' ? (
        <DemoProgress line={demo.line} />
      ) : (
        <>
          <PageHead
            title="Your works"
            under="Its place gives gravity, which every sounding needs, and the time zone of every date. All of it can be changed in Settings."
          />
          {demo.state === 'failed' ? (
            <p className="problem" role="alert">
              The demo works was not loaded. {demo.line}
            </p>
          ) : null}
          <ActionForm action={createWorksAction} label="Your works">
            <div className="fields">
              <TextField name="name" label="Name" autoComplete="organization" maxLength={120} />
              <TextField name="place" label="Place" optional maxLength={120} />
              <TimeZoneField zones={Intl.supportedValuesOf('timeZone')} />
              <NumberField
                name="latitudeDegrees"
                label="Latitude"
                hint="Degrees, south negative; a tenth of a degree is near enough."
                unit="°"
              />
              <NumberField
                name="heightMetres"
                label="Height above sea level"
                hint="To 50 m is near enough."
                unit="m"
              />
            </div>
            <div className="actions">
              <Submit>Begin with an empty works</Submit>
            </div>
          </ActionForm>
          {demo.state === 'offered' ? (
            <section className="section">
              <h2>Or look around first</h2>
              <p>
                The demo works is invented: a family of plain steel strings, lots of 300 working days, a die
                that wears and a micrometer that was off for a week. It takes under a minute to load, and it
                stays a demo: real lots belong into a works of their own, in another data folder.
              </p>
              <ActionForm action={loadDemoAction} label="Demo works">
                <div className="actions">
                  <Submit tone="plain">Load the demo works</Submit>
                </div>
              </ActionForm>
            </section>
          ) : null}
        </>
      )}
    </main>
  )
}
