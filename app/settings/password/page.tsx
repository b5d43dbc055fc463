import type { Metadata } from 'next'
import { roomPage } from '@/app/_page'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextField } from '@/app/_ui/forms/TextField'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { leastPassword } from '@/lib/input/person'
import { getWorks } from '@/lib/services/get-works'
import { SettingsTabs } from '../_ui/SettingsTabs'
import { changeOwnPasswordAction } from '../actions'

export const metadata: Metadata = { title: 'Your password' }

export default roomPage(async (actor) => {
  const works = await getWorks(actor)
  return (
    <>
      <PageHead title="Settings" under={works.name} />
      <SettingsTabs current="/settings/password" />
      <section className="section">
        <h2>The password of {actor.name}</h2>
        <p className="small">Changing it signs you out everywhere; you sign in again with the new one.</p>
        <ActionForm action={changeOwnPasswordAction} label="Your password">
          <div className="fields">
            <TextField
              name="current"
              label="Present password"
              type="password"
              autoComplete="current-password"
              whole
            />
            <TextField
              name="password"
              label="New password"
              hint={`At least ${leastPassword} characters.`}
              type="password"
              autoComplete="new-password"
            />
            <TextField
              name="passwordAgain"
              label="New password again"
              type="password"
              autoComplete="new-password"
            />
          </div>
          <div className="actions">
            <Submit>Change my password</Submit>
          </div>
        </ActionForm>
      </section>
    </>
  )
})
