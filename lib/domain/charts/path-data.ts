import type { Segment } from './shape'

/** Two decimals are a fiftieth of the finest line; −0 is 0. */
export const px = (value: number): string => String(Math.round(value * 100) / 100 + 0)

/** The `d` of a path. */
export const pathData = (segments: readonly Segment[]): string =>
  segments
    .map(([letter, ...numbers]) => letter + numbers.map((value) => px(Number(value))).join(' '))
    .join('')
