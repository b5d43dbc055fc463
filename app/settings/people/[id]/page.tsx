import type { Metadata } from 'next'
import Link from 'next/link'
import { notFound } from 'next/navigation'
import { roomPage } from '@/app/_page'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { CheckField, ChoiceField } from '@/app/_ui/forms/ChoiceField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextField } from '@/app/_ui/forms/TextField'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { leastPassword } from '@/lib/input/person'
import { requirePerson } from '@/lib/services/get-person'
import { roleChoicesWithNotes } from '../../_ui/role-choices'
import { changePersonAction, setPasswordAction } from '../../actions'

export const metadata: Metadata = { title: 'Person' }

export default roomPage(async (actor, { params }) => {
  permit(actor, 'people.keep')
  const id = Number(params.id)
  if (!Number.isSafeInteger(id)) notFound()
  const person = await requirePerson(actor, id)
  return (
    <>
      <PageHead
        over={<Link href="/settings/people">People</Link>}
        title={person.name}
        under={`Signs in as ${person.username}`}
      />
      <div className="columns">
        <ActionForm action={changePersonAction.bind(null, person.id)} label="Name and roles">
          <input type="hidden" name="version" value={person.version} />
          <div className="fields">
            <TextField name="name" label="Name" value={person.name} maxLength={80} />
            <ChoiceField
              name="roles"
              legend="Roles"
              choices={roleChoicesWithNotes}
              chosen={person.roles}
              several
            />
            <CheckField
              name="active"
              label="Active"
              note="Who is not active can’t sign in and is signed out at once; the record keeps the name."
              checked={person.active}
            />
          </div>
          <div className="actions">
            <Submit>Save {person.name}</Submit>
          </div>
        </ActionForm>
        <aside>
          <h2>Another password</h2>
          <ActionForm action={setPasswordAction.bind(null, person.id)} label="Another password">
            <div className="fields">
              <TextField
                name="password"
                label="New password"
                hint={`At least ${leastPassword} characters.`}
                type="password"
                autoComplete="new-password"
                whole
              />
              <TextField
                name="passwordAgain"
                label="New password again"
                type="password"
                autoComplete="new-password"
                whole
              />
            </div>
            <div className="actions">
              <Submit tone="plain">Set the password</Submit>
            </div>
          </ActionForm>
          <p className="small">{person.name} is signed out everywhere when it is set.</p>
        </aside>
      </div>
    </>
  )
})
