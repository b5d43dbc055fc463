import type { Ink } from './ink'
import { lines, noteHead, openHead } from './marks'
import type { Drawing, Shape } from './shape'

export const verdictKinds = ['within', 'near', 'beyond', 'waiting', 'run'] as const

export type VerdictKind = (typeof verdictKinds)[number]

/** What a mark says where no word stands beside it. */
export const verdictWords: Readonly<Record<VerdictKind, string>> = {
  within: 'within',
  near: 'near the limit',
  beyond: 'beyond',
  waiting: 'waiting',
  run: 'run',
}

const head = { rx: 4, ry: 2.9 }
const tone: Readonly<Record<VerdictKind, Ink>> = {
  within: 'verdigris',
  near: 'brass',
  beyond: 'vermilion',
  waiting: 'slate',
  run: 'vermilion',
} as const

/** Which ink a verdict has when nothing else is said; the mark never says it by colour alone. */
export const verdictInk = (kind: VerdictKind): Ink => tone[kind]

const shapesOf: Readonly<Record<VerdictKind, (ink: Ink) => readonly Shape[]>> = {
  within: (ink) => [
    lines(
      [
        [1, 3.5, 19, 3.5],
        [1, 12.5, 19, 12.5],
      ],
      { stroke: ink },
    ),
    noteHead(10, 8, ink, head),
  ],
  near: (ink) => [
    lines(
      [
        [1, 4.5, 19, 4.5],
        [1, 13.5, 19, 13.5],
      ],
      { stroke: ink },
    ),
    noteHead(10, 4.5, ink, head),
  ],
  beyond: (ink) => [
    lines(
      [
        [1, 8.5, 19, 8.5],
        [1, 14.5, 19, 14.5],
        [4, 3, 16, 3],
      ],
      { stroke: ink },
    ),
    noteHead(10, 3, ink, head),
  ],
  waiting: (ink) => [
    lines(
      [
        [1, 3.5, 19, 3.5],
        [1, 12.5, 19, 12.5],
      ],
      { stroke: ink, dash: [2, 2] },
    ),
    { ...openHead(10, 8, ink, { rx: 3.7, ry: 2.6 }), fill: undefined },
  ],
  run: (ink) => [
    {
      kind: 'path',
      fill: ink,
      segments: [['M', 1, 9], ['C', 5, 2.2, 15, 2.2, 19, 9], ['C', 15, 4, 5, 4, 1, 9], ['Z']],
    },
    lines([[1, 13, 19, 13]], { stroke: ink, dash: [3, 3] }),
  ],
}

/** The 20 × 16 mark of a verdict: a note between, on or beyond two lines; a slur for a run. */
export const verdictMark = (kind: VerdictKind, ink = verdictInk(kind)): Drawing => ({
  width: 20,
  height: 16,
  label: verdictWords[kind],
  shapes: shapesOf[kind](ink),
})
