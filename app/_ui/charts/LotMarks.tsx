import { type LotMarksInput, lotMarks } from '@/lib/domain/charts/lot-marks'
import { DrawingView } from './DrawingView'

/** Every released lot as a note on the rule. */
export function LotMarks(input: LotMarksInput) {
  return <DrawingView drawing={lotMarks(input)} />
}
