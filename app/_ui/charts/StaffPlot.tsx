'use client'

import { memo, useMemo } from 'react'
import { ComposedChart, useXAxisScale, useYAxisScale, XAxis, YAxis } from 'recharts'
import { marginShapes, type PlotLayer, plotLayers } from '@/lib/domain/charts/draw-staff-chart'
import type { StaffLayout, StaveLayout } from '@/lib/domain/charts/layout-staff-chart'
import { placeShape } from '@/lib/domain/charts/place-shape'
import { ShapesView } from './DrawingView'

const LOTS = 'lots'

/** One layer of marks, placed by the chart's own axes: x by the lot axis, y by the axis of its stave. */
function PlacedLayer({
  layer,
  stave,
  layout,
}: {
  readonly layer: PlotLayer
  readonly stave: StaveLayout
  readonly layout: StaffLayout
}) {
  const xScale = useXAxisScale(LOTS)
  const yScale = useYAxisScale(stave.stave.key)
  const placed = useMemo(
    () =>
      xScale && yScale
        ? layer.shapes.map((shape) =>
            placeShape(shape, (x, y) => [
              xScale(layout.frame.indexAt(x)) ?? Number.NaN,
              yScale(stave.valueAt(y - stave.y)) ?? Number.NaN,
            ]),
          )
        : [],
    [layer, layout, stave, xScale, yScale],
  )
  return <ShapesView shapes={placed} />
}

/** The staves as a chart with one lot axis and an axis per stave, domains and marks from the core. */
export const StaffPlot = memo(function StaffPlot({ layout }: { readonly layout: StaffLayout }) {
  const { width, height, plot, frame, chart, staves } = layout
  const layers = useMemo(() => plotLayers(layout), [layout])
  const margins = useMemo(() => marginShapes(layout), [layout])
  const data = useMemo(
    () =>
      // Domains are given: the ends of the window stand for all the lots between them.
      [...new Set([chart.window.from, chart.window.to])].flatMap((index) => {
        const lot = chart.lots[index]
        return lot ? [{ index, code: lot.code }] : []
      }),
    [chart],
  )
  const [first] = staves
  return (
    <ComposedChart
      width={width}
      height={height}
      data={data}
      accessibilityLayer={false}
      margin={{
        top: plot.y,
        left: plot.x,
        right: width - plot.x - plot.w,
        bottom: height - plot.y - plot.h,
      }}
    >
      <XAxis
        xAxisId={LOTS}
        type="number"
        dataKey="index"
        domain={[frame.domain[0], frame.domain[1]]}
        allowDataOverflow
        hide
      />
      {staves.map(({ stave, domain }) => (
        <YAxis
          key={stave.key}
          yAxisId={stave.key}
          type="number"
          domain={[domain[0], domain[1]]}
          allowDataOverflow
          hide
        />
      ))}
      {layers.map((layer, place) => {
        const stave = staves.find((one) => one.stave.key === layer.stave) ?? first
        const key = `${place}-${layer.stave ?? ''}`
        return stave ? <PlacedLayer key={key} layer={layer} stave={stave} layout={layout} /> : null
      })}
      <ShapesView shapes={margins} />
    </ComposedChart>
  )
})
