import { formatNumber } from '../units/format'
import { lines, noteHead, words } from './marks'
import { spreadColumn } from './place-labels'
import type { Drawing, Shape } from './shape'

export interface LotMarksInput {
  readonly unit: string
  readonly decimals: number
  readonly decimal?: 'point' | 'comma'
  /** One value a lot. */
  readonly values: readonly number[]
  /** The mean that is published. */
  readonly mean: number
  /** What is stated of the lots: the lowest and the highest, or a band. */
  readonly band?: { readonly from: number; readonly to: number }
}

const WIDTH = 330
const [BIN, ROW, MOST_ROWS] = [9, 6.2, 10]

/**
 * What the works really makes: every released lot as a note, piled on the rule where its mean lies, with the band
 * that is stated and the mean that is published. Piles grow; beyond ten notes they are pressed together.
 */
export function lotMarks(input: LotMarksInput): Drawing {
  const { values, mean, band } = input
  const ends = [...values, mean, ...(band ? [band.from, band.to] : [])].filter(Number.isFinite)
  const [low, high] = [Math.min(...ends), Math.max(...ends)]
  const margin = (high - low) * 0.18 || Math.abs(mean) * 0.001 || 1
  const [from, to] = [low - margin, high + margin]
  const xAt = (value: number): number => ((value - from) / (to - from)) * WIDTH
  const piles = new Map<number, number>()
  const binned = values.filter(Number.isFinite).map((value) => {
    const bin = Math.round(xAt(value) / BIN)
    const height = piles.get(bin) ?? 0
    piles.set(bin, height + 1)
    return { x: bin * BIN, height }
  })
  const tallest = Math.max(1, ...piles.values())
  const row = Math.min(ROW, (MOST_ROWS * ROW) / tallest)
  const base = 10 + Math.min(tallest, MOST_ROWS) * ROW
  const text = (value: number): string =>
    formatNumber(value, { decimals: input.decimals, decimal: input.decimal })
  return {
    width: WIDTH,
    height: base + 22,
    label: `${values.length} lots, mean ${text(mean)} ${input.unit}${band ? `, from ${text(band.from)} to ${text(band.to)}` : ''}`,
    shapes: [
      ...(band
        ? [
            {
              kind: 'rect' as const,
              x: xAt(band.from),
              y: 6,
              w: xAt(band.to) - xAt(band.from),
              h: base - 6,
              fill: 'wash' as const,
            },
          ]
        : []),
      lines([[0, base, WIDTH, base]], { stroke: 'ink', width: 0.8 }),
      ...(band
        ? [
            lines(
              [
                [xAt(band.from), 2, xAt(band.from), base],
                [xAt(band.to), 2, xAt(band.to), base],
              ],
              { stroke: 'ink', width: 1.5 },
            ),
          ]
        : []),
      lines([[xAt(mean), 2, xAt(mean), base]], { stroke: 'ink', width: 0.8, dash: [4, 2] }),
      ...binned.map(
        ({ x, height }): Shape =>
          noteHead(x, base - 4 - height * row, 'ink', { rx: 3.9, ry: 2.8 }, { mark: 'lot' }),
      ),
      ...ruleLabels(input, xAt, text, base, from, to),
    ],
  }
}

function ruleLabels(
  input: LotMarksInput,
  xAt: (value: number) => number,
  text: (value: number) => string,
  base: number,
  from: number,
  to: number,
): Shape[] {
  const y = base + 14
  const inner = [...(input.band ? [input.band.from] : []), input.mean, ...(input.band ? [input.band.to] : [])]
  const places = spreadColumn(inner.map(xAt), 44)
  const clear = (x: number): boolean => places.every((place) => Math.abs(place - x) > 56)
  return [
    ...(clear(0) ? [words(0, y, text(from), { size: 9.5, ink: 'slate' })] : []),
    ...inner.map((value, index) =>
      words(places[index] ?? 0, y, text(value), {
        size: 9.5,
        anchor: 'middle',
        ...(value === input.mean ? { weight: 600 as const } : {}),
      }),
    ),
    ...(clear(WIDTH) ? [words(WIDTH, y, text(to), { size: 9.5, anchor: 'end', ink: 'slate' })] : []),
  ]
}
