import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDate } from '@/app/_ui/format/dates'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { ChoiceField } from '@/app/_ui/forms/ChoiceField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextAreaField } from '@/app/_ui/forms/TextField'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { lotHref } from '@/lib/domain/charts/draw-notes'
import { chartName, chartUnit } from '@/lib/domain/record/display-unit'
import { proposalChart } from '@/lib/domain/record/proposal-chart'
import { formatNumber } from '@/lib/domain/units/format'
import { differenceFromSi, fromSi } from '@/lib/domain/units/unit'
import { parseBaseline } from '@/lib/input/baseline-form'
import { chartId, defaultCharts, offeredCharts } from '@/lib/input/drift-view'
import { getDrift } from '@/lib/services/get-drift'
import { getWorks, type WorksFacts } from '@/lib/services/get-works'
import type { LimitSetView } from '@/lib/services/limit-set-view'
import { type LimitProposalView, proposeLimits } from '@/lib/services/propose-limits'
import { driftHref } from '../_ui/drift-address'
import { LimitSets } from '../_ui/LimitSets'
import { ProposalChart } from '../_ui/ProposalChart'
import { freezeLimitsAction } from '../actions'
import '@/app/_ui/charts/charts.css'
import '../drift.css'

export const metadata: Metadata = { title: 'Control limits' }

const FIRST_CHART = defaultCharts[0] ? chartId(defaultCharts[0]) : ''

/** What the chosen baseline would give, and the signature that freezes it. The question stands in the address. */
export default roomPage(async (actor, { query }) => {
  const productCode = query.product ?? ''
  const [drift, works] = [await getDrift(actor, productCode), await getWorks(actor)]
  const asked = { ...query, chart: query.chart ?? FIRST_CHART }
  const baseline = parseBaseline(asked)
  const view = baseline.ok ? await proposeLimits(actor, baseline.value) : undefined
  const sets = drift.limitSets.filter((set) => chartId(set) === asked.chart)
  return (
    <>
      <PageHead
        over={<Link href={driftHref(drift.product.code)}>{drift.product.name}</Link>}
        title="Control limits"
        under="Limits come from lots of a calm time, are frozen by a person, and stay until somebody freezes others."
      />
      <form method="get" className="form drift-baseline" aria-label="Baseline">
        <input type="hidden" name="product" value={drift.product.code} />
        <div className="fields">
          <div className="field">
            <label htmlFor="limits-chart">Chart</label>
            <select id="limits-chart" name="chart" className="input" defaultValue={asked.chart}>
              {offeredCharts.map((choice) => (
                <option key={chartId(choice)} value={chartId(choice)}>
                  {chartName(choice.characteristic, choice.statistic)}
                </option>
              ))}
            </select>
          </div>
          <div className="drift-ends">
            <LotField name="first" label="First lot" value={query.first} hint="none: the oldest" />
            <LotField name="last" label="Last lot" value={query.last} hint="none: the newest" />
          </div>
          <div className="field whole">
            <label htmlFor="limits-left-out">Left out</label>
            <textarea
              id="limits-left-out"
              name="leftOut"
              className="input"
              rows={2}
              maxLength={8000}
              defaultValue={query.leftOut ?? ''}
              aria-describedby="limits-left-out-hint"
            />
            <p className="hint" id="limits-left-out-hint">
              One lot a line, its code and then why: LA-336 load 10 g short. A lot is left out because a cause
              was found, never because it lies far off.
            </p>
          </div>
          <div className="field">
            <label htmlFor="limits-alike">Neighbouring lots are alike by nature</label>
            <select id="limits-alike" name="alike" className="input" defaultValue={query.alike ?? ''}>
              <option value="">as the lots themselves say</option>
              <option value="yes">yes: spread of all lots, no runs</option>
              <option value="no">no: moving ranges, runs asked for</option>
            </select>
          </div>
        </div>
        <div className="actions">
          <button type="submit" className="button">
            Propose
          </button>
        </div>
      </form>
      {baseline.ok ? null : (
        <Notice tone="alarm">
          {baseline.problems.map((one) => `${one.message} ${one.mend ?? ''}`).join(' ')}
        </Notice>
      )}
      {view ? (
        <Proposal
          view={view}
          works={works}
          asked={asked}
          chart={baseline.ok ? baseline.value : undefined}
          mayFreeze={may(actor, 'limits.freeze')}
          signer={actor.name}
        />
      ) : null}
      <section className="section">
        <h2>Sets of this chart so far</h2>
        {sets.length === 0 ? <p>None yet.</p> : <LimitSets sets={sets} works={works} />}
      </section>
    </>
  )
})

function LotField({
  name,
  label,
  value,
  hint,
}: {
  readonly name: string
  readonly label: string
  readonly value: string | undefined
  readonly hint: string
}) {
  return (
    <div className="field">
      <label htmlFor={`limits-${name}`}>{label}</label>
      <input
        id={`limits-${name}`}
        name={name}
        className="input"
        defaultValue={value ?? ''}
        maxLength={40}
        autoCapitalize="none"
        spellCheck={false}
        aria-describedby={`limits-${name}-hint`}
      />
      <p className="hint" id={`limits-${name}-hint`}>
        {hint}
      </p>
    </div>
  )
}

type Chart = Pick<LimitSetView, 'characteristic' | 'statistic'>

interface ProposalProps {
  readonly view: LimitProposalView
  readonly works: WorksFacts
  readonly asked: Readonly<Record<string, string | undefined>>
  readonly chart: Chart | undefined
  readonly mayFreeze: boolean
  readonly signer: string
}

function Proposal({ view, works, asked, chart, mayFreeze, signer }: ProposalProps) {
  if (!chart) return null
  const { proposal, refusal, lots, newest } = view
  const { unit, decimals } = chartUnit(chart.characteristic, chart.statistic, works.units)
  const show = chart.statistic === 'mean' ? fromSi : differenceFromSi
  const text = (value: number | undefined, more = 0): string =>
    formatNumber(value === undefined ? undefined : show(value, unit), {
      decimals: decimals + more,
      decimal: works.numberFormat,
    })
  const number = (newest?.number ?? 0) + 1
  return (
    <div className="columns">
      <section className="section">
        <h2>
          What these lots give{' '}
          <small>
            {lots.length} {lots.length === 1 ? 'lot' : 'lots'}, {lots.filter((lot) => lot.leftOut).length}{' '}
            left out
          </small>
        </h2>
        {refusal ? (
          <Notice tone="question">
            {refusal.message} {refusal.mend ?? ''}
          </Notice>
        ) : null}
        <ProposalChart
          key={JSON.stringify(asked)}
          input={proposalChart({
            ...chart,
            lots: lots.map((lot) => ({ ...lot, label: formatDate(lot.madeAt, works.timeZone) })),
            proposal,
            number,
            units: works.units,
            decimal: works.numberFormat,
          })}
        />
        {proposal ? (
          <>
            <dl className="facts drift-limit-facts">
              <div>
                <dt>Upper limit</dt>
                <dd>
                  {text(proposal.upper)} {unit}
                </dd>
              </div>
              <div>
                <dt>Centre</dt>
                <dd>
                  {text(proposal.centre)} {unit}
                </dd>
              </div>
              <div>
                <dt>Lower limit</dt>
                <dd>{proposal.lower === undefined ? 'none' : `${text(proposal.lower)} ${unit}`}</dd>
              </div>
              <div>
                <dt>σ of a lot</dt>
                <dd>
                  {formatNumber(differenceFromSi(proposal.sigma, unit), {
                    decimals: decimals + 1,
                    decimal: works.numberFormat,
                  })}{' '}
                  {unit}, {proposal.sigmaEstimator}
                </dd>
              </div>
            </dl>
            {proposal.beyond.length > 0 ? (
              <Notice tone="question">
                Beyond their own limits:{' '}
                {proposal.beyond.flatMap((lot, index) => [
                  index > 0 ? ', ' : '',
                  <Link key={lot.code} href={lotHref(lot.code)} prefetch={false}>
                    {lot.code}
                  </Link>,
                ])}
                . Look for what happened there; leave such a lot out only with the cause that was found.
              </Notice>
            ) : null}
            {proposal.advice.map((sentence) => (
              <Notice key={sentence} tone="question">
                {sentence}
              </Notice>
            ))}
          </>
        ) : null}
      </section>
      <aside>
        <section className="section">
          <h2>Freeze as set {number}</h2>
          {!proposal ? (
            <p>Nothing to freeze yet.</p>
          ) : !mayFreeze ? (
            <p>Quality freezes limits. You can look at what they would be.</p>
          ) : (
            <FreezeForm view={view} asked={asked} number={number} works={works} signer={signer} />
          )}
        </section>
      </aside>
    </div>
  )
}

function FreezeForm({
  view,
  asked,
  number,
  works,
  signer,
}: Pick<ProposalProps, 'view' | 'asked' | 'works' | 'signer'> & { readonly number: number }) {
  const first = view.lots[0]
  const iso = (at: number): string => new Date(at).toISOString()
  return (
    <ActionForm action={freezeLimitsAction} label={`Freeze limit set ${number}`}>
      {(['product', 'chart', 'first', 'last', 'leftOut', 'alike'] as const).map((name) => (
        <input key={name} type="hidden" name={name} value={asked[name] ?? ''} />
      ))}
      <input type="hidden" name="supersedes" value={number - 1} />
      {view.proposal?.provisional ? (
        <Notice tone="question">Provisional: fewer than sixty lots. Freeze again when there are more.</Notice>
      ) : null}
      <ChoiceField
        name="effectiveFrom"
        legend="In force from"
        chosen={['']}
        choices={[
          {
            value: '',
            label: number === 1 ? 'the first lot of the baseline' : 'the first lot after the baseline',
          },
          ...(number > 1 && first
            ? [
                {
                  value: iso(first.madeAt),
                  label: `the first lot of the baseline, ${first.code}`,
                  note: `made ${formatDate(first.madeAt, works.timeZone)}; replaces the older set there`,
                },
              ]
            : []),
        ]}
      />
      <TextAreaField name="reason" label="Why" optional maxLength={1000} />
      <div className="actions">
        <Submit wide>
          Freeze set {number} as {signer}
        </Submit>
      </div>
      <p className="small">
        The rules are asked again from there. Decisions that rested on another set are marked, not changed.
      </p>
    </ActionForm>
  )
}
