import { basisNames } from '@/lib/domain/datasheets/tension-by-basis'
import { guardFactorOf } from '@/lib/domain/quality/tolerances'
import { loadBearingSection } from '@/lib/domain/strings/load-bearing'
import type { MaterialBody } from '@/lib/domain/strings/material'
import {
  breakingLoad,
  CAUTION_FRACTION,
  tensileStrengthAt,
  workingFraction,
} from '@/lib/domain/strings/strength'
import { formatNumber, formatQuantity } from '@/lib/domain/units/format'
import type { WorksFacts } from '@/lib/services/get-works'
import type { SpecificationFacts } from '@/lib/services/list-products'
import { diameterDecimals, shownReference, shownTolerance } from './shown'

interface SpecificationViewProps {
  readonly specification: SpecificationFacts
  readonly works: WorksFacts
  /** For the working fraction; left out where the material has changed or gone. */
  readonly material: MaterialBody | undefined
}

/** One revision, all of it, in the works' units. */
export function SpecificationView({ specification, works, material }: SpecificationViewProps) {
  const { body, materialName } = specification
  const { numberFormat: decimal, units } = works
  const { plan } = body
  const heads = plan.takenAt.filter((end) => end === 'head').length
  return (
    <div className="columns even">
      <section className="section">
        <h2>What it has to be</h2>
        <dl className="facts">
          <dt>Material</dt>
          <dd>{materialName}</dd>
          {body.core ? (
            <>
              <dt>Core</dt>
              <dd>
                {body.core.shape === 'hex' ? 'hexagonal, ' : 'round, '}
                {formatQuantity(body.core.size, units.diameter, {
                  decimals: diameterDecimals(units.diameter),
                  decimal,
                  withUnit: true,
                })}
                {body.core.shape === 'hex' ? ' across flats' : ''}
              </dd>
            </>
          ) : null}
          <dt>Diameter</dt>
          <dd>
            {shownTolerance(body.diameter, units.diameter, {
              decimals: diameterDecimals(units.diameter),
              decimal,
            })}
          </dd>
          <dt>Ovality</dt>
          <dd>at most {formatQuantity(body.ovalityMax, 'µm', { decimals: 1, decimal, withUnit: true })}</dd>
          <dt>Mass per metre</dt>
          <dd>{shownTolerance(body.massPerMetre, 'mg/m', { decimals: 1, decimal })}</dd>
          <dt>Effective density</dt>
          <dd>{shownTolerance(body.effectiveDensity, 'kg/m³', { decimals: 0, decimal })}</dd>
          <dt>Tension</dt>
          <dd>{shownTolerance(body.tension, units.force, { decimal })}</dd>
          <dt>At</dt>
          <dd>{shownReference(body.reference, works)}</dd>
          <dt>Basis</dt>
          <dd>{basisNames[body.basis]}</dd>
          <dt>Guard band</dt>
          <dd>
            diameter {guardWord(guardFactorOf(body, 'diameter'))}, mass and tension{' '}
            {guardWord(guardFactorOf(body, 'massPerMetreWeighed'))}
          </dd>
        </dl>
        <WorkingFraction body={body} material={material} decimal={decimal} />
      </section>
      <section className="section">
        <h2>How a lot is inspected</h2>
        <dl className="facts">
          <dt>Specimens</dt>
          <dd>
            {plan.specimens}: {heads} from the head, {plan.specimens - heads} from the tail
          </dd>
          <dt>Diameter</dt>
          <dd>
            {plan.positions} {plan.positions === 1 ? 'place' : 'places'} × {plan.directions}{' '}
            {plan.directions === 1 ? 'direction' : 'directions'}
          </dd>
          <dt>Cut</dt>
          <dd>
            {formatQuantity(plan.cutLength, 'mm', { decimals: 0, decimal, withUnit: true })},{' '}
            {plan.weighedState === 'slack' ? 'slack' : 'marked under load'}
          </dd>
          <dt>Rig</dt>
          <dd>{plan.rigCode}</dd>
          <dt>Acceptance</dt>
          <dd>
            (limit − mean)/s of at least {formatNumber(plan.acceptanceConstant, { decimals: 3, decimal })}
          </dd>
        </dl>
      </section>
    </div>
  )
}

const guardWord = (factor: 0 | 1): string => (factor === 1 ? 'by the expanded uncertainty' : 'none')

interface WorkingFractionProps {
  readonly body: SpecificationFacts['body']
  readonly material: MaterialBody | undefined
  readonly decimal: WorksFacts['numberFormat']
}

/** How much of the least breaking load the string bears at its reference note, with the caution that goes with it. */
function WorkingFraction({ body, material, decimal }: WorkingFractionProps) {
  const bearing = loadBearingSection(body.core, body.diameter.target)
  const strength = material && tensileStrengthAt(material, bearing.size)
  if (!strength) {
    return (
      <p className="small">Its breaking load is not known: the material has no strength at this diameter.</p>
    )
  }
  const breaking = breakingLoad(strength.low, bearing.area)
  const fraction = workingFraction(body.tension.target, breaking)
  const high = fraction > CAUTION_FRACTION
  return (
    <p className={high ? 'vermilion' : 'small'}>
      {high ? <b>Loaded near breaking. </b> : null}
      At this note it bears {formatNumber(fraction, { decimals: 2, decimal })} of the least breaking load,{' '}
      {formatQuantity(breaking, 'N', { decimals: 0, decimal, withUnit: true })}. Worn, kinked or nicked
      strings break far below it.
    </p>
  )
}
