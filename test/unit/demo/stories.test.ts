import { describe, expect, it } from 'vitest'
import { normalisedError } from '@/lib/domain/metrology/closure'
import { demoStories } from '@/prisma/demo/stories'
import { demoSignals, foundAt, simulateDemo } from '@/test/support/demo-simulation'

const signals = demoSignals(simulateDemo())

describe('faults of the demo on the default charts', () => {
  it.each(
    demoStories.flatMap((story) =>
      story.foundBy === 'charts' ? [[story.key, story.firstLot, story.foundWithin ?? 0, story] as const] : [],
    ),
  )('%s, begun with %s, is found within %i of its lots', (_key, _first, within, story) => {
    expect(foundAt(story, signals) ?? Number.POSITIVE_INFINITY).toBeLessThanOrEqual(within)
  })

  it('opens the closure of a specimen where the bench slipped or a weight was missing, whatever the luck', () => {
    const slips = demoStories.filter(({ foundBy }) => foundBy === 'closure')
    expect(slips.map(({ key }) => key)).toEqual(['octave', 'swapped-digits', 'missing-slot'])
    for (const { lots } of slips)
      for (const seed of [0, 1, 2, 3, 4, 5]) {
        const errors = simulateDemo(seed, ({ code }) => lots.includes(code)).flatMap(({ evaluations }) =>
          evaluations.map(({ results: { closure } }) =>
            closure ? Math.abs(normalisedError(closure.value, closure.u)) : 0,
          ),
        )
        expect(Math.max(...errors)).toBeGreaterThan(1.5)
      }
  })

  it('does not take a target that was moved, a coarse micrometer or a late lot for a fault', () => {
    for (const story of demoStories.filter(({ key }) =>
      ['moved-target', 'coarse-micrometer', 'late-lot'].includes(key),
    ))
      expect(foundAt(story, signals)).toBeUndefined()
  })

  it('raises far fewer signals than it has lots: on five charts of 740 lots', () => {
    expect(signals.length).toBeLessThan(130)
  })
})
