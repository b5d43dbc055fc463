import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { firstNoteFrom, noteAt } from '@/lib/domain/charts/note-at'
import { sampleChart } from '@/test/support/staff-chart-sample'

const [stave] = buildStaffChart(sampleChart({ window: { from: 20, to: 59 } })).staves

describe('noteAt', () => {
  it('finds each lot of the window, and nothing at a gap or outside', () => {
    if (!stave) throw new Error('the sample has staves')
    for (let index = 0; index < 70; index += 1)
      expect(noteAt(stave, index)).toBe(stave.notes.find((note) => note.index === index))
    expect(noteAt(stave, 30)).toBeUndefined()
    expect(noteAt(stave, 31)?.code).toBe('LA-332')
  })

  it('leads to the next note where a lot has none, and past the end where none follows', () => {
    if (!stave) throw new Error('the sample has staves')
    expect(stave.notes[firstNoteFrom(stave.notes, 30)]?.index).toBe(31)
    expect(firstNoteFrom(stave.notes, 0)).toBe(0)
    expect(firstNoteFrom(stave.notes, 60)).toBe(stave.notes.length)
    expect(firstNoteFrom([], 5)).toBe(0)
  })
})
