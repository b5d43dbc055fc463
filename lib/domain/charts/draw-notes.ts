import type { StaffLayout, StaveLayout } from './layout-staff-chart'
import { lines, noteHead, openHead, polyline } from './marks'
import { placeShape } from './place-shape'
import { sigmasText, valueText } from './readout'
import type { Paint, Role, Shape } from './shape'
import { slurOutline } from './slur'
import type { PlacedNote, PlacedSlur } from './stave-layout'

const LEDGER = 10

export const lotHref = (code: string): string => `/lots/${encodeURIComponent(code)}`

const stateOf = ({ note }: PlacedNote): string | undefined =>
  [note.leftOut ? 'left-out' : '', note.beyond ? `beyond ${note.beyond}` : '', note.open ? 'open' : '']
    .filter((word) => word !== '')
    .join(' ') || undefined

/** Short lines through notes that have left their limits: what the program is named after. */
export function ledgerShapes({ stave, notes, y }: StaveLayout): Shape[] {
  return notes
    .filter(({ note }) => note.beyond !== undefined)
    .map(({ note, x, y: down }) =>
      lines(
        [[x - LEDGER, y + down, x + LEDGER, y + down]],
        { stroke: note.open ? 'vermilion' : 'ink', width: 1.4 },
        { mark: 'ledger-line', lot: note.code, stave: stave.key, state: note.open ? 'open' : undefined },
      ),
    )
}

/** Towards a note that lies further off than the page can follow. */
function offArrow(x: number, y: number, off: 'above' | 'below', ink: 'vermilion' | 'ink'): Shape {
  const [tip, back] = off === 'above' ? [y - 11, y - 7] : [y + 11, y + 7]
  return polyline(
    [
      [x - 4, back],
      [x, tip],
      [x + 4, back],
    ],
    { stroke: ink, width: 1.2 },
  )
}

/** Note heads, each a way to its lot. */
export function noteShapes({ stave, notes, y }: StaveLayout, { chart }: StaffLayout): Shape[] {
  return notes.map((placed): Shape => {
    const { note, x, off } = placed
    const ink = note.open ? 'vermilion' : 'ink'
    const role: Role = { mark: 'note', lot: note.code, stave: stave.key, state: stateOf(placed) }
    const head = note.leftOut
      ? openHead(x, y + placed.y, ink, undefined, role)
      : noteHead(x, y + placed.y, ink, undefined, role)
    return {
      kind: 'group',
      href: lotHref(note.code),
      title: `${note.code}: ${stave.label} ${valueText(note.value, stave, chart)}${note.sigmas === undefined ? '' : `, ${sigmasText(note.sigmas, chart)}`}${note.leftOut ? ', left out of the baseline' : ''}`,
      shapes: [...(off ? [offArrow(x, y + placed.y, off, ink)] : []), head],
    }
  })
}

/** Slurs: vermilion while open, slate when answered, an empty broken outline when they no longer hold. */
export function slurShapes({ stave, slurs, y }: StaveLayout): Shape[] {
  return slurs.map(({ slur, curve }: PlacedSlur): Shape => {
    const ink = slur.state === 'open' ? 'vermilion' : 'slate'
    const paint: Paint =
      slur.state === 'no-longer-holds'
        ? { stroke: ink, width: 0.9, dash: [3, 3] }
        : { fill: ink, stroke: ink, width: 0.7, round: true }
    const role: Role = { mark: 'slur', stave: stave.key, signal: slur.signal, state: slur.state }
    const outline: Shape = { kind: 'path', segments: slurOutline(curve), ...paint, role }
    return { kind: 'group', title: slur.sentence, shapes: [placeShape(outline, (x, down) => [x, y + down])] }
  })
}
