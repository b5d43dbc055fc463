import { formatNumber, formatQuantity, formatWithUncertainty } from '@/lib/domain/units/format'
import type { WorksFacts } from '@/lib/services/get-works'

/** Gravity as every sounding uses it, with how sure it is and what that is worth. */
export function GravityFacts({ works }: { readonly works: WorksFacts }) {
  const { gravity, numberFormat: decimal } = works
  const { value, uncertainty } = formatWithUncertainty(gravity.value, 2 * gravity.u, 'm/s²', { decimal })
  // f ∝ √F: a relative error of gravity is half of that in frequency; 1200/ln 2 cents a unit of ln f.
  const cents = (600 / Math.LN2) * ((2 * gravity.u) / gravity.value)
  return (
    <section className="section">
      <h2>Gravity in use</h2>
      <dl className="facts">
        <dt>g</dt>
        <dd>
          {value} ± {uncertainty} m/s²
        </dd>
        <dt>From</dt>
        <dd>{gravity.typed ? 'a published local value' : 'latitude and height'}</dd>
        <dt>Worth</dt>
        <dd>
          ± {formatNumber(cents, { decimals: 2, decimal })} cents of every sounding, ±{' '}
          {formatQuantity((2 * gravity.u) / gravity.value, '%', { decimals: 3, decimal })} % of every force
        </dd>
      </dl>
      <p className="small">
        ± is the expanded uncertainty, k = 2.
        {gravity.typed
          ? ' A published value is taken as good to 2 mGal.'
          : ' The formula (GRS 80 with free air and rock below) knows nothing of local anomalies; a published value from a survey makes it several times better.'}{' '}
        Results already computed keep the gravity they were computed with.
      </p>
    </section>
  )
}
