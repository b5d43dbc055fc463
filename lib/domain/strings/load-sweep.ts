import { positive } from '../units/positive'
import { type Hertz, type Metres, type Newtons, newtons } from '../units/quantity'

export interface LoadStep {
  readonly force: Newtons
  readonly frequency: Hertz
}

/** Ordinary least squares y = a + b x; undefined with fewer than two distinct x. */
function line(points: readonly (readonly [number, number])[]): { a: number; b: number } | undefined {
  const n = points.length
  const meanX = points.reduce((sum, [x]) => sum + x, 0) / n
  const meanY = points.reduce((sum, [, y]) => sum + y, 0) / n
  const sxx = points.reduce((sum, [x]) => sum + (x - meanX) * (x - meanX), 0)
  if (n < 2 || !(sxx > 0)) return undefined
  const b = points.reduce((sum, [x, y]) => sum + (x - meanX) * (y - meanY), 0) / sxx
  return { a: meanY - b * meanX, b }
}

/**
 * A load that was not recorded (hook, carrier), from one span under several loads:
 * f² = (F + F₀)/(4 L² µ), a straight line in F, whose intercept over slope is F₀.
 *
 * F recorded loads N, f fundamentals Hz, F₀ N. Tells a load error from a span error, which only scales the
 * slope. Stretch bends the line by F/EA: correct f² for it first where that matters. Undefined with fewer
 * than two different loads. Source: from f = √(T/µ)/(2L), derived.
 */
export function unrecordedLoad(steps: readonly LoadStep[]): Newtons | undefined {
  const fit = line(steps.map(({ force, frequency }) => [force, frequency * frequency] as const))
  return fit && fit.b > 0 ? newtons(fit.a / fit.b) : undefined
}

/**
 * Axial stiffness EA from one span under several loads: 4 L² f² / F = (1 + F/EA)/µ₀, a straight line in F.
 *
 * F loads N (complete), f fundamentals corrected for ends and air Hz, L span m, EA N. Undefined with fewer
 * than two different loads or when the line does not rise. Source: as `unrecordedLoad` with
 * µ = µ₀/(1 + F/EA), derived.
 */
export function axialStiffnessFromLoads(steps: readonly LoadStep[], span: Metres): Newtons | undefined {
  const length = 2 * positive('L', span)
  const fit = line(
    steps.map(({ force, frequency }) => {
      const speed = length * frequency
      return [force, (speed * speed) / positive('F', force)] as const
    }),
  )
  return fit && fit.b > 0 && fit.a > 0 ? newtons(fit.a / fit.b) : undefined
}
