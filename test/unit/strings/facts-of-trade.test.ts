/**
 * What every maker knows, as tests of the laws. Each is common practice, no source: proportions that follow from
 * f = √(T/µ)/2L and from the geometry of a round wire.
 */
import { describe, expect, it } from 'vitest'
import { fundamental } from '@/lib/domain/strings/fundamental'
import { frequencyOfNote, noteName } from '@/lib/domain/strings/pitch'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import { tensionAtPitch } from '@/lib/domain/strings/tension-at-pitch'
import { waveSpeed } from '@/lib/domain/strings/wave-speed'
import { kilogramsPerCubicMetre, kilogramsPerMetre, metres, newtons } from '@/lib/domain/units/quantity'

const length = metres(0.648)
const tension = newtons(72)
const light = kilogramsPerMetre(0.4e-3)
const e4 = frequencyOfNote(64)
const e2 = frequencyOfNote(40)

describe('facts of the trade (common practice, no source)', () => {
  it('at equal tension and length, two octaves down is a quarter of the wave speed and sixteen times the mass per metre', () => {
    expect([noteName(64), noteName(40)]).toEqual(['E4', 'E2'])
    const heavy = kilogramsPerMetre(16 * light)
    expect(waveSpeed(tension, heavy) / waveSpeed(tension, light)).toBeCloseTo(1 / 4, 14)
    expect(fundamental(tension, heavy, length) / fundamental(tension, light, length)).toBeCloseTo(e2 / e4, 14)
    expect(tensionAtPitch(heavy, e2, length) / tensionAtPitch(light, e4, length)).toBeCloseTo(1, 14)
  })

  it('four times the tension is one octave', () => {
    expect(
      fundamental(newtons(4 * tension), light, length) / fundamental(tension, light, length),
    ).toBeCloseTo(2, 14)
  })

  it('half the length is one octave at the same tension', () => {
    expect(fundamental(tension, light, metres(length / 2)) / fundamental(tension, light, length)).toBeCloseTo(
      2,
      14,
    )
  })

  it('one semitone up needs about 12 % more tension', () => {
    const up = tensionAtPitch(light, frequencyOfNote(65), length) / tensionAtPitch(light, e4, length)
    expect(up).toBeCloseTo(2 ** (1 / 6), 12)
    expect(up - 1).toBeCloseTo(0.1225, 4)
  })

  it('1 % more diameter is 2 % more mass per metre, and 2 % more tension at the same note', () => {
    const steel = kilogramsPerCubicMetre(7850)
    const thin = solidWireMassPerMetre(metres(0.254e-3), steel)
    const thick = solidWireMassPerMetre(metres(0.254e-3 * 1.01), steel)
    expect(thick / thin).toBeCloseTo(1.0201, 12)
    expect(tensionAtPitch(thick, e4, length) / tensionAtPitch(thin, e4, length)).toBeCloseTo(1.0201, 12)
  })

  it('a plain steel string of 0.254 mm on 648 mm pulls about 72 N at E4', () => {
    const mass = solidWireMassPerMetre(metres(0.254e-3), kilogramsPerCubicMetre(7850))
    expect(tensionAtPitch(mass, e4, length)).toBeCloseTo(72.6, 1)
  })
})
