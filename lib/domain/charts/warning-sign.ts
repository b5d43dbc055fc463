import { lines, polyline } from './marks'
import type { Drawing } from './shape'

/** The triangle that stands before cautions, 22 × 20 px. */
export const warningSign: Drawing = {
  width: 22,
  height: 20,
  label: 'Caution',
  shapes: [
    polyline(
      [
        [11, 1.5],
        [20.8, 18.5],
        [1.2, 18.5],
      ],
      { stroke: 'ink', width: 1.8, round: true },
      { closed: true },
    ),
    lines(
      [
        [11, 7.5, 11, 13],
        [11, 14.8, 11, 16.6],
      ],
      { stroke: 'ink', width: 2 },
    ),
  ],
}
