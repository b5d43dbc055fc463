import { describe, expect, it } from 'vitest'
import { formatAlong } from '@/app/_ui/format/along'

describe('formatAlong', () => {
  it.each([
    [0, 800, '0 – 800'],
    [800.5, 1200, '800.5 – 1200'],
    [800, undefined, 'from 800'],
    [undefined, 800, 'to 800'],
    [undefined, undefined, '–'],
  ])('of %s and %s is %s', (from, to, text) => {
    expect(formatAlong(from, to, 'point')).toBe(text)
  })

  it('keeps to the works’ decimal sign', () => {
    expect(formatAlong(undefined, 0.5, 'comma')).toBe('to 0,5')
  })
})
