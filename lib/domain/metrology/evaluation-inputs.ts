import { endHalfWidthOfMass } from '../strings/end-condition'
import { sectionFromPairs } from '../strings/section'
import type { GaugeFacts } from './evaluation'
import type { ModelFacts, ModelSteps } from './measurement-model'
import type { ModelInput } from './propagate'
import { diameterPairs } from './sheet-readings'
import { resolutionUncertainty, standardUncertaintyFromBounds } from './type-b'

/** Relative standard uncertainty of the air mass moved by a string (common practice, no source). */
const AIR_MASS_RELATIVE_U = 0.1

type Partly = Omit<ModelInput, 'type' | 'distribution' | 'value'> &
  Partial<Pick<ModelInput, 'type' | 'distribution' | 'value'>>

const input = (one: Partly): ModelInput => ({ type: 'B', distribution: 'normal', value: 0, ...one })

/** Calibration uncertainty of a gauge at a reading: absolute and proportional part in quadrature. */
const gaugeUncertainty = (gauge: GaugeFacts, reading: number): number =>
  Math.sqrt(gauge.uAbsolute * gauge.uAbsolute + gauge.uRelative * reading * gauge.uRelative * reading)

/**
 * Every uncertain input of the chain with its standard uncertainty. What the specimens of a lot share
 * (calibrations, load, span, gravity, ends, modulus, air) is marked common; reading and scatter are not.
 */
export function evaluationInputs(facts: ModelFacts, steps: ModelSteps): readonly ModelInput[] {
  return [...sectionInputs(facts), ...weighingInputs(facts), ...soundingInputs(facts, steps)]
}

function sectionInputs({ sheet, context }: ModelFacts): readonly ModelInput[] {
  const { pairs } = diameterPairs(sheet, -(context.micrometer?.error ?? 0))
  const diameter = sectionFromPairs(pairs)?.areaDiameter
  if (diameter === undefined) return []
  const gauge = context.micrometer
  const step = gauge ? resolutionUncertainty(gauge.resolution) : 0
  const perPosition = pairs.map(([a, b]) => Math.sqrt(a * b))
  const mean = perPosition.reduce((sum, value) => sum + value, 0) / perPosition.length
  const squares = perPosition.reduce((sum, value) => sum + (value - mean) * (value - mean), 0)
  const n = perPosition.length
  const scatter = n < 2 ? 0 : Math.sqrt(squares / (n - 1) / n)
  const rounding = step / Math.sqrt(Math.max(1, sheet.diameters.length))
  return [
    ...(gauge
      ? [
          input({
            id: 'micrometer',
            name: `Micrometer ${gauge.code}, calibration`,
            u: gaugeUncertainty(gauge, diameter),
            unit: 'm',
            common: true,
            note: gauge.mode === 'direct' ? 'Used directly.' : 'Compared with a pin of the nominal size.',
          }),
        ]
      : []),
    input({
      id: 'section',
      name: 'Diameter along the specimen',
      u: Math.sqrt(scatter * scatter + rounding * rounding),
      unit: 'm',
      type: 'A',
      distribution: 'observed',
      common: false,
      note: `Scatter of ${n} ${n === 1 ? 'position' : 'positions'}, with the resolution of the readings.`,
    }),
    input({
      id: 'ovality',
      name: 'Resolution of two readings',
      u: step * Math.SQRT2,
      unit: 'm',
      distribution: 'rectangular',
      common: false,
    }),
  ]
}

function weighingInputs({ sheet, context }: ModelFacts): readonly ModelInput[] {
  const { balance, rule } = context
  if (!sheet.cutMass || !sheet.cutLength) return []
  return [
    ...(balance
      ? [
          input({
            id: 'balance',
            name: `Balance ${balance.code}, calibration`,
            u: gaugeUncertainty(balance, sheet.cutMass.si),
            unit: 'kg',
            common: true,
          }),
          input({
            id: 'balanceReading',
            name: 'Reading of the balance',
            u: resolutionUncertainty(balance.resolution),
            unit: 'kg',
            distribution: 'rectangular' as const,
            common: false,
          }),
        ]
      : []),
    ...(rule
      ? [
          input({
            id: 'rule',
            name: `Rule ${rule.code}, calibration`,
            u: gaugeUncertainty(rule, sheet.cutLength.si),
            unit: 'm',
            common: true,
          }),
          input({
            id: 'ruleReading',
            name: 'Reading of the rule',
            u: resolutionUncertainty(rule.resolution),
            unit: 'm',
            distribution: 'rectangular' as const,
            common: false,
          }),
        ]
      : []),
  ]
}

function soundingInputs(facts: ModelFacts, steps: ModelSteps): readonly ModelInput[] {
  const { context, frequency, load } = facts
  const { counter, gravity, material, rig } = context
  const modulus = input({
    id: 'modulus',
    name: 'Young’s modulus',
    value: material.youngsModulus.value,
    u: standardUncertaintyFromBounds((material.youngsModulus.high - material.youngsModulus.low) / 2),
    unit: 'Pa',
    distribution: 'rectangular',
    common: true,
    note: 'Range of the material: stretch and ends.',
  })
  if (!load) return [modulus]
  const force = [
    modulus,
    input({
      id: 'load',
      name: 'What hangs',
      u: load.u,
      unit: load.kind === 'mass' ? 'kg' : 'N',
      common: true,
      ...(load.note === undefined ? {} : { note: load.note }),
    }),
    input({
      id: 'gravity',
      name: 'Local gravity',
      value: gravity.value,
      u: load.kind === 'mass' ? gravity.u : 0,
      unit: 'm/s²',
      common: true,
    }),
    input({
      id: 'friction',
      name: 'Friction at the edges',
      u: standardUncertaintyFromBounds(rig?.frictionHalfWidth ?? 0),
      unit: '',
      distribution: 'rectangular',
      common: false,
      note: 'Differs each time a string is hung.',
    }),
  ]
  if (!rig || !frequency || !steps.chain) return force
  const typed = rig.uEndRelative
  return [
    ...force,
    input({ id: 'span', name: `Span of rig ${rig.code}`, u: rig.span.u, unit: 'm', common: true }),
    input({
      id: 'plucks',
      name: `Frequency, ${frequency.n} ${frequency.n === 1 ? 'pluck' : 'plucks'}`,
      u: Math.sqrt(
        frequency.scatter * frequency.scatter +
          (counter ? (counter.resolution * counter.resolution) / 12 / frequency.n : 0) +
          (counter ? counter.uAbsolute * counter.uAbsolute : 0),
      ),
      unit: 'Hz',
      type: frequency.n > 1 ? 'A' : 'B',
      distribution: frequency.n > 1 ? 'observed' : 'normal',
      common: false,
    }),
    input({
      id: 'counterRate',
      name: counter ? `Rate of counter ${counter.code}` : 'Rate of the counter',
      u: counter?.uRelative ?? 0,
      unit: '',
      common: true,
    }),
    input({
      id: 'end',
      name: 'End condition',
      u: typed ?? standardUncertaintyFromBounds(endHalfWidthOfMass(steps.chain.inharmonicity)),
      unit: '',
      distribution: typed === undefined ? 'rectangular' : 'normal',
      common: true,
      note:
        typed === undefined
          ? 'From pinned to clamped; two spacings would make it smaller.'
          : 'Found by two spacings.',
    }),
    input({ id: 'airMass', name: 'Air that moves along', u: AIR_MASS_RELATIVE_U, unit: '', common: true }),
  ]
}
