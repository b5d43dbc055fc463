import type { ReactNode } from 'react'

interface EmptyStateProps {
  readonly title: string
  /** What to do next, in a sentence. */
  readonly children: ReactNode
  readonly action?: ReactNode
}

/** Stands where nothing is yet, and says what to do next. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="empty">
      <h2>{title}</h2>
      <p>{children}</p>
      {action}
    </div>
  )
}
