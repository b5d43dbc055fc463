import { describe, expect, it } from 'vitest'
import { lotStanding } from '@/lib/domain/quality/lot-standing'
import type { LotSummaryBody } from '@/lib/domain/quality/lot-summary'
import { steelContext } from '@/test/support/steel-context'

const { specification } = steelContext()
const { diameter } = specification

/** Five specimens about a mean. */
const about = (mean: number, spread: number, u = spread / 10): LotSummaryBody => ({
  n: 5,
  mean,
  m2: 4 * spread * spread,
  min: mean - 1.3 * spread,
  max: mean + 1.3 * spread,
  uCommon: u,
  uMean: u,
})

const width = diameter.upper - diameter.lower
const calm = about(diameter.target, width / 50)

describe('lotStanding(specification, summaries)', () => {
  it('is calm for a lot that is inside by its plan and closed', () => {
    expect(lotStanding(specification, { diameter: calm, closure: about(0.0001, 0.0005, 0.0005) })).toEqual({
      standing: 'calm',
      reason: 'Inside tolerance.',
    })
  })

  it('is outside when the mean is beyond its tolerance, and says in what', () => {
    const thick = about(diameter.upper + width, width / 50)
    expect(lotStanding(specification, { diameter: thick, closure: about(1, 0.0005) })).toEqual({
      standing: 'outside',
      reason: 'Outside tolerance: diameter.',
    })
  })

  it('is an open closure above a normalised error of 1.5, and not below', () => {
    const closing = (mean: number) =>
      lotStanding(specification, { diameter: calm, closure: about(mean, 1e-4, 1e-3) })
    expect(closing(0.0029).standing).toBe('calm')
    expect(closing(-0.0031).standing).toBe('open closure')
  })

  it('is doubtful when the spread is too wide for the plan', () => {
    const wide = about(diameter.target, width)
    expect(lotStanding(specification, { diameter: wide })).toMatchObject({
      standing: 'doubtful',
      reason: 'Not proven to be inside tolerance: diameter.',
    })
  })

  it('is doubtful when one specimen strays though the lot is inside', () => {
    const stray = { ...calm, max: diameter.upper + width / 100 }
    expect(lotStanding(specification, { diameter: stray })).toMatchObject({
      standing: 'doubtful',
      reason: expect.stringContaining('a specimen lies beyond: diameter'),
    })
  })

  it('proposes nothing for a lot of which nothing is known', () => {
    expect(lotStanding(specification, {})).toEqual({ standing: 'doubtful', reason: 'Not yet measured.' })
  })
})
