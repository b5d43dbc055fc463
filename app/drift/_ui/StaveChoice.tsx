import Link from 'next/link'
import { chartName } from '@/lib/domain/record/display-unit'
import { type ChartChoice, chartId, defaultCharts, offeredCharts } from '@/lib/input/drift-view'

/** The address of a product's chart with these staves, the usual ones unnamed. */
export function stavesParameter(charts: readonly ChartChoice[]): string {
  const ids = charts.map(chartId).join(',')
  return ids === defaultCharts.map(chartId).join(',') ? '' : ids
}

export const driftHref = (productCode: string, staves = '', lot?: string): string =>
  `/drift?${new URLSearchParams({
    product: productCode,
    ...(staves ? { staves } : {}),
    ...(lot ? { lot } : {}),
  })}`

interface Props {
  readonly productCode: string
  readonly shown: readonly ChartChoice[]
}

/** Which staves are drawn: each name puts its stave on or takes it off; the last one stays. */
export function StaveChoice({ productCode, shown }: Props) {
  const ids = new Set(shown.map(chartId))
  return (
    <nav className="drift-staves no-print" aria-label="Staves">
      <span>Staves</span>
      {offeredCharts.map((choice) => {
        const id = chartId(choice)
        const on = ids.has(id)
        const next = offeredCharts.filter((one) => (one === choice ? !on : ids.has(chartId(one))))
        return (
          <Link
            key={id}
            href={driftHref(productCode, stavesParameter(next.length > 0 ? next : [choice]))}
            prefetch={false}
            scroll={false}
            aria-current={on ? 'true' : undefined}
          >
            {chartName(choice.characteristic, choice.statistic)}
          </Link>
        )
      })}
    </nav>
  )
}
