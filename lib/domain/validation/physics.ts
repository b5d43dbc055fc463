import type { QuantityTable } from './inputs'
import { constructionQuantities } from './physics-construction'
import { forceQuantities } from './physics-force'
import { pitchQuantities } from './physics-pitch'
import { safetyQuantities } from './physics-safety'
import { soundingQuantities } from './physics-sounding'
import { textbookQuantities } from './physics-textbook'

/** Each quantity of the physics cases with the function that computes it. What is not built is absent. */
export const physicsQuantities: QuantityTable = {
  ...pitchQuantities,
  ...forceQuantities,
  ...soundingQuantities,
  ...constructionQuantities,
  ...safetyQuantities,
  ...textbookQuantities,
}
