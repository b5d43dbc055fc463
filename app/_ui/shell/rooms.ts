import type { Actor } from '@/lib/access/actor'
import { may } from '@/lib/access/permit'
import type { Verb } from '@/lib/access/rights'

interface Room {
  readonly href: string
  readonly label: string
  /** A room is shown to those who may read something in it. */
  readonly needs: Verb
}

/** The rooms that work, in groups divided by a rule. */
const groups: readonly (readonly Room[])[] = [
  [{ href: '/today', label: 'Today', needs: 'settings.read' }],
  [
    { href: '/bench', label: 'Bench', needs: 'readings.record' },
    { href: '/lots', label: 'Lots', needs: 'lots.read-released' },
  ],
  [
    { href: '/drift', label: 'Drift', needs: 'drift.read' },
    { href: '/datasheets', label: 'Datasheets', needs: 'datasheets.read' },
  ],
  [
    { href: '/catalogue', label: 'Catalogue', needs: 'catalogue.read' },
    { href: '/equipment', label: 'Equipment', needs: 'equipment.read' },
    { href: '/materials-in', label: 'Materials in', needs: 'materials-in.read' },
  ],
  [{ href: '/settings', label: 'Settings', needs: 'settings.read' }],
]

export interface RoomCount {
  readonly count: number
  /** What is counted: "3 open signals". */
  readonly meaning: string
}

export interface RoomLink {
  readonly href: string
  readonly label: string
  readonly waiting?: RoomCount
}

/** The rail of one person: rooms of their rights, with what waits in each. */
export const roomsFor = (
  actor: Actor,
  waiting: Readonly<Record<string, RoomCount | undefined>>,
): readonly (readonly RoomLink[])[] =>
  groups
    .map((group) =>
      group
        .filter(({ needs }) => may(actor, needs))
        .map(({ href, label }) => ({ href, label, waiting: waiting[href] })),
    )
    .filter((group) => group.length > 0)
