'use client'

import { type RefObject, useId } from 'react'
import { footShapes } from '@/lib/domain/charts/draw-staff'
import { nameShapes, plotLayers } from '@/lib/domain/charts/draw-staff-chart'
import type { StaffLayout } from '@/lib/domain/charts/layout-staff-chart'
import { lines } from '@/lib/domain/charts/marks'
import { ShapesView } from './DrawingView'

/**
 * What is seen while the chart is dragged: lots of up to twice the window, drawn once and moved as a whole over the
 * plot; names and values around it stay.
 */
export function StaffLayer({
  layout,
  wide,
  moved,
}: {
  readonly layout: StaffLayout
  readonly wide: StaffLayout
  /** The group whose transform follows the hand. */
  readonly moved: RefObject<SVGGElement | null>
}) {
  const clip = useId()
  const { plot, axis, bars, frame, width, height } = layout
  const ground = { x: plot.x, y: 0, width: plot.w + 1, height: axis.y + 32 }
  return (
    <svg
      className="staff-layer"
      aria-hidden="true"
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
    >
      <clipPath id={clip}>
        <rect {...ground} />
      </clipPath>
      <rect className="ground" {...ground} />
      {/* Codes and days of the last lots reach beyond the plot. */}
      <rect className="ground" x={plot.x} y={axis.y} width={width - plot.x} height={32} />
      <g clipPath={`url(#${clip})`}>
        <g ref={moved}>
          <ShapesView shapes={plotLayers(wide).flatMap(({ shapes }) => shapes)} />
          <ShapesView shapes={footShapes(wide)} />
        </g>
        <ShapesView shapes={[lines([[frame.x, bars.y1, frame.x, bars.y2]], { stroke: 'ink', width: 1.1 })]} />
      </g>
      {frame.compact ? <ShapesView shapes={nameShapes(layout)} /> : null}
    </svg>
  )
}
