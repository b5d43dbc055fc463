'use client'

import { newestWindow } from '@/lib/domain/charts/build-staff-chart'
import { LEAST_WINDOW } from '@/lib/domain/charts/staff-brush'
import type { LotWindow } from '@/lib/domain/charts/staff-chart'

export interface StaffZoomProps {
  readonly window: LotWindow
  readonly lotCount: number
  readonly onZoom: (direction: 'in' | 'out') => void
  readonly onWindow: (window: LotWindow) => void
}

/** Fewer lots, more, all of them, or the newest: for those who have no wheel. */
export function StaffZoom({ window, lotCount, onZoom, onWindow }: StaffZoomProps) {
  const newest = newestWindow(lotCount)
  const count = window.to - window.from + 1
  const isAll = count >= lotCount
  const isNewest = window.from === newest.from && window.to === newest.to
  const button = (text: string, name: string, keys: string | undefined, idle: boolean, act: () => void) => (
    // A button that can do nothing now keeps the focus: who presses + again is not thrown out.
    <button
      type="button"
      aria-label={name}
      title={keys === undefined ? name : `${name} (key ${keys})`}
      aria-keyshortcuts={keys}
      aria-disabled={idle}
      onClick={() => (idle ? undefined : act())}
    >
      {text}
    </button>
  )
  return (
    <fieldset className="staff-zoom">
      <legend>Lots shown</legend>
      {button('–', 'Show more lots', '-', isAll, () => onZoom('out'))}
      {button('+', 'Show fewer lots, larger', '+', count <= LEAST_WINDOW, () => onZoom('in'))}
      {button('all', 'Show all lots', '0', isAll, () => onWindow({ from: 0, to: lotCount - 1 }))}
      {button('newest', 'Show the newest lots', undefined, isNewest, () => onWindow(newest))}
    </fieldset>
  )
}
