import { lotStrip, type StripInput } from '@/lib/domain/charts/lot-strip'
import { DrawingView } from './DrawingView'

/** One characteristic of a lot: tolerance, control limits, mean ± U and specimens on one line. */
export function LotStrip(input: StripInput) {
  return <DrawingView drawing={lotStrip(input)} className="lot-strip" />
}
