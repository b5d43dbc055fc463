import { closureGate, type GateInput, weightMark } from '@/lib/domain/charts/closure-gate'
import { noteHead } from '@/lib/domain/charts/marks'
import { DrawingView, ShapesView } from './DrawingView'

/** Two routes, one wire: weighed and sounded mass per metre of every specimen on one rule. */
export function ClosureGate(input: GateInput) {
  return (
    <figure className="chart-figure">
      <DrawingView drawing={closureGate(input)} />
      <figcaption>
        <svg width={14} height={13} aria-hidden="true">
          <ShapesView shapes={[weightMark(7, 12)]} />
        </svg>{' '}
        weighed{' '}
        <svg width={14} height={10} aria-hidden="true">
          <ShapesView shapes={[noteHead(7, 5, 'ink', { rx: 5.6, ry: 4 })]} />
        </svg>{' '}
        sounded, bars ± U (k = 2). Closed when the note stands inside the gate.
      </figcaption>
    </figure>
  )
}
