import type { Today } from '@/lib/services/get-today'

/** The day and the week in four figures. */
export function DayFigures({ day, week }: NonNullable<Today['figures']>) {
  const share = week.firstDecided === 0 ? undefined : (100 * week.rightFirstTime) / week.firstDecided
  return (
    <dl className="today-figures">
      <Figure name="made" today={day.made} week={week.made} />
      <Figure name="measured" today={day.measured} week={week.measured} />
      <Figure name="released" today={day.released} week={week.released} />
      <div>
        <dt>right first time</dt>
        <dd>
          <b>{share === undefined ? '–' : `${Math.round(share)} %`}</b>{' '}
          {week.firstDecided === 0
            ? 'nothing decided in seven days'
            : `${week.rightFirstTime} of ${week.firstDecided} decided in seven days`}
        </dd>
      </div>
    </dl>
  )
}

function Figure({
  name,
  today,
  week,
}: {
  readonly name: string
  readonly today: number
  readonly week: number
}) {
  return (
    <div>
      <dt>lots {name}</dt>
      <dd>
        <b>{today}</b> today, {week} in seven days
      </dd>
    </div>
  )
}
