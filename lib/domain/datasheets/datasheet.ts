import type { TensionBasis } from '../metrology/specification'

/** How hard a string works at a note: share of the least breaking load. */
export type WorkingState = 'slack' | 'working' | 'upper' | 'over'

export interface DatasheetCell {
  /** Newtons, unrounded: the law of the basis holds for it to the last digits. */
  readonly tension: number
  /** Share of the least breaking load; absent when no strength is known. */
  readonly fraction?: number
  readonly state: WorkingState
}

export interface DatasheetRow {
  readonly midi: number
  readonly note: string
  /** Hz. */
  readonly frequency: number
  /** One cell a length, in the order of `lengths`. */
  readonly cells: readonly DatasheetCell[]
}

export interface DatasheetLotMark {
  readonly code: string
  /** Epoch milliseconds. */
  readonly madeAt: number
  /** Mean mass per metre, weighed, kg/m. */
  readonly massPerMetre: number
  readonly specimens: number
}

/** What released lots really have. Standard deviations in kg/m. */
export interface DatasheetSpread {
  readonly lots: number
  readonly specimens: number
  readonly lowestLot: number
  readonly highestLot: number
  readonly lowestSpecimen: number
  readonly highestSpecimen: number
  readonly betweenLots: number
  readonly withinLots: number
  /** The statement that is printed, with what it rests on. */
  readonly statement: string
}

export interface DatasheetFigure {
  readonly value: number
  /** Expanded uncertainty, k = 2, where there is one. */
  readonly expanded?: number
}

/** A frozen snapshot: everything a page, a file or a print of this revision shows. SI, canonical JSON. */
export interface DatasheetBody {
  readonly format: 1
  readonly works: string
  readonly product: { readonly code: string; readonly name: string; readonly construction: string }
  readonly material: string
  readonly specification: number
  readonly modelVersion: string
  readonly basis: TensionBasis
  readonly a4: number
  readonly forceUnit: 'N' | 'kgf' | 'lbf'
  /** Decimals of the printed tensions: no digit that the uncertainty does not carry. */
  readonly decimals: number
  readonly massPerMetre: DatasheetFigure
  readonly diameter: DatasheetFigure
  readonly effectiveDensity: DatasheetFigure
  /** EA in newtons that the stretch was solved with. */
  readonly axialStiffness: number
  /** Mass per metre that the loaded basis uses, kg/m. */
  readonly loadedMassPerMetre: number
  readonly breakingLoad?: { readonly value: number; readonly basis: string }
  /** At the reference note and length. */
  readonly reference: {
    readonly note: string
    readonly frequency: number
    readonly length: number
    readonly tension: number
    readonly waveSpeed: number
    /** Newtons for one cent, and the relative rise of tension for one semitone. */
    readonly newtonsPerCent: number
    readonly semitoneRatio: number
  }
  readonly lengths: readonly number[]
  readonly rows: readonly DatasheetRow[]
  readonly spread: DatasheetSpread
  readonly lots: readonly DatasheetLotMark[]
  readonly method: string
  readonly cautions: readonly string[]
}
