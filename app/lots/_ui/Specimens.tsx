import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { formatDateTime } from '@/app/_ui/format/dates'
import {
  type CharacteristicId,
  characteristicIds,
  characteristics,
} from '@/lib/domain/metrology/characteristics'
import { COVERAGE_FACTOR } from '@/lib/domain/metrology/closure'
import type { BudgetLine } from '@/lib/domain/metrology/evaluation'
import { displayUnit } from '@/lib/domain/record/display-unit'
import { decimalsForUncertainty, formatNumber, formatQuantity } from '@/lib/domain/units/format'
import { differenceFromSi } from '@/lib/domain/units/unit'
import type { LotView } from '@/lib/services/get-lot'
import type { ReadingView, SpecimenView } from '@/lib/services/specimen-view'

const takenAtText = (sheet: SpecimenView['sheet']): string => {
  const { takenAt } = sheet
  if (!takenAt) return ''
  return 'end' in takenAt
    ? `from the ${takenAt.end}`
    : `at ${formatNumber(takenAt.metres, { decimals: 0 })} m`
}

/** A small number as it is read: 3.4e−5 needs no counting of zeros. */
const small = (value: number): string => {
  if (value === 0) return '0'
  const size = Math.abs(value)
  if (size >= 0.001 && size < 1e6) return String(Number(value.toPrecision(4))).replace('-', '−')
  const [digits = '', exponent = ''] = value.toExponential(2).split('e')
  return `${digits.replace('-', '−')} × 10^${exponent.replace('+', '').replace('-', '−')}`
}

/** Every specimen with what was read, what was corrected and where its uncertainty comes from. */
export function Specimens({ view }: { readonly view: LotView }) {
  return (
    <section className="section">
      <h2>
        Specimens <small>open one for readings, corrections and budgets</small>
      </h2>
      {view.specimens.map((specimen) => (
        <details key={specimen.number} className="lots-specimen">
          <summary>
            <b>Specimen {specimen.number}</b> {takenAtText(specimen.sheet)}
            {specimen.assessment?.closure ? (
              <>
                {' · '}
                <em>{specimen.assessment.closure.verdict}</em>
              </>
            ) : null}
            {Object.values(specimen.assessment?.verdicts ?? {}).includes('outside') ? (
              <>
                {' · '}
                <VerdictMark verdict="beyond" /> <em className="vermilion">outside a tolerance</em>
              </>
            ) : null}
            {specimen.evaluation?.verified === false ? (
              <>
                {' · '}
                <em className="vermilion">computes differently now</em>
              </>
            ) : null}
          </summary>
          <div>
            <Results view={view} specimen={specimen} />
            <Readings view={view} specimen={specimen} />
            <Corrections specimen={specimen} />
            <Budgets view={view} specimen={specimen} />
            <Provenance view={view} specimen={specimen} />
          </div>
        </details>
      ))}
    </section>
  )
}

function Results({ view, specimen }: { readonly view: LotView; readonly specimen: SpecimenView }) {
  const { works } = view
  const rows = characteristicIds.flatMap((id) => {
    const estimate = specimen.results[id]
    if (!estimate) return []
    const { decimals, unit } = displayUnit(id, works.units)
    const expanded = differenceFromSi(COVERAGE_FACTOR * estimate.u, unit)
    const digits = Math.max(0, Math.min(decimals + 1, decimalsForUncertainty(expanded) ?? decimals))
    return [
      {
        id,
        name: characteristics[id].name,
        unit,
        value: formatQuantity(estimate.value, unit, { decimals: digits, decimal: works.numberFormat }),
        expanded: formatNumber(expanded, { decimals: digits, decimal: works.numberFormat }),
        common: formatNumber(differenceFromSi(estimate.uCommon * COVERAGE_FACTOR, unit), {
          decimals: digits,
          decimal: works.numberFormat,
        }),
        verdict: specimen.assessment?.verdicts[id],
      },
    ]
  })
  return (
    <div className="table-frame">
      <table className="table dense">
        <caption className="visually-hidden">Results of specimen {specimen.number}</caption>
        <thead>
          <tr>
            <th scope="col">Result</th>
            <th scope="col" className="number">
              Value
            </th>
            <th scope="col" className="number">
              ± U (k = 2)
            </th>
            <th scope="col" className="number">
              of it common to the lot
            </th>
            <th scope="col">Against its tolerance</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id}>
              <th scope="row">
                {row.name} <span className="unit">{row.unit}</span>
              </th>
              <td className="number">{row.value}</td>
              <td className="number">{row.expanded}</td>
              <td className="number">{row.common}</td>
              <td>{row.verdict ? <em>{row.verdict}</em> : ''}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {specimen.missing.length > 0 ? <p className="small">{specimen.missing.join(' ')}</p> : null}
    </div>
  )
}

const readingParts = (reading: ReadingView): readonly string[] => {
  const { values } = reading
  const typed = (one: { readonly typed: string; readonly unit: string }): string =>
    /[a-zµ°"%]/i.test(one.typed) ? one.typed : `${one.typed} ${one.unit}`
  const load = values.load
  return [
    ...(values.diameters && values.diameters.length > 0
      ? [
          `diameter ${values.diameters.map((one) => `${one.position}${one.direction} ${one.value.typed}`).join(', ')} ${values.diameters[0]?.value.unit ?? ''}`,
        ]
      : []),
    ...(values.cutLength ? [`cut length ${typed(values.cutLength)}, ${values.weighedState ?? 'slack'}`] : []),
    ...(values.cutMass ? [`cut mass ${typed(values.cutMass)}`] : []),
    ...(load?.kind === 'weights'
      ? [`hanging ${[load.hanger, ...load.weights].filter(Boolean).join(', ')}`]
      : []),
    ...(load && load.kind !== 'weights' ? [`load ${typed(load.value)}`] : []),
    ...(values.span ? [`span ${typed(values.span)}`] : []),
    ...(values.frequencies && values.frequencies.length > 0
      ? [`frequency ${values.frequencies.map(typed).join(', ')}`]
      : []),
    ...(values.temperature ? [typed(values.temperature)] : []),
  ]
}

function Readings({ view, specimen }: { readonly view: LotView; readonly specimen: SpecimenView }) {
  return (
    <>
      <h3>Readings, as typed</h3>
      <ul>
        {specimen.readings.map((reading) => (
          <li key={reading.clientId}>
            <span className={reading.supersededBy ? 'lots-struck' : undefined}>
              {readingParts(reading).join('; ')}
            </span>{' '}
            <span className="small">
              {reading.supersededBy ? 'superseded; ' : ''}
              {reading.supersedes ? `corrects an earlier reading: “${reading.reason}”; ` : ''}
              {formatDateTime(reading.measuredAt, view.works.timeZone)}
              {reading.person ? `, ${reading.person}` : ''}
              {Object.values(reading.equipment).length > 0
                ? `, with ${Object.values(reading.equipment).filter(Boolean).join(', ')}`
                : ''}
            </span>
            {(reading.values.keptDoubts ?? []).map((doubt) => (
              <p key={doubt.field} className="small">
                Asked “{doubt.question}” and kept: {doubt.reason}
              </p>
            ))}
          </li>
        ))}
      </ul>
    </>
  )
}

const onNames: Readonly<Record<string, string>> = {
  diameter: 'diameter',
  massPerMetreWeighed: 'mass per metre, weighed',
  massPerMetreSounded: 'mass per metre, sounded',
  force: 'force on the string',
}

function Corrections({ specimen }: { readonly specimen: SpecimenView }) {
  if (specimen.corrections.length === 0) return null
  return (
    <>
      <h3>Corrections that were made</h3>
      <div className="table-frame">
        <table className="table dense">
          <caption className="visually-hidden">Corrections of specimen {specimen.number}</caption>
          <thead>
            <tr>
              <th scope="col">Correction</th>
              <th scope="col">on</th>
              <th scope="col" className="number">
                Size <span className="unit">%</span>
              </th>
              <th scope="col" className="number">
                <span className="unit">cents</span>
              </th>
              <th scope="col">Formula and source</th>
            </tr>
          </thead>
          <tbody>
            {specimen.corrections.map((one) => (
              <tr key={one.id}>
                <th scope="row">{one.name}</th>
                <td>{onNames[one.on]}</td>
                <td className="number">
                  {formatNumber(one.relative * 100, { decimals: 4, sign: 'always' })}
                </td>
                <td className="number">{formatNumber(one.cents, { decimals: 2, sign: 'always' })}</td>
                <td>
                  <small>
                    {one.formula}. {one.source}{' '}
                    {one.outside ? <em className="brass">{one.outside}</em> : null}
                  </small>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  )
}

function Budgets({ view, specimen }: { readonly view: LotView; readonly specimen: SpecimenView }) {
  const ids = characteristicIds.filter((id) => (specimen.budgets[id]?.length ?? 0) > 0)
  if (ids.length === 0) return null
  return (
    <>
      <h3>Where the uncertainty comes from</h3>
      {ids.map((id) => (
        <details key={id}>
          <summary>{characteristics[id].name}</summary>
          <BudgetTable
            view={view}
            id={id}
            lines={specimen.budgets[id] ?? []}
            total={specimen.results[id]?.u ?? 0}
          />
        </details>
      ))}
    </>
  )
}

function BudgetTable({
  view,
  id,
  lines,
  total,
}: {
  readonly view: LotView
  readonly id: CharacteristicId
  readonly lines: readonly BudgetLine[]
  readonly total: number
}) {
  const { unit } = displayUnit(id, view.works.units)
  const sorted = lines.toSorted((a, b) => b.contribution - a.contribution)
  return (
    <div className="table-frame">
      <table className="table dense">
        <caption className="visually-hidden">Uncertainty budget: {characteristics[id].name}</caption>
        <thead>
          <tr>
            <th scope="col">Input</th>
            <th scope="col" className="number">
              u of it
            </th>
            <th scope="col">Kind</th>
            <th scope="col" className="number">
              Contribution <span className="unit">{unit}</span>
            </th>
            <th scope="col" className="number">
              Share <span className="unit">%</span>
            </th>
            <th scope="col">In the lot</th>
          </tr>
        </thead>
        <tbody>
          {sorted.map((line) => (
            <tr key={line.input}>
              <th scope="row">
                {line.input} {line.note ? <small>{line.note}</small> : null}
              </th>
              <td className="number">
                {small(line.u)} <span className="unit">{line.unit}</span>
              </td>
              <td>
                {line.type}, {line.distribution}
              </td>
              <td className="number">{small(differenceFromSi(line.contribution, unit))}</td>
              <td className="number">
                {formatNumber(
                  total > 0 ? ((line.contribution * line.contribution) / (total * total)) * 100 : 0,
                  {
                    decimals: 1,
                  },
                )}
              </td>
              <td>{line.common ? 'common' : 'of each specimen'}</td>
            </tr>
          ))}
          <tr className="results">
            <th scope="row">Combined standard uncertainty</th>
            <td />
            <td />
            <td className="number">
              <b>{small(differenceFromSi(total, unit))}</b>
            </td>
            <td />
            <td />
          </tr>
        </tbody>
      </table>
    </div>
  )
}

function Provenance({ view, specimen }: { readonly view: LotView; readonly specimen: SpecimenView }) {
  const { evaluation } = specimen
  if (!evaluation) return null
  const check =
    evaluation.verified === undefined
      ? 'made by an older model, which is not computed again here.'
      : evaluation.verified
        ? 'computed again just now from what is stored: equal to the last bit.'
        : 'computed again just now from what is stored: not equal. Tell whoever looks after this program.'
  return (
    <p className="small">
      Evaluation {evaluation.number}, model {evaluation.modelVersion}, {evaluation.cause},{' '}
      {formatDateTime(evaluation.at, view.works.timeZone)}; {check} Inputs {evaluation.inputHash.slice(0, 12)}
      .
    </p>
  )
}
