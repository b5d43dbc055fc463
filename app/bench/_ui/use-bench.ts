'use client'

import { useCallback, useEffect, useMemo, useReducer, useRef } from 'react'
import { type BenchCell, cellKey, cellOrder, nextCell, shiftFrom } from '@/lib/input/bench-cells'
import { clientIdFrom } from '@/lib/input/client-id'
import { type BenchEntry, doubtAbout, type Question, readEntry, sheetOf, startValues } from './bench-core'
import type { BenchView } from './bench-view'
import { DRAFT_FORMAT, type DraftValue, dropDraft, keepDraft, readDraft } from './draft-store'
import { type SendOutcome, sendSpecimen } from './send-specimen'

type Values = Readonly<Record<string, DraftValue>>

export type Delivery =
  | { readonly state: 'stored'; readonly at: string }
  | { readonly state: 'sending' }
  | { readonly state: 'waits'; readonly message: string }
  | { readonly state: 'refused'; readonly message: string }

export interface BenchState {
  readonly values: Values
  readonly setUp: Values
  readonly requestIds: Readonly<Record<string, string>>
  readonly at: string
  /** What stands in the current cell while it is being typed; undefined when nothing was touched. */
  readonly text: string | undefined
  readonly problem: string | undefined
  readonly question: (Question & { readonly key: string; readonly entry: BenchEntry }) | undefined
  readonly delivery: Readonly<Record<number, Delivery>>
  readonly keptAt: number | undefined
  readonly restored: boolean
  readonly loaded: boolean
}

type Action =
  | { readonly type: 'patch'; readonly patch: Partial<BenchState> }
  | { readonly type: 'deliver'; readonly specimen: number; readonly delivery: Delivery }

const reduce = (state: BenchState, action: Action): BenchState =>
  action.type === 'patch'
    ? { ...state, ...action.patch }
    : { ...state, delivery: { ...state.delivery, [action.specimen]: action.delivery } }

const newId = (): string => clientIdFrom(Date.now(), crypto.getRandomValues(new Uint8Array(16)))

export interface Bench {
  readonly state: BenchState
  readonly order: readonly BenchCell[]
  readonly locked: (specimen: number) => boolean
  readonly goTo: (key: string) => void
  readonly type: (text: string) => void
  /** Enter: take what is typed, ask if it is doubtful, go on to the next cell. */
  readonly take: (move: boolean) => void
  readonly back: () => void
  readonly repeatFromLeft: () => void
  readonly skippedOne: () => void
  readonly answer: (choice: Question['choices'][number], reason?: string) => void
  readonly setSetUp: (field: string, text: string) => string | undefined
  readonly send: (specimen: number) => Promise<void>
}

export function useBench(view: BenchView): Bench {
  const order = useMemo(() => cellOrder(view.plan), [view.plan])
  const [state, dispatch] = useReducer(reduce, undefined, (): BenchState => {
    const { values, setUp } = startValues(view)
    const first = order.find((cell) => values[cell.key] === undefined)
    return {
      values,
      setUp,
      requestIds: {},
      at: first?.key ?? order[0]?.key ?? '',
      text: undefined,
      problem: undefined,
      question: undefined,
      delivery: Object.fromEntries(
        view.stored.map((one) => [one.number, { state: 'stored', at: one.storedAt }] as const),
      ),
      keptAt: undefined,
      restored: false,
      loaded: false,
    }
  })
  // Handlers read the newest state through this, so that two keys pressed within one frame both count.
  const now = useRef(state)
  now.current = state
  const patch = useCallback((change: Partial<BenchState>) => {
    now.current = { ...now.current, ...change }
    dispatch({ type: 'patch', patch: change })
  }, [])
  const deliver = useCallback((specimen: number, delivery: Delivery) => {
    now.current = { ...now.current, delivery: { ...now.current.delivery, [specimen]: delivery } }
    dispatch({ type: 'deliver', specimen, delivery })
  }, [])

  const locked = useCallback((specimen: number): boolean => {
    const delivery = now.current.delivery[specimen]
    return delivery?.state === 'stored' || delivery?.state === 'sending'
  }, [])

  const keep = useCallback(async () => {
    const { values, setUp, requestIds } = now.current
    try {
      await keepDraft({
        format: DRAFT_FORMAT,
        personId: view.personId,
        lotCode: view.lot.code,
        values: Object.fromEntries(
          Object.entries(values).filter(([key]) => !locked(Number.parseInt(key, 10))),
        ),
        setUp,
        requestIds,
        savedAt: Date.now(),
      })
      patch({ keptAt: Date.now() })
    } catch {
      patch({
        problem: 'This browser refuses to keep drafts. Leave this page open until everything is sent.',
      })
    }
  }, [locked, patch, view.lot.code, view.personId])

  const send = useCallback(
    async (specimen: number) => {
      const current = now.current
      if (locked(specimen)) return
      const idKey = String(specimen)
      const requestId = current.requestIds[idKey] ?? newId()
      const ids = { ...current.requestIds, [idKey]: requestId }
      for (const part of ['specimen', 'reading']) ids[`${idKey}.${part}`] ??= newId()
      patch({ requestIds: ids })
      deliver(specimen, { state: 'sending' })
      // The ids are on the disk before the first attempt: sending again can never store twice.
      await keep()
      const outcome: SendOutcome = await sendSpecimen(view, {
        requestId,
        specimenId: ids[`${idKey}.specimen`] ?? newId(),
        readingId: ids[`${idKey}.reading`] ?? newId(),
        number: specimen,
        sheet: sheetOf(view, now.current.values, now.current.setUp, specimen),
      })
      deliver(specimen, outcome)
      if (outcome.state !== 'stored') return
      const all = Array.from({ length: view.plan.specimens }, (_, index) => index + 1)
      if (all.every((one) => now.current.delivery[one]?.state === 'stored'))
        await dropDraft(view.personId, view.lot.code).catch(() => undefined)
      else await keep()
    },
    [deliver, keep, locked, patch, view],
  )

  useEffect(() => {
    let gone = false
    readDraft(view.personId, view.lot.code)
      .then((draft) => {
        if (gone) return
        if (!draft) return patch({ loaded: true })
        const storedNumbers = new Set(view.stored.map((one) => one.number))
        const typed = Object.fromEntries(
          Object.entries(draft.values).filter(([key]) => !storedNumbers.has(Number.parseInt(key, 10))),
        )
        const values = { ...now.current.values, ...typed }
        const first = order.find((cell) => values[cell.key] === undefined)
        patch({
          values,
          setUp: { ...now.current.setUp, ...draft.setUp },
          requestIds: draft.requestIds,
          at: first?.key ?? now.current.at,
          keptAt: draft.savedAt,
          restored: Object.keys(typed).length > 0,
          loaded: true,
        })
      })
      .catch(() => {
        if (!gone) patch({ loaded: true })
      })
    return () => {
      gone = true
    }
  }, [order, patch, view.lot.code, view.personId, view.stored])

  // What waits is tried again when the network is back, and every ten seconds.
  useEffect(() => {
    const again = () => {
      for (const [specimen, delivery] of Object.entries(now.current.delivery))
        if (delivery.state === 'waits') void send(Number(specimen))
    }
    const timer = setInterval(again, 10_000)
    window.addEventListener('online', again)
    return () => {
      clearInterval(timer)
      window.removeEventListener('online', again)
    }
  }, [send])

  const complete = useCallback(
    (specimen: number, values: Values): boolean =>
      order.filter((cell) => cell.specimen === specimen).every((cell) => values[cell.key] !== undefined),
    [order],
  )

  const accept = useCallback(
    (key: string, value: DraftValue, move: boolean) => {
      const values = { ...now.current.values, [key]: value }
      const next = move ? nextCell(order, key, (one) => values[one] !== undefined) : undefined
      patch({
        values,
        text: undefined,
        problem: undefined,
        question: undefined,
        ...(next ? { at: next.key } : {}),
      })
      const specimen = Number.parseInt(key, 10)
      if (complete(specimen, values)) void send(specimen)
      else void keep()
    },
    [complete, keep, order, patch, send],
  )

  const take = useCallback(
    (move: boolean) => {
      const { at, text, values } = now.current
      const cell = order.find((one) => one.key === at)
      if (!cell || now.current.question) return
      if (text === undefined || text.trim() === '') {
        // Enter on a filled or empty cell just goes on: an empty one stays to do.
        const index = order.indexOf(cell)
        const next = order[index + 1]
        patch({ text: undefined, problem: undefined, ...(move && next ? { at: next.key } : {}) })
        return
      }
      const entry = readEntry(view, cell.field, text)
      if (!entry.ok) {
        patch({ problem: entry.problems.map((one) => [one.message, one.mend].join(' ')).join(' ') })
        return
      }
      const question = doubtAbout(view, values, now.current.setUp, cell, entry.value)
      if (question) patch({ question: { ...question, key: at, entry: entry.value }, problem: undefined })
      else accept(at, entry.value, move)
    },
    [accept, order, patch, view],
  )

  const answer = useCallback(
    (choice: Question['choices'][number], reason?: string) => {
      const { question } = now.current
      if (!question) return
      if (choice.kind === 'measure-again')
        patch({ question: undefined, text: '', at: question.key, problem: undefined })
      else if (choice.kind === 'meant') accept(question.key, choice.entry, true)
      else if (reason && reason.trim() !== '')
        accept(
          question.key,
          { ...question.entry, kept: { question: question.question, reason: reason.trim() } },
          true,
        )
    },
    [accept, patch],
  )

  const goTo = useCallback(
    (key: string) => {
      if (key === now.current.at || now.current.question) return
      patch({ at: key, text: undefined, problem: undefined })
    },
    [patch],
  )

  const back = useCallback(() => {
    const index = order.findIndex((cell) => cell.key === now.current.at)
    const previous = order
      .slice(0, Math.max(0, index))
      .reverse()
      .find((cell) => !locked(cell.specimen))
    if (previous) patch({ at: previous.key, text: undefined, problem: undefined })
  }, [locked, order, patch])

  const repeatFromLeft = useCallback(() => {
    const cell = order.find((one) => one.key === now.current.at)
    if (!cell) return
    const left = now.current.values[cellKey(cell.specimen - 1, cell.field.id)]
    if (!left) {
      patch({ problem: 'There is no value to the left to repeat.' })
      return
    }
    const { kept: _, ...value } = left
    accept(cell.key, value, true)
  }, [accept, order, patch])

  const skippedOne = useCallback(() => {
    const moved = shiftFrom(order, now.current.at, now.current.values, locked)
    if (!moved) {
      patch({ problem: 'The last value of this station would have no place. Nothing was moved.' })
      return
    }
    patch({ values: moved, text: undefined, problem: undefined })
    void keep()
  }, [keep, locked, order, patch])

  const setSetUp = useCallback(
    (field: string, text: string): string | undefined => {
      const entry = readEntry(view, { id: field }, text)
      if (!entry.ok) return entry.problems.map((one) => [one.message, one.mend].join(' ')).join(' ')
      patch({ setUp: { ...now.current.setUp, [field]: entry.value } })
      void keep()
      return undefined
    },
    [keep, patch, view],
  )

  const type = useCallback((text: string) => patch({ text, problem: undefined }), [patch])

  return {
    state,
    order,
    locked,
    goTo,
    type,
    take,
    back,
    repeatFromLeft,
    skippedOne,
    answer,
    setSetUp,
    send,
  }
}
