import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  differenceFromSi,
  differenceToSi,
  dimensions,
  findUnit,
  fromSi,
  isUnit,
  toSi,
  type UnitId,
  unit,
  unitsOf,
} from '@/lib/domain/units/unit'

describe('toSi(value, unit)', () => {
  // Sources: international yard and pound agreement 1959; 9.80665 m/s² of the 3rd CGPM, 1901.
  it.each([
    [1, 'in', 0.0254],
    [1, 'thou', 0.0000254],
    [1, 'ft', 0.3048],
    [1, 'lb', 0.45359237],
    [16, 'oz', 0.45359237],
    [1, 'kgf', 9.80665],
    [1, 'lbf', 4.4482216152605],
    [1, 'hPa', 100],
    [7.85, 'g/cm³', 7850],
    [0.4, 'g/m', 0.0004],
    [400, 'mg/m', 0.0004],
    [32, '°F', 0],
    [212, '°F', 100],
    [-40, '°F', -40],
    [273.15, 'K', 0],
    [50, '%', 0.5],
    [11.5, 'µm/(m·K)', 0.0000115],
  ])('%d %s is %d', (value, id, si) => {
    expect(toSi(value, id)).toBe(si)
  })

  it('throws for a text that is no unit and for a value that is not finite', () => {
    expect(() => toSi(1, 'furlong')).toThrow('“furlong” is not a unit')
    expect(() => toSi(Number.NaN, 'mm')).toThrow(RangeError)
    expect(() => fromSi(Number.POSITIVE_INFINITY, 'mm')).toThrow(RangeError)
  })

  it('goes back and forth through fromSi in every unit', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...dimensions.flatMap((dimension) => unitsOf(dimension))),
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        (id, value) => {
          const tolerance = 1e-15 * (Math.abs(value) + 600)
          expect(Math.abs(fromSi(toSi(value, id), id) - value)).toBeLessThanOrEqual(tolerance)
        },
      ),
    )
  })
})

describe('differences', () => {
  it('have no zero: 9 °F are 5 K', () => {
    expect(differenceToSi(9, '°F')).toBe(5)
    expect(differenceFromSi(5, '°F')).toBe(9)
    expect(differenceFromSi(5, 'K')).toBe(5)
    expect(differenceFromSi(0.00001, 'mm')).toBeCloseTo(0.01, 15)
  })
})

describe('unitsOf, findUnit, isUnit', () => {
  it('every dimension has at least one unit, whose spellings lead back to it', () => {
    for (const dimension of dimensions) {
      const ids: readonly UnitId[] = unitsOf(dimension)
      expect(ids.length).toBeGreaterThan(0)
      for (const id of ids) {
        expect(findUnit(dimension, id)).toBe(id)
        for (const spelling of unit(id).spellings) expect(findUnit(dimension, spelling)).toBe(id)
      }
    }
  })

  it('does not find a unit of another dimension', () => {
    expect(findUnit('length', 'kg')).toBeUndefined()
    expect(findUnit('temperature', 'c')).toBe('°C')
    expect(findUnit('cents', 'c')).toBe('cents')
    expect(isUnit('mm')).toBe(true)
    expect(isUnit('toString')).toBe(false)
  })
})
