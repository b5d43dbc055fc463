import type { ReactNode } from 'react'

interface PageHeadProps {
  /** Small line above: the room, or the date. */
  readonly over?: ReactNode
  /** `<h1>`; put the lighter half into a `<span>`. */
  readonly title: ReactNode
  /** Second text under the title. */
  readonly under?: ReactNode
  /** Buttons and links at the right. */
  readonly actions?: ReactNode
}

/** The head of every page, closed by an ink line. */
export function PageHead({ over, title, under, actions }: PageHeadProps) {
  return (
    <header className="page-head">
      <div>
        {over ? <p className="small">{over}</p> : null}
        <h1>{title}</h1>
        {under ? <p className="small">{under}</p> : null}
      </div>
      {actions ? <div className="actions">{actions}</div> : null}
    </header>
  )
}
