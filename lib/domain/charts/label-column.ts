import { formatNumber } from '../units/format'
import type { PlotFrame } from './plot-frame'
import type { ReadoutFormat } from './readout'
import type { StaveModel } from './staff-chart'
import type { StaveParts } from './stave-layout'
import { wrapWords } from './text-width'

export interface ColumnLine {
  readonly x: number
  readonly y: number
  readonly text: string
  readonly kind: 'name' | 'unit'
}

const COLUMN = 128
const NAME_LINE = 15
const UNIT_LINE = 13
/** Above its stave a name stands clear of the left bar. */
const BESIDE_BAR = 5
/** Room for the reading beside the name on a narrow page. */
const READING = 76

/** Tolerances that lie too far off to be drawn, in words: "tolerance 391.5 – 404.1". */
function untoldText({ untold, stave }: StaveParts, format: ReadoutFormat): string | undefined {
  const text = (value: number): string =>
    formatNumber(value, {
      decimals: decimalsOf(value, stave),
      decimal: format.decimal,
      sign: stave.signed ? 'always' : 'negative',
    })
  const upper = untold.find(({ side }) => side === 'above')
  const lower = untold.find(({ side }) => side === 'below')
  if (upper && lower) return `tolerance ${text(lower.value)} – ${text(upper.value)}`
  if (upper) return `at most ${text(upper.value)}`
  return lower ? `at least ${text(lower.value)}` : undefined
}

const decimalsOf = (value: number, { decimals }: StaveModel): number =>
  Number.isInteger(Number(value.toFixed(decimals))) ? 0 : decimals

type Line = Pick<ColumnLine, 'text' | 'kind'>

/** Name, unit and remarks of a stave, broken into lines: beside it, or above it on a narrow page. */
export function columnText(part: StaveParts, frame: PlotFrame, format: ReadoutFormat): readonly Line[] {
  const { stave } = part
  const provisional = stave.segments.at(-1)?.provisional ? ', provisional' : ''
  const untold = untoldText(part, format)
  const unit = `${stave.unitLabel}${provisional}`
  const named = (width: number): Line[] =>
    wrapWords(stave.label, width, 13, 'strong').map((text) => ({ text, kind: 'name' as const }))
  const second = (text: string, width: number): Line[] =>
    wrapWords(text, width, 11).map((line) => ({ text: line, kind: 'unit' as const }))
  return frame.compact
    ? [...named(frame.w - READING), ...second(untold ? `${unit}, ${untold}` : unit, frame.w - BESIDE_BAR)]
    : [...named(COLUMN), ...second(unit, COLUMN), ...(untold ? second(untold, COLUMN) : [])]
}

/** Height of such lines, from a little above the first to the foot of the last. */
export const columnHeight = (text: readonly Line[]): number =>
  text.reduce((sum, { kind }) => sum + (kind === 'name' ? NAME_LINE : UNIT_LINE), 4)

/** Where the reading stands below the lines beside a stave, counted from the top of its staff. */
export const readingBelow = (part: StaveParts, text: readonly Line[]): number =>
  Math.max(part.bottom - part.top, 84, columnHeight(text) + 14) - 2

/** Places the lines of a stave and its reading. */
export function labelColumn(
  part: StaveParts,
  y: number,
  frame: PlotFrame,
  text: readonly Line[],
): {
  readonly column: readonly ColumnLine[]
  readonly readout: { readonly valueX: number; readonly sigmaX: number; readonly y: number }
} {
  const top = frame.compact
    ? y + part.top - part.above + part.freeAbove - columnHeight(text) + 13
    : y + part.top + 10
  let next = top
  const column = text.map((line, index): ColumnLine => {
    const own = next
    const isLastName = line.kind === 'name' && text[index + 1]?.kind === 'unit'
    // Units stand a little closer below the name than names below each other.
    next += line.kind === 'unit' || (frame.compact && isLastName) ? UNIT_LINE : NAME_LINE
    return { ...line, x: frame.compact ? frame.x + BESIDE_BAR : 0, y: own }
  })
  return {
    column,
    readout: frame.compact
      ? { valueX: frame.x + frame.w, sigmaX: frame.x + frame.w + 46, y: top }
      : { valueX: 0, sigmaX: COLUMN, y: y + part.top + readingBelow(part, text) },
  }
}
