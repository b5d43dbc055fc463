import { formatNumber } from '../units/format'
import type { Ink } from './ink'
import { lines, noteHead, polyline, words } from './marks'
import { niceTicks } from './nice-ticks'
import type { Drawing, Shape } from './shape'

export interface GateRoute {
  readonly value: number
  /** Expanded uncertainty, k = 2. */
  readonly expanded?: number
}

export interface GateSpecimen {
  readonly label: string
  readonly weighed?: GateRoute
  readonly sounded?: GateRoute
  /** Expanded uncertainty of the difference between the routes. */
  readonly combined?: number
  readonly verdict?: 'closed' | 'doubtful' | 'open'
  /** The closure as it is shown: "−0.03 %". */
  readonly closureText?: string
}

export interface GateInput {
  readonly unit: string
  readonly decimals: number
  readonly decimal?: 'point' | 'comma'
  readonly specimens: readonly GateSpecimen[]
}

const [WIDTH, RULE, ROW, TOP] = [340, 264, 58, 20]

const tone: Readonly<Record<'closed' | 'doubtful' | 'open', Ink>> = {
  closed: 'verdigris',
  doubtful: 'brass',
  open: 'vermilion',
}

const median = (values: readonly number[]): number | undefined => {
  const sorted = values.toSorted((a, b) => a - b)
  return sorted[Math.floor((sorted.length - 1) / 2)]
}

/**
 * The stretch of mass per metre that the rule shows: every gate of the specimens that lie together; what lies
 * further off than eight gates is shown by an arrow, or one slip would squeeze all the others into a line.
 */
function ruleRange(specimens: readonly GateSpecimen[]): readonly [number, number] | undefined {
  const routes = specimens
    .flatMap(({ weighed, sounded }) => [weighed, sounded])
    .filter((one) => one !== undefined)
  const middle = median(routes.map(({ value }) => value))
  if (middle === undefined) return undefined
  const gates = specimens
    .map(({ combined }) => combined)
    .filter((one): one is number => one !== undefined && one > 0)
  // Never so narrow that numbers could not tell its two ends apart.
  const gate = Math.max(
    median(gates) ?? (Math.abs(middle) * 0.002 || 1),
    Math.abs(middle) * 1e-9,
    Number.MIN_VALUE * 1e16,
  )
  const shown = specimens.flatMap(({ weighed, sounded, combined = 0 }) => [
    ...(weighed ? [weighed.value - combined, weighed.value + combined] : []),
    ...(sounded ? [sounded.value - (sounded.expanded ?? 0), sounded.value + (sounded.expanded ?? 0)] : []),
  ])
  const near = shown.filter((value) => Math.abs(value - middle) <= 8 * gate)
  const [low, high] = [Math.min(middle - gate, ...near), Math.max(middle + gate, ...near)]
  const margin = (high - low) * 0.06
  return [low - margin, high + margin]
}

/** A weight of the balance, seen from the side; its foot is at y. */
export const weightMark = (x: number, y: number, ink: Ink = 'ink'): Shape => ({
  kind: 'path',
  fill: ink,
  role: { mark: 'weight' },
  segments: [
    ['M', x - 5, y - 9],
    ['L', x + 5, y - 9],
    ['L', x + 7, y],
    ['L', x - 7, y],
    ['Z'],
    ['M', x - 2, y - 12],
    ['L', x + 2, y - 12],
    ['L', x + 2, y - 9],
    ['L', x - 2, y - 9],
    ['Z'],
  ],
})

/**
 * Two routes, one wire: one rule in mass per metre for all specimens. The weight stands where a specimen was
 * weighed, the note where it was sounded, each with its bar ± U; the brackets stand at weighed ± the combined
 * U, so that a note between them is *closed*. Off the rule: an arrow and the value.
 */
export function closureGate(input: GateInput): Drawing {
  const range = ruleRange(input.specimens)
  const bottom = TOP + input.specimens.length * ROW - 14
  const at = (value: number): number =>
    range === undefined ? 0 : ((value - range[0]) / (range[1] - range[0])) * RULE
  const shapes = input.specimens.flatMap((specimen, row) => rowShapes(specimen, TOP + row * ROW, at, input))
  return {
    width: WIDTH,
    height: bottom + 22,
    label: `Two routes to mass per metre, ${input.specimens.length} ${input.specimens.length === 1 ? 'specimen' : 'specimens'}`,
    description: input.specimens.map((one) => sentenceOf(one, input)).join(' '),
    shapes: [...shapes, ...(range ? ruleShapes(range, bottom, at, input) : [])],
  }
}

function sentenceOf(
  { label, weighed, sounded, verdict, closureText }: GateSpecimen,
  input: GateInput,
): string {
  const text = (route: GateRoute | undefined): string =>
    route
      ? `${formatNumber(route.value, { decimals: input.decimals, decimal: input.decimal })} ${input.unit}`
      : 'nothing yet'
  const said = verdict ? `; ${verdict}${closureText ? `, ${closureText}` : ''}` : ''
  return `Specimen ${label}: weighed ${text(weighed)}, sounded ${text(sounded)}${said}.`
}

const clamp = (x: number): number => Math.min(RULE, Math.max(0, x))

function rowShapes(
  specimen: GateSpecimen,
  y: number,
  at: (value: number) => number,
  input: GateInput,
): Shape[] {
  const { weighed, sounded, combined, verdict } = specimen
  const ink = verdict ? tone[verdict] : 'edge'
  const gate =
    weighed && combined !== undefined
      ? { from: clamp(at(weighed.value - combined)), to: clamp(at(weighed.value + combined)) }
      : undefined
  const bar = (route: GateRoute, barY: number): Shape[] => {
    const { value, expanded } = route
    if (expanded === undefined) return []
    const [from, to] = [clamp(at(value - expanded)), clamp(at(value + expanded))]
    return to > from ? [lines([[from, barY, to, barY]], { stroke: 'ink', width: 1.2 })] : []
  }
  const off = (route: GateRoute): -1 | 0 | 1 => (at(route.value) < 0 ? -1 : at(route.value) > RULE ? 1 : 0)
  const mark = (
    route: GateRoute,
    markY: number,
    draw: (x: number) => Shape,
    word: 'weighed' | 'sounded',
  ): Shape[] => {
    if (off(route) === 0) return [...bar(route, markY), draw(at(route.value))]
    const value = formatNumber(route.value, { decimals: input.decimals, decimal: input.decimal })
    return offRule(off(route), markY, word, `${word} ${value}, off the rule`)
  }
  return [
    words(0, y - 1, specimen.label, { weight: 600 }),
    ...(gate
      ? [
          {
            kind: 'rect' as const,
            x: gate.from,
            y: y - 8,
            w: gate.to - gate.from,
            h: 40,
            fill: verdict === 'closed' ? ('verdigris' as const) : ('wash' as const),
            ...(verdict === 'closed' ? { opacity: 0.13 } : {}),
          },
          polyline(
            [
              [gate.from + 5, y - 8],
              [gate.from, y - 8],
              [gate.from, y + 32],
              [gate.from + 5, y + 32],
            ],
            { stroke: ink, width: 2 },
          ),
          polyline(
            [
              [gate.to - 5, y - 8],
              [gate.to, y - 8],
              [gate.to, y + 32],
              [gate.to - 5, y + 32],
            ],
            { stroke: ink, width: 2 },
          ),
        ]
      : []),
    lines([[0, y + 12, RULE, y + 12]], { stroke: 'staff' }),
    ...(weighed ? mark(weighed, y + 1, (x) => weightMark(x, y + 5), 'weighed') : []),
    ...(sounded
      ? mark(
          sounded,
          y + 22,
          (x) => noteHead(x, y + 22, 'ink', { rx: 5.6, ry: 4 }, { mark: 'note' }),
          'sounded',
        )
      : []),
    words(WIDTH, y + 8, verdict ?? 'waits', {
      anchor: 'end',
      weight: verdict ? 600 : 400,
      ink: verdict ? ink : 'slate',
      italic: verdict === undefined,
    }),
    ...(specimen.closureText ? [words(WIDTH, y + 27, specimen.closureText, { anchor: 'end' })] : []),
  ]
}

/** An arrow towards a value that the rule does not reach; the words keep clear of the rule's line. */
function offRule(side: -1 | 0 | 1, y: number, word: 'weighed' | 'sounded', text: string): Shape[] {
  const [from, to] = side < 0 ? [90, 4] : [RULE - 90, RULE - 4]
  const back = side < 0 ? 7 : -7
  const [arrowY, textY] = word === 'sounded' ? [y - 4, y + 8] : [y + 5, y - 1]
  return [
    lines([[from, arrowY, to, arrowY]], { stroke: 'brass', width: 1.4 }),
    polyline(
      [
        [to + back, arrowY - 4],
        [to, arrowY],
        [to + back, arrowY + 4],
      ],
      { stroke: 'brass', width: 1.4 },
    ),
    words(side < 0 ? 4 : RULE - 6, textY, text, {
      anchor: side < 0 ? 'start' : 'end',
      ink: 'brass',
      weight: 600,
      // They may lie across a bracket of the gate.
      halo: true,
    }),
  ]
}

function ruleShapes(
  range: readonly [number, number],
  y: number,
  at: (value: number) => number,
  input: GateInput,
): Shape[] {
  const major = niceTicks(range[0], range[1], 3)
  const minor = niceTicks(range[0], range[1], 12)
  return [
    lines([[0, y, RULE, y]], { stroke: 'edge' }),
    lines(
      minor.values.map((value) => [at(value), y, at(value), y + 3] as const),
      { stroke: 'edge' },
    ),
    lines(
      major.values.map((value) => [at(value), y, at(value), y + 6] as const),
      { stroke: 'edge' },
    ),
    ...major.values.map((value) =>
      words(at(value), y + 18, formatNumber(value, { decimals: major.decimals, decimal: input.decimal }), {
        anchor: 'middle',
      }),
    ),
    words(WIDTH, y + 18, input.unit, { anchor: 'end' }),
  ]
}
