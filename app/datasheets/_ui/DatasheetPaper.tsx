import { formatDate } from '@/app/_ui/format/dates'
import { Cautions } from '@/app/_ui/shell/Cautions'
import type { DatasheetBody, DatasheetCell, WorkingState } from '@/lib/domain/datasheets/datasheet'
import { basisSentences } from '@/lib/domain/datasheets/tension-by-basis'
import { WORKING_BOUNDS } from '@/lib/domain/datasheets/working-state'
import { formatNumber, formatQuantity } from '@/lib/domain/units/format'

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

const unitNames: Readonly<Record<DatasheetBody['forceUnit'], string>> = {
  N: 'newtons',
  kgf: 'kilograms-force',
  lbf: 'pounds-force',
}

const stateWords: Readonly<Record<WorkingState, string>> = {
  slack: `below ${WORKING_BOUNDS.slack}, slack`,
  working: `${WORKING_BOUNDS.slack} to ${WORKING_BOUNDS.working}, working`,
  upper: `${WORKING_BOUNDS.working} to ${WORKING_BOUNDS.upper}, only if the maker of the instrument agrees`,
  over: `above ${WORKING_BOUNDS.upper}, not offered`,
}

/** A datasheet as it is printed: white paper and ink in either theme. */
export function DatasheetPaper({ body, decimal, timeZone, published }: Props) {
  const { massPerMetre, diameter, effectiveDensity, reference } = body
  const number = (value: number, decimals: number): string => formatNumber(value, { decimals, decimal })
  const figures: readonly { name: string; value: string; note?: string }[] = [
    {
      name: 'Mass per metre',
      value: formatQuantity(massPerMetre.value, 'mg/m', { decimals: 1, decimal, withUnit: true }),
      note:
        massPerMetre.expanded === undefined
          ? undefined
          : `± ${formatQuantity(massPerMetre.expanded, 'mg/m', { decimals: 1, decimal })} (k = 2)`,
    },
    {
      name: 'Diameter',
      value: formatQuantity(diameter.value, 'mm', { decimals: 4, decimal, withUnit: true }),
      note:
        diameter.expanded === undefined
          ? 'by the specification'
          : `± ${formatQuantity(diameter.expanded, 'mm', { decimals: 4, decimal })} (k = 2)`,
    },
    {
      name: 'Effective density',
      value: formatQuantity(effectiveDensity.value, 'kg/m³', { decimals: 0, decimal, withUnit: true }),
      note: 'of the measured circle',
    },
    {
      name: 'Breaking load',
      value: body.breakingLoad
        ? formatQuantity(body.breakingLoad.value, body.forceUnit, { decimals: 0, decimal, withUnit: true })
        : '–',
      note: body.breakingLoad ? 'least, by the material’s table' : 'not known',
    },
    {
      name: `${reference.note} on ${number(reference.length * 1000, 0)} mm`,
      value: formatQuantity(reference.tension, body.forceUnit, {
        decimals: body.decimals,
        decimal,
        withUnit: true,
      }),
      note: `${number(reference.frequency, 2)} Hz`,
    },
    {
      name: 'Wave speed',
      value: `${number(reference.waveSpeed, 1)} m/s`,
      note: `at ${reference.note}`,
    },
    {
      name: 'One semitone up',
      value: `+${number(reference.semitoneRatio * 100, 1)} %`,
      note: 'tension',
    },
    {
      name: 'One cent',
      value: formatQuantity(reference.newtonsPerCent, body.forceUnit, {
        decimals: 2,
        decimal,
        withUnit: true,
      }),
      note: `at ${reference.note}`,
    },
  ]
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
          {figures.map(({ name, note, value }) => (
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
          Tension in {unitNames[body.forceUnit]}{' '}
          <small>
            with the share of the least breaking load beside it. A4 = {number(body.a4, 0)} Hz, equal
            temperament, 20 °C
          </small>
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
                    {number(length * 1000, length * 1000 === Math.round(length * 1000) ? 0 : 1)} mm
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {body.rows.map((row) => (
                <tr key={row.midi}>
                  <th scope="row">{row.note}</th>
                  <td>{number(row.frequency, 2)}</td>
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
              <span className={`datasheet-swatch ${state}`} aria-hidden="true" /> {stateWords[state]}
            </li>
          ))}
        </ul>
      </section>

      <div className="datasheet-two">
        <section aria-labelledby="datasheet-made">
          <h2 id="datasheet-made">What the works really makes</h2>
          <p>Mass per metre of the released lots. {body.spread.statement}</p>
        </section>
        <section aria-labelledby="datasheet-method">
          <h2 id="datasheet-method">How it was found</h2>
          <p>{body.method.replace(` ${basisSentences[body.basis]}`, '')}</p>
          <p>
            <b>{basisSentences[body.basis]}</b>{' '}
            {body.basis === 'unloaded-mass'
              ? `EA = ${formatQuantity(body.axialStiffness, 'N', { decimals: 0, decimal, withUnit: true })}.`
              : body.basis === 'loaded-mass'
                ? `µ_loaded = ${formatQuantity(body.loadedMassPerMetre, 'mg/m', { decimals: 2, decimal, withUnit: true })}.`
                : null}
          </p>
          <p>
            Stiffness is not in the table; at {reference.note} it adds less than a tenth of a cent to a thin
            string.
          </p>
        </section>
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
  return (
    <td className={`datasheet-cell ${cell.state}`}>
      <span className="tension">
        {cell.state === 'over'
          ? 'over'
          : formatQuantity(cell.tension, body.forceUnit, { decimals: body.decimals, decimal })}
      </span>
      <span className="share">
        {cell.fraction === undefined ? '' : formatNumber(cell.fraction, { decimals: 2, decimal })}
      </span>
    </td>
  )
}
