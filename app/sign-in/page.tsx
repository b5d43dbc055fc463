import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { currentActor } from '@/app/_session'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { CheckField } from '@/app/_ui/forms/ChoiceField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextField } from '@/app/_ui/forms/TextField'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Wordmark } from '@/app/_ui/shell/Wordmark'
import { sessionDays } from '@/lib/access/sign-in'
import { isFirstAccountMissing } from '@/lib/services/create-first-account'
import { signInAction } from './actions'
import { nextPath } from './next-path'

export const metadata: Metadata = { title: 'Sign in' }

interface SignInPageProps {
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>
}

export default async function SignInPage({ searchParams }: SignInPageProps) {
  const { next } = await searchParams
  const path = nextPath(typeof next === 'string' ? next : undefined)
  if (await isFirstAccountMissing()) redirect('/set-up')
  if (await currentActor()) redirect(path)
  return (
    <main className="alone">
      <p className="wordmark">
        <Wordmark />
      </p>
      <PageHead title="Sign in" />
      <ActionForm action={signInAction} label="Sign in">
        <input type="hidden" name="next" value={path} />
        <div className="fields">
          <TextField name="username" label="Sign-in name" autoComplete="username" plain whole />
          <TextField name="password" label="Password" type="password" autoComplete="current-password" whole />
          <CheckField
            name="stay"
            label="Keep me signed in on this device"
            note={`For ${sessionDays} days. Leave it empty on a computer that others use.`}
          />
        </div>
        <div className="actions">
          <Submit>Sign in</Submit>
        </div>
      </ActionForm>
      <p className="small">No account, or the password is lost? An administrator of the works sets both.</p>
    </main>
  )
}
