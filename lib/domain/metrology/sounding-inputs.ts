import { endHalfWidthOfMass } from '../strings/end-condition'
import type { ModelSteps } from './measurement-model'
import type { ModelFacts } from './model-facts'
import { gaugeUncertainty, modelInput } from './model-input'
import type { ModelInput } from './propagate'
import { standardUncertaintyFromBounds } from './type-b'

/** Relative standard uncertainty of the air mass moved by a string (common practice, no source). */
const AIR_MASS_RELATIVE_U = 0.1

/** How well one pluck repeats, relative to the frequency: a tenth of a cent (common practice, no source). */
const SINGLE_PLUCK_RELATIVE_U = 5.8e-5

/** Standard uncertainty of the room's temperature at the specimen, K (common practice, no source). */
const TEMPERATURE_U = 0.5

/**
 * Uncertain inputs of force, stretch and sounding. Load, gravity, span, ends, modulus and air are the same
 * for all specimens of a lot, and so is friction: the same edges, hung by the same hand in the same way, so
 * that taking it for random would make a lot's mean look better than it is. Only the plucks are random.
 *
 * The two routes share no input but `modulus` and `temperature`, and the diameter through stretch and
 * stiffness; the span is taken as measured by another rule than the one that the piece was cut by (with the
 * same rule a part of either length would cancel in the closure, and this budget is on the safe side).
 */
export function soundingInputs(facts: ModelFacts, steps: ModelSteps): readonly ModelInput[] {
  return [...stateInputs(facts), ...forceInputs(facts), ...spanInputs(facts, steps)]
}

function stateInputs({ celsius, context }: ModelFacts): readonly ModelInput[] {
  const { youngsModulus } = context.material
  return [
    modelInput({
      id: 'modulus',
      name: 'Young’s modulus',
      value: youngsModulus.value,
      u: standardUncertaintyFromBounds((youngsModulus.high - youngsModulus.low) / 2),
      unit: 'Pa',
      distribution: 'rectangular',
      common: true,
      note: 'Range of the material: stretch and ends.',
    }),
    modelInput({
      id: 'temperature',
      name: 'Temperature of the specimen',
      u: TEMPERATURE_U,
      unit: 'K',
      common: true,
      note: `About ${celsius} °C: expansion of specimen, gauge, rule and rig.`,
    }),
  ]
}

function forceInputs({ context, load }: ModelFacts): readonly ModelInput[] {
  if (!load) return []
  const { gravity, rig } = context
  return [
    modelInput({
      id: 'load',
      name: 'What hangs',
      u: load.u,
      unit: load.kind === 'mass' ? 'kg' : 'N',
      common: true,
      ...(load.note === undefined ? {} : { note: load.note }),
    }),
    modelInput({
      id: 'gravity',
      name: 'Local gravity',
      value: gravity.value,
      u: load.kind === 'mass' ? gravity.u : 0,
      unit: 'm/s²',
      common: true,
    }),
    modelInput({
      id: 'friction',
      name: 'Friction at the edges',
      u: standardUncertaintyFromBounds(rig?.frictionHalfWidth ?? 0),
      unit: '',
      distribution: 'rectangular',
      common: true,
      note: 'The same edges and the same hand for a whole lot.',
    }),
  ]
}

function spanInputs({ context, frequency, load, sheet }: ModelFacts, { chain }: ModelSteps) {
  const { counter, rig } = context
  if (!rig || !load) return []
  const span = modelInput({
    id: 'span',
    name: `Span of rig ${rig.code}`,
    u: rig.span.u,
    unit: 'm',
    common: true,
    ...(sheet.span ? { note: 'Taken as well known as the rig’s own span.' } : {}),
  })
  if (!frequency || !chain) return [span]
  const { n, scatter, value } = frequency
  const single = n > 1 ? 0 : SINGLE_PLUCK_RELATIVE_U * value
  const step = counter ? (counter.resolution * counter.resolution) / 12 / n : 0
  const typed = rig.uEndRelative
  return [
    span,
    modelInput({
      id: 'plucks',
      name: `Frequency, ${n} ${n === 1 ? 'pluck' : 'plucks'}`,
      u: Math.sqrt(scatter * scatter + single * single + step),
      unit: 'Hz',
      type: n > 1 ? 'A' : 'B',
      distribution: n > 1 ? 'observed' : 'normal',
      common: false,
      note:
        n > 1
          ? 'Scatter of the plucks, with the resolution.'
          : 'One pluck: a tenth of a cent, with the resolution.',
    }),
    ...(counter
      ? [
          modelInput({
            id: 'counter',
            name: `Counter ${counter.code}, calibration`,
            u: gaugeUncertainty(counter, value),
            unit: 'Hz',
            common: true,
          }),
        ]
      : []),
    modelInput({
      id: 'end',
      name: 'End condition',
      u: typed ?? standardUncertaintyFromBounds(endHalfWidthOfMass(chain.inharmonicity)),
      unit: '',
      distribution: typed === undefined ? 'rectangular' : 'normal',
      common: true,
      note:
        typed === undefined
          ? 'From pinned to clamped; two spacings would make it smaller.'
          : 'Found by two spacings.',
    }),
    modelInput({
      id: 'airMass',
      name: 'Air that moves along',
      u: AIR_MASS_RELATIVE_U,
      unit: '',
      common: true,
    }),
  ]
}
