import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDate } from '@/app/_ui/format/dates'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { getWorks } from '@/lib/services/get-works'
import { listPeople } from '@/lib/services/list-people'
import { SettingsTabs } from '../_ui/SettingsTabs'

export const metadata: Metadata = { title: 'People' }

export default roomPage(async (actor) => {
  const works = await getWorks(actor)
  const people = await listPeople(actor)
  const keeps = may(actor, 'people.keep')
  return (
    <>
      <PageHead
        title="Settings"
        under={works.name}
        actions={
          keeps ? (
            <Link className="button primary" href="/settings/people/new">
              Add a person
            </Link>
          ) : undefined
        }
      />
      <SettingsTabs current="/settings/people" />
      <section className="section">
        <h2>People</h2>
        <Table
          caption="People of the works"
          rows={people}
          keyOf={({ id }) => id}
          leftOut={({ active }) => !active}
          columns={[
            {
              head: 'Name',
              cell: ({ id, name }) => (keeps ? <Link href={`/settings/people/${id}`}>{name}</Link> : name),
            },
            { head: 'Sign-in name', cell: ({ username }) => username },
            { head: 'Roles', cell: ({ roles }) => roles.join(', ') || 'none' },
            { head: 'Since', cell: ({ createdAt }) => formatDate(createdAt, works.timeZone) },
            { head: 'Standing', cell: ({ active }) => (active ? 'active' : 'no longer active') },
          ]}
        />
        <p className="small">
          Nobody is ever deleted: the record names them. Who leaves is set inactive and can sign in no more.
        </p>
      </section>
    </>
  )
})
