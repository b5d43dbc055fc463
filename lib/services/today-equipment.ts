import { listGaugesDueBefore } from '@/lib/data/gauges'
import { countReadingsOf } from '@/lib/data/today-desks'
import { shortDate } from './short-date'
import {
  type AskedToday,
  counted,
  DAY,
  type FoundToday,
  SHOWN,
  totalOf,
  type WaitingItem,
} from './today-item'

/** Calibrations are told of this many days before they fall due: a laboratory takes weeks. */
const TOLD_BEFORE_DAYS = 30

/** Measuring equipment that is overdue or falls due within a month, with the readings that rest on it. */
export async function equipmentOfToday({ at, desks, tx, works }: AskedToday): Promise<FoundToday> {
  const due = await listGaugesDueBefore(tx, at + TOLD_BEFORE_DAYS * DAY)
  const readings = await countReadingsOf(tx, due, at - TOLD_BEFORE_DAYS * DAY)
  const items = due.map((gauge): WaitingItem => {
    const dueAt = gauge.calibrationDueAt ?? at
    const overdue = dueAt < at
    const days = Math.floor((dueAt - at) / DAY)
    const count = readings.get(gauge.id) ?? 0
    return {
      kind: overdue ? 'gauge-overdue' : 'gauge-due',
      key: `gauge ${gauge.code}`,
      since: dueAt,
      mark: overdue ? 'beyond' : 'near',
      title: overdue
        ? `The calibration of ${gauge.code} is overdue`
        : `${gauge.code} is due on ${shortDate(dueAt, works.timeZone)}`,
      text: overdue
        ? `${gauge.name}. Lots measured with it are not proposed for release until somebody answers for it.`
        : `${gauge.name}. After that day lots measured with it are not proposed for release.`,
      stake:
        count === 0
          ? 'no reading this month'
          : `${counted(count, 'reading', 'readings')} of lots of this month`,
      waiting: overdue
        ? `since ${shortDate(dueAt, works.timeZone)}`
        : days < 1
          ? 'today'
          : `${counted(days, 'day', 'days')} left`,
      href: `/equipment/gauges/${encodeURIComponent(gauge.code)}`,
      deed: desks.includes('quality') ? 'Calibrate' : 'Look',
    }
  })
  const shown = (kind: WaitingItem['kind']) => items.filter((item) => item.kind === kind)
  return {
    items: [...shown('gauge-overdue').slice(0, SHOWN), ...shown('gauge-due').slice(0, SHOWN)],
    totals: [
      ...totalOf('gauge-overdue', shown('gauge-overdue').length, '/equipment'),
      ...totalOf('gauge-due', shown('gauge-due').length, '/equipment'),
    ],
  }
}
