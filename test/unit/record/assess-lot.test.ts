import { describe, expect, it } from 'vitest'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import { assessLot } from '@/lib/domain/record/assess-lot'
import { diameterAt, steelSheet, typedHertz } from '../../support/sheets'
import { steelContext } from '../../support/steel-context'

const context = steelContext()

const lotOf = (changes: readonly Partial<SpecimenSheet>[]) => ({
  specification: context.specification,
  specimens: changes.map((change, index) => {
    const sheet = steelSheet(change)
    return { number: index + 1, sheet, results: evaluateSpecimen(sheet, context).results }
  }),
  openSignals: [],
  overdueEquipment: [],
})

describe('assessLot', () => {
  it('proposes nothing for a lot that was not measured', () => {
    const { proposal, progress } = assessLot(lotOf([]))
    expect(proposal.verb).toBeUndefined()
    expect(progress.missing).toEqual(['5 of 5 specimens are still to be measured.'])
  })

  it('stops at an incomplete plan and names what is missing', () => {
    const { proposal, progress, specimens } = assessLot(lotOf([{}, { cutMass: undefined }]))
    expect(proposal.stops.map((stop) => stop.id)).toContain('plan-incomplete')
    expect(progress.missing).toEqual([
      'Specimen 2 lacks the weighing.',
      '3 of 5 specimens are still to be measured.',
    ])
    expect(specimens[1]?.missing).toEqual(['the weighing'])
  })

  it('judges every characteristic that has a tolerance and a result', () => {
    const { judgements } = assessLot(lotOf([{}, {}, {}, {}, {}]))
    expect(judgements.map((one) => one.id)).toEqual([
      'diameter',
      'ovality',
      'massPerMetreWeighed',
      'massPerMetreSounded',
      'effectiveDensity',
      'tension',
    ])
    expect(judgements.every((one) => one.n === 5)).toBe(true)
  })

  it('asks about a specimen outside its tolerance', () => {
    const oval = {
      diameters: [1, 2, 3].flatMap((position) => [
        diameterAt(position, 'a', '0.2510'),
        diameterAt(position, 'b', '0.2570'),
      ]),
    }
    const { proposal, specimens } = assessLot(lotOf([{}, {}, oval, {}, {}]))
    expect(specimens[2]?.verdicts.ovality).toBe('outside')
    expect(proposal.stops.map((stop) => stop.id)).toContain('outside-3')
  })

  it('asks about a specimen whose routes disagree', () => {
    const { specimens, proposal } = assessLot(lotOf([{}, {}, {}, {}, { frequencies: [typedHertz('165.4')] }]))
    expect(specimens[4]?.closure?.verdict).toBe('open')
    expect(proposal.stops.map((stop) => stop.id)).toContain('closure-open-5')
  })

  it('names unanswered signals and overdue equipment', () => {
    const lot = lotOf([{}, {}, {}, {}, {}])
    const { proposal } = assessLot({
      ...lot,
      openSignals: [{ id: 7, sentence: 'Diameter: nine lots on one side.' }],
      overdueEquipment: ['M-14'],
    })
    expect(proposal.stops.map((stop) => stop.id)).toEqual(
      expect.arrayContaining(['signal-7', 'overdue-M-14']),
    )
    expect(proposal.verb).toBeUndefined()
  })
})
