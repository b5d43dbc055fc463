'use client'

import { useEffect } from 'react'
import { PageHead } from './PageHead'

interface RoomErrorProps {
  readonly error: unknown
  readonly retry: () => void
}

const referenceOf = (error: unknown): string | undefined =>
  error instanceof Error && 'digest' in error && typeof error.digest === 'string' ? error.digest : undefined

/** Something unforeseen: says so, keeps the rail, offers another try. */
export function RoomError({ error, retry }: RoomErrorProps) {
  useEffect(() => console.error(error), [error])
  const reference = referenceOf(error)
  return (
    <>
      <PageHead title="This page failed" />
      <div className="empty" role="alert">
        <p className="lead">Ledgerline met an error it did not expect. What was saved before is kept.</p>
        <p>
          Try again; if it fails again, tell whoever runs the server
          {reference ? <>, with this reference: {reference}</> : null}.
        </p>
        <button type="button" className="button primary" onClick={retry}>
          Try again
        </button>
      </div>
    </>
  )
}
