import type { Actor } from '@/lib/access/actor'
import { createMaterialIn } from '@/lib/services/keep-material-in'
import { materialsNamed } from './material-plan'
import type { DemoSchedule } from './schedule'

const HOUR = 3_600_000
const DAY = 24 * HOUR

/** Registers what a lot is made of, and what that was wound from, unless an earlier lot had it: a few days before. */
export async function receiveMaterials(
  quality: Actor,
  lot: DemoSchedule,
  received: Set<string>,
): Promise<void> {
  const wanted = lot.materials.flatMap(({ code }) => materialsNamed(code))
  for (const { code, ...facts } of wanted) {
    if (received.has(code)) continue
    received.add(code)
    const days = facts.kind === 'spool' ? 1 : 5 + (code.length % 4)
    await createMaterialIn(
      quality,
      code,
      { ...facts, receivedAt: lot.madeAt - days * DAY },
      lot.openedAt - HOUR,
    )
  }
}
