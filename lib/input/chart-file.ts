import { z } from 'zod'
import { driftOrders } from './drift-view'
import { codeText } from './plain-text'

export const chartFormats = ['svg', 'png', 'csv', 'pdf'] as const
export type ChartFormat = (typeof chartFormats)[number]

/** How a saved chart looks: which lots (both ends included), which staves, how wide, on which ground. */
export const chartFileSchema = z.object({
  from: codeText('First lot').optional(),
  to: codeText('Last lot').optional(),
  /** Names of charts, divided by commas. */
  staves: z.string().max(400, { error: 'That is more staves than there are.' }).optional(),
  order: z.enum(driftOrders).default('made'),
  theme: z
    .enum(['light', 'dark', 'print'], { error: 'The ground is one of light, dark, print.' })
    .default('print'),
  width: z.coerce
    .number({ error: 'The width is a number of px.' })
    .int({ error: 'The width is a whole number of px.' })
    .min(360, { error: 'A chart is at least 360 px wide.' })
    .max(4000, { error: 'A chart is at most 4000 px wide.' })
    .default(1200),
})

export type ChartFileInput = z.output<typeof chartFileSchema>
