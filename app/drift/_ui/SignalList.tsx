import Link from 'next/link'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { formatDate } from '@/app/_ui/format/dates'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { Submit } from '@/app/_ui/forms/Submit'
import { TextAreaField, TextField } from '@/app/_ui/forms/TextField'
import { lotHref } from '@/lib/domain/charts/draw-notes'
import type { SignalView } from '@/lib/services/signal-views'
import { answerSignalAction } from '../actions'

interface Props {
  readonly signals: readonly SignalView[]
  readonly timeZone: string
  readonly mayAnswer: boolean
  /** Where the pointer of the chart is put on a lot. */
  readonly onChart: (lotCode: string) => string
}

const stateText = (signal: SignalView, timeZone: string): string => {
  if (signal.state === 'no-longer-holds') return 'no longer holds: a reading or a limit set changed since'
  if (signal.answeredAt === undefined) return `nobody yet, since ${formatDate(signal.raisedAt, timeZone)}`
  return `${signal.answeredBy ? `${signal.answeredBy}, ` : ''}${formatDate(signal.answeredAt, timeZone)}`
}

/** The heading has named the chart already. */
const afterName = ({ chartName, machine, sentence }: SignalView): string => {
  const name = machine ? `${chartName} on ${machine.name}: ` : `${chartName}: `
  return sentence.startsWith(name) ? sentence.slice(name.length) : sentence
}

function Members({ signal, onChart }: { readonly signal: SignalView; readonly onChart: Props['onChart'] }) {
  const [first, last] = [signal.memberCodes[0], signal.memberCodes.at(-1)]
  return (
    <p className="drift-lots">
      {[...new Set([first, last])].flatMap((code, index) =>
        code
          ? [
              index > 0 ? ' to ' : null,
              <Link key={code} href={lotHref(code)} prefetch={false}>
                {code}
              </Link>,
            ]
          : [],
      )}
      {last ? (
        <Link href={onChart(last)} prefetch={false} className="small">
          on the chart
        </Link>
      ) : null}
    </p>
  )
}

/** One signal: what happened, which lots, and what somebody found out about it. */
export function Signal({
  signal,
  timeZone,
  mayAnswer,
  onChart,
}: Omit<Props, 'signals'> & { readonly signal: SignalView }) {
  const open = signal.state === 'open'
  return (
    <li id={`signal-${signal.id}`} tabIndex={-1} data-state={signal.state}>
      <h3>
        <VerdictMark verdict={signal.rule === 'nine-on-one-side' ? 'run' : 'beyond'} /> {signal.chartName}{' '}
        <small>{signal.machine?.name ?? signal.productName}</small>
      </h3>
      <p>{afterName(signal)}</p>
      <Members signal={signal} onChart={onChart} />
      {signal.cause ? (
        <p>
          <b>{signal.cause}.</b> {signal.answer}
        </p>
      ) : null}
      <p className="small">{stateText(signal, timeZone)}</p>
      {signal.evidenceChanged ? (
        <p className="vermilion">
          <em>evidence changed since it was answered</em>
        </p>
      ) : null}
      {open && mayAnswer ? (
        <details>
          <summary>Answer</summary>
          <ActionForm
            action={answerSignalAction.bind(null, signal.id)}
            label={`Answer the signal of ${signal.chartName}, ${signal.memberCodes.at(-1) ?? ''}`}
          >
            <input type="hidden" name="version" value={signal.version} />
            <TextField name="cause" label="What was found" hint="such as: die 7 worn" maxLength={200} />
            <TextAreaField name="answer" label="What was done about it" maxLength={2000} />
            <div className="actions">
              <Submit>Answer</Submit>
            </div>
            <p className="small">An answer is given once, signed, and stays.</p>
          </ActionForm>
        </details>
      ) : null}
    </li>
  )
}

/** Most of the answered ones that stand beside the chart at once. */
const SHOWN = 4

/** Signals beside the chart: unanswered ones first, then the newest others; the rest folds away. */
export function SignalList({ signals, ...rest }: Props) {
  const open = signals.filter(({ state }) => state === 'open')
  const others = signals.filter(({ state }) => state !== 'open')
  const list = (some: readonly SignalView[]) => (
    <ul className="drift-signals">
      {some.map((signal) => (
        <Signal key={signal.id} signal={signal} {...rest} />
      ))}
    </ul>
  )
  return (
    <section aria-labelledby="drift-signals">
      <h2 id="drift-signals">
        Signals <small>{open.length === 0 ? 'none open' : `${open.length} open`}</small>
      </h2>
      {signals.length === 0 ? <p>The rules have found nothing on these staves.</p> : null}
      {list([...open, ...others.slice(0, SHOWN)])}
      {others.length > SHOWN ? (
        <details>
          <summary>{others.length - SHOWN} older ones</summary>
          {list(others.slice(SHOWN))}
        </details>
      ) : null}
      <p className="small">
        A signal rejects no lot by itself. It asks what changed, and has to be answered before a lot that
        belongs to it is released.
      </p>
    </section>
  )
}
