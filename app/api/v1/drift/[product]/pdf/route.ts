import { chartFile } from '../../_chart-file'

export const GET = chartFile('pdf')
