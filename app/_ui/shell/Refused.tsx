import Link from 'next/link'
import type { Problem } from '@/lib/domain/errors'
import { PageHead } from './PageHead'

const titles: Readonly<Partial<Record<Problem['code'], string>>> = {
  'not-permitted': 'Not yours to open',
  'not-ready': 'Not ready yet',
  busy: 'Busy just now',
  storage: 'The store gave way',
}

/** A page that could not be shown, with the sentence why. */
export function Refused({ problem }: { readonly problem: Problem }) {
  return (
    <>
      <PageHead title={titles[problem.code] ?? 'This can’t be shown'} />
      <div className="empty" role="alert">
        <p className="lead">{problem.message}</p>
        {problem.mend ? <p>{problem.mend}</p> : null}
        <Link className="button" href="/today">
          Go to Today
        </Link>
      </div>
    </>
  )
}
