import { describe, expect, it } from 'vitest'
import { demoStories } from '@/prisma/demo/stories'
import { demoSignals, foundAt, simulateDemo } from '@/test/support/demo-simulation'

const signals = demoSignals(simulateDemo())

describe('faults of the demo on the default charts', () => {
  it.each(
    demoStories.flatMap((story) =>
      story.foundWithin === undefined ? [] : [[story.key, story.firstLot, story.foundWithin, story] as const],
    ),
  )('%s, begun with %s, is found within %i of its lots', (_key, _first, within, story) => {
    expect(foundAt(story, signals) ?? Number.POSITIVE_INFINITY).toBeLessThanOrEqual(within)
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
