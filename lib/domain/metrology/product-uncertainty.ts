/**
 * Standard uncertainty of the product of two independent normal inputs, to first order, and exactly: the
 * exact variance has u₁²u₂² more. Tells whether the law of propagation is good enough.
 * Source: JCGM 100:2008, 5.1.2 note; exact variance of a product, textbook identity.
 */
export function productUncertainty(
  one: { readonly value: number; readonly u: number },
  other: { readonly value: number; readonly u: number },
): { readonly firstOrder: number; readonly exact: number } {
  const a = one.value * other.u
  const b = other.value * one.u
  const c = one.u * other.u
  return { firstOrder: Math.sqrt(a * a + b * b), exact: Math.sqrt(a * a + b * b + c * c) }
}
