import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type DrawnRow, sumDrawn } from '@/lib/data/made-lots'

export type DrawnByDie = ReadonlyMap<number, DrawnRow>

/** Metres drawn through each die, by the die's id; dies that drew nothing are left out. */
export async function listDrawn(actor: Actor | undefined): Promise<DrawnByDie> {
  permit(actor, 'equipment.read')
  return new Map((await sumDrawn(database().read)).map((row) => [row.dieId, row]))
}
