'use client'

import dynamic from 'next/dynamic'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'

const StaffChart = dynamic(() => import('@/app/_ui/charts/StaffChart').then((part) => part.StaffChart), {
  ssr: false,
  loading: () => <div className="drift-waits short">The chart is being drawn.</div>,
})

export function ProposalChart({ input }: { readonly input: StaffChartInput }) {
  return <StaffChart input={input} />
}
