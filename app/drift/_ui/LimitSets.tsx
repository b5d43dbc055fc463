import { formatDate } from '@/app/_ui/format/dates'
import { chartName, chartUnit } from '@/lib/domain/record/display-unit'
import { formatNumber } from '@/lib/domain/units/format'
import { differenceFromSi, fromSi } from '@/lib/domain/units/unit'
import type { WorksFacts } from '@/lib/services/get-works'
import type { LimitSetView } from '@/lib/services/limit-set-view'

interface Props {
  readonly sets: readonly LimitSetView[]
  readonly works: WorksFacts
}

const lotsText = (set: LimitSetView): string => {
  const span = set.firstLotCode && set.lastLotCode ? ` (${set.firstLotCode} to ${set.lastLotCode}` : undefined
  const left = set.leftOut.length > 0 ? `, ${set.leftOut.length} left out` : ''
  return `${set.lotCount} lots${span ? `${span}${left})` : ''}`
}

/** Limit sets in words and numbers, newest first. */
export function LimitSets({ sets, works }: Props) {
  if (sets.length === 0) return null
  return (
    <ul className="drift-sets">
      {[...sets].reverse().map((set) => {
        const { unit, decimals } = chartUnit(set.characteristic, set.statistic, works.units)
        const show = set.statistic === 'mean' ? fromSi : differenceFromSi
        const text = (value: number | undefined): string =>
          formatNumber(value === undefined ? undefined : show(value, unit), {
            decimals,
            decimal: works.numberFormat,
          })
        return (
          <li key={set.id} data-left-out={set.supersededAt === undefined ? undefined : true}>
            <b>
              {chartName(set.characteristic, set.statistic)}, set {set.number}
            </b>
            <span>
              {set.lower === undefined
                ? `centre ${text(set.centre)}, at most ${text(set.upper)} ${unit}`
                : `${text(set.lower)} · ${text(set.centre)} · ${text(set.upper)} ${unit}`}
            </span>
            <span className="small">
              {lotsText(set)}, {set.sigmaEstimator}
              {set.provisional ? ', provisional' : ''}
              {set.rules?.includes('nine-on-one-side') === false ? ', runs not asked for' : ''}; frozen{' '}
              {formatDate(set.frozenAt, works.timeZone)}
              {set.frozenBy ? ` by ${set.frozenBy}` : ''}
              {set.reason ? `: “${set.reason}”` : ''}
            </span>
            {set.leftOut.length > 0 ? (
              <details className="small">
                <summary>Left out</summary>
                <ul>
                  {set.leftOut.map(({ lotCode, reason }) => (
                    <li key={lotCode}>
                      {lotCode}: {reason}
                    </li>
                  ))}
                </ul>
              </details>
            ) : null}
          </li>
        )
      })}
    </ul>
  )
}
