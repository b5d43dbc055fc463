import Link from 'next/link'
import type { ReactNode } from 'react'
import type { WorksFacts } from '@/lib/services/get-works'
import type { EquipmentList } from '@/lib/services/list-equipment'

export interface SectionProps {
  readonly list: EquipmentList
  readonly works: WorksFacts
  readonly keeps: boolean
  /** Epoch milliseconds. */
  readonly now: number
}

interface SectionFrameProps {
  readonly title: string
  readonly empty: string
  readonly count: number
  readonly add: { readonly href: string; readonly label: string } | undefined
  readonly children: ReactNode
}

/** One kind of equipment: heading, the way to add one, table or a sentence. */
export function SectionFrame({ title, empty, count, add, children }: SectionFrameProps) {
  return (
    <section className="section">
      <header>
        <h2>{title}</h2>
        {add ? (
          <Link className="button quiet" href={add.href}>
            {add.label}
          </Link>
        ) : null}
      </header>
      {count === 0 ? <p className="slate">{empty}</p> : children}
    </section>
  )
}
