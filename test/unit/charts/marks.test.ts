import { describe, expect, it } from 'vitest'
import { lines, noteHead, openHead, polyline, words } from '@/lib/domain/charts/marks'

describe('noteHead and openHead', () => {
  it('have the sizes and the lean of a note: 5.8 × 4.2 filled, 5.2 × 3.6 open with paper inside', () => {
    expect(noteHead(3, 4, 'ink')).toMatchObject({ cx: 3, cy: 4, rx: 5.8, ry: 4.2, turn: -20, fill: 'ink' })
    expect(openHead(3, 4, 'ink')).toMatchObject({
      rx: 5.2,
      ry: 3.6,
      turn: -20,
      fill: 'paper',
      stroke: 'ink',
      width: 1.3,
    })
  })
})

describe('lines and polyline', () => {
  it('move to each line’s beginning, or once', () => {
    expect(
      lines(
        [
          [0, 1, 2, 3],
          [4, 5, 6, 7],
        ],
        { stroke: 'ink' },
      ).segments,
    ).toEqual([
      ['M', 0, 1],
      ['L', 2, 3],
      ['M', 4, 5],
      ['L', 6, 7],
    ])
    const corners = [
      [0, 0],
      [1, 0],
      [1, 1],
    ] as const
    expect(polyline(corners, { stroke: 'ink' }, { closed: true }).segments.map(([letter]) => letter)).toEqual(
      ['M', 'L', 'L', 'Z'],
    )
    expect(polyline([], { stroke: 'ink' }).segments).toEqual([])
  })
})

describe('words', () => {
  it('stand where they are told, dressed as they are told', () => {
    expect(words(1, 2, 'coil C-118', { italic: true })).toEqual({
      kind: 'text',
      x: 1,
      y: 2,
      text: 'coil C-118',
      italic: true,
    })
  })
})
