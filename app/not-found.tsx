import type { Metadata } from 'next'
import { RoomNotFound } from './_ui/shell/RoomNotFound'

export const metadata: Metadata = { title: 'Not here' }

export default function NotFound() {
  return (
    <main className="alone">
      <RoomNotFound />
    </main>
  )
}
