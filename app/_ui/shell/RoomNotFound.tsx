import Link from 'next/link'
import { PageHead } from './PageHead'

/** Something that was asked for by name and is not there. */
export function RoomNotFound() {
  return (
    <>
      <PageHead title="Not here" />
      <div className="empty">
        <p className="lead">There is nothing under this name.</p>
        <p>A letter may be missing in the address. Nothing has been deleted: Ledgerline deletes nothing.</p>
        <Link className="button" href="/today">
          Go to Today
        </Link>
      </div>
    </>
  )
}
