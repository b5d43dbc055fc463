import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import { degreesCelsius, kilograms, newtons, pascals } from '@/lib/domain/units/quantity'
import { diameterAt, steelSheet, typedHertz, typedMass, typedMetres } from './sheets'

/** A sheet with everything varied that can vary, some of it missing; `random` gives numbers in [0, 1). */
export function randomSheet(random: () => number): SpecimenSheet {
  const between = (low: number, high: number) => low + (high - low) * random()
  const chance = (p: number) => random() < p
  const positions = Math.floor(between(1, 5))
  const massKilograms = between(6, 9)
  const load: SpecimenSheet['load'] = chance(0.5)
    ? { kind: 'weights', hanger: 'H-01', weights: chance(0.5) ? ['W-05', 'W-02'] : ['W-02', 'W-05'] }
    : chance(0.5)
      ? {
          kind: 'mass',
          value: {
            typed: massKilograms.toFixed(3),
            unit: 'kg',
            si: kilograms(Number(massKilograms.toFixed(3))),
          },
        }
      : { kind: 'force', value: { typed: '72.4', unit: 'N', si: newtons(72.4) } }
  const celsius = Number(between(15, 27).toFixed(1))
  return steelSheet({
    takenAt: { end: chance(0.5) ? 'head' : 'tail' },
    diameters: Array.from({ length: positions }, (_, index) => index + 1).flatMap((position) => [
      diameterAt(position, 'a', between(0.25, 0.258).toFixed(4)),
      ...(chance(0.9) ? [diameterAt(position, 'b', between(0.25, 0.258).toFixed(4))] : []),
    ]),
    weighedState: chance(0.8) ? 'slack' : 'marked',
    cutLength: chance(0.95) ? typedMetres(between(400, 600).toFixed(1)) : undefined,
    cutMass: chance(0.95) ? typedMass(between(150, 250).toFixed(1)) : undefined,
    load: chance(0.95) ? load : undefined,
    span: typedMetres(between(600, 700).toFixed(1)),
    frequencies: Array.from({ length: Math.floor(between(0, 6)) }, () =>
      typedHertz(between(320, 340).toFixed(2)),
    ),
    ...(chance(0.5)
      ? {
          temperature: { typed: String(celsius), unit: '°C', si: degreesCelsius(celsius) },
          pressure: { typed: '1002.5', unit: 'hPa', si: pascals(100_250) },
          humidity: Number(between(0.2, 0.8).toFixed(2)),
        }
      : {}),
  })
}
