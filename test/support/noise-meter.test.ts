import { describe, expect, it } from 'vitest'
import { expectNoise } from './no-noise'
import { NoiseMeter } from './noise-meter'

describe('noise meter', () => {
  it('is content with silence', () => {
    expect(new NoiseMeter().complaint()).toBeUndefined()
  })

  it('complains of a message that was not announced, with its text', () => {
    const meter = new NoiseMeter()
    meter.hear('error', ['not wrapped in %s', 'act'])
    expect(meter.complaint()).toBe('Unexpected output:\nconsole.error: not wrapped in act')
  })

  it('complains of the unannounced one of two messages only', () => {
    const meter = new NoiseMeter()
    meter.announce(/known/)
    meter.hear('warn', ['known'])
    meter.hear('log', ['stray'])
    expect(meter.complaint()).toBe('Unexpected output:\nconsole.log: stray')
  })

  it('complains of an announced message that never came', () => {
    const meter = new NoiseMeter()
    meter.announce(/locked/)
    expect(meter.complaint()).toContain('/locked/')
  })

  it('listens to the console of every test', () => {
    expectNoise(/heard by the meter/)
    console.info('heard by the meter')
  })
})
