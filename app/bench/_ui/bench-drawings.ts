import type { GateInput } from '@/lib/domain/charts/closure-gate'
import type { SectionInput } from '@/lib/domain/charts/section-drawing'
import { COVERAGE_FACTOR, closureVerdict } from '@/lib/domain/metrology/closure'
import { formatNumber } from '@/lib/domain/units/format'
import { fromSi, type UnitId } from '@/lib/domain/units/unit'
import { benchFields, cellKey } from '@/lib/input/bench-cells'
import type { LiveLot } from './bench-lot'
import type { BenchView } from './bench-view'
import type { DraftValue } from './draft-store'

/** The cross-section of one specimen as it is typed so far. */
export function sectionOf(
  view: BenchView,
  values: Readonly<Record<string, DraftValue>>,
  specimen: number,
): SectionInput {
  const unit: UnitId = view.units.diameter === 'in' || view.units.diameter === 'thou' ? 'thou' : 'µm'
  const { diameter } = view.context.specification
  const read = (position: number, direction: 'a' | 'b'): number | undefined => {
    const value = values[cellKey(specimen, `d${position}${direction}`)]
    return value && fromSi(value.si, unit)
  }
  const positions = new Set(
    benchFields(view.plan).flatMap((field) =>
      field.station === 'micrometer' ? [Number.parseInt(field.id.slice(1), 10)] : [],
    ),
  )
  return {
    title: `Cross-section of specimen ${specimen}`,
    unit,
    decimals: unit === 'thou' ? 2 : 1,
    decimal: view.decimal,
    nominal: fromSi(diameter.target, unit),
    lower: fromSi(diameter.lower, unit),
    upper: fromSi(diameter.upper, unit),
    places: [...positions].map((position) => ({
      label: String(position),
      a: read(position, 'a'),
      b: read(position, 'b'),
    })),
  }
}

/** Weighed and sounded mass per metre of every specimen that has one of them; undefined before there is any. */
export function gateOf(view: BenchView, lot: LiveLot): GateInput | undefined {
  const unit = view.units.massPerLength as UnitId
  const specimens = lot.evaluations.flatMap((evaluation, index) => {
    const weighed = evaluation?.results.massPerMetreWeighed
    const sounded = evaluation?.results.massPerMetreSounded
    if (!weighed && !sounded) return []
    const closure = evaluation?.results.closure
    const route = (one: typeof weighed) =>
      one && { value: fromSi(one.value, unit), expanded: fromSi(COVERAGE_FACTOR * one.u, unit) }
    return [
      {
        label: String(index + 1),
        weighed: route(weighed),
        sounded: route(sounded),
        ...(closure && weighed
          ? {
              combined: fromSi(COVERAGE_FACTOR * closure.u * weighed.value, unit),
              verdict: closureVerdict(closure.value, closure.u),
              closureText: `${formatNumber(closure.value * 100, { decimals: 2, sign: 'always', decimal: view.decimal })} %`,
            }
          : {}),
      },
    ]
  })
  return specimens.length === 0 ? undefined : { unit, decimals: 1, decimal: view.decimal, specimens }
}
