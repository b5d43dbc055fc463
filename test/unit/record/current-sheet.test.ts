import { describe, expect, it } from 'vitest'
import { currentSheet } from '@/lib/domain/record/current-sheet'
import type { ReadingFact } from '@/lib/domain/record/reading'
import { diameterAt, sheetReading, typedHertz, typedMass, typedMetres } from '../../support/sheets'

describe('currentSheet', () => {
  it('gives an empty sheet for no readings', () => {
    expect(currentSheet([]).sheet).toEqual({
      diameters: [],
      weighedState: 'slack',
      frequencies: [],
      keptDoubts: [],
    })
  })

  it('gives a first sheet back as it was read', () => {
    const reading = sheetReading('r1')
    const current = currentSheet([reading])
    expect(current.sheet).toEqual(reading.values)
    expect(current.sources).toEqual({ section: 'r1', weighing: 'r1', sounding: 'r1' })
    expect(current.equipment).toEqual(reading.equipment)
  })

  it('replaces only the act that a correction is about, with its equipment', () => {
    const first = sheetReading('r1')
    const current = currentSheet([
      first,
      {
        clientId: 'r2',
        kind: 'weighing',
        values: { weighedState: 'slack', cutMass: typedMass('201.0'), cutLength: typedMetres('500.0') },
        equipment: { balance: 'B-04', rule: 'R-01' },
        supersedes: 'r1',
      },
    ])
    expect(current.sheet.cutMass?.typed).toBe('201.0')
    expect(current.sheet.diameters).toEqual(first.values.diameters)
    expect(current.sheet.frequencies).toEqual(first.values.frequencies)
    expect(current.equipment).toEqual({ ...first.equipment, balance: 'B-04' })
    expect(current.sources).toEqual({ section: 'r1', weighing: 'r2', sounding: 'r1' })
  })

  it('lets a second correction follow the first one', () => {
    const current = currentSheet([
      sheetReading('r1'),
      {
        clientId: 'r2',
        kind: 'weighing',
        values: { cutMass: typedMass('201.0') },
        equipment: {},
        supersedes: 'r1',
      },
      {
        clientId: 'r3',
        kind: 'sounding',
        values: { frequencies: [typedHertz('329.7')], span: typedMetres('648.0') },
        equipment: {},
        supersedes: 'r2',
      },
    ])
    expect(current.sheet.cutMass?.typed).toBe('201.0')
    expect(current.sheet.frequencies.map((one) => one.typed)).toEqual(['329.7'])
  })

  it('withdraws an act that is corrected by nothing', () => {
    const current = currentSheet([
      sheetReading('r1'),
      { clientId: 'r2', kind: 'sounding', values: { frequencies: [] }, equipment: {}, supersedes: 'r1' },
    ])
    expect(current.sheet.frequencies).toEqual([])
    expect(current.sheet.cutMass).toBeDefined()
  })

  it('drops the kept doubts of what a correction replaces, and keeps the others', () => {
    const first = sheetReading('r1')
    const doubted: ReadingFact = {
      ...first,
      values: {
        ...first.values,
        keptDoubts: [
          { field: 'cutMass', question: 'Two digits swapped?', reason: 'Weighed twice.' },
          { field: 'frequency', question: 'An octave low?', reason: 'Heard so.' },
        ],
      },
    }
    const correction: ReadingFact = {
      clientId: 'r2',
      kind: 'weighing',
      values: { cutMass: typedMass('201.0') },
      equipment: {},
      supersedes: 'r1',
    }
    expect(currentSheet([doubted, correction]).sheet.keptDoubts.map((doubt) => doubt.field)).toEqual([
      'frequency',
    ])
  })

  it('merges the acts of two people, each with its own equipment', () => {
    const current = currentSheet([
      {
        clientId: 'a',
        kind: 'sheet',
        values: { diameters: [diameterAt(1, 'b', '0.2541'), diameterAt(1, 'a', '0.2540')], note: 'bright' },
        equipment: { micrometer: 'M-14' },
      },
      {
        clientId: 'b',
        kind: 'sheet',
        values: {
          diameters: [],
          weighedState: 'marked',
          cutLength: typedMetres('500.0'),
          cutMass: typedMass('201.0'),
          frequencies: [],
        },
        equipment: { balance: 'B-03', rule: 'R-01' },
      },
    ])
    expect(current.sheet.diameters.map((one) => one.direction)).toEqual(['a', 'b'])
    expect(current.sheet.weighedState).toBe('marked')
    expect(current.sheet.note).toBe('bright')
    expect(current.equipment).toEqual({ micrometer: 'M-14', balance: 'B-03', rule: 'R-01' })
    expect(current.sources).toEqual({ section: 'a', weighing: 'b' })
  })

  it('lets the act bring its own set-up values, whoever typed them before', () => {
    const current = currentSheet([
      { clientId: 'a', kind: 'sheet', values: { cutLength: typedMetres('500.0') }, equipment: {} },
      {
        clientId: 'b',
        kind: 'weighing',
        values: { cutLength: typedMetres('499.8'), cutMass: typedMass('201.0') },
        equipment: {},
      },
    ])
    expect(current.sheet.cutLength?.typed).toBe('499.8')
  })

  it('changes nothing that it was given', () => {
    const readings = Object.freeze([Object.freeze(sheetReading('r1'))])
    const before = JSON.stringify(readings)
    currentSheet(readings)
    expect(JSON.stringify(readings)).toBe(before)
  })
})
