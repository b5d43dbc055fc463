import { describe, expect, it } from 'vitest'
import { correctionsFor } from '@/lib/domain/record/corrections-for'
import { currentSheet } from '@/lib/domain/record/current-sheet'
import { mergeOf } from '@/lib/domain/record/merge-clash'
import type { SpecimenEntry, SpecimenState } from '@/lib/domain/record/write-state'
import { diameterAt, typedHertz, typedMass, typedMetres } from '../../support/sheets'
import { entryOf, lotState, planned, stored } from '../../support/write-states'

const specimenOf = (...entries: readonly SpecimenEntry[]): SpecimenState => {
  const state = entries.reduce(
    (before, entry) => stored(before, [entry], planned(before, [entry])),
    lotState(),
  )
  const [specimen] = state.specimens
  if (!specimen) throw new Error('nothing was stored')
  return specimen
}

const first = entryOf(1)

/** A row of a file about the same specimen. */
const rowOf = (
  ...change: Parameters<typeof entryOf> extends [number, ...infer Rest] ? Partial<Rest> : never
) => {
  const entry = entryOf(1, ...change)
  return {
    ...entry,
    specimen: { clientId: 'file', number: 1 },
    reading: { ...entry.reading, clientId: 'row' },
  }
}

const corrected = (specimen: SpecimenState, row: SpecimenEntry) => {
  let count = 0
  return correctionsFor(specimen, row, 'the file is right', () => {
    count += 1
    return `c${count}`
  })
}

/** The sheet in force once the corrections are stored one after the other. */
const sheetAfter = (specimen: SpecimenState, row: SpecimenEntry) => {
  const all = corrected(specimen, row)
  const state = all.reduce(
    (before, entry) => stored(before, [entry], planned(before, [entry])),
    lotState({ specimens: [specimen] }),
  )
  return currentSheet(state.specimens[0]?.readings ?? [])
}

describe('correctionsFor', () => {
  it('gives nothing for an entry that says what is stored', () => {
    expect(corrected(specimenOf(first), rowOf())).toEqual([])
  })

  it('corrects only the act that differs, names what it takes the place of, and why', () => {
    const [correction, ...more] = corrected(specimenOf(first), rowOf({ cutMass: typedMass('201.7') }))
    expect(more).toEqual([])
    expect(correction).toMatchObject({
      specimen: { clientId: 's1', number: 1 },
      reading: { clientId: 'c1', kind: 'weighing', supersedes: 'r1', reason: 'the file is right' },
    })
    expect(Object.keys(correction?.reading.values ?? {}).sort()).toEqual([
      'cutLength',
      'cutMass',
      'weighedState',
    ])
  })

  it('leaves the specimen saying what the entry says, whatever differs', () => {
    const row = rowOf({
      diameters: [diameterAt(1, 'a', '0.2551'), diameterAt(2, 'b', '0.2549')],
      cutMass: typedMass('201.7'),
      cutLength: typedMetres('501.0'),
      frequencies: [typedHertz('333.1'), typedHertz('333.2')],
      weighedState: 'marked',
    })
    const specimen = specimenOf(first)
    const after = sheetAfter(specimen, row)
    expect(
      mergeOf(currentSheet(specimen.readings), row.reading.values, row.reading.equipment).clashes.length,
    ).toBe(6)
    expect(mergeOf(after, row.reading.values, row.reading.equipment)).toEqual({ clashes: [], adds: false })
    expect(corrected(specimen, row).map(({ reading }) => [reading.kind, reading.supersedes])).toEqual([
      ['sheet', 'r1'],
    ])
  })

  it('corrects a second act of a reading whose first was corrected before, and leaves that one alone', () => {
    const section = entryOf(
      1,
      { diameters: [diameterAt(1, 'a', '0.2551')] },
      { clientId: 'r2', kind: 'section', supersedes: 'r1', reason: 'misread' },
    )
    const row = rowOf({ diameters: [diameterAt(1, 'a', '0.2551')], cutMass: typedMass('201.7') })
    const specimen = specimenOf(first, section)
    expect(corrected(specimen, row)).toMatchObject([{ reading: { kind: 'sheet', supersedes: 'r2' } }])
    const after = sheetAfter(specimen, row)
    expect(after.sheet.cutMass?.typed).toBe('201.7')
    expect(after.sheet.diameters.map((one) => one.value.typed)).toEqual(['0.2551'])
    expect(after.equipment).toEqual(currentSheet(specimen.readings).equipment)
  })

  it('keeps the diameters that the entry does not speak of', () => {
    const after = sheetAfter(specimenOf(first), rowOf({ diameters: [diameterAt(2, 'a', '0.2551')] }))
    expect(after.sheet.diameters.map((one) => `${one.position}${one.direction} ${one.value.typed}`)).toEqual([
      '1a 0.2540',
      '1b 0.2542',
      '2a 0.2551',
      '2b 0.2542',
      '3a 0.2540',
      '3b 0.2542',
    ])
  })

  it('takes the place of the newest correction, not of the first reading', () => {
    const before = entryOf(
      1,
      { cutMass: typedMass('200.0') },
      { clientId: 'r2', kind: 'weighing', supersedes: 'r1', reason: 'misread' },
    )
    const [correction] = corrected(specimenOf(first, before), rowOf({ cutMass: typedMass('201.7') }))
    expect(correction?.reading.supersedes).toBe('r2')
  })

  it('adds acts that are not there yet as readings of their own', () => {
    const section = entryOf(1, { cutMass: undefined, cutLength: undefined, frequencies: [] })
    const all = corrected(specimenOf(section), rowOf({ diameters: [diameterAt(1, 'a', '0.2551')] }))
    expect(all.map(({ reading }) => [reading.kind, reading.supersedes])).toEqual([
      ['section', 'r1'],
      ['weighing', undefined],
      ['sounding', undefined],
    ])
  })
})
