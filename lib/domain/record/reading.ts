import type { SpecimenSheet } from '../metrology/sheet'

/** A first entry is a whole `sheet`; the others are single acts, added by a second person or corrected. */
export const readingKinds = ['sheet', 'section', 'weighing', 'sounding'] as const

export type ReadingKind = (typeof readingKinds)[number]

/** The acts of measuring a specimen: section at the micrometer, weighing at the balance, sounding at the rig. */
export const acts = ['section', 'weighing', 'sounding'] as const

export type Act = (typeof acts)[number]

/** What one reading says: any part of a sheet. */
export type SheetPart = Partial<SpecimenSheet>

/** Codes of the equipment an act was made with. */
export interface EquipmentCodes {
  readonly rig?: string
  readonly micrometer?: string
  readonly balance?: string
  readonly rule?: string
  readonly counter?: string
}

/** The stored content of a reading, as canonical JSON in `Reading.body`. */
export interface ReadingBody {
  readonly format: 1
  readonly values: SheetPart
}

/** A reading as the fold over all readings of a specimen sees it. */
export interface ReadingFact {
  readonly clientId: string
  readonly kind: ReadingKind
  readonly values: SheetPart
  readonly equipment: EquipmentCodes
  /** Client id of the reading this one corrects. */
  readonly supersedes?: string
}

/** The acts that a reading of this kind replaces when it corrects another. */
export const actsOf = (kind: ReadingKind): readonly Act[] => (kind === 'sheet' ? acts : [kind])

/** Whether a part holds the reading that makes the act: set-up values alone do not. */
export function holdsAct(part: SheetPart, act: Act): boolean {
  if (act === 'section') return (part.diameters?.length ?? 0) > 0
  if (act === 'weighing') return part.cutMass !== undefined
  return (part.frequencies?.length ?? 0) > 0
}

/** The act that a field of the entry sheet belongs to: `d1a` … `cutMass`, `frequency`; undefined for the others. */
export function actOfField(field: string): Act | undefined {
  if (/^d\d+[ab]?$/.test(field) || field.startsWith('diameter')) return 'section'
  if (field === 'cutMass' || field === 'cutLength') return 'weighing'
  if (/^(frequency|frequencies|span|load)/.test(field)) return 'sounding'
  return undefined
}
