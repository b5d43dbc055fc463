import { type VerdictKind, VerdictMark } from '@/app/_ui/charts/VerdictMark'
import type { Reason } from '@/lib/domain/quality/propose-disposition'

const marks: Readonly<Record<Reason['tone'], VerdictKind>> = { good: 'within', doubt: 'near', bad: 'beyond' }

/** The reasons of a proposal, each with its number. */
export function Reasons({ reasons }: { readonly reasons: readonly Reason[] }) {
  return (
    <ul className="lots-reasons">
      {reasons.map((reason) => (
        <li key={reason.text}>
          <VerdictMark verdict={marks[reason.tone]} />
          <span>{reason.text}</span>
        </li>
      ))}
    </ul>
  )
}
