'use client'

import { RoomError } from './_ui/shell/RoomError'

export default function AppError(props: { readonly error: unknown; readonly retry: () => void }) {
  return (
    <main className="alone">
      <RoomError {...props} />
    </main>
  )
}
