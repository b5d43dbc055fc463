/** Proportions, inverses and limiting cases of the laws; their numbers are checked by the reference cases. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { airDensity } from '@/lib/domain/strings/air-density'
import { deadWeightForce } from '@/lib/domain/strings/dead-weight-force'
import { diameterAt20, diameterAt20ByContact } from '@/lib/domain/strings/diameter-at-20'
import { edgeFrictionBounds } from '@/lib/domain/strings/edge-friction'
import { effectiveDensity } from '@/lib/domain/strings/effective-density'
import { endShift, stiffPartialRatio } from '@/lib/domain/strings/end-condition'
import { fundamental, partialFrequency } from '@/lib/domain/strings/fundamental'
import { massPerMetreFromResonance } from '@/lib/domain/strings/mass-from-resonance'
import { massPerMetreFromTotal } from '@/lib/domain/strings/mass-from-total'
import { normalGravity } from '@/lib/domain/strings/normal-gravity'
import {
  centsBetween,
  frequencyOfNote,
  nearestNote,
  noteName,
  parseNote,
  ratioOfCents,
} from '@/lib/domain/strings/pitch'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import {
  inharmonicity,
  plainWireAxialStiffness,
  plainWireBendingStiffness,
} from '@/lib/domain/strings/stiffness'
import { elasticStrain, loadedMassPerMetre, unloadedMassPerMetre } from '@/lib/domain/strings/stretch'
import { tensionAtPitch } from '@/lib/domain/strings/tension-at-pitch'
import { tensionWithStretch, unloadedMassAtTension } from '@/lib/domain/strings/tension-with-stretch'
import { thermalPitchUnderDeadWeight, thermalTensionChange } from '@/lib/domain/strings/thermal'
import { waveSpeed } from '@/lib/domain/strings/wave-speed'
import { weighedMass } from '@/lib/domain/strings/weighed-mass'
import {
  degreesCelsius,
  hertz,
  kilograms,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  metresPerSecondSquared,
  newtons,
  pascals,
  perKelvin,
} from '@/lib/domain/units/quantity'

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const mass = between(1e-4, 0.05).map(kilogramsPerMetre)
const length = between(0.2, 2).map(metres)
const frequency = between(20, 2000).map(hertz)
const diameter = between(1e-4, 5e-3).map(metres)
const stiffness = between(500, 1e5).map(newtons)
const density = between(900, 20_000).map(kilogramsPerCubicMetre)
const near = (a: number, b: number, relative = 1e-12): void => {
  expect(Math.abs(a / b - 1)).toBeLessThan(relative)
}

describe('the plain laws', () => {
  it('tension at pitch sounds that pitch, and its string weighs what it weighed', () => {
    fc.assert(
      fc.property(mass, frequency, length, (µ, f, L) => {
        const T = tensionAtPitch(µ, f, L)
        near(fundamental(T, µ, L), f)
        near(massPerMetreFromResonance(T, f, L), µ)
        near(waveSpeed(T, µ), 2 * L * f)
        near(partialFrequency(T, µ, L, 3), 3 * f)
      }),
    )
  })

  it('a length of string divides out of its mass', () => {
    fc.assert(fc.property(mass, length, (µ, L) => near(massPerMetreFromTotal(kilograms(µ * L), L), µ)))
  })

  it('effective density of a solid wire is its density', () => {
    fc.assert(
      fc.property(diameter, density, (d, ρ) => near(effectiveDensity(solidWireMassPerMetre(d, ρ), d), ρ)),
    )
  })

  it.each([
    ['waveSpeed', () => waveSpeed(newtons(0), kilogramsPerMetre(1e-3))],
    ['waveSpeed', () => waveSpeed(newtons(70), kilogramsPerMetre(0))],
    ['tensionAtPitch', () => tensionAtPitch(kilogramsPerMetre(4e-4), hertz(0), metres(0.6))],
    ['fundamental', () => fundamental(newtons(70), kilogramsPerMetre(4e-4), metres(-0.6))],
    ['massPerMetreFromTotal', () => massPerMetreFromTotal(kilograms(1e-3), metres(0))],
    ['massPerMetreFromResonance', () => massPerMetreFromResonance(newtons(-70), hertz(330), metres(0.6))],
  ])('%s refuses what no string can be', (_, call) => {
    expect(call).toThrow(RangeError)
  })
})

describe('stretch', () => {
  it('of the unloaded mass is undone by its inverse', () => {
    fc.assert(
      fc.property(mass, between(0, 0.05), (µ, strain) =>
        near(unloadedMassPerMetre(loadedMassPerMetre(µ, strain), strain), µ),
      ),
    )
  })

  it('lowers the tension at pitch below the plain formula by the strain, and the inverse finds the mass again', () => {
    fc.assert(
      fc.property(mass, frequency, length, stiffness, (µ, f, L, EA) => {
        const plain = tensionAtPitch(µ, f, L)
        fc.pre(plain < 0.1 * EA)
        const T = tensionWithStretch(µ, f, L, EA)
        expect(T).toBeLessThan(plain)
        near(T * (1 + elasticStrain(T, EA)), plain, 1e-9)
        near(unloadedMassAtTension(T, f, L, EA), µ, 1e-9)
      }),
    )
  })

  it('vanishes for a string that does not stretch', () => {
    near(
      tensionWithStretch(kilogramsPerMetre(4e-4), hertz(330), metres(0.648), newtons(1e12)),
      tensionAtPitch(kilogramsPerMetre(4e-4), hertz(330), metres(0.648)),
      1e-9,
    )
  })
})

describe('stiffness and ends', () => {
  const inharmonicityOf = (d: number) =>
    inharmonicity(plainWireBendingStiffness(pascals(206e9), metres(d)), newtons(72), metres(0.648))

  it('grows with the fourth power of the diameter, axial stiffness with the second', () => {
    near(inharmonicityOf(0.5e-3) / inharmonicityOf(0.25e-3), 16)
    near(
      plainWireAxialStiffness(pascals(206e9), metres(0.5e-3)) /
        plainWireAxialStiffness(pascals(206e9), metres(0.25e-3)),
      4,
    )
  })

  it('raises a clamped string more than one on knife edges, and that more than a pinned one', () => {
    fc.assert(
      fc.property(between(1e-7, 1e-3), (b) => {
        expect(endShift('knife', b)).toBeGreaterThan(endShift('pinned', b))
        expect(endShift('clamped', b)).toBeGreaterThan(endShift('knife', b))
      }),
    )
  })

  it('spreads the partials: the tenth stands higher over the first than ten', () => {
    const b = inharmonicityOf(0.5e-3)
    const ratio = (10 * stiffPartialRatio('pinned', b, 10)) / stiffPartialRatio('pinned', b, 1)
    expect(ratio).toBeGreaterThan(10)
    near(ratio, 10 * Math.sqrt((1 + 100 * b) / (1 + b)))
  })

  it('does nothing to a perfectly flexible string, at any end', () => {
    for (const end of ['pinned', 'knife', 'clamped'] as const) expect(endShift(end, 0)).toBe(0)
    expect(() => endShift('knife', -1e-6)).toThrow(RangeError)
  })
})

describe('gravity, air and weights', () => {
  it('gravity grows from 9.780 at the equator to 9.832 at the pole (GRS 80)', () => {
    // Source: H. Moritz, Geodetic Reference System 1980, J. Geodesy 74 (2000) 128.
    expect(normalGravity(0)).toBeCloseTo(9.7803267715, 9)
    expect(normalGravity(90)).toBeCloseTo(9.8321863685, 9)
    fc.assert(
      fc.property(between(0, 89), between(0.1, 1), (φ, step) => {
        expect(normalGravity(φ + step)).toBeGreaterThan(normalGravity(φ))
        expect(normalGravity(-φ)).toBe(normalGravity(φ))
      }),
    )
    expect(() => normalGravity(91)).toThrow(RangeError)
  })

  it('air weighs about 1.2 kg/m³, less when warmer and when damper', () => {
    const air = (t: number, humidity: number) =>
      airDensity({ temperature: degreesCelsius(t), pressure: pascals(101_325), humidity })
    expect(air(20, 0.5)).toBeGreaterThan(1.19)
    expect(air(20, 0.5)).toBeLessThan(1.21)
    expect(air(25, 0.5)).toBeLessThan(air(20, 0.5))
    expect(air(20, 0.8)).toBeLessThan(air(20, 0.2))
  })

  it('a conventional mass in ordinary air pulls with m g (1 − 1.2/8000), within the buoyancy of the day', () => {
    const force = deadWeightForce(kilograms(7.4), metresPerSecondSquared(9.81), kilogramsPerCubicMetre(1.2))
    near(force, 7.4 * 9.81 * (1 - 1.2 / 8000), 1e-9)
    const vacuum = deadWeightForce(kilograms(7.4), metresPerSecondSquared(9.81), kilogramsPerCubicMetre(0))
    expect(vacuum).toBeGreaterThan(force)
  })

  it('a sample as dense as the weights weighs what the balance shows, a lighter one more', () => {
    const air = kilogramsPerCubicMetre(1.2)
    near(weighedMass(kilograms(2e-4), air, kilogramsPerCubicMetre(8000)), 2e-4)
    expect(weighedMass(kilograms(2e-4), air, kilogramsPerCubicMetre(1140))).toBeGreaterThan(2e-4)
  })

  it('friction at the edges leaves the tension between two bounds about the load, equal without friction', () => {
    const { highest, lowest } = edgeFrictionBounds(newtons(72), 0.1, 15 as never)
    expect(lowest).toBeLessThan(72)
    expect(highest).toBeGreaterThan(72)
    near(lowest * highest, 72 * 72, 1e-12)
    expect(edgeFrictionBounds(newtons(72), 0, 15 as never)).toEqual({ lowest: 72, highest: 72 })
  })
})

describe('temperature', () => {
  it('brings a diameter to 20 °C: nothing at 20 °C, less when warm, nothing for gauge and string alike', () => {
    const d = metres(0.254e-3)
    const α = perKelvin(11.5e-6)
    expect(diameterAt20(d, degreesCelsius(20), α)).toBe(d)
    expect(diameterAt20(d, degreesCelsius(27), α)).toBeLessThan(d)
    expect(diameterAt20ByContact(d, degreesCelsius(27), α, α)).toBe(d)
  })

  it('slackens a steel string between fixed ends when it warms, and leaves a dead weight’s pitch nearly alone', () => {
    const α = perKelvin(11.5e-6)
    expect(thermalTensionChange(newtons(10_000), α, perKelvin(0), 1)).toBeCloseTo(-0.115, 12)
    expect(Math.abs(thermalPitchUnderDeadWeight(α, perKelvin(0), 1) - 1)).toBeLessThan(6e-6)
  })
})

describe('notes', () => {
  it('name every key of a keyboard, and read it back', () => {
    for (let midi = 0; midi <= 127; midi += 1) {
      const parsed = parseNote(noteName(midi))
      expect(parsed).toEqual({ ok: true, value: midi })
      const nearest = nearestNote(frequencyOfNote(midi))
      expect(nearest.midi).toBe(midi)
      expect(Math.abs(nearest.cents)).toBeLessThan(1e-9)
    }
  })

  it('stand an octave apart at twice the frequency, whatever concert pitch', () => {
    fc.assert(
      fc.property(between(400, 466).map(hertz), fc.integer({ min: 0, max: 115 }), (a4, midi) => {
        near(frequencyOfNote(midi + 12, a4) / frequencyOfNote(midi, a4), 2)
        near(centsBetween(frequencyOfNote(midi + 1, a4), frequencyOfNote(midi, a4)), 100, 1e-9)
      }),
    )
    expect(frequencyOfNote(69)).toBe(440)
  })

  it('cents and ratios are each other’s inverse', () => {
    fc.assert(
      fc.property(between(-2400, 2400), (interval) => {
        const back = centsBetween(hertz(440 * ratioOfCents(interval)), hertz(440))
        expect(Math.abs(back - interval)).toBeLessThan(1e-9)
      }),
    )
  })
})
