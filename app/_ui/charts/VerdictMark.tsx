import type { Ink } from '@/lib/domain/charts/ink'
import { type VerdictKind, verdictMark } from '@/lib/domain/charts/verdict-mark'
import { ShapesView } from './DrawingView'

export type { VerdictKind }

/** The 20 × 16 mark of a verdict. The word that goes with it stands beside it, so the mark itself is silent. */
export function VerdictMark({ verdict, ink }: { readonly verdict: VerdictKind; readonly ink?: Ink }) {
  return (
    <svg className="verdict-mark" width={20} height={16} viewBox="0 0 20 16" aria-hidden="true">
      <ShapesView shapes={verdictMark(verdict, ink).shapes} />
    </svg>
  )
}
