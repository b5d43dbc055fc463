/** A page with nothing but one staff chart on it, for tests that need a real browser's layout. */
import { createRoot } from 'react-dom/client'
import { StaffChart } from '@/app/_ui/charts/StaffChart'
import { buildStaffChart, newestWindow } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { svgText } from '@/lib/domain/charts/svg'
import { type SampleOptions, sampleChart } from './staff-chart-sample'

declare global {
  interface Window {
    /** Draws the sample and returns the file that the same data give at the same width. */
    drawSample: (options: SampleOptions, width: number) => string
    opened: string[]
  }
}

window.opened = []
const place = document.getElementById('chart')
const root = place ? createRoot(place) : undefined

window.drawSample = (options, width) => {
  const input = sampleChart(options)
  root?.render(
    <StaffChart
      key={JSON.stringify([options, width])}
      input={input}
      width={width}
      onOpen={(code) => window.opened.push(code)}
    />,
  )
  const shown = input.window ?? newestWindow(input.lots.length)
  return svgText(drawStaffChart(layoutStaffChart(buildStaffChart({ ...input, window: shown }), width)))
}
