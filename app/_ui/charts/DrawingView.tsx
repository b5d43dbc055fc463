import { createElement, Fragment, type ReactElement } from 'react'
import type { Ink } from '@/lib/domain/charts/ink'
import { pathData, px } from '@/lib/domain/charts/path-data'
import type { Drawing, GroupShape, Paint, Role, Shape, TextShape } from '@/lib/domain/charts/shape'

const colour = (ink: Ink | undefined): string => (ink === undefined ? 'none' : `var(--${ink})`)

const paintOf = (paint: Paint) => ({
  fill: colour(paint.fill),
  ...(paint.stroke === undefined
    ? {}
    : {
        stroke: colour(paint.stroke),
        strokeWidth: paint.width ?? 1,
        strokeDasharray: paint.dash?.join(' '),
        ...(paint.round ? ({ strokeLinejoin: 'round', strokeLinecap: 'round' } as const) : {}),
      }),
  opacity: paint.opacity,
})

const roleOf = (role: Role | undefined) => ({
  'data-mark': role?.mark,
  'data-lot': role?.lot,
  'data-stave': role?.stave,
  'data-signal': role?.signal,
  'data-state': role?.state,
})

/** Style sheets rule over presentation attributes, so letters are dressed by classes (charts.css). */
function TextView({ shape }: { readonly shape: TextShape }) {
  const size = shape.size ?? (shape.italic ? 13 : 11)
  const dress = [
    'chart-text',
    `ink-${shape.ink ?? 'ink'}`,
    `size-${String(size).replace('.', '-')}`,
    ...(shape.weight && shape.weight !== 400 ? [`weight-${shape.weight}`] : []),
    ...(shape.italic ? ['italic'] : []),
    ...(shape.halo ? ['halo'] : []),
  ]
  return (
    <text
      x={px(shape.x)}
      y={px(shape.y)}
      textAnchor={shape.anchor}
      className={dress.join(' ')}
      {...roleOf(shape.role)}
    >
      {shape.text}
      {shape.strong === undefined ? null : <tspan className="weight-600">{shape.strong}</tspan>}
    </text>
  )
}

function GroupView({ shape }: { readonly shape: GroupShape }) {
  const content = (
    <>
      {shape.title === undefined ? null : <title>{shape.title}</title>}
      <ShapesView shapes={shape.shapes} />
    </>
  )
  return shape.href === undefined ? (
    <g {...roleOf(shape.role)}>{content}</g>
  ) : (
    <a href={shape.href} tabIndex={-1} {...roleOf(shape.role)}>
      {content}
    </a>
  )
}

function shapeElement(shape: Shape): ReactElement {
  switch (shape.kind) {
    case 'path':
      return <path d={pathData(shape.segments)} {...paintOf(shape)} {...roleOf(shape.role)} />
    case 'ellipse':
      return (
        <ellipse
          cx={px(shape.cx)}
          cy={px(shape.cy)}
          rx={px(shape.rx)}
          ry={px(shape.ry)}
          transform={shape.turn ? `rotate(${shape.turn} ${px(shape.cx)} ${px(shape.cy)})` : undefined}
          {...paintOf(shape)}
          {...roleOf(shape.role)}
        />
      )
    case 'rect':
      return (
        <rect
          x={px(shape.x)}
          y={px(shape.y)}
          width={px(shape.w)}
          height={px(shape.h)}
          rx={shape.radius}
          {...paintOf(shape)}
          {...roleOf(shape.role)}
        />
      )
    case 'text':
      return <TextView shape={shape} />
    case 'group':
      return <GroupView shape={shape} />
  }
}

/**
 * Shapes of the core as elements, in the colours of the page's theme. They are children in fixed places, as if
 * written out one after the other: a drawing is made anew as a whole and its shapes hold no state.
 */
export function ShapesView({ shapes }: { readonly shapes: readonly Shape[] }) {
  return createElement(Fragment, null, ...shapes.map(shapeElement))
}

/** A whole drawing as a picture with a name. */
export function DrawingView({
  drawing,
  className = 'drawing',
}: {
  readonly drawing: Drawing
  readonly className?: string
}) {
  const name = drawing.description ? `${drawing.label}. ${drawing.description}` : drawing.label
  return (
    <svg
      className={className}
      width={px(drawing.width)}
      height={px(drawing.height)}
      viewBox={`0 0 ${px(drawing.width)} ${px(drawing.height)}`}
      role="img"
      aria-label={name}
    >
      <ShapesView shapes={drawing.shapes} />
    </svg>
  )
}
