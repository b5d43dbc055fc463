import { partialFrequency } from '../strings/fundamental'
import { massPerMetreFromTotal } from '../strings/mass-from-total'
import { solidWireMassPerMetre } from '../strings/round-section'
import { plainWireAxialStiffness } from '../strings/stiffness'
import { tensionAtPitch } from '../strings/tension-at-pitch'
import { waveSpeed } from '../strings/wave-speed'
import {
  hertz,
  kilograms,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  newtons,
  pascals,
} from '../units/quantity'
import { type Inputs, numberOf, type QuantityTable } from './inputs'

const mu = (inputs: Inputs) => kilogramsPerMetre(numberOf(inputs, 'mu'))
const L = (inputs: Inputs) => metres(numberOf(inputs, 'L'))
const T = (inputs: Inputs, name = 'T') => newtons(numberOf(inputs, name))
const f = (inputs: Inputs) => hertz(numberOf(inputs, 'f'))
const total = (inputs: Inputs) => massPerMetreFromTotal(kilograms(numberOf(inputs, 'm')), L(inputs))

/** Worked examples of textbooks, named by their inputs and outputs, through the same laws as everything. */
export const textbookQuantities: QuantityTable = {
  'textbook:T,mu,mu2->T2,v': (inputs) => {
    const v = waveSpeed(T(inputs), mu(inputs))
    return { v, T2: numberOf(inputs, 'mu2') * v * v }
  },
  'textbook:L,g,m,mu->f,v': (inputs) => {
    const pull = newtons(numberOf(inputs, 'm') * numberOf(inputs, 'g'))
    return {
      v: waveSpeed(pull, mu(inputs)),
      f: [1, 2, 3].map((n) => partialFrequency(pull, mu(inputs), L(inputs), n)),
    }
  },
  'textbook:L,T,m->f,v': (inputs) => ({
    v: waveSpeed(T(inputs), total(inputs)),
    f: [1, 2, 3, 4].map((n) => partialFrequency(T(inputs), total(inputs), L(inputs), n)),
  }),
  'textbook:L,T,mu,n->f_n,v': (inputs) => ({
    v: waveSpeed(T(inputs), mu(inputs)),
    f_n: partialFrequency(T(inputs), mu(inputs), L(inputs), numberOf(inputs, 'n')),
  }),
  'textbook:T,r,rho->mu,v': (inputs) => {
    const mass = solidWireMassPerMetre(
      metres(2 * numberOf(inputs, 'r')),
      kilogramsPerCubicMetre(numberOf(inputs, 'rho')),
    )
    return { mu: mass, v: waveSpeed(T(inputs), mass) }
  },
  'textbook:L,T_A,T_B,mu,n->beat,v_A,v_B': (inputs) => {
    const n = numberOf(inputs, 'n')
    const partial = (name: string) => partialFrequency(T(inputs, name), mu(inputs), L(inputs), n)
    return {
      v_A: waveSpeed(T(inputs, 'T_A'), mu(inputs)),
      v_B: waveSpeed(T(inputs, 'T_B'), mu(inputs)),
      beat: partial('T_B') - partial('T_A'),
    }
  },
  'textbook:L,f,mu,n->T,v': (inputs) => {
    const pull = tensionAtPitch(mu(inputs), hertz(f(inputs) / numberOf(inputs, 'n')), L(inputs))
    return { T: pull, v: waveSpeed(pull, mu(inputs)) }
  },
  'textbook:E,L0,d,dL->F': (inputs) => ({
    F:
      (plainWireAxialStiffness(pascals(numberOf(inputs, 'E')), metres(numberOf(inputs, 'd'))) *
        numberOf(inputs, 'dL')) /
      numberOf(inputs, 'L0'),
  }),
  'textbook:L,f_n,f_n1,mu->T,n': (inputs) => {
    // Neighbouring partials differ by the fundamental.
    const spacing = numberOf(inputs, 'f_n1') - numberOf(inputs, 'f_n')
    return {
      n: numberOf(inputs, 'f_n') / spacing,
      T: tensionAtPitch(mu(inputs), hertz(spacing), L(inputs)),
    }
  },
  'textbook:L,T,m->t,v': (inputs) => {
    const v = waveSpeed(T(inputs), total(inputs))
    return { v, t: L(inputs) / v }
  },
  'textbook:T,f,mu->v,wavelength': (inputs) => {
    const v = waveSpeed(T(inputs), mu(inputs))
    return { v, wavelength: v / f(inputs) }
  },
  'textbook:L,f,m->T': (inputs) => ({ T: tensionAtPitch(total(inputs), f(inputs), L(inputs)) }),
}
