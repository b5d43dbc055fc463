import type { ModelSteps } from './measurement-model'
import type { ModelFacts } from './model-facts'
import type { ModelInput } from './propagate'
import { sectionInputs } from './section-inputs'
import { soundingInputs } from './sounding-inputs'
import { weighingInputs } from './weighing-inputs'

/**
 * Every uncertain input of the chain with its standard uncertainty. What the specimens of a lot share is
 * marked common, so that the mean of the lot does not lessen it; readings and scatter are not.
 */
export const evaluationInputs = (facts: ModelFacts, steps: ModelSteps): readonly ModelInput[] => [
  ...sectionInputs(facts),
  ...weighingInputs(facts),
  ...soundingInputs(facts, steps),
]
