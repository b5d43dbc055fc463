import Link from 'next/link'
import { chartName } from '@/lib/domain/record/display-unit'
import {
  type ChartChoice,
  chartId,
  type DriftOrder,
  driftOrders,
  offeredCharts,
} from '@/lib/input/drift-view'
import { type DriftSubject, driftAddress, stavesParameter } from './drift-address'

interface Props {
  readonly subject: DriftSubject
  readonly shown: readonly ChartChoice[]
  readonly order: DriftOrder
}

const orderWords: Readonly<Record<DriftOrder, string>> = {
  made: 'as made',
  measured: 'as measured',
}

/** Which staves are drawn, each name putting its stave on or taking it off, and in which order the lots stand. */
export function StaveChoice({ order, shown, subject }: Props) {
  const ids = new Set(shown.map(chartId))
  return (
    <div className="drift-choices no-print">
      <nav className="drift-staves" aria-label="Staves">
        <span>Staves</span>
        {offeredCharts.map((choice) => {
          const id = chartId(choice)
          const on = ids.has(id)
          const next = offeredCharts.filter((one) => (one === choice ? !on : ids.has(chartId(one))))
          return (
            <Link
              key={id}
              href={driftAddress(subject, {
                staves: stavesParameter(next.length > 0 ? next : [choice]),
                order,
              })}
              prefetch={false}
              scroll={false}
              aria-current={on ? 'true' : undefined}
            >
              {chartName(choice.characteristic, choice.statistic)}
            </Link>
          )
        })}
      </nav>
      <nav className="drift-staves" aria-label="Order of the lots">
        <span>Lots</span>
        {driftOrders.map((one) => (
          <Link
            key={one}
            href={driftAddress(subject, { staves: stavesParameter(shown), order: one })}
            prefetch={false}
            scroll={false}
            aria-current={one === order ? 'true' : undefined}
          >
            {orderWords[one]}
          </Link>
        ))}
      </nav>
    </div>
  )
}
