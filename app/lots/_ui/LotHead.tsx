import Link from 'next/link'
import { formatDateTime } from '@/app/_ui/format/dates'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { formatNumber } from '@/lib/domain/units/format'
import type { LotView } from '@/lib/services/get-lot'
import { stateWords } from '../state-words'

interface Props {
  readonly view: LotView
  readonly tab: 'lot' | 'release'
  readonly mayMeasure: boolean
  readonly maySeeDrift: boolean
}

/** Head, tabs and the marks that concern the whole lot. */
export function LotHead({ view, tab, mayMeasure, maySeeDrift }: Props) {
  const { lot, material, product, specification, works } = view
  const address = `/lots/${encodeURIComponent(lot.code)}`
  const facts = [
    material.name,
    lot.machine?.name,
    lot.die ? `${lot.die.name} (${lot.die.code})` : undefined,
    `made ${formatDateTime(lot.madeAt, works.timeZone)}${lot.madeBy ? ` by ${lot.madeBy}` : ''}`,
    lot.lengthMetres === undefined
      ? undefined
      : `${formatNumber(lot.lengthMetres, { decimals: 0, decimal: works.numberFormat })} m`,
    `specification revision ${specification.number}`,
  ].filter(Boolean)
  return (
    <>
      <PageHead
        over={<Link href="/lots">Lots</Link>}
        title={
          <>
            {lot.code} <span>{product.name}</span>
          </>
        }
        under={facts.join(' · ')}
        actions={
          <>
            {maySeeDrift ? (
              <Link
                className="button quiet"
                href={`/drift?product=${encodeURIComponent(product.code)}&lot=${encodeURIComponent(lot.code)}`}
              >
                On the staff chart
              </Link>
            ) : null}
            {mayMeasure ? (
              <Link className="button" href={`/bench/${encodeURIComponent(lot.code)}`}>
                Measure
              </Link>
            ) : null}
          </>
        }
      />
      <nav className="tabs" aria-label={`Lot ${lot.code}`}>
        <Link href={address} prefetch={false} aria-current={tab === 'lot' ? 'page' : undefined}>
          Results
        </Link>
        <Link
          href={`${address}/release`}
          prefetch={false}
          aria-current={tab === 'release' ? 'page' : undefined}
        >
          Release: {stateWords[lot.state].word}
        </Link>
      </nav>
      {lot.evidenceChanged ? (
        <Notice tone="alarm">
          Evidence changed: a reading that the decision on this lot rests on is no longer the same. Look at
          the results and decide again.
        </Notice>
      ) : null}
    </>
  )
}
