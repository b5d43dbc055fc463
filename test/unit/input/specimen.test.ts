import { describe, expect, it } from 'vitest'
import { parseInput } from '@/lib/input/parse-input'
import { recordSpecimenSchema, recordSpecimensSchema, supersedeReadingSchema } from '@/lib/input/specimen'
import { steelEquipment, steelSheet } from '../../support/sheets'

const id = (last: number): string => `018f0000-0000-7000-8000-${String(last).padStart(12, '0')}`

const posted = (change: object = {}) => ({
  requestId: id(1),
  lotCode: 'LA-354',
  specimen: { clientId: id(2), number: 1 },
  reading: { clientId: id(3), sheet: steelSheet(), equipment: steelEquipment },
  ...change,
})

describe('recordSpecimenSchema', () => {
  it('gives the sheet of the bench back unchanged', () => {
    const parsed = parseInput(recordSpecimenSchema, JSON.parse(JSON.stringify(posted())))
    expect(parsed.ok && parsed.value.entries[0]?.reading.sheet).toEqual(steelSheet())
  })

  it('takes a first entry as a sheet', () => {
    const parsed = parseInput(recordSpecimenSchema, posted())
    expect(parsed.ok && parsed.value.entries[0]?.reading.kind).toBe('sheet')
  })

  it.each([
    ['an id that is no UUID', posted({ requestId: 'one' }), 'requestId'],
    ['specimen 0', posted({ specimen: { clientId: id(2), number: 0 } }), 'specimen.number'],
    ['half a specimen', posted({ specimen: { clientId: id(2), number: 1.5 } }), 'specimen.number'],
    ['a field nobody knows', posted({ verdict: 'good' }), undefined],
    ['no reading', posted({ reading: undefined }), 'reading'],
  ])('refuses %s and says where', (_, input, where) => {
    const parsed = parseInput(recordSpecimenSchema, input)
    expect(parsed.ok).toBe(false)
    if (!parsed.ok) expect(parsed.problems[0]?.where).toBe(where)
  })

  it('names the field of a value that is not understood', () => {
    const sheet = { ...steelSheet(), cutMass: { typed: 'heavy', unit: 'mg' } }
    const parsed = parseInput(recordSpecimenSchema, posted({ reading: { clientId: id(3), sheet } }))
    expect(parsed).toMatchObject({
      ok: false,
      problems: [{ where: 'reading.sheet.cutMass', message: expect.stringContaining('heavy') }],
    })
  })

  it('refuses one place given twice and one weight hung twice', () => {
    const [first] = steelSheet().diameters
    const sheet = {
      ...steelSheet(),
      diameters: [first, first],
      load: { kind: 'weights', hanger: 'H-01', weights: ['W-02', 'W-02'] },
    }
    const parsed = parseInput(recordSpecimenSchema, posted({ reading: { clientId: id(3), sheet } }))
    expect(parsed.ok).toBe(false)
    if (!parsed.ok)
      expect(parsed.problems.map((one) => one.message)).toEqual([
        'Diameter at place 1 a is given twice.',
        'Weight W-02 can hang only once.',
      ])
  })

  it('stores no prototype that a sender smuggles in', () => {
    const text = JSON.stringify(posted()).replace('"lotCode"', '"__proto__":{"lotCode":"x"},"lotCode"')
    const parsed = parseInput(recordSpecimenSchema, JSON.parse(text))
    expect(parsed.ok).toBe(false)
  })
})

describe('recordSpecimensSchema', () => {
  it('refuses one specimen number twice in one request', () => {
    const { specimen, reading } = posted()
    const parsed = parseInput(recordSpecimensSchema, {
      requestId: id(1),
      lotCode: 'LA-354',
      entries: [
        { specimen, reading },
        { specimen: { ...specimen, clientId: id(4) }, reading },
      ],
    })
    expect(parsed.ok).toBe(false)
  })
})

describe('supersedeReadingSchema', () => {
  const correction = {
    requestId: id(5),
    supersedes: id(3),
    reading: { clientId: id(6), kind: 'weighing', sheet: { cutMass: { typed: '201.0', unit: 'mg' } } },
  }

  it('takes a correction of one act with its reason', () => {
    const parsed = parseInput(supersedeReadingSchema, { ...correction, reason: 'Two digits were swapped.' })
    expect(parsed.ok).toBe(true)
  })

  it.each(['', '  ', undefined])('refuses a correction without a reason (%s)', (reason) => {
    expect(parseInput(supersedeReadingSchema, { ...correction, reason }).ok).toBe(false)
  })
})
