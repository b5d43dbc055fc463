/** How the ends of the span hold the string. */
export const endConditions = ['pinned', 'knife', 'clamped'] as const
export type EndCondition = (typeof endConditions)[number]

/** Factor of all partials alike that comes from the ends, without the partial's own √(1 + B n²). */
export function endFactor(end: EndCondition, inharmonicity: number): number {
  if (!(inharmonicity >= 0) || !Number.isFinite(inharmonicity))
    throw new RangeError(`B has to be zero or more, not ${inharmonicity}`)
  const root = Math.sqrt(inharmonicity)
  if (end === 'pinned') return 1
  if (end === 'knife') return 1 / (1 - root / Math.PI)
  return 1 + (2 / Math.PI) * root + (4 / (Math.PI * Math.PI)) * inharmonicity
}

/**
 * Partial n of a stiff string over n f₀, f₀ = √(T/µ)/(2L) of the flexible string:
 * pinned √(1 + B n²); sharp frictionless knife edges over which the string runs on √(1 + B n²)/(1 − √B/π),
 * a shortening by the bending length λ (λ/2 an edge); clamped √(1 + B n²)(1 + (2/π)√B + (4/π²)B), 2λ.
 *
 * B inharmonicity, n partial from 1. Clamped is low by 1e-5 at B = 1e-4, n = 10: `stiff-string-roots.ts` has
 * the exact roots. A rounded edge shortens further, by about its radius times the break angle.
 * Throws a RangeError when B is negative. Sources: H. Fletcher, J. Acoust. Soc. Am. 36 (1964) 203 (pinned,
 * clamped); knife edge derived, and checked against the exact solution of three spans.
 */
export const stiffPartialRatio = (end: EndCondition, inharmonicity: number, n: number): number =>
  endFactor(end, inharmonicity) * Math.sqrt(1 + inharmonicity * n * n)

/** Relative rise e of the fundamental: f₁ = f₀ (1 + e). */
export const endShift = (end: EndCondition, inharmonicity: number): number =>
  stiffPartialRatio(end, inharmonicity, 1) - 1

/**
 * Half-width, relative to mass per metre, of not knowing the end between pinned and clamped around the knife
 * edge: 2√B/π, to be taken as rectangular (u = half-width/√3), unless two spacings were measured.
 */
export const endHalfWidthOfMass = (inharmonicity: number): number => (2 / Math.PI) * Math.sqrt(inharmonicity)
