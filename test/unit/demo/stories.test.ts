import { describe, expect, it } from 'vitest'
import { normalisedError } from '@/lib/domain/metrology/closure'
import { type DemoStory, demoStories } from '@/prisma/demo/stories'
import { demoSignals, foundAt, signalsOf, simulateDemo } from '@/test/support/demo-simulation'

const signals = demoSignals(simulateDemo())

/** The lot with which the charts of the shipped demo find a fault. */
const foundWith = (story: DemoStory): string => story.lots[(foundAt(story, signals) ?? 0) - 1] ?? 'no lot'

describe('faults of the demo on the default charts', () => {
  it.each(
    demoStories.flatMap((story) =>
      story.foundBy === 'charts'
        ? [[story.key, story.firstLot, foundWith(story), story.foundWithin ?? 0, story] as const]
        : [],
    ),
  )('%s, begun with %s, is found with %s: within %i of its lots', (_key, _first, _found, within, story) => {
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

  it('leaves the light spool to the newest lots, and its closure to the hook: neither hides the other', () => {
    const [alloy, hook] = ['wrong-alloy', 'uncounted-hook'].map((key) =>
      demoStories.find((story) => story.key === key),
    )
    if (!alloy || !hook) throw new Error('The demo has other stories.')
    expect(alloy.lastLot).toBe('RC-050')
    expect(signalsOf(alloy, signals).length).toBeGreaterThan(0)
    expect(signalsOf(hook, signals).some(({ lot }) => !alloy.lots.includes(lot))).toBe(true)
  })

  it('raises far fewer signals than it has lots: on five charts of 740 lots', () => {
    expect(signals.length).toBeLessThan(130)
  })
})

describe('decoys of the demo on the default charts', () => {
  // The shipped demo is calm by choice; that decoys raise no more signals than their lots would without them is
  // counted over many works in test/long/demo-stories.test.ts.
  it.each(
    demoStories.flatMap((story) =>
      story.kind === 'decoy' ? [[story.key, story.firstLot, story.touches.join(', '), story] as const] : [],
    ),
  )('%s, begun with %s, raises no signal on %s', (_key, _first, _touches, story) => {
    expect(signalsOf(story, signals)).toEqual([])
  })
})
