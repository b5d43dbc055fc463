/** The note on its ledger line. */
export function NoteMark({ size = 24 }: { readonly size?: number }) {
  return (
    <svg width={size} height={(size * 2) / 3} viewBox="0 0 24 16" aria-hidden="true">
      <path d="M0 8.5H24" stroke="currentColor" strokeWidth="1.6" />
      <ellipse cx="12" cy="8.5" rx="6" ry="4.2" transform="rotate(-20 12 8.5)" fill="currentColor" />
    </svg>
  )
}

export function Wordmark() {
  return (
    <>
      <NoteMark />
      Ledgerline
    </>
  )
}
