'use client'

import {
  type KeyboardEvent,
  type MouseEvent,
  type PointerEvent,
  useDeferredValue,
  useMemo,
  useRef,
  useState,
} from 'react'
import { buildStaffChart, clampWindow, newestWindow } from '@/lib/domain/charts/build-staff-chart'
import { describeStaffChart } from '@/lib/domain/charts/describe-staff-chart'
import { lotHref } from '@/lib/domain/charts/draw-notes'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { ZOOM_STEP, zoomWindow } from '@/lib/domain/charts/pan-zoom'
import { moveWindow } from '@/lib/domain/charts/staff-brush'
import type { LotWindow, StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { lotAt, pointerShapes, readingShapes, readingText, readLot } from '@/lib/domain/charts/staff-pointer'
import { ShapesView } from './DrawingView'
import { StaffBrush } from './StaffBrush'
import { StaffLayer } from './StaffLayer'
import { StaffPlot } from './StaffPlot'
import { StaffTable } from './StaffTable'
import { StaffZoom } from './StaffZoom'
import { usePanZoom } from './use-pan-zoom'
import { useWidth } from './use-width'

export interface StaffChartProps {
  /** `window` of the input is where the chart opens; without it the newest lots. */
  readonly input: StaffChartInput
  /** Lots shown, when the page keeps them (in its address). */
  readonly window?: LotWindow
  readonly onWindow?: (window: LotWindow) => void
  /** Lot under the pointer, by index, when the page keeps it (a signal was followed to its lot). */
  readonly pointer?: number
  readonly onPointer?: (index: number | undefined) => void
  /** Called by Enter on a lot; without it the lot's page is opened. */
  readonly onOpen?: (code: string) => void
  /** Called when a slur is followed. */
  readonly onSignal?: (signal: string) => void
  /** Fixed width in px; without it the chart follows its place on the page. */
  readonly width?: number
}

const open = (code: string): void => globalThis.location.assign(lotHref(code))

const strides: Readonly<Record<string, number>> = { ArrowLeft: -1, ArrowRight: 1, PageUp: -10, PageDown: 10 }

/**
 * Control charts of several characteristics on one lot axis. One pointer reads all staves (mouse, touch, arrow
 * keys); notes lead to their lots; the overview below chooses the lots shown.
 */
export function StaffChart(props: StaffChartProps) {
  const { input, onOpen = open } = props
  const lotCount = input.lots.length
  const [box, measured] = useWidth<HTMLDivElement>()
  const [ownWindow, setOwnWindow] = useState<LotWindow>()
  const [ownPointer, setOwnPointer] = useState<number>()
  const slider = useRef<HTMLDivElement>(null)
  const freshTap = useRef(false)

  const width = props.width ?? measured
  const window = clampWindow(props.window ?? ownWindow ?? input.window ?? newestWindow(lotCount), lotCount)
  const shown = useDeferredValue(window)
  const chart = useMemo(() => buildStaffChart({ ...input, window: shown }), [input, shown])
  const layout = useMemo(() => layoutStaffChart(chart, width), [chart, width])
  const wanted = props.pointer ?? ownPointer
  const reading = wanted === undefined ? undefined : readLot(layout, wanted)
  const pointer = reading?.index

  const setWindow = (next: LotWindow): void => {
    setOwnWindow(next)
    props.onWindow?.(next)
  }
  const setPointer = (next: number | undefined): void => {
    if (next === pointer) return
    setOwnPointer(next)
    props.onPointer?.(next)
  }
  const pan = usePanZoom({
    input,
    layout,
    window,
    settled: shown.from === window.from && shown.to === window.to,
    onWindow: setWindow,
  })
  const zoom = (direction: 'in' | 'out'): void => {
    const factor = direction === 'in' ? 1 / ZOOM_STEP : ZOOM_STEP
    const anchor = pointer ?? (window.from + window.to) / 2
    setWindow(clampWindow(zoomWindow(window, factor, anchor, lotCount), lotCount))
  }
  const pointAt = (event: PointerEvent<HTMLElement>): void => {
    const left = event.currentTarget.getBoundingClientRect().left
    const x = event.clientX - left
    if (x >= layout.plot.x - 8 && x <= layout.plot.x + layout.plot.w + 8) setPointer(lotAt(layout, x))
  }
  const press = (event: PointerEvent<HTMLElement>): void => {
    const before = pointer
    pan.down(event)
    pointAt(event)
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left
    freshTap.current = event.pointerType === 'touch' && lotAt(layout, x) !== before
    slider.current?.focus({ preventScroll: true })
  }
  // A finger has no hovering: the first tap on a note reads it, the second one follows it.
  const click = (event: MouseEvent<HTMLElement>): void => {
    const isDrag = pan.wasDragged()
    if (freshTap.current || isDrag) event.preventDefault()
    freshTap.current = false
    if (isDrag) return
    const slur = event.target instanceof Element ? event.target.closest('[data-mark="slur"]') : null
    const signal = slur?.getAttribute('data-signal')
    if (signal) props.onSignal?.(signal)
  }
  const move = (event: KeyboardEvent<HTMLElement>): void => {
    const { key } = event
    // With ctrl or cmd they are the browser’s own.
    if (event.ctrlKey || event.metaKey || event.altKey) return
    const by = strides[key]
    if (key === 'Enter' && reading) onOpen(reading.code)
    else if (key === '+' || key === '=') zoom('in')
    else if (key === '-') zoom('out')
    else if (key === '0') setWindow({ from: 0, to: lotCount - 1 })
    else if (key === 'Escape') setPointer(undefined)
    else if (key === 'Home') setPointer(window.from)
    else if (key === 'End') setPointer(window.to)
    else if (by !== undefined) {
      const next = Math.min(lotCount - 1, Math.max(0, pointer === undefined ? window.to : pointer + by))
      if (next < window.from) setWindow(moveWindow(window, next - window.from, lotCount))
      if (next > window.to) setWindow(moveWindow(window, next - window.to, lotCount))
      setPointer(next)
    } else return
    event.preventDefault()
  }

  return (
    <figure className="staff-chart" aria-label={`Staff chart of ${chart.title}`}>
      <div className="staff-box" ref={box}>
        {width === undefined ? (
          <div className="staff-waits" style={{ height: layout.height }} />
        ) : (
          <>
            <div
              ref={pan.box}
              className="staff-plot"
              data-dragged={pan.layer ? true : undefined}
              style={{ width: layout.width, height: layout.height }}
              onPointerMove={(event) => (pan.move(event) ? undefined : pointAt(event))}
              onPointerDown={press}
              onPointerUp={pan.up}
              onPointerCancel={pan.up}
              onClickCapture={click}
            >
              <div aria-hidden="true">
                <StaffPlot layout={layout} />
                {pan.layer ? (
                  <StaffLayer layout={pan.layer.layout} wide={pan.layer.wide} moved={pan.moved} />
                ) : null}
                <svg
                  className="staff-over"
                  aria-hidden="true"
                  width={layout.width}
                  height={layout.height}
                  viewBox={`0 0 ${layout.width} ${layout.height}`}
                >
                  {pointer === undefined || pan.layer ? null : (
                    <>
                      <ShapesView shapes={pointerShapes(layout, pointer)} />
                      <ShapesView shapes={readingShapes(layout, pointer)} />
                    </>
                  )}
                </svg>
              </div>
              {lotCount > 0 ? (
                <div
                  ref={slider}
                  className="staff-pointer"
                  role="slider"
                  tabIndex={0}
                  aria-label="Lot read on all staves"
                  aria-orientation="horizontal"
                  aria-valuemin={1}
                  aria-valuemax={lotCount}
                  aria-valuenow={(pointer ?? window.to) + 1}
                  aria-valuetext={reading ? readingText(reading) : 'no lot read yet'}
                  style={{
                    left: layout.plot.x,
                    top: layout.plot.y,
                    width: layout.plot.w,
                    height: Math.max(layout.bars.y2 + 8, layout.reasonsY - 12) - layout.plot.y,
                  }}
                  onKeyDown={move}
                />
              ) : null}
            </div>
            {lotCount > 1 ? (
              <>
                <StaffBrush
                  input={input}
                  window={window}
                  onWindow={setWindow}
                  frame={layout.frame}
                  width={layout.width}
                />
                <StaffZoom window={window} lotCount={lotCount} onZoom={zoom} onWindow={setWindow} />
              </>
            ) : null}
          </>
        )}
      </div>
      <figcaption className="staff-words">{describeStaffChart(chart)}</figcaption>
      {lotCount > 0 ? <StaffTable chart={chart} /> : null}
    </figure>
  )
}
