import { LotMarks } from '@/app/_ui/charts/LotMarks'
import { TensionCurves } from '@/app/_ui/charts/TensionCurves'
import { formatDate } from '@/app/_ui/format/dates'
import { Cautions } from '@/app/_ui/shell/Cautions'
import { datasheetCurves, datasheetLots } from '@/lib/domain/charts/datasheet-charts'
import type { DatasheetBody, DatasheetCell } from '@/lib/domain/datasheets/datasheet'
import {
  cellInWords,
  figuresInWords,
  forceUnitNames,
  lawInWords,
  lengthInWords,
  methodInWords,
  stiffnessInWords,
  tableInWords,
  workingStateWords,
} from '@/lib/domain/datasheets/datasheet-words'
import { formatNumber } from '@/lib/domain/units/format'

interface Props {
  readonly body: DatasheetBody
  readonly decimal: 'point' | 'comma'
  readonly timeZone: string
  /** Absent while it is only built, not published. */
  readonly published?: {
    readonly code: string
    readonly number: number
    readonly at: number
    readonly by: string
    readonly hash: string
    readonly revisions: readonly {
      readonly number: number
      readonly publishedAt: number
      readonly lots: number
      readonly changes: readonly string[]
    }[]
  }
}

/** A datasheet as it is printed: white paper and ink in either theme. */
export function DatasheetPaper({ body, decimal, timeZone, published }: Props) {
  const states = workingStateWords(decimal)
  const { law, values } = lawInWords(body, decimal)
  const curves = datasheetCurves(body, decimal)
  return (
    <article className="datasheet-paper">
      <header>
        <div>
          <p className="datasheet-works">{body.works}</p>
          <h1>{body.product.name}</h1>
          <p className="datasheet-kind">
            {body.material}, {body.product.construction}
          </p>
        </div>
        <dl>
          <div>
            <dt>Datasheet</dt>
            <dd>{published?.code ?? 'not published'}</dd>
          </div>
          <div>
            <dt>Revision</dt>
            <dd>{published?.number ?? 'draft'}</dd>
          </div>
          <div>
            <dt>Issued</dt>
            <dd>{published ? formatDate(published.at, timeZone) : '–'}</dd>
          </div>
          <div>
            <dt>Specification</dt>
            <dd>revision {body.specification}</dd>
          </div>
        </dl>
      </header>

      <section aria-labelledby="datasheet-figures">
        <h2 id="datasheet-figures">In figures</h2>
        <dl className="datasheet-figures">
          {figuresInWords(body, decimal).map(({ name, note, value }) => (
            <div key={name}>
              <dt>{name}</dt>
              <dd>
                <b>{value}</b>
                {note ? <em>{note}</em> : null}
              </dd>
            </div>
          ))}
        </dl>
      </section>

      <section aria-labelledby="datasheet-table">
        <h2 id="datasheet-table">
          Tension in {forceUnitNames[body.forceUnit]} <small>{tableInWords(body, decimal)}</small>
        </h2>
        {/* biome-ignore lint/a11y/noNoninteractiveTabindex: a table that scrolls sideways has to be reachable by keyboard */}
        <section className="table-frame" tabIndex={0} aria-label="Tension table">
          <table className="datasheet-table">
            <thead>
              <tr>
                <th scope="col">Note</th>
                <th scope="col">Hz</th>
                {body.lengths.map((length) => (
                  <th scope="col" key={length}>
                    {lengthInWords(length, decimal)}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {body.rows.map((row) => (
                <tr key={row.midi}>
                  <th scope="row">{row.note}</th>
                  <td>{formatNumber(row.frequency, { decimals: 2, decimal })}</td>
                  {row.cells.map((cell, index) => (
                    <TensionCell key={body.lengths[index]} cell={cell} body={body} decimal={decimal} />
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </section>
        <ul className="datasheet-legend">
          {(['slack', 'working', 'upper', 'over'] as const).map((state) => (
            <li key={state}>
              <span className={`datasheet-swatch ${state}`} aria-hidden="true" /> {states[state]}
            </li>
          ))}
        </ul>
      </section>

      <div className="datasheet-two">
        {curves ? (
          <section aria-labelledby="datasheet-curves">
            <h2 id="datasheet-curves">Tension against pitch</h2>
            <TensionCurves {...curves} />
          </section>
        ) : null}
        <div>
          <section aria-labelledby="datasheet-made">
            <h2 id="datasheet-made">What the works really makes</h2>
            <LotMarks {...datasheetLots(body, decimal)} />
            <p>Mass per metre of the released lots, one mark a lot. {body.spread.statement}</p>
          </section>
          <section aria-labelledby="datasheet-method">
            <h2 id="datasheet-method">How it was found</h2>
            <p>{methodInWords(body)}</p>
            <p>
              <b>{law}</b> {values}
            </p>
            <p>{stiffnessInWords(body, decimal)}</p>
          </section>
        </div>
      </div>

      <Cautions title="A string under tension can hurt." sentences={body.cautions} />

      {published ? (
        <footer>
          <table className="datasheet-revisions">
            <caption className="visually-hidden">Revisions</caption>
            <thead>
              <tr>
                <th scope="col">Rev.</th>
                <th scope="col">Date</th>
                <th scope="col">What changed</th>
                <th scope="col">Rests on</th>
              </tr>
            </thead>
            <tbody>
              {published.revisions.map((one) => (
                <tr key={one.number} aria-current={one.number === published.number ? 'true' : undefined}>
                  <th scope="row">{one.number}</th>
                  <td>{formatDate(one.publishedAt, timeZone)}</td>
                  <td>{one.changes.join(', ')}</td>
                  <td>
                    {one.lots} {one.lots === 1 ? 'lot' : 'lots'}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
          <p className="datasheet-code">
            Published by {published.by}. Check code {published.hash.slice(0, 12)}
          </p>
        </footer>
      ) : null}
    </article>
  )
}

function TensionCell({
  cell,
  body,
  decimal,
}: {
  readonly cell: DatasheetCell
  readonly body: DatasheetBody
  readonly decimal: 'point' | 'comma'
}) {
  const { share, tension } = cellInWords(cell, body, decimal)
  return (
    <td className={`datasheet-cell ${cell.state}`}>
      <span className="tension">{tension}</span>
      <span className="share">{share}</span>
    </td>
  )
}
