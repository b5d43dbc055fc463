import { type TensionCurvesInput, tensionCurves } from '@/lib/domain/charts/tension-curves'
import { DrawingView } from './DrawingView'

/** Tension against pitch for the lengths of a datasheet. */
export function TensionCurves(input: TensionCurvesInput) {
  return <DrawingView drawing={tensionCurves(input)} />
}
