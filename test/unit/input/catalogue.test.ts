import { describe, expect, it } from 'vitest'
import { parseSpecification } from '@/lib/input/catalogue'

const plain = {
  materialCode: 'MUSIC-WIRE',
  effectiveDay: '2026-11-27',
  note: '',
  diameter: '1.06',
  diameterTolerance: '15',
  massPerMetre: '6307',
  massTolerance: '2.5',
  ovalityMax: '15',
  densityTolerance: '3',
  referenceNote: 'E2',
  a4: '440',
  length: '648',
  basis: 'unloaded-mass',
  guardDiameter: '0',
  guardMass: '1',
  heads: '3',
  tails: '2',
  positions: '3',
  directions: '2',
  weighedState: 'slack',
  cutLength: '500',
  acceptanceConstant: '1.5',
  rigCode: 'RIG-3',
}

const problemsOf = (fields: Record<string, string>) => {
  const read = parseSpecification(fields, 'mm')
  return read.ok ? [] : read.problems.map(({ message, where }) => ({ message, where }))
}

describe('parseSpecification', () => {
  it('takes a string for plain when no core is given', () => {
    const read = parseSpecification({ ...plain, coreShape: '', coreSize: '' }, 'mm')
    expect(read.ok && 'core' in read.value.draft).toBe(false)
    expect(read.ok).toBe(true)
  })

  it('reads the core of a wound string in the unit that is typed', () => {
    for (const coreSize of ['0.4', '400 µm', '0,4 mm']) {
      const read = parseSpecification({ ...plain, coreShape: 'hex', coreSize }, 'mm')
      expect(read.ok && read.value.draft.core).toEqual({ shape: 'hex', size: 4e-4 })
    }
  })

  it('asks for the other half of a core', () => {
    expect(problemsOf({ ...plain, coreShape: 'round' })).toMatchObject([{ where: 'coreSize' }])
    expect(problemsOf({ ...plain, coreSize: '0.4' })).toMatchObject([{ where: 'coreShape' }])
  })

  it('refuses a core as thick as the string, and a wound string without its mass per metre', () => {
    expect(problemsOf({ ...plain, coreShape: 'round', coreSize: '1.06' })).toEqual([
      { where: 'coreSize', message: 'The core is as thick as the whole string.' },
    ])
    expect(problemsOf({ ...plain, coreShape: 'round', coreSize: '0.4', massPerMetre: '' })).toEqual([
      { where: 'massPerMetre', message: 'A wound string needs its mass per metre.' },
    ])
  })
})
