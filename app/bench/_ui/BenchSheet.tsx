'use client'

import Link from 'next/link'
import { useMemo } from 'react'
import { ClosureGate } from '@/app/_ui/charts/ClosureGate'
import { SectionDrawing } from '@/app/_ui/charts/SectionDrawing'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { gateOf, sectionOf } from './bench-drawings'
import { liveLot, planTextsOf, setUpFieldsOf } from './bench-lot'
import type { BenchView } from './bench-view'
import { SetUpBar } from './SetUpBar'
import { SheetTable } from './SheetTable'
import { useBench } from './use-bench'

const clock = (at: number): string => new Date(at).toLocaleTimeString('en-GB')

/** The bench: entries, live results by the same core as the server's, and the next thing to do. */
export function BenchSheet({ view }: { readonly view: BenchView }) {
  const bench = useBench(view)
  const { state } = bench
  const current = Number.parseInt(state.at, 10)
  const lot = useMemo(
    () => liveLot(view, state.values, state.setUp, state.delivery),
    [view, state.values, state.setUp, state.delivery],
  )
  const planTexts = useMemo(() => planTextsOf(view), [view])
  const section = sectionOf(view, state.values, current)
  const gate = gateOf(view, lot)
  const waiting = Object.entries(state.delivery).filter(
    ([, one]) => one.state === 'waits' || one.state === 'refused',
  )

  return (
    <>
      <div className="bench-state" role="status">
        <b className={lot.headline.tone}>
          <VerdictMark verdict={lot.headline.mark} /> {lot.headline.text}
        </b>
        {view.driftLine ? (
          <span>
            {view.driftLine}{' '}
            <Link href={`/drift?product=${encodeURIComponent(view.lot.productCode)}`}>See Drift</Link>
          </span>
        ) : null}
        <span className="kept">
          {state.restored ? 'Your draft was found on this device. ' : ''}
          {state.keptAt ? `Kept on this device ${clock(state.keptAt)}` : ''}
        </span>
      </div>
      <p className="bench-next" aria-live="polite">
        {lot.nextAction.text}
        {lot.nextAction.more ? <small>{lot.nextAction.more}</small> : null}
      </p>
      {lot.finished ? (
        <p>
          <Link className="button primary" href={`/lots/${encodeURIComponent(view.lot.code)}`}>
            Open lot {view.lot.code}
          </Link>{' '}
          <Link className="button" href="/bench">
            Next lot
          </Link>
        </p>
      ) : null}
      {waiting.map(([specimen, one]) => (
        <p key={specimen} className="problem" role="alert">
          Specimen {specimen}: {'message' in one ? one.message : ''}{' '}
          <button type="button" className="button" onClick={() => void bench.send(Number(specimen))}>
            Send again
          </button>
        </p>
      ))}
      <div className="bench-cols">
        <section aria-label="Readings">
          <SetUpBar fields={setUpFieldsOf(view, state.setUp)} values={state.setUp} onSet={bench.setSetUp} />
          <SheetTable view={view} bench={bench} rows={lot.rows} planTexts={planTexts} />
        </section>
        <aside className="bench-aside">
          <section>
            <h2>Still missing by the plan</h2>
            {lot.missing.length === 0 ? (
              <p className="slate">Nothing: every specimen of the plan is measured.</p>
            ) : (
              <ul className="bench-missing">
                {lot.missing.map((one) => (
                  <li key={one.who}>
                    <b>{one.who}</b> {one.what}
                  </li>
                ))}
              </ul>
            )}
          </section>
          <section>
            <h2>Section of specimen {current}</h2>
            <SectionDrawing {...section} />
          </section>
          {gate ? (
            <section>
              <h2>Two routes, one wire</h2>
              <ClosureGate {...gate} />
            </section>
          ) : null}
        </aside>
      </div>
      <footer className="bench-foot">
        <div>
          <h3>Rig</h3>
          <p>{view.rigLine}</p>
        </div>
        <div>
          <h3>Equipment</h3>
          <p>
            {view.equipmentLines.map((line) => (
              <span key={line.text}>
                {line.text}
                {line.due ? (
                  <span className={line.overdue ? 'vermilion' : line.soon ? 'brass' : undefined}>
                    {' '}
                    {line.due}
                  </span>
                ) : null}
                .{' '}
              </span>
            ))}
          </p>
        </div>
        <div className="caution">
          <h3>{lot.caution.title}</h3>
          <p>{lot.caution.text}</p>
        </div>
      </footer>
    </>
  )
}
