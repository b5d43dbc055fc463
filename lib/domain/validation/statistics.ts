import type { QuantityTable } from './inputs'
import { distributionQuantities } from './statistics-distributions'
import { summaryQuantities } from './statistics-summaries'

/** Each quantity of the statistics cases with the function that computes it. What is not built is absent. */
export const statisticsQuantities: QuantityTable = {
  ...distributionQuantities,
  ...summaryQuantities,
}
