import { formatDate } from '@/app/_ui/format/dates'

const day_ms = 24 * 3600_000
const soon_days = 30

interface DueProps {
  /** Epoch milliseconds; undefined: not calibrated to a date. */
  readonly at: number | undefined
  readonly now: number
  readonly timeZone: string
}

/** When a calibration falls due, in words that colour only supports. */
export function Due({ at, now, timeZone }: DueProps) {
  if (at === undefined) return <span className="slate">no date set</span>
  const date = formatDate(at, timeZone)
  const days = Math.floor((at - now) / day_ms)
  if (at < now) return <b className="vermilion">overdue since {date}</b>
  if (days <= soon_days)
    return (
      <span className="brass">
        {date}, {days === 0 ? 'today' : days === 1 ? 'a day left' : `${days} days left`}
      </span>
    )
  return date
}
