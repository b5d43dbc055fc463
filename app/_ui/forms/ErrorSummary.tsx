'use client'

import { useEffect, useRef } from 'react'
import type { Problem } from '@/lib/domain/errors'

const heading = (count: number): string =>
  count === 1 ? 'One thing needs mending' : `${count} things need mending`

/** All problems of a form in one place; takes the focus when it appears, each line leads to its field. */
export function ErrorSummary({ problems }: { readonly problems: readonly Problem[] }) {
  const box = useRef<HTMLDivElement>(null)
  useEffect(() => box.current?.focus(), [])
  if (problems.length === 0) return null
  return (
    <div ref={box} className="problems" role="alert" tabIndex={-1}>
      <h2>{heading(problems.length)}</h2>
      <ul>
        {problems.map((problem) => (
          <li key={`${problem.where} ${problem.message}`}>
            {problem.where ? <a href={`#field-${problem.where}`}>{problem.message}</a> : problem.message}
            {problem.mend ? <> {problem.mend}</> : null}
          </li>
        ))}
      </ul>
    </div>
  )
}
