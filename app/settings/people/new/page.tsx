import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { ChoiceField } from '@/app/_ui/forms/ChoiceField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextField } from '@/app/_ui/forms/TextField'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { leastPassword } from '@/lib/input/person'
import { roleChoicesWithNotes } from '../../_ui/role-choices'
import { createPersonAction } from '../../actions'

export const metadata: Metadata = { title: 'Add a person' }

export default roomPage(async (actor) => {
  permit(actor, 'people.keep')
  return (
    <>
      <PageHead over={<Link href="/settings/people">People</Link>} title="Add a person" />
      <ActionForm action={createPersonAction} label="Add a person">
        <div className="fields">
          <TextField name="name" label="Name" hint="As it stands in the ledger." maxLength={80} />
          <TextField
            name="username"
            label="Sign-in name"
            hint="2 to 30 letters a to z, digits, . _ -"
            maxLength={30}
            plain
          />
          <TextField
            name="password"
            label="First password"
            hint={`At least ${leastPassword} characters; the person can change it.`}
            type="password"
            autoComplete="new-password"
          />
          <TextField
            name="passwordAgain"
            label="First password again"
            type="password"
            autoComplete="new-password"
          />
          <ChoiceField name="roles" legend="Roles" choices={roleChoicesWithNotes} several />
        </div>
        <div className="actions">
          <Submit>Add this person</Submit>
        </div>
      </ActionForm>
    </>
  )
})
