import { machineChartFile } from '@/app/api/v1/drift/_chart-file'

export const GET = machineChartFile('svg')
