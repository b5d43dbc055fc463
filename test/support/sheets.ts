import type { DiameterReading, SpecimenSheet, TypedValue } from '@/lib/domain/metrology/sheet'
import type { ReadingFact } from '@/lib/domain/record/reading'
import {
  type Hertz,
  hertz,
  type Kilograms,
  kilograms,
  type Metres,
  metres,
} from '@/lib/domain/units/quantity'

/** Typed values as a bench would hand them in, and a whole sheet of a plain steel string of 0.254 mm. */
export const typedMetres = (typed: string): TypedValue<Metres> => ({
  typed,
  unit: 'mm',
  si: metres(Number(typed) / 1000),
})

export const typedMass = (typed: string): TypedValue<Kilograms> => ({
  typed,
  unit: 'mg',
  si: kilograms(Number(typed) / 1e6),
})

export const typedHertz = (typed: string): TypedValue<Hertz> => ({
  typed,
  unit: 'Hz',
  si: hertz(Number(typed)),
})

export const diameterAt = (position: number, direction: 'a' | 'b', typed: string): DiameterReading => ({
  position,
  direction,
  value: typedMetres(typed),
})

export const steelSheet = (change: Partial<SpecimenSheet> = {}): SpecimenSheet => ({
  takenAt: { end: 'head' },
  diameters: [1, 2, 3].flatMap((position) => [
    diameterAt(position, 'a', '0.2540'),
    diameterAt(position, 'b', '0.2542'),
  ]),
  weighedState: 'slack',
  cutLength: typedMetres('500.0'),
  cutMass: typedMass('199.1'),
  load: { kind: 'weights', hanger: 'H-01', weights: ['W-05', 'W-02'] },
  span: typedMetres('648.0'),
  frequencies: [typedHertz('331.0')],
  keptDoubts: [],
  ...change,
})

export const steelEquipment = {
  rig: 'RIG-2',
  micrometer: 'M-14',
  balance: 'B-03',
  rule: 'R-01',
  counter: 'F-02',
} as const

export const sheetReading = (clientId: string, change: Partial<SpecimenSheet> = {}): ReadingFact => ({
  clientId,
  kind: 'sheet',
  values: steelSheet(change),
  equipment: steelEquipment,
})
