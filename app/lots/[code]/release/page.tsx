import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDateTime } from '@/app/_ui/format/dates'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { ChoiceField } from '@/app/_ui/forms/ChoiceField'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextAreaField } from '@/app/_ui/forms/TextField'
import { Notice } from '@/app/_ui/shell/Notice'
import { may } from '@/lib/access/permit'
import { dispositionVerbs } from '@/lib/domain/quality/propose-disposition'
import { isFinal } from '@/lib/domain/record/lot-state'
import { signalHref } from '@/lib/domain/record/signal-href'
import { getLot } from '@/lib/services/get-lot'
import { LotHead } from '../../_ui/LotHead'
import { Reasons } from '../../_ui/Reasons'
import { decideLotAction } from '../../actions'
import { stateWords, verbWords } from '../../state-words'
import '@/app/_ui/charts/charts.css'
import '../../lots.css'

export const metadata: Metadata = { title: 'Release' }

/** The decision rule, printed with the plan (DESIGN §3). */
const rule = [
  'A specimen is inside, not proven or outside each tolerance, with its uncertainty. It never decides a lot alone; outside has to be answered.',
  'A lot is judged by its plan: mean and spread against the acceptance constant; what measuring has in common is not divided by √n.',
  'An open closure, an incomplete plan or overdue equipment stops the proposal until it is answered.',
  'A signal of the control chart never rejects by itself; it has to be answered before release.',
] as const

/** The proposal with every number, and the decision of a named person. */
export default roomPage(async (actor, { params }) => {
  const view = await getLot(actor, params.code ?? '')
  const { assessment, dispositions, lot, specification, works } = view
  const { proposal } = assessment
  const decides = may(actor, 'lots.decide')
  const asked = proposal.stops.filter((stop) => !stop.id.startsWith('signal-'))
  const signals = view.signals.filter((one) => one.state === 'open')
  const [first] = signals
  const current = dispositions.find((one) => one.current)
  return (
    <>
      <LotHead
        view={view}
        tab="release"
        mayMeasure={may(actor, 'readings.record') && !isFinal(lot.state)}
        maySeeDrift={may(actor, 'drift.read')}
      />
      <div className="columns">
        <div>
          <p className="lots-verdict">{proposal.headline}</p>
          <section className="section">
            <h2>
              Proposed: {proposal.verb ? verbWords[proposal.verb].name.toLowerCase() : 'nothing yet'}{' '}
              <small>
                k = {specification.body.plan.acceptanceConstant},{' '}
                {assessment.specimens.filter((one) => one.missing.length === 0).length} of{' '}
                {specification.body.plan.specimens} specimens complete
              </small>
            </h2>
            <Reasons reasons={proposal.reasons} />
            {proposal.stops.map((stop) => (
              <Notice key={stop.id} tone="alarm">
                {stop.text}
              </Notice>
            ))}
          </section>
          <section className="section">
            <h2>How it is decided</h2>
            <ol>
              {rule.map((sentence) => (
                <li key={sentence}>{sentence}</li>
              ))}
            </ol>
          </section>
          <section className="section">
            <h2>Decisions so far</h2>
            {dispositions.length === 0 ? <p>Nobody has decided yet.</p> : null}
            <ol className="lots-history">
              {dispositions.map((one) => (
                <li key={one.number}>
                  <time dateTime={new Date(one.decidedAt).toISOString()}>
                    {formatDateTime(one.decidedAt, works.timeZone)}
                  </time>
                  <b>{verbWords[one.verb].name}</b>
                  <span>
                    “{one.reason}”{' '}
                    {one.evidenceChanged ? <em className="vermilion">evidence changed since</em> : null}
                    {one.current ? null : <span className="slate"> replaced by a later decision</span>}{' '}
                    <span className="small">
                      Proposed was {one.proposal.verb ?? 'nothing'}. Evidence {one.evidenceHash.slice(0, 12)}.
                    </span>
                  </span>
                  <span className="who">{one.decidedBy ?? ''}</span>
                </li>
              ))}
            </ol>
          </section>
        </div>
        <aside>
          <section className="section">
            <h2>{current ? `Decided: ${stateWords[lot.state].word}` : 'Decide'}</h2>
            {!decides ? (
              <p>Quality decides on lots. You can read why.</p>
            ) : (
              <ActionForm action={decideLotAction.bind(null, lot.code)} label={`Decide lot ${lot.code}`}>
                <input type="hidden" name="lotVersion" value={lot.version} />
                {first ? (
                  <Notice tone="question">
                    {signals.length === 1 ? 'One signal has' : `${signals.length} signals have`} to be
                    answered first,{' '}
                    <Link href={signalHref({ ...first, machineCode: first.machine?.code })}>in Drift</Link>,
                    if the lot is to be released.
                  </Notice>
                ) : null}
                <ChoiceField
                  name="verb"
                  legend={current ? 'Decide again' : 'What happens with it'}
                  chosen={proposal.verb ? [proposal.verb] : []}
                  choices={dispositionVerbs.map((verb) => ({
                    value: verb,
                    label:
                      verb === proposal.verb ? `${verbWords[verb].name} (proposed)` : verbWords[verb].name,
                    note: verbWords[verb].meaning,
                  }))}
                />
                {asked.map((stop) => (
                  <div key={stop.id} className="lots-stop">
                    <TextAreaField
                      name={`answer:${stop.id}`}
                      label={stop.text}
                      hint="Your answer, needed for a release"
                      optional
                      maxLength={2000}
                    />
                  </div>
                ))}
                <TextAreaField name="reason" label="Why" maxLength={2000} />
                <div className="actions">
                  <Submit wide>
                    Decide {lot.code} as {actor.name}
                  </Submit>
                </div>
                <p className="small">Recorded in the ledger. It can be decided again, and is never erased.</p>
              </ActionForm>
            )}
          </section>
        </aside>
      </div>
    </>
  )
})
