import { frequencyReadByClock } from '../strings/clock-error'
import { fundamental } from '../strings/fundamental'
import { massPerMetreFromResonance } from '../strings/mass-from-resonance'
import { centsBetween, frequencyOfNote, noteName } from '../strings/pitch'
import { centsOfChange, ratiosOfCents, tensionChangeAtPitch } from '../strings/pitch-sensitivity'
import { tensionAtPitch } from '../strings/tension-at-pitch'
import { massPerMetreFromTwoSpacings } from '../strings/two-spacing'
import { waveSpeed } from '../strings/wave-speed'
import { cents, hertz, kilogramsPerMetre, metres, newtons } from '../units/quantity'
import { numberOf, type QuantityTable, textOf } from './inputs'

/** Wave speed, pitch, tension, and how one moves the other. */
export const pitchQuantities: QuantityTable = {
  'wave-speed-and-fundamental': (inputs) => {
    const tension = newtons(numberOf(inputs, 'T'))
    const mass = kilogramsPerMetre(numberOf(inputs, 'mu'))
    return {
      v: waveSpeed(tension, mass),
      f1: fundamental(tension, mass, metres(numberOf(inputs, 'L'))),
    }
  },
  'tension-at-pitch': (inputs) => ({
    T: tensionAtPitch(
      kilogramsPerMetre(numberOf(inputs, 'mu')),
      hertz(numberOf(inputs, 'f')),
      metres(numberOf(inputs, 'L')),
    ),
  }),
  'mass-per-metre-from-resonance': (inputs) => ({
    mu: massPerMetreFromResonance(
      newtons(numberOf(inputs, 'T')),
      hertz(numberOf(inputs, 'f')),
      metres(numberOf(inputs, 'L')),
    ),
  }),
  'two-spacing-mass-per-metre': (inputs) => {
    const found = massPerMetreFromTwoSpacings(
      newtons(numberOf(inputs, 'T')),
      { span: metres(numberOf(inputs, 'L1')), frequency: hertz(numberOf(inputs, 'f1')) },
      { span: metres(numberOf(inputs, 'L2')), frequency: hertz(numberOf(inputs, 'f2')) },
    )
    return { mu: found.massPerMetre, end_correction_total: found.endCorrection }
  },
  'pitch-sensitivity': (inputs) => {
    const cause = textOf(inputs, 'quantity', ['mu', 'd', 'L'])
    const change = numberOf(inputs, 'change_percent') / 100
    return {
      cents_at_fixed_others: centsOfChange(cause, change),
      tension_change_percent_at_fixed_pitch: 100 * tensionChangeAtPitch(cause, change),
    }
  },
  'cents-to-ratios': (inputs) => {
    const ratios = ratiosOfCents(cents(numberOf(inputs, 'cents')))
    return { f_ratio: ratios.frequency, mu_or_T_ratio: ratios.massOrTension }
  },
  'cents-between': (inputs) => ({
    cents: centsBetween(hertz(numberOf(inputs, 'f')), hertz(numberOf(inputs, 'f_ref'))),
  }),
  'pitch-frequency': (inputs) => {
    const midi = numberOf(inputs, 'midi')
    return { name: noteName(midi), f: frequencyOfNote(midi, hertz(numberOf(inputs, 'a4'))) }
  },
  'sampling-clock-error': (inputs) => {
    const f = hertz(numberOf(inputs, 'f_true'))
    const { read, massBias } = frequencyReadByClock(f, numberOf(inputs, 'clock_error_ppm') * 1e-6)
    return { f_read: read, cents: centsBetween(read, f), mu_bias_rel: massBias }
  },
}
