import Link from 'next/link'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import type { Actor } from '@/lib/access/actor'
import { may } from '@/lib/access/permit'
import type { Verb } from '@/lib/access/rights'

interface Next {
  readonly needs: Verb
  readonly text: string
  readonly href: string
  readonly deed: string
}

/** What comes next for whom: the first that the person may do. */
const nexts: readonly Next[] = [
  {
    needs: 'lots.decide',
    text: 'Lots come here once their plan is measured, when they leave their limits, and when readings behind a decision change.',
    href: '/drift',
    deed: 'Look at the charts',
  },
  {
    needs: 'lots.open',
    text: 'Every lot is measured. The next one comes here as soon as it is opened.',
    href: '/bench',
    deed: 'Open a lot',
  },
  {
    needs: 'datasheets.build',
    text: 'Every datasheet is true to the lots it rests on. Newly released lots come here.',
    href: '/datasheets',
    deed: 'Look at the datasheets',
  },
  {
    needs: 'people.keep',
    text: 'Everybody has a role, and no import failed.',
    href: '/settings',
    deed: 'Settings',
  },
]

/** A calm page: it says so, and what is next. */
export function NothingWaits({ actor }: { readonly actor: Actor }) {
  const next = nexts.find(({ needs }) => may(actor, needs))
  return next ? (
    <EmptyState
      title="All is done for now."
      action={
        <Link className="button" href={next.href}>
          {next.deed}
        </Link>
      }
    >
      {next.text}
    </EmptyState>
  ) : (
    <EmptyState title="You have no role yet.">
      Ask an administrator for one; what waits for you then stands here.
    </EmptyState>
  )
}
