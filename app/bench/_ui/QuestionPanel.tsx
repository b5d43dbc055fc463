'use client'

import { useEffect, useRef, useState } from 'react'
import type { Question } from './bench-core'

interface Props {
  readonly question: Question
  readonly onAnswer: (choice: Question['choices'][number], reason?: string) => void
}

/** A doubtful entry, asked about on the spot: the number keys answer, nothing is changed by itself. */
export function QuestionPanel({ question, onAnswer }: Props) {
  const [asksWhy, setAsksWhy] = useState(false)
  const [reason, setReason] = useState('')
  const first = useRef<HTMLButtonElement>(null)
  const why = useRef<HTMLInputElement>(null)

  useEffect(() => {
    first.current?.focus()
  }, [])
  useEffect(() => {
    if (asksWhy) why.current?.focus()
  }, [asksWhy])

  const choose = (choice: Question['choices'][number]) => {
    if (choice.kind === 'keep') setAsksWhy(true)
    else onAnswer(choice)
  }

  return (
    <div
      className="bench-question"
      role="alertdialog"
      aria-labelledby="bench-question-title"
      aria-describedby="bench-question-detail"
      onKeyDown={(event) => {
        if (asksWhy) return
        const choice = question.choices[Number(event.key) - 1]
        if (!choice) return
        event.preventDefault()
        choose(choice)
      }}
    >
      <div className="words">
        <h2 id="bench-question-title">{question.question}</h2>
        <p id="bench-question-detail">{question.detail}</p>
      </div>
      <div className="choices">
        {question.choices.map((choice, index) => (
          <button
            key={choice.label}
            type="button"
            ref={index === 0 ? first : undefined}
            className={index === 0 ? 'button primary' : 'button'}
            onClick={() => choose(choice)}
          >
            <kbd>{index + 1}</kbd> {choice.label}
          </button>
        ))}
      </div>
      {asksWhy ? (
        <div className="why">
          <label htmlFor="bench-why">Why is it right?</label>
          <input
            id="bench-why"
            ref={why}
            className="input"
            value={reason}
            maxLength={200}
            onChange={(event) => setReason(event.target.value)}
            onKeyDown={(event) => {
              const keep = question.choices.find((choice) => choice.kind === 'keep')
              if (event.key === 'Enter' && keep && reason.trim() !== '') {
                event.preventDefault()
                onAnswer(keep, reason)
              }
              if (event.key === 'Escape') setAsksWhy(false)
            }}
          />
          <span className="hint">Enter keeps the value with this reason.</span>
        </div>
      ) : null}
    </div>
  )
}
