import { alder } from './alder'
import { larch } from './larch'
import type { DemoProduct } from './product'
import { rowan } from './rowan'
import { yew } from './yew'

export type { DemoProduct } from './product'

/** Four families: plain steel, bronze-wound, nylon, steel core with a flat wrap. */
export const demoProducts: readonly DemoProduct[] = [...larch, ...rowan, ...alder, ...yew]

export function productOf(code: string): DemoProduct {
  const product = demoProducts.find((one) => one.code === code)
  if (!product) throw new Error(`The demo has no product ${code}.`)
  return product
}
