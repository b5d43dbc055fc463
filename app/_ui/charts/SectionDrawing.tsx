import { type SectionInput, sectionDrawing } from '@/lib/domain/charts/section-drawing'
import { DrawingView } from './DrawingView'

/** Cross-section of a specimen with its tolerance ring, and what the lines mean. */
export function SectionDrawing(input: SectionInput) {
  const { drawing, caption } = sectionDrawing(input)
  return (
    <figure className="chart-figure">
      <DrawingView drawing={drawing} />
      <figcaption>{caption}</figcaption>
    </figure>
  )
}
