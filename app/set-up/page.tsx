import type { Metadata } from 'next'
import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { ChoiceField } from '@/app/_ui/forms/ChoiceField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextField } from '@/app/_ui/forms/TextField'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Wordmark } from '@/app/_ui/shell/Wordmark'
import { leastPassword } from '@/lib/input/person'
import { isCodeNeeded, isFirstAccountMissing } from '@/lib/services/create-first-account'
import { createFirstAccountAction } from './actions'

export const metadata: Metadata = { title: 'First account' }

export default async function FirstAccountPage() {
  if (!(await isFirstAccountMissing())) redirect('/set-up/works')
  const codeNeeded = isCodeNeeded(await headers())
  return (
    <main className="alone wide">
      <p className="wordmark">
        <Wordmark />
      </p>
      <PageHead
        title="An empty works"
        under="Nobody has an account here yet. The first one is an administrator, who adds everyone else."
      />
      <ActionForm action={createFirstAccountAction} label="First account">
        <div className="fields">
          {codeNeeded ? (
            <TextField
              name="code"
              label="Code from the terminal"
              hint="The start of Ledgerline printed it, such as K7QP-2MXD-9RTA."
              plain
              whole
            />
          ) : (
            <input type="hidden" name="code" value="" />
          )}
          <TextField name="name" label="Your name" hint="As it stands in the ledger." autoComplete="name" />
          <TextField
            name="username"
            label="Sign-in name"
            hint="Letters a to z, digits, . _ -"
            autoComplete="username"
            plain
          />
          <TextField
            name="password"
            label="Password"
            hint={`At least ${leastPassword} characters.`}
            type="password"
            autoComplete="new-password"
          />
          <TextField
            name="passwordAgain"
            label="Password again"
            type="password"
            autoComplete="new-password"
          />
          <ChoiceField
            name="roles"
            legend="Besides running the place, you also"
            several
            chosen={['bench', 'quality', 'sales']}
            choices={[
              { value: 'bench', label: 'measure at the bench' },
              { value: 'quality', label: 'decide lots, keep limits, equipment and catalogue' },
              { value: 'sales', label: 'build and publish datasheets' },
            ]}
          />
        </div>
        <div className="actions">
          <Submit>Make the first account</Submit>
        </div>
      </ActionForm>
    </main>
  )
}
