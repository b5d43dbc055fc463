/** Shown when a page takes longer than the click. */
export function RoomLoading() {
  return (
    <p className="waiting" role="status">
      One moment …
    </p>
  )
}
