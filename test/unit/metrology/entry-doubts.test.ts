import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { doubtDigits, doubtFrequency, doubtMass, type EntryFacts } from '@/lib/domain/metrology/entry-doubts'

const frequency = (typed: string): EntryFacts => ({
  name: 'Frequency',
  unit: 'Hz',
  decimals: 2,
  typed,
  si: Number(typed),
  expected: 328.5,
  usual: 0.015,
  because: '7.4 kg on 648 mm should sound near 328.5 Hz.',
})

describe('doubtFrequency(facts)', () => {
  it.each([
    ['164.2', 'an octave low', '328.4'],
    ['657.0', 'an octave high', '328.5'],
    ['985.2', 'the third partial', '328.4'],
    ['109.6', 'a third of the fundamental', '328.8'],
  ])('asks about %s: %s', (typed, words, meant) => {
    const doubt = doubtFrequency(frequency(typed))
    expect(doubt?.question).toContain(words)
    expect(doubt?.choices).toContainEqual({ kind: 'meant', si: Number(meant), typed: meant })
  })

  it('lets ordinary values pass, and never asks without a way to keep the value', () => {
    expect(doubtFrequency(frequency('328.9'))).toBeUndefined()
    fc.assert(
      fc.property(fc.double({ min: 20, max: 3000, noNaN: true }), (f) => {
        const doubt = doubtFrequency(frequency(f.toFixed(1)))
        if (doubt) expect(doubt.choices.map((one) => one.kind)).toContain('keep')
      }),
    )
  })
})

describe('doubtDigits(facts)', () => {
  it('finds two neighbouring digits swapped, also across the decimal sign', () => {
    const tight = { ...frequency('327.9'), expected: 329.7, usual: 0.002 }
    expect(doubtDigits(tight)).toMatchObject({ kind: 'digits', choices: [{}, { typed: '329.7' }, {}] })
    expect(doubtDigits({ ...tight, typed: '322.97', si: 322.97 })).toMatchObject({ kind: 'digits' })
    expect(doubtDigits({ ...tight, typed: '337.29', si: 337.29, expected: 332.79 })).toMatchObject({
      choices: [{}, { typed: '332.79' }, {}],
    })
  })

  it('says nothing when the entry is ordinary though a swap would be ordinary too', () => {
    expect(doubtDigits({ ...frequency('328.2'), usual: 0.02 })).toBeUndefined()
  })

  it('finds swapped digits also before a unit that was typed', () => {
    const tight = { ...frequency('327.9'), typed: '327.9 Hz', expected: 329.7, usual: 0.002 }
    expect(doubtDigits(tight)).toMatchObject({ kind: 'digits', choices: [{}, { typed: '329.7 Hz' }, {}] })
  })

  it('asks about another unit where the same digits would fit in it', () => {
    const facts: EntryFacts = {
      name: 'Diameter',
      unit: 'mm',
      decimals: 4,
      typed: '254 mm',
      si: 0.254,
      expected: 254e-6,
      usual: 0.02,
      because: 'This product is 0.2540 mm by its specification.',
    }
    const doubt = doubtDigits(facts)
    expect(doubt).toMatchObject({ kind: 'unit', question: 'Is 254 mm meant in µm?' })
    expect(doubt?.choices[1]).toMatchObject({ kind: 'meant', typed: '0.254' })
    const thou = doubtDigits({ ...facts, typed: '10', si: 0.01 })
    expect(thou?.question).toBe('Is 10 meant in thou?')
    expect(thou?.choices[1]).toMatchObject({ typed: '0.254' })
  })

  it('never asks about what is expected, whatever the digits', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 50, max: 900, noNaN: true }),
        fc.double({ min: -1, max: 1, noNaN: true }),
        (f, share) => {
          const facts = { ...frequency((f * (1 + 0.01 * share)).toFixed(2)), expected: f, usual: 0.0101 }
          expect(doubtFrequency(facts)).toBeUndefined()
        },
      ),
    )
  })

  it('finds every swap of two neighbouring digits that matters', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1000, max: 9999 }), fc.integer({ min: 0, max: 2 }), (tenths, place) => {
        const right = (tenths / 10).toFixed(1).replace('.', '')
        const letters = [...right]
        ;[letters[place], letters[place + 1]] = [letters[place + 1] ?? '', letters[place] ?? '']
        const typed = `${letters.slice(0, 3).join('')}.${letters[3]}`
        const expected = tenths / 10
        fc.pre(Math.abs(Number(typed) / expected - 1) > 0.0011)
        const doubt = doubtDigits({ ...frequency(typed), expected, usual: 0.001 })
        expect(doubt?.kind).toBe('digits')
        expect(doubt?.choices).toContainEqual({ kind: 'meant', typed: expected.toFixed(1), si: expected })
      }),
    )
  })

  it('asks about a value far off that no swap explains', () => {
    expect(doubtDigits(frequency('411.1'))).toMatchObject({ kind: 'far' })
  })
})

describe('doubtMass(facts)', () => {
  it('asks about ten times', () => {
    const facts: EntryFacts = {
      name: 'Cut mass',
      unit: 'mg',
      decimals: 1,
      typed: '1991',
      si: 1991e-6,
      expected: 199e-6,
      usual: 0.05,
      because: '500 mm of this wire weigh about 199 mg.',
    }
    expect(doubtMass(facts)?.question).toContain('ten times too heavy')
    expect(doubtMass({ ...facts, typed: '199.6', si: 199.6e-6 })).toBeUndefined()
  })
})
