import type { Role } from './actor'

/**
 * The one table of rights: which roles may do what. Every service asks `permit` with one of these verbs; no
 * page, action or route decides by role itself. `doing` begins the sentence a person reads when refused.
 */
interface Right {
  readonly doing: string
  readonly roles: readonly Role[]
}

const everyone: readonly Role[] = ['bench', 'quality', 'sales', 'administrator']
const workshop: readonly Role[] = ['bench', 'quality', 'administrator']
const measurers: readonly Role[] = ['bench', 'quality']

const table = {
  // Reading. Sales sees the lots a datasheet may rest on, and nothing of what is still being judged.
  'lots.read': { doing: 'Reading lots that are not released', roles: workshop },
  'lots.read-released': { doing: 'Reading released lots', roles: everyone },
  'drift.read': { doing: 'Reading the control charts', roles: workshop },
  'equipment.read': { doing: 'Reading the equipment list', roles: workshop },
  'materials-in.read': { doing: 'Reading what materials came in', roles: workshop },
  'imports.read': { doing: 'Reading imports', roles: workshop },
  'catalogue.read': { doing: 'Reading the catalogue', roles: everyone },
  'datasheets.read': { doing: 'Reading datasheets', roles: everyone },
  'settings.read': { doing: 'Reading the settings of the works', roles: everyone },
  'people.read': { doing: 'Reading who works here', roles: everyone },
  'ledger.read': { doing: 'Reading the ledger', roles: ['quality', 'administrator'] },

  // Measuring.
  'lots.open': { doing: 'Opening a lot', roles: measurers },
  'imports.run': { doing: 'Importing readings', roles: measurers },
  'readings.record': { doing: 'Recording readings', roles: measurers },
  'readings.supersede-own': { doing: 'Correcting readings', roles: measurers },
  'readings.supersede-any': {
    doing: 'Correcting readings of others or of a decided lot',
    roles: ['quality'],
  },

  // Judging.
  'lots.decide': { doing: 'Deciding a lot', roles: ['quality'] },
  'limits.freeze': { doing: 'Freezing control limits', roles: ['quality'] },
  'signals.answer': { doing: 'Answering a signal', roles: ['quality'] },
  'equipment.keep': { doing: 'Changing the equipment list', roles: ['quality'] },
  'materials-in.keep': { doing: 'Changing what materials came in', roles: ['quality'] },
  'catalogue.keep': { doing: 'Changing the catalogue', roles: ['quality'] },

  // Publishing.
  'datasheets.build': { doing: 'Building a datasheet', roles: ['sales'] },
  'datasheets.check': { doing: 'Checking a datasheet', roles: ['quality'] },
  'datasheets.publish': { doing: 'Publishing a datasheet', roles: ['sales'] },

  // Running the place.
  'people.keep': { doing: 'Changing people and their roles', roles: ['administrator'] },
  'settings.keep': { doing: 'Changing the settings of the works', roles: ['administrator'] },
  'backup.make': { doing: 'Making a back-up', roles: ['administrator'] },
} as const satisfies Record<string, Right>

export type Verb = keyof typeof table

export const verbs = Object.keys(table) as Verb[]

export const rights: Readonly<Record<Verb, Right>> = table

/** The roles as a person reads them, in the order of the table. */
export const roleNames: Readonly<Record<Role, string>> = {
  bench: 'bench',
  quality: 'quality',
  sales: 'sales',
  administrator: 'administrator',
}
