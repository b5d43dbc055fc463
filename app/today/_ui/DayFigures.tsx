import type { Today } from '@/lib/services/get-today'

/** The day and the week in figures. */
export function DayFigures({ day, week }: NonNullable<Today['figures']>) {
  return (
    <section className="section" aria-labelledby="today-figures">
      <table className="today-figures">
        <caption id="today-figures">Lots</caption>
        <thead>
          <tr>
            <td />
            <th scope="col">today</th>
            <th scope="col">seven days</th>
          </tr>
        </thead>
        <tbody>
          <Row name="made" day={day.made} week={week.made} />
          <Row name="measured" day={day.measured} week={week.measured} />
          <Row name="released" day={day.released} week={week.released} />
          <Row name="right first time" day={shareOf(day)} week={shareOf(week)} />
        </tbody>
      </table>
      <p className="small">Right first time: released by the first decision.</p>
    </section>
  )
}

/** Share of the lots decided for the first time that were released then; a dash when none was. */
const shareOf = ({ firstDecided, rightFirstTime }: NonNullable<Today['figures']>['day']): string =>
  firstDecided === 0 ? '–' : `${Math.round((100 * rightFirstTime) / firstDecided)} %`

interface RowProps {
  readonly name: string
  readonly day: number | string
  readonly week: number | string
}

function Row({ day, name, week }: RowProps) {
  return (
    <tr>
      <th scope="row">{name}</th>
      <td>{day}</td>
      <td>{week}</td>
    </tr>
  )
}
