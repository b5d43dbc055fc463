import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { listDriftRows } from '@/lib/data/charted-lots'
import { database } from '@/lib/data/database'

export interface DriftProduct {
  readonly code: string
  readonly name: string
  readonly family: string
  readonly active: boolean
  /** Lots on its chart. */
  readonly lots: number
  readonly lastMadeAt: number | undefined
  readonly openSignals: number
  /** Limit sets in force. */
  readonly limitSets: number
}

/** Products that can be charted, with what waits on each chart. */
export async function listDriftProducts(actor: Actor | undefined): Promise<readonly DriftProduct[]> {
  permit(actor, 'drift.read')
  return (await listDriftRows(database().read)).map(({ id: _, ...product }) => product)
}
