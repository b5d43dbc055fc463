import type { Ink } from './ink'

/** What a mark is, for those who count marks or read them by program. */
export type MarkKind =
  | 'note'
  | 'ledger-line'
  | 'slur'
  | 'bar-line'
  | 'staff-line'
  | 'limit-line'
  | 'centre-line'
  | 'tolerance-line'
  | 'value-label'
  | 'run-label'
  | 'pointer'
  | 'specimen'
  | 'mean'
  | 'weight'
  | 'lot'
  | 'curve'

/** The role of a mark; each member becomes a `data-` attribute. */
export interface Role {
  readonly mark?: MarkKind
  readonly lot?: string
  readonly stave?: string
  readonly signal?: string
  /** What the mark says of itself: left-out, beyond, open, answered … */
  readonly state?: string
}

export interface Paint {
  readonly fill?: Ink
  readonly stroke?: Ink
  readonly width?: number
  readonly dash?: readonly number[]
  readonly opacity?: number
  readonly round?: boolean
}

export type Segment =
  | readonly ['M', number, number]
  | readonly ['L', number, number]
  | readonly ['C', number, number, number, number, number, number]
  | readonly ['Z']

export interface PathShape extends Paint {
  readonly kind: 'path'
  readonly segments: readonly Segment[]
  readonly role?: Role
}

export interface EllipseShape extends Paint {
  readonly kind: 'ellipse'
  readonly cx: number
  readonly cy: number
  readonly rx: number
  readonly ry: number
  /** Degrees, clockwise on screen. */
  readonly turn?: number
  readonly role?: Role
}

export interface RectShape extends Paint {
  readonly kind: 'rect'
  readonly x: number
  readonly y: number
  readonly w: number
  readonly h: number
  readonly radius?: number
  readonly role?: Role
}

export type TextSize = 9.5 | 10 | 11 | 12 | 13 | 14 | 17

export interface TextShape {
  readonly kind: 'text'
  readonly x: number
  readonly y: number
  readonly text: string
  /** A second, heavier part right after the first. */
  readonly strong?: string
  readonly size?: TextSize
  readonly weight?: 400 | 500 | 600
  /** Words written onto a chart are in the italic of the serif. */
  readonly italic?: boolean
  readonly anchor?: 'start' | 'middle' | 'end'
  readonly ink?: Ink
  /** 3 px of paper around the letters. */
  readonly halo?: boolean
  readonly role?: Role
}

export interface GroupShape {
  readonly kind: 'group'
  readonly shapes: readonly Shape[]
  /** Where a click leads. */
  readonly href?: string
  /** Read aloud, and shown on hovering. */
  readonly title?: string
  readonly role?: Role
}

export type Shape = PathShape | EllipseShape | RectShape | TextShape | GroupShape

/** A finished drawing in pixels, free of any way to show it. */
export interface Drawing {
  readonly width: number
  readonly height: number
  /** What the picture is, in one line. */
  readonly label: string
  /** What it shows, for those who cannot see it. */
  readonly description?: string
  readonly shapes: readonly Shape[]
}
