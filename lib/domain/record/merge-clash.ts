import type { TypedValue } from '../metrology/sheet'
import type { CurrentSheet } from './current-sheet'
import { type EquipmentCodes, holdsAct, type SheetPart } from './reading'

/** One reading that stands twice with different values. */
export interface Clash {
  readonly field: string
  readonly stored: string
  readonly entered: string
}

export interface Merge {
  /** The same reading with another value: a person has to choose. */
  readonly clashes: readonly Clash[]
  /** Whether the part brings any reading that is not there yet. */
  readonly adds: boolean
}

/**
 * What happens when a second entry for a specimen arrives: different readings of one specimen by two people
 * merge, equal ones count as already there, and only the same reading with another value clashes. Values are
 * compared in SI, so that 0.254 mm and 254 µm are one value. Set-up values clash with their act only.
 */
export function mergeOf(current: CurrentSheet, part: SheetPart, equipment: EquipmentCodes): Merge {
  const { sheet } = current
  const clashes: Clash[] = []
  let adds = false
  const compare = (
    field: string,
    stored: string | undefined,
    entered: string | undefined,
    equal: boolean,
  ) => {
    if (!equal) clashes.push({ field, stored: stored ?? 'nothing', entered: entered ?? 'nothing' })
  }
  const compareValue = (field: string, stored: Typed | undefined, entered: Typed | undefined) =>
    compare(field, shown(stored), shown(entered), stored?.si === entered?.si)

  for (const one of part.diameters ?? []) {
    const there = sheet.diameters.find((d) => d.position === one.position && d.direction === one.direction)
    if (there) compareValue(`d${one.position}${one.direction}`, there.value, one.value)
    else adds = true
  }
  if (holdsAct(part, 'section') && holdsAct(sheet, 'section') && adds)
    compare(
      'micrometer',
      current.equipment.micrometer,
      equipment.micrometer,
      current.equipment.micrometer === equipment.micrometer,
    )
  if (holdsAct(part, 'weighing')) {
    if (holdsAct(sheet, 'weighing')) {
      compareValue('cutMass', sheet.cutMass, part.cutMass)
      compareValue('cutLength', sheet.cutLength, part.cutLength)
      const state = part.weighedState ?? sheet.weighedState
      compare('weighedState', sheet.weighedState, state, sheet.weighedState === state)
    } else adds = true
  }
  if (holdsAct(part, 'sounding')) {
    if (holdsAct(sheet, 'sounding')) {
      const stored = sheet.frequencies.map((one) => one.si).join(' ')
      const entered = (part.frequencies ?? []).map((one) => one.si).join(' ')
      compare('frequency', plucks(sheet.frequencies), plucks(part.frequencies ?? []), stored === entered)
      compareValue('span', sheet.span, part.span)
      compare('load', loadText(sheet.load), loadText(part.load), loadText(sheet.load) === loadText(part.load))
    } else adds = true
  }
  return { clashes, adds }
}

type Typed = TypedValue<number>

const shown = (value: Typed | undefined): string | undefined =>
  value === undefined
    ? undefined
    : value.typed.endsWith(value.unit)
      ? value.typed
      : `${value.typed} ${value.unit}`

const plucks = (values: readonly Typed[]): string => values.map((one) => shown(one)).join(', ')

function loadText(load: SheetPart['load']): string | undefined {
  if (load === undefined) return undefined
  if (load.kind === 'weights') return [load.hanger, ...[...load.weights].sort()].join(' ')
  return `${load.kind} ${load.value.si}`
}
