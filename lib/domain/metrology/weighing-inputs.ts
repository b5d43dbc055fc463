import type { GaugeFacts } from './evaluation'
import type { ModelFacts } from './model-facts'
import { gaugeUncertainty, modelInput } from './model-input'
import type { ModelInput } from './propagate'
import { resolutionUncertainty } from './type-b'
import { pieceLength } from './weighing-model'

/**
 * Uncertain inputs of the weighing: calibration of balance and rule, common to a lot, and their readings.
 * Buoyancy of the piece is known to 1e-6 for metals and 3e-5 for nylon, and has no line of its own.
 */
export function weighingInputs(facts: ModelFacts): readonly ModelInput[] {
  const { sheet, context } = facts
  const { reading, by } = pieceLength(facts)
  if (!sheet.cutMass || reading === undefined) return []
  const { balance, rule } = context
  return [
    ...(balance ? gaugeLines('balance', 'Balance', balance, sheet.cutMass.si, 'kg') : []),
    ...(rule && by === 'rule' ? gaugeLines('rule', 'Rule', rule, reading, 'm') : []),
  ]
}

const gaugeLines = (
  id: 'balance' | 'rule',
  name: string,
  gauge: GaugeFacts,
  reading: number,
  unit: string,
): readonly ModelInput[] => [
  modelInput({
    id,
    name: `${name} ${gauge.code}, calibration`,
    u: gaugeUncertainty(gauge, reading),
    unit,
    common: true,
  }),
  modelInput({
    id: `${id}Reading`,
    name: `Reading of the ${name.toLowerCase()}`,
    u: resolutionUncertainty(gauge.resolution),
    unit,
    distribution: 'rectangular',
    common: false,
  }),
]
