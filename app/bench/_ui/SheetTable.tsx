'use client'

import { Fragment, type KeyboardEvent, useLayoutEffect, useRef, useState } from 'react'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { benchFields, cellKey } from '@/lib/input/bench-cells'
import { shownValue } from './bench-core'
import { type ResultRow, soFarOf } from './bench-lot'
import type { BenchView } from './bench-view'
import { QuestionPanel } from './QuestionPanel'
import { SoFarStrip } from './SoFarStrip'
import type { Bench, Delivery } from './use-bench'

interface Props {
  readonly view: BenchView
  readonly bench: Bench
  readonly rows: readonly ResultRow[]
  readonly planTexts: Readonly<Record<string, string>>
}

const deliveryWord = (delivery: Delivery | undefined, draft: boolean): string => {
  if (delivery?.state === 'stored') return 'stored'
  if (delivery?.state === 'sending') return 'sending'
  if (delivery?.state === 'waits') return 'waits'
  if (delivery?.state === 'refused') return 'refused'
  return draft ? 'draft' : 'to do'
}

/** Entries above the double line, results below it; one column a specimen. */
export function SheetTable({ view, bench, rows, planTexts }: Props) {
  const { state } = bench
  const specimens = Array.from({ length: view.plan.specimens }, (_, index) => index + 1)
  const fields = benchFields(view.plan)
  const current = Number.parseInt(state.at, 10)
  // A phone shows one column: that of the entry, until another one is looked at.
  const [looked, setLooked] = useState<{ readonly at: string; readonly specimen: number }>()
  const onPhone = looked?.at === state.at ? looked.specimen : current
  const inputs = useRef(new Map<string, HTMLInputElement>())

  // The column of the next specimen is shown by now, so that its entry can take the focus before the next key.
  useLayoutEffect(() => {
    if (!state.question && onPhone === current) inputs.current.get(state.at)?.focus()
  }, [state.at, state.question, onPhone, current])

  const columnClass = (specimen: number): string | undefined => (specimen === onPhone ? undefined : 'other')
  const hasDraft = (specimen: number): boolean =>
    fields.some((field) => state.values[cellKey(specimen, field.id)] !== undefined)

  const move = (key: string, rows: number, columns: number) => {
    const [specimenText = '1', id = ''] = key.split('.')
    const entries = fields.filter((field) => !field.setUp)
    const row = entries.findIndex((field) => field.id === id)
    const specimen = Number(specimenText) + columns
    const field = entries[row + rows]
    if (field && specimens.includes(specimen)) bench.goTo(cellKey(specimen, field.id))
  }

  /** What a key does in a cell; letters and digits are simply typed. */
  const actionOf = (pressed: string, key: string): (() => void) | undefined => {
    switch (pressed) {
      case 'Enter':
        return () => bench.take(true)
      case 'Escape':
        return () => bench.type('')
      case 'ArrowUp':
        return () => move(key, -1, 0)
      case 'ArrowDown':
        return () => move(key, 1, 0)
      case '*':
        return bench.repeatFromLeft
    }
    // Signs and sideways arrows belong to the number while one is being typed.
    if ((state.text ?? '') !== '') return undefined
    switch (pressed) {
      case '-':
        return bench.back
      case '+':
        return bench.skippedOne
      case 'ArrowLeft':
        return () => move(key, 0, -1)
      case 'ArrowRight':
        return () => move(key, 0, 1)
      default:
        return undefined
    }
  }

  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>, key: string) => {
    if (event.ctrlKey || event.altKey || event.metaKey) return
    const action = actionOf(event.key, key)
    if (!action) return
    event.preventDefault()
    action()
  }

  return (
    <>
      <fieldset className="bench-switch">
        <legend className="visually-hidden">Specimen shown</legend>
        {specimens.map((specimen) => (
          <button
            key={specimen}
            type="button"
            aria-pressed={specimen === onPhone}
            onClick={() => {
              setLooked({ at: state.at, specimen })
              const first = bench.order.find(
                (cell) => cell.specimen === specimen && state.values[cell.key] === undefined,
              )
              if (first) bench.goTo(first.key)
            }}
          >
            {specimen}
            <em>{deliveryWord(state.delivery[specimen], hasDraft(specimen))}</em>
          </button>
        ))}
      </fieldset>
      <table className="bench-sheet">
        <caption className="visually-hidden">
          Readings and results of lot {view.lot.code}, one column a specimen
        </caption>
        <thead>
          <tr>
            <th scope="col">
              <span className="visually-hidden">Reading</span>
            </th>
            {specimens.map((specimen) => (
              <th
                key={specimen}
                scope="col"
                className={[columnClass(specimen), specimen === current ? 'now' : '']
                  .filter(Boolean)
                  .join(' ')}
              >
                {specimen}
                <em>{deliveryWord(state.delivery[specimen], hasDraft(specimen))}</em>
              </th>
            ))}
            <th scope="col" className="so-far">
              Lot so far
            </th>
            <th scope="col" className="plan">
              Plan and tolerance
            </th>
          </tr>
        </thead>
        <tbody>
          {fields.map((field, index) => {
            const firstOfStation = index > 0 && fields[index - 1]?.station !== field.station
            const asking = state.question?.key.endsWith(`.${field.id}`) ? state.question : undefined
            const failing = state.problem && state.at.endsWith(`.${field.id}`) ? state.problem : undefined
            return (
              <Fragment key={field.id}>
                <tr className={firstOfStation ? 'first-of-station' : undefined}>
                  <th scope="row">
                    {field.label}
                    <span>{shownValue(view, field.id).unit}</span>
                  </th>
                  {specimens.map((specimen) => {
                    const key = cellKey(specimen, field.id)
                    const value = state.values[key] ?? (field.setUp ? state.setUp[field.id] : undefined)
                    const locked = bench.locked(specimen)
                    const shown = shownValue(view, field.id, value)
                    if (field.setUp || locked)
                      return (
                        <td
                          key={key}
                          className={[columnClass(specimen), field.setUp ? 'prefilled' : '']
                            .filter(Boolean)
                            .join(' ')}
                        >
                          {shown.text}
                        </td>
                      )
                    return (
                      <td
                        key={key}
                        className={['cell', columnClass(specimen), value ? '' : 'empty']
                          .filter(Boolean)
                          .join(' ')}
                      >
                        <input
                          ref={(element) => {
                            if (element) inputs.current.set(key, element)
                            else inputs.current.delete(key)
                          }}
                          className="entry"
                          inputMode="decimal"
                          autoComplete="off"
                          spellCheck={false}
                          aria-label={`${field.label}, specimen ${specimen}, ${shown.unit}`}
                          aria-invalid={failing && key === state.at ? true : undefined}
                          aria-describedby={failing && key === state.at ? 'bench-problem' : undefined}
                          value={
                            key === state.at && state.text !== undefined
                              ? state.text
                              : value
                                ? shown.text
                                : ''
                          }
                          onFocus={() => bench.goTo(key)}
                          onChange={(event) => bench.type(event.target.value)}
                          onBlur={() => bench.take(false)}
                          onKeyDown={(event) => onKeyDown(event, key)}
                        />
                      </td>
                    )
                  })}
                  <td className="so-far">
                    <SoFarStrip soFar={soFarOf(view, state.values, field.id)} />
                  </td>
                  <td className="plan">{planTexts[field.id] ?? ''}</td>
                </tr>
                {failing ? (
                  <tr className="asks">
                    <td colSpan={specimens.length + 3}>
                      <p className="problem" id="bench-problem" role="alert">
                        {failing}
                      </p>
                    </td>
                  </tr>
                ) : null}
                {asking ? (
                  <tr className="asks">
                    <td colSpan={specimens.length + 3}>
                      <QuestionPanel question={asking} onAnswer={bench.answer} />
                    </td>
                  </tr>
                ) : null}
              </Fragment>
            )
          })}
        </tbody>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id} className="results">
              <th scope="row">
                {row.label}
                <span>{row.unit}</span>
              </th>
              {specimens.map((specimen) => (
                <td key={specimen} className={columnClass(specimen)}>
                  {row.values[specimen - 1] ?? ''}
                </td>
              ))}
              <td className="so-far">
                {row.mean ? (
                  <>
                    <b>{row.mean}</b> {row.expanded ? <small>± {row.expanded}</small> : null}
                  </>
                ) : null}
              </td>
              <td className="plan">
                <div className="verdict">
                  <span>{row.plan}</span>
                  {row.verdict ? (
                    <>
                      <VerdictMark verdict={row.verdict.mark} /> <em>{row.verdict.word}</em>
                    </>
                  ) : null}
                </div>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="bench-keys">
        <kbd>Enter</kbd> next reading <kbd>−</kbd> back <kbd>*</kbd> repeat from left <kbd>+</kbd> I skipped
        one: the rest of this station moves on by one. Comma or point; a unit may follow the number:{' '}
        <b>10.06 thou</b>.
      </p>
    </>
  )
}
