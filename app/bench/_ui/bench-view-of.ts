import { formatDate, formatDateTime } from '@/app/_ui/format/dates'
import { formatNumber, formatQuantity } from '@/lib/domain/units/format'
import type { BenchFacts } from '@/lib/services/get-bench'
import type { BenchView } from './bench-view'

/** The sheet's unit of mass per metre follows the unit of mass. */
const perMetre: Readonly<Record<string, string>> = { mg: 'mg/m', g: 'g/m', kg: 'kg/m' }

/** A calibration that ends within this time is shown in brass. */
const SOON = 14 * 86_400_000

/** From what the service knows to what the sheet shows. `at`: epoch milliseconds, for what is overdue. */
export function benchViewOf(facts: BenchFacts, personId: number, at: number): BenchView {
  const { context, lot, works } = facts
  const decimal = works.numberFormat
  const { rig } = context
  const hung = context.weights.map((one) => one.code).join(', ')
  const total = context.weights.reduce((sum, one) => sum + one.mass.value, 0)
  const [signal] = facts.openSignals
  return {
    personId,
    lot: {
      code: lot.code,
      productName: lot.product.name,
      productCode: lot.product.code,
      state: lot.state,
      line: [
        facts.materialName,
        lot.machine?.name,
        lot.die?.name,
        `made ${formatDateTime(lot.madeAt, works.timeZone)}${facts.makerName ? ` by ${facts.makerName}` : ''}`,
        `specification revision ${facts.revision}`,
      ]
        .filter(Boolean)
        .join(' · '),
    },
    plan: context.specification.plan,
    context,
    equipment: facts.equipment,
    units: { ...works.units, massPerLength: perMetre[works.units.mass] ?? 'mg/m' },
    decimal,
    stored: facts.specimens.map(({ number, sheet, storedAt }) => ({
      number,
      sheet,
      storedAt: new Date(storedAt).toISOString(),
    })),
    rigLine: rig
      ? `${facts.rigName ?? rig.code}, ${rig.arrangement}, ${rig.endCondition === 'knife' ? 'knife edges' : `${rig.endCondition} ends`}, span ${formatQuantity(rig.span.value, 'mm', { decimals: 1, decimal, withUnit: true })}. Hanging: ${hung || 'nothing'} (${formatNumber(total, { decimals: 3, decimal })} kg). g = ${formatNumber(context.gravity.value, { decimals: 4, decimal })} m/s².`
      : `The plan asks for rig ${context.specification.plan.rigCode}, which is not registered.`,
    equipmentLines: facts.gauges.map(({ code, dueAt, name }) => ({
      text: `${name} ${code}`,
      ...(dueAt === undefined
        ? {}
        : {
            due:
              dueAt < at
                ? `overdue since ${formatDate(dueAt, works.timeZone)}`
                : `due ${formatDate(dueAt, works.timeZone)}`,
            soon: dueAt >= at && dueAt < at + SOON,
          }),
      overdue: dueAt !== undefined && dueAt < at,
    })),
    ...(signal ? { driftLine: signal.sentence } : {}),
  }
}
