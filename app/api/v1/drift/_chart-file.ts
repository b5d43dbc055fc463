import { replyFile } from '@/app/api/_reply'
import { parsedOrThrow, reading } from '@/app/api/_route'
import { type ChartFormat, chartFileSchema } from '@/lib/input/chart-file'
import { saveDriftChart, saveMachineChart } from '@/lib/services/save-drift-chart'

/** A route that gives a product's staff chart as a file. */
export const chartFile = (format: ChartFormat) =>
  reading(async (actor, query, { product = '' }) =>
    replyFile(await saveDriftChart(actor, product, format, parsedOrThrow(chartFileSchema, query))),
  )

/** The same of a machine over its products. */
export const machineChartFile = (format: ChartFormat) =>
  reading(async (actor, query, { code = '' }) =>
    replyFile(await saveMachineChart(actor, code, format, parsedOrThrow(chartFileSchema, query))),
  )
