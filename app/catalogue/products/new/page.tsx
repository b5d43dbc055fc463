import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextField } from '@/app/_ui/forms/TextField'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { createProductAction } from '../../actions'

export const metadata: Metadata = { title: 'Add a product' }

export default roomPage(async (actor) => {
  permit(actor, 'catalogue.keep')
  return (
    <>
      <PageHead over={<Link href="/catalogue">Catalogue</Link>} title="Add a product" />
      <ActionForm action={createProductAction} label="Add a product">
        <div className="fields">
          <TextField name="name" label="Name" hint="As people say it: Larch 254." maxLength={80} />
          <TextField
            name="code"
            label="Code"
            hint="As on labels and in files; it stays for good."
            maxLength={40}
            plain
          />
          <TextField
            name="family"
            label="Family"
            hint="Products that are compared with each other."
            maxLength={60}
          />
          <SelectField
            name="construction"
            label="Construction"
            options={[
              { value: 'plain', label: 'plain: one solid round wire' },
              { value: 'wound', label: 'wound: a core with wraps' },
            ]}
          />
        </div>
        <div className="actions">
          <Submit>Add this product</Submit>
        </div>
      </ActionForm>
    </>
  )
})
