import { airDensity } from '@/lib/domain/strings/air-density'
import { deadWeightForce } from '@/lib/domain/strings/dead-weight-force'
import { formatQuantity } from '@/lib/domain/units/format'
import { degreesCelsius, kilograms, metresPerSecondSquared, pascals } from '@/lib/domain/units/quantity'
import type { WorksFacts } from '@/lib/services/get-works'
import type { EquipmentList } from '@/lib/services/list-equipment'
import { shownMass } from './shown'

interface UsualLoadProps {
  readonly rig: EquipmentList['rigs'][number]
  readonly weights: EquipmentList['weights']
  readonly works: WorksFacts
}

/** What usually hangs, and how hard that pulls at this works. */
export function UsualLoad({ rig, weights, works }: UsualLoadProps) {
  const { numberFormat: decimal, gravity, air, units } = works
  const codes = [rig.hangerCode, ...rig.weightCodes].filter((code) => code !== '')
  const hanging = codes.flatMap((code) => weights.filter((weight) => weight.code === code))
  if (hanging.length === 0) {
    return (
      <section className="section">
        <h2>Usual load</h2>
        <p className="slate">Nothing is named yet.</p>
      </section>
    )
  }
  const mass = hanging.reduce((sum, { conventionalMass }) => sum + conventionalMass, 0)
  const u = Math.sqrt(hanging.reduce((sum, { uMass }) => sum + uMass * uMass, 0))
  const force = deadWeightForce(
    kilograms(mass),
    metresPerSecondSquared(gravity.value),
    airDensity({
      temperature: degreesCelsius(air.celsius),
      pressure: pascals(air.pascals),
      humidity: air.humidity,
    }),
  )
  return (
    <section className="section">
      <h2>
        Usual load <small>± k = 2</small>
      </h2>
      <ul className="rows">
        {hanging.map(({ code, kind, conventionalMass, uMass, active }) => (
          <li key={code}>
            <span>
              {code}, {kind}
              {active ? null : <span className="vermilion"> put away</span>}
            </span>
            <span>{shownMass(conventionalMass, uMass, decimal)}</span>
          </li>
        ))}
        <li>
          <b>Together</b>
          <b>{shownMass(mass, u, decimal)}</b>
        </li>
        <li>
          <b>Pulls</b>
          <b>{formatQuantity(force, units.force, { decimals: 3, decimal, withUnit: true })}</b>
        </li>
      </ul>
    </section>
  )
}
