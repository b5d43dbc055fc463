import { formatNumber } from '../units/format'
import { hatchDisc } from './hatch'
import type { Ink } from './ink'
import { lines, polyline, words } from './marks'
import type { Drawing, EllipseShape, Shape } from './shape'

export interface SectionPlace {
  readonly label: string
  /** Diameters in two directions at right angles, in the drawing's unit; either may be missing. */
  readonly a?: number
  readonly b?: number
}

export interface SectionInput {
  readonly title: string
  readonly unit: string
  readonly decimals: number
  readonly decimal?: 'point' | 'comma'
  readonly nominal: number
  readonly lower?: number
  readonly upper?: number
  /** Core of a wound string, same unit. */
  readonly core?: number
  readonly places: readonly SectionPlace[]
}

export interface SectionPicture {
  readonly drawing: Drawing
  /** How much departures from the nominal are enlarged. */
  readonly factor: number
  readonly caption: string
}

const [CX, CY, NOMINAL, MOST] = [166, 140, 86, 118]
const RING = 28
const factors = [1, 2, 4, 5, 10, 20, 40, 50, 100, 200, 400, 500, 1000]

/** The largest round factor at which tolerance and measured departures stay within the drawing. */
function magnification(input: SectionInput, measured: readonly number[]): number {
  const perUnit = (NOMINAL * 2) / input.nominal
  const reach = (value: number | undefined): number =>
    value === undefined ? 0 : (Math.abs(value - input.nominal) / 2) * perUnit
  const ring = Math.max(reach(input.lower), reach(input.upper))
  const departure = Math.max(0, ...measured.map(reach))
  const fits = (factor: number): boolean => ring * factor <= RING && departure * factor <= MOST - NOMINAL
  return factors.findLast(fits) ?? 1
}

/**
 * Cross-section of a specimen: nominal as a broken ring, tolerance as a shaded one, each measured place as an
 * ellipse, departures from the nominal enlarged by a stated factor (a wire that is 1 µm out of round looks round
 * at any honest scale). The first place is the thick line.
 */
export function sectionDrawing(input: SectionInput): SectionPicture {
  const filled = input.places.filter(({ a, b }) => a !== undefined || b !== undefined)
  const measured = filled.flatMap(({ a, b }) => [a, b]).filter((value) => value !== undefined)
  const factor = magnification(input, measured)
  const radius = (value: number): number =>
    Math.min(MOST, Math.max(6, NOMINAL + ((value - input.nominal) * factor * NOMINAL) / input.nominal))
  const text = (value: number): string =>
    formatNumber(value, { decimals: input.decimals, decimal: input.decimal })
  const { lower, upper } = input
  const outside = (value: number): boolean =>
    (upper !== undefined && value > upper) || (lower !== undefined && value < lower)
  const inkOf = (place: SectionPlace): Ink =>
    [place.a, place.b].some((value) => value !== undefined && outside(value)) ? 'vermilion' : 'verdigris'
  const ring = (r: number, paint: Partial<EllipseShape>): EllipseShape => ({
    kind: 'ellipse',
    cx: CX,
    cy: CY,
    rx: r,
    ry: r,
    ...paint,
  })
  const rings = [lower, upper].filter((value) => value !== undefined).map(radius)
  const solid =
    input.core === undefined
      ? Math.max(6, Math.min(NOMINAL - RING, ...rings, ...measured.map(radius)) - 3)
      : (NOMINAL * input.core) / input.nominal
  const mean =
    measured.length > 0 ? measured.reduce((sum, value) => sum + value, 0) / measured.length : undefined
  const scaleBar = scaleBarOf(input)

  const shapes: Shape[] = [
    ...(upper === undefined ? [] : [ring(radius(upper), { fill: 'wash', stroke: 'edge', width: 0.8 })]),
    ...(lower === undefined ? [] : [ring(radius(lower), { fill: 'paper', stroke: 'edge', width: 0.8 })]),
    lines(hatchDisc(CX, CY, solid, 5), { stroke: 'staff' }),
    ...(input.core === undefined ? [] : [ring(solid, { stroke: 'ink', width: 0.9 })]),
    ring(NOMINAL, { stroke: 'ink', width: 0.9, dash: [5, 3] }),
    ...filled.toReversed().map((place): Shape => {
      const { a = place.b ?? input.nominal, b = place.a ?? input.nominal } = place
      const width = place === filled[0] ? 2.2 : 1
      const role = { mark: 'specimen' as const, state: place.label }
      return {
        kind: 'ellipse',
        cx: CX,
        cy: CY,
        rx: radius(a),
        ry: radius(b),
        stroke: inkOf(place),
        width,
        role,
      }
    }),
    lines(
      [
        [43, CY, 289, CY],
        [CX, 19, CX, 261],
      ],
      { stroke: 'slate', width: 0.7, dash: [10, 3, 2, 3] },
    ),
    ...(mean === undefined
      ? []
      : [
          { kind: 'rect' as const, x: CX - 32, y: CY - 10, w: 64, h: 20, fill: 'paper' as const },
          words(CX, CY + 4.5, `Ø ${text(mean)}`, { size: 13, weight: 600, anchor: 'middle' }),
        ]),
    ...directions(filled[0], text),
    ...leaders(input, radius, text),
    ...scaleBar,
  ]
  return {
    drawing: { width: 340, height: 276, label: labelOf(input, filled, text), shapes },
    factor,
    caption: captionOf(filled, input, factor),
  }
}

function directions(place: SectionPlace | undefined, text: (value: number) => string): Shape[] {
  return [
    ...(place?.a === undefined
      ? []
      : [words(293, CY - 4, 'a'), words(293, CY + 10, text(place.a), { weight: 600 })]),
    ...(place?.b === undefined ? [] : [words(CX + 6, 16, 'b ', { strong: text(place.b) })]),
  ]
}

/** Values of the rings, each with a line to its ring at the left of the drawing. */
function leaders(
  input: SectionInput,
  radius: (value: number) => number,
  text: (value: number) => string,
): Shape[] {
  const at = (value: number | undefined, angle: number, y: number): Shape[] => {
    if (value === undefined) return []
    const turn = (angle * Math.PI) / 180
    const [x, from] = [CX + radius(value) * Math.cos(turn), CY + radius(value) * Math.sin(turn)]
    return [
      polyline(
        [
          [x, from],
          [38, y],
          [2, y],
        ],
        { stroke: 'edge', width: 0.7 },
      ),
      words(2, y - 5, text(value), { ink: 'slate' }),
    ]
  }
  return [...at(input.upper, -135, 40), ...at(input.nominal, 145, 214), ...at(input.lower, 120, 252)]
}

/** A bar of a round length: the drawing's scale, not the departures'. */
function scaleBarOf({ nominal, unit }: SectionInput): Shape[] {
  const perUnit = (NOMINAL * 2) / nominal
  const power = 10 ** Math.floor(Math.log10(40 / perUnit))
  const length =
    ([5, 2, 1] as const).map((times) => times * power).find((size) => size * perUnit <= 40) ?? power
  const w = length * perUnit
  return [
    polyline(
      [
        [340 - w, 262],
        [340 - w, 268],
        [339.5, 268],
        [339.5, 262],
      ],
      { stroke: 'ink' },
    ),
    words(340, 257, `${Number(length.toPrecision(3))} ${unit}`, { anchor: 'end' }),
  ]
}

function labelOf(
  input: SectionInput,
  filled: readonly SectionPlace[],
  text: (value: number) => string,
): string {
  const places = filled.map(({ label, a, b }) => {
    const sizes = [a, b].filter((value) => value !== undefined).map(text)
    return `${sizes.join(' by ')} ${input.unit} at place ${label}`
  })
  return places.length === 0 ? `${input.title}, not measured yet` : `${input.title}: ${places.join(', ')}`
}

function captionOf(filled: readonly SectionPlace[], input: SectionInput, factor: number): string {
  const [first, ...others] = filled.map(({ label }) => label)
  const said = [
    first === undefined ? 'Nothing measured yet' : `Thick line place ${first}`,
    ...(others.length > 0
      ? [`thin ${others.length === 1 ? 'line place' : 'lines places'} ${others.join(', ')}`]
      : []),
  ].join(', ')
  const tolerance = input.lower === undefined && input.upper === undefined ? '' : ', shaded ring tolerance'
  return `${said}. Broken ring nominal${tolerance}; departures × ${factor}.`
}
