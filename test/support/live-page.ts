/** What a browser runs to evaluate specimens: the same core as the server's, on the same sheets. */
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import { randomSheet } from './random-sheets'
import { seededUniform } from './seeded-random'
import { steelContext } from './steel-context'

/** The bits of every number in a value, in the order of its keys; and everything else as it is. */
export const bitsOf = (value: unknown): string =>
  JSON.stringify(value, (_, one: unknown) => {
    if (typeof one !== 'number') return one
    const view = new DataView(new ArrayBuffer(8))
    view.setFloat64(0, one)
    return `${view.getUint32(0).toString(16)}:${view.getUint32(4).toString(16)}`
  })

/** Evaluations of `count` random specimens, each as text with all bits of its numbers. */
export function evaluateMany(count: number, seed: number): string[] {
  const random = seededUniform(seed)
  const context = steelContext()
  return Array.from({ length: count }, () => bitsOf(evaluateSpecimen(randomSheet(random), context)))
}
