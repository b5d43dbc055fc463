import { describe, expect, it } from 'vitest'
import { missingOf, planProgress } from '@/lib/domain/record/plan-progress'
import { steelSheet, typedMetres } from '@/test/support/sheets'
import { steelContext } from '@/test/support/steel-context'

const { plan } = steelContext().specification

/** A sheet on which nothing stands for this field. */
const without = (field: 'cutLength' | 'cutMass' | 'span', change: Parameters<typeof steelSheet>[0] = {}) => {
  const { [field]: _, ...sheet } = steelSheet(change)
  return sheet
}

describe('missingOf(plan, sheet)', () => {
  it('is nothing when the planned diameters were read, the piece weighed and the string sounded', () => {
    expect(missingOf(plan, steelSheet())).toEqual([])
  })

  it('counts the diameters that are there', () => {
    const diameters = steelSheet().diameters.slice(0, 4)
    expect(missingOf(plan, steelSheet({ diameters }))).toEqual(['diameters (4 of 6)'])
  })

  it('asks a piece that was cut slack for its length, and one marked under load not: the span stands in for it', () => {
    expect(missingOf(plan, without('cutLength'))).toEqual(['the weighing'])
    expect(missingOf(plan, without('cutLength', { weighedState: 'marked' }))).toEqual([])
    expect(missingOf(plan, steelSheet({ weighedState: 'marked', cutLength: typedMetres('640.0') }))).toEqual(
      [],
    )
  })

  it('still asks a marked piece for its mass, and for the span it was marked on', () => {
    expect(missingOf(plan, without('cutMass', { weighedState: 'marked' }))).toEqual(['the weighing'])
    expect(missingOf(plan, without('span', { weighedState: 'marked' }))).toEqual(['the sounding'])
  })
})

describe('planProgress(plan, specimens)', () => {
  const sheets = (count: number) =>
    Array.from({ length: count }, (_, index) => ({ number: index + 1, sheet: steelSheet() }))

  it('is complete when as many specimens as planned are done, whatever else was begun', () => {
    const begun = { number: 6, sheet: steelSheet({ frequencies: [] }) }
    expect(planProgress(plan, [...sheets(5), begun])).toEqual({ complete: true, missing: [] })
  })

  it('says what each specimen lacks and how many are to come', () => {
    expect(planProgress(plan, [...sheets(2), { number: 3, sheet: steelSheet({ frequencies: [] }) }])).toEqual(
      {
        complete: false,
        missing: ['Specimen 3 lacks the sounding.', '2 of 5 specimens are still to be measured.'],
      },
    )
  })
})
