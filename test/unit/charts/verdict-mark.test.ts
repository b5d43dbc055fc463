import { describe, expect, it } from 'vitest'
import { verdictInk, verdictKinds, verdictMark, verdictWords } from '@/lib/domain/charts/verdict-mark'
import { allShapes } from '@/test/support/drawing'

/** The mark without its colours. */
const drawnAs = (kind: (typeof verdictKinds)[number]): string =>
  JSON.stringify(verdictMark(kind, 'ink').shapes)

describe('verdictMark', () => {
  it('is 20 × 16 px and says its word', () => {
    for (const kind of verdictKinds) {
      const mark = verdictMark(kind)
      expect([mark.width, mark.height, mark.label]).toEqual([20, 16, verdictWords[kind]])
      expect(verdictWords[kind]).not.toBe('')
    }
  })

  it('tells every verdict from every other without colour', () => {
    expect(new Set(verdictKinds.map(drawnAs)).size).toBe(verdictKinds.length)
  })

  it('puts the note between the lines, on the upper one, or beyond on a line of its own', () => {
    const headAndLines = (kind: 'within' | 'near' | 'beyond') => {
      const shapes = allShapes(verdictMark(kind).shapes)
      const head = shapes.find((shape) => shape.kind === 'ellipse')
      const heights = shapes.flatMap((shape) =>
        shape.kind === 'path'
          ? shape.segments.flatMap(([letter, , y]) => (letter === 'M' ? [y ?? 0] : []))
          : [],
      )
      return { y: head?.kind === 'ellipse' ? head.cy : Number.NaN, heights: heights.map(Number) }
    }
    const within = headAndLines('within')
    expect(within.y).toBeGreaterThan(Math.min(...within.heights))
    expect(within.y).toBeLessThan(Math.max(...within.heights))
    const near = headAndLines('near')
    expect(near.y).toBe(Math.min(...near.heights))
    const beyond = headAndLines('beyond')
    expect(beyond.heights).toHaveLength(3)
    expect(beyond.heights).toContain(beyond.y)
    expect(beyond.y).toBe(Math.min(...beyond.heights))
  })

  it('has an ink of its own meaning, which the caller may overrule', () => {
    expect(verdictInk('within')).toBe('verdigris')
    expect(verdictInk('beyond')).toBe('vermilion')
    expect(JSON.stringify(verdictMark('beyond', 'slate').shapes)).not.toContain('vermilion')
  })
})
