import { LotStrip } from '@/app/_ui/charts/LotStrip'
import { type VerdictKind, VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { type CharacteristicId, characteristics } from '@/lib/domain/metrology/characteristics'
import { type ClosureVerdict, COVERAGE_FACTOR } from '@/lib/domain/metrology/closure'
import { guardBand } from '@/lib/domain/quality/guard-band'
import type { LotJudgement } from '@/lib/domain/quality/judge-lot'
import { limitsOf } from '@/lib/domain/quality/tolerances'
import { displayUnit } from '@/lib/domain/record/display-unit'
import { noteName } from '@/lib/domain/strings/pitch'
import { decimalsForUncertainty, formatNumber, formatQuantity } from '@/lib/domain/units/format'
import { differenceFromSi, fromSi } from '@/lib/domain/units/unit'
import type { LotView } from '@/lib/services/get-lot'

const shown = [
  'diameter',
  'ovality',
  'massPerMetreWeighed',
  'massPerMetreSounded',
  'closure',
  'effectiveDensity',
  'densityCheckWeighed',
  'densityCheckSounded',
  'tension',
  'pitchError',
] as const satisfies readonly CharacteristicId[]

const conformityMark: Readonly<Record<LotJudgement['verdict'], VerdictKind>> = {
  inside: 'within',
  'not proven': 'near',
  outside: 'beyond',
}
const closureMark: Readonly<Record<ClosureVerdict, VerdictKind>> = {
  closed: 'within',
  doubtful: 'near',
  open: 'beyond',
}

const signedOnes = new Set<CharacteristicId>([
  'closure',
  'pitchError',
  'densityCheckWeighed',
  'densityCheckSounded',
])

const probabilityText = (probability: number): string =>
  probability > 0.999
    ? '> 0.999'
    : probability < 0.001
      ? '< 0.001'
      : formatNumber(probability, { decimals: 3 })

/** Lot mean ± U on a strip with its specimens, tolerance, guard band and control limits; the verdict in a word. */
export function ResultsTable({ view }: { readonly view: LotView }) {
  const { assessment, controlLimits, specification, specimens, works } = view
  const decimal = works.numberFormat
  const rows = shown.flatMap((id) => {
    const summary = assessment.summaries[id]
    if (!summary) return []
    const { decimals, unit } = displayUnit(id, works.units)
    const judgement = assessment.judgements.find((one) => one.id === id)
    const limits = limitsOf(specification.body, id)
    const control = controlLimits.find((one) => one.characteristic === id && one.statistic === 'mean')
    const beyond =
      control !== undefined &&
      ((control.upper !== undefined && summary.mean > control.upper) ||
        (control.lower !== undefined && summary.mean < control.lower))
    const expanded = differenceFromSi(COVERAGE_FACTOR * summary.uMean, unit)
    const digits = Math.max(0, Math.min(decimals + 1, decimalsForUncertainty(expanded) ?? decimals))
    const show = (si: number, places = decimals): string =>
      formatQuantity(si, unit, {
        decimals: places,
        decimal,
        sign: signedOnes.has(id) ? 'always' : 'negative',
      })
    const closure = id === 'closure' ? assessment.proposal.closure : undefined
    const verdict = closure
      ? { mark: closureMark[closure], word: closure as string }
      : judgement
        ? { mark: conformityMark[judgement.verdict], word: judgement.verdict as string }
        : undefined
    const inUnit = (si: number | undefined): number | undefined =>
      si === undefined ? undefined : fromSi(si, unit)
    const tolerance = !limits
      ? ''
      : limits.lower === undefined
        ? `at most ${show(limits.upper ?? 0, Math.min(decimals, 1))}`
        : `${show(limits.lower, Math.min(decimals, 1))} – ${show(limits.upper ?? 0, Math.min(decimals, 1))}`
    const { reference } = specification.body
    return [
      {
        id,
        name:
          id === 'tension'
            ? `Tension, ${noteName(reference.midi)} on ${formatNumber(reference.length * 1000, { decimals: 0 })} mm`
            : characteristics[id].name,
        meaning: characteristics[id].meaning,
        unit,
        mean: show(summary.mean, digits),
        expanded:
          Number(expanded.toFixed(digits)) > 0
            ? formatNumber(expanded, { decimals: digits, decimal })
            : undefined,
        n: summary.n,
        spread:
          judgement?.s === undefined
            ? undefined
            : formatNumber(differenceFromSi(judgement.s, unit), { decimals: decimals + 1, decimal }),
        tolerance,
        verdict,
        beyond,
        probability: judgement ? probabilityText(judgement.probability) : '',
        strip: {
          label: characteristics[id].name,
          unit,
          decimals,
          decimal,
          signed: signedOnes.has(id),
          mean: inUnit(summary.mean),
          expanded,
          specimens: specimens.flatMap((one) => inUnit(one.results[id]?.value) ?? []),
          lower: inUnit(limits?.lower),
          upper: inUnit(limits?.upper),
          guard: judgement
            ? differenceFromSi(guardBand(judgement.limits, judgement.u, judgement.guardFactor).width, unit)
            : undefined,
          controlLower: inUnit(control?.lower),
          controlUpper: inUnit(control?.upper),
          beyond,
        },
      },
    ]
  })
  return (
    <div className="table-frame">
      <table className="table stack lots-results">
        <caption className="visually-hidden">
          Results of the lot with tolerance, verdict and probability
        </caption>
        <thead>
          <tr>
            <th scope="col">Characteristic</th>
            <th scope="col" className="number">
              Lot mean ± U
            </th>
            <th scope="col">
              <span className="visually-hidden">Drawn</span>
            </th>
            <th scope="col">Tolerance</th>
            <th scope="col">Verdict</th>
            <th scope="col" className="number">
              Probability
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id}>
              <th scope="row" title={row.meaning}>
                {row.name} <span className="unit">{row.unit}</span>
              </th>
              <td className="number" data-head="Lot mean ± U">
                <span>
                  <b>{row.mean}</b> {row.expanded ? <small>± {row.expanded}</small> : null}
                </span>
              </td>
              <td className="strip">
                <LotStrip {...row.strip} />
              </td>
              <td data-head="Tolerance">
                {row.tolerance ? (
                  <span>
                    {row.tolerance}
                    {row.spread ? <small> s = {row.spread}</small> : null}
                  </span>
                ) : null}
              </td>
              <td data-head="Verdict">
                {row.verdict || row.beyond ? (
                  <span>
                    {row.verdict ? (
                      <span className="lots-verdict-cell">
                        <VerdictMark verdict={row.verdict.mark} /> <em>{row.verdict.word}</em>
                      </span>
                    ) : null}
                    {row.beyond ? <em className="vermilion"> beyond its control limit</em> : null}
                  </span>
                ) : null}
              </td>
              <td className="number" data-head="Probability">
                {row.probability || null}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
