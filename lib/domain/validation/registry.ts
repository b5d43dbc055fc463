import { controlQuantities } from './control'
import type { QuantityTable } from './inputs'
import { metrologyQuantities } from './metrology'
import { physicsQuantities } from './physics'
import { statisticsQuantities } from './statistics'

/** One name, one function: two tables that name the same quantity are a mistake. Throws an Error naming it. */
export function mergeQuantities(...tables: readonly QuantityTable[]): QuantityTable {
  const merged = new Map<string, QuantityTable[string]>()
  for (const table of tables) {
    for (const [name, compute] of Object.entries(table)) {
      if (merged.has(name)) throw new Error(`two functions compute “${name}”`)
      merged.set(name, compute)
    }
  }
  return Object.fromEntries(merged)
}

/** Every quantity that check cases can ask for. What is not built is absent. */
export const quantities: QuantityTable = mergeQuantities(
  physicsQuantities,
  metrologyQuantities,
  statisticsQuantities,
  controlQuantities,
)
