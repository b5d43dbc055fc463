'use client'

import { type KeyboardEvent, type PointerEvent, useMemo, useRef } from 'react'
import { BRUSH_HEIGHT, moveWindow, resizeWindow, staffBrush } from '@/lib/domain/charts/staff-brush'
import type { LotWindow, StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { ShapesView } from './DrawingView'

type Grip = 'from' | 'to' | 'both'

const TOP = 4
const steps: Readonly<Record<string, number>> = { ArrowLeft: -1, ArrowRight: 1, PageUp: -10, PageDown: 10 }
const names: Readonly<Record<Grip, string>> = {
  from: 'First lot shown',
  to: 'Last lot shown',
  both: 'Lots shown',
}

export interface StaffBrushProps {
  readonly input: StaffChartInput
  readonly window: LotWindow
  readonly onWindow: (window: LotWindow) => void
  readonly frame: { readonly x: number; readonly w: number; readonly compact: boolean }
  readonly width: number
}

/** All lots in little; the window is dragged as a whole or by its ends, or moved with the arrow keys. */
export function StaffBrush({ input, window, onWindow, frame, width }: StaffBrushProps) {
  // The frame is made anew with each window; of the overview only its place on the page matters.
  const { x: left0, w: wide, compact } = frame
  const brush = useMemo(
    () => staffBrush(input, { x: left0, w: wide, compact }, width),
    [input, left0, wide, compact, width],
  )
  const held = useRef<{ grip: Grip; at: number; window: LotWindow } | undefined>(undefined)
  const { lotCount, xAt, indexAt } = brush
  const codeAt = (index: number): string => input.lots[index]?.code ?? ''
  const placeOf = (event: PointerEvent<Element>): number => {
    const box = event.currentTarget.closest('.staff-brush')?.getBoundingClientRect()
    return indexAt(event.clientX - (box?.left ?? 0))
  }
  const changed = (grip: Grip, from: LotWindow, by: number): LotWindow =>
    grip === 'both'
      ? moveWindow(from, by, lotCount)
      : resizeWindow(from, grip, Math.round(from[grip] + by), lotCount)

  const grab = (grip: Grip) => (event: PointerEvent<HTMLElement>) => {
    event.stopPropagation()
    event.currentTarget.setPointerCapture?.(event.pointerId)
    held.current = { grip, at: placeOf(event), window }
  }
  const drag = (event: PointerEvent<HTMLElement>) => {
    const { current } = held
    if (current) onWindow(changed(current.grip, current.window, placeOf(event) - current.at))
  }
  const drop = () => {
    held.current = undefined
  }
  const jump = (event: PointerEvent<HTMLElement>) => {
    const place = placeOf(event)
    if (place < -2 || place > lotCount + 1) return
    onWindow(moveWindow(window, place - (window.from + window.to) / 2, lotCount))
  }
  const press = (grip: Grip) => (event: KeyboardEvent<HTMLElement>) => {
    const by =
      event.key === 'Home' ? -lotCount : event.key === 'End' ? lotCount : (steps[event.key] ?? undefined)
    if (by === undefined) return
    event.preventDefault()
    onWindow(changed(grip, window, by))
  }
  const [left, right] = [xAt(window.from) - 4, xAt(window.to) + 4]
  const grips: readonly { readonly grip: Grip; readonly x: number; readonly w: number }[] = [
    { grip: 'both', x: left, w: Math.max(1, right - left) },
    { grip: 'from', x: left - 12, w: 24 },
    { grip: 'to', x: right - 12, w: 24 },
  ]
  return (
    <section
      className="staff-brush"
      style={{ width, height: brush.height }}
      aria-label={`All ${lotCount} lots`}
      onPointerDown={jump}
    >
      <svg width={width} height={brush.height} viewBox={`0 0 ${width} ${brush.height}`} aria-hidden="true">
        <ShapesView shapes={brush.shapes} />
        <rect
          className="veil"
          x={frame.x}
          y={TOP}
          width={Math.max(0, left - frame.x)}
          height={BRUSH_HEIGHT}
        />
        <rect
          className="veil"
          x={right}
          y={TOP}
          width={Math.max(0, frame.x + frame.w - right)}
          height={BRUSH_HEIGHT}
        />
        <rect
          className="window"
          x={left}
          y={TOP - 2}
          width={Math.max(1, right - left)}
          height={BRUSH_HEIGHT + 4}
        />
        {[left, right].map((x, place) => (
          <g key={place === 0 ? 'from' : 'to'} className="handle">
            <path d={`M${x} ${TOP - 2}V${TOP + BRUSH_HEIGHT + 2}`} />
            <rect x={x - 4} y={TOP + 13} width={8} height={14} rx={2} />
          </g>
        ))}
      </svg>
      {grips.map(({ grip, x, w }) => (
        <div
          key={grip}
          className={`grip grip-${grip}`}
          style={{ left: x, top: TOP - 2, width: w, height: BRUSH_HEIGHT + 4 }}
          role="slider"
          tabIndex={0}
          aria-label={names[grip]}
          aria-orientation="horizontal"
          aria-valuemin={1}
          aria-valuemax={lotCount}
          aria-valuenow={(grip === 'to' ? window.to : window.from) + 1}
          aria-valuetext={
            grip === 'both' ? `${codeAt(window.from)} to ${codeAt(window.to)}` : codeAt(window[grip])
          }
          onPointerDown={grab(grip)}
          onPointerMove={drag}
          onPointerUp={drop}
          onPointerCancel={drop}
          onKeyDown={press(grip)}
        />
      ))}
    </section>
  )
}
