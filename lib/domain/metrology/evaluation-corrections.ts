import type { Correction } from './evaluation'
import type { ModelOutcome } from './measurement-model'
import type { ModelFacts } from './model-facts'
import { sectionCorrections } from './section-corrections'
import { soundingCorrections } from './sounding-corrections'
import { weighingCorrections } from './weighing-corrections'

/** Every correction that was made, in the order of the chain, each with its size, sign and source. */
export const evaluationCorrections = (facts: ModelFacts, outcome: ModelOutcome): readonly Correction[] => [
  ...sectionCorrections(facts, outcome),
  ...weighingCorrections(facts, outcome),
  ...soundingCorrections(facts, outcome),
]
