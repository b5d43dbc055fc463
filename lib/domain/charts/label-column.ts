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

/** Name, unit and remarks of a stave, and where its reading stands: beside it, or above it on a narrow page. */
export function labelColumn(
  part: StaveParts,
  y: number,
  frame: PlotFrame,
  format: ReadoutFormat,
): {
  readonly column: readonly ColumnLine[]
  readonly readout: { readonly valueX: number; readonly sigmaX: number; readonly y: number }
} {
  const { stave } = part
  const provisional = stave.segments.at(-1)?.provisional ? ', provisional' : ''
  const untold = untoldText(part, format)
  const unit = `${stave.unitLabel}${provisional}`
  if (frame.compact) {
    const nameY = y + part.top - part.above - 6
    return {
      column: [
        { x: frame.x, y: nameY, text: stave.label, kind: 'name' },
        { x: frame.x, y: nameY + 13, text: untold ? `${unit}, ${untold}` : unit, kind: 'unit' },
      ],
      readout: { valueX: frame.x + frame.w, sigmaX: frame.x + frame.w + 46, y: nameY },
    }
  }
  const top = y + part.top + 10
  const lines: Omit<ColumnLine, 'x' | 'y'>[] = [
    ...wrapWords(stave.label, COLUMN, 13, 'strong').map((text) => ({ text, kind: 'name' as const })),
    ...wrapWords(unit, COLUMN, 11).map((text) => ({ text, kind: 'unit' as const })),
    ...(untold ? wrapWords(untold, COLUMN, 11).map((text) => ({ text, kind: 'unit' as const })) : []),
  ]
  const names = lines.filter(({ kind }) => kind === 'name').length
  return {
    column: lines.map((line, index) => ({
      ...line,
      x: 0,
      y: top + Math.min(index, names) * NAME_LINE + Math.max(0, index - names) * UNIT_LINE,
    })),
    readout: { valueX: 0, sigmaX: COLUMN, y: y + Math.max(part.bottom, part.top + 84) - 2 },
  }
}
