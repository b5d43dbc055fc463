import { type Ink, lightTheme, type Theme } from './ink'
import { pathData, px } from './path-data'
import type { Drawing, GroupShape, Paint, Role, Shape, TextShape } from './shape'

export interface SvgOptions {
  readonly theme?: Theme
  /** Fill the ground with paper: for files that are opened alone. */
  readonly ground?: boolean
  readonly fonts?: { readonly sans: string; readonly serif: string; readonly accidentals: string }
}

export const fileFonts = {
  sans: 'IBM Plex Sans',
  serif: 'Source Serif 4',
  accidentals: 'Noto Sans Math',
} as const

/** XML text: the five characters that mean something, and nothing that XML 1.0 forbids. */
export const escapeXml = (text: string): string =>
  text
    // biome-ignore lint/suspicious/noControlCharactersInRegex: XML 1.0 has no way to write these characters
    .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, '')
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;')
    .replace(/'/g, '&#39;')

const attribute = (name: string, value: string | number | undefined): string =>
  value === undefined ? '' : ` ${name}="${escapeXml(String(value))}"`

const roleText = (role: Role | undefined): string =>
  role === undefined
    ? ''
    : attribute('data-mark', role.mark) +
      attribute('data-lot', role.lot) +
      attribute('data-stave', role.stave) +
      attribute('data-signal', role.signal) +
      attribute('data-state', role.state)

/**
 * A drawing as SVG text. Pure text: the same drawing and theme give the same bytes, in the browser and on the
 * server; no styles, scripts, patterns, ids or outside references, so that several may stand in one document.
 */
export function svgText(drawing: Drawing, options: SvgOptions = {}): string {
  const { theme = lightTheme, ground = false, fonts = fileFonts } = options
  const colour = (ink: Ink | undefined): string => (ink === undefined ? 'none' : theme[ink])
  const size = `width="${px(drawing.width)}" height="${px(drawing.height)}"`

  const paintText = (paint: Paint): string =>
    attribute('fill', colour(paint.fill)) +
    (paint.stroke === undefined
      ? ''
      : attribute('stroke', colour(paint.stroke)) +
        attribute('stroke-width', px(paint.width ?? 1)) +
        attribute('stroke-dasharray', paint.dash?.map(px).join(' ')) +
        (paint.round ? ' stroke-linejoin="round" stroke-linecap="round"' : '')) +
    attribute('opacity', paint.opacity)

  const written = (text: string): string =>
    escapeXml(text).replace(/[♯♭]+/g, (signs) => `<tspan font-family="${fonts.accidentals}">${signs}</tspan>`)

  const letters = (shape: TextShape, paint: string): string =>
    `<text x="${px(shape.x)}" y="${px(shape.y)}"` +
    attribute('font-family', shape.italic ? `${fonts.serif}, serif` : `${fonts.sans}, sans-serif`) +
    attribute('font-size', shape.size ?? (shape.italic ? 13 : 11)) +
    (shape.italic ? ' font-style="italic"' : '') +
    (shape.weight && shape.weight !== 400 ? attribute('font-weight', shape.weight) : '') +
    (shape.anchor && shape.anchor !== 'start' ? attribute('text-anchor', shape.anchor) : '') +
    `${paint}>${written(shape.text)}` +
    (shape.strong === undefined ? '' : `<tspan font-weight="600">${written(shape.strong)}</tspan>`) +
    '</text>'

  // Not every renderer knows paint-order: the halo is a text of its own, hidden from readers, under the letters.
  const textShape = (shape: TextShape): string =>
    (shape.halo
      ? letters(
          shape,
          ` aria-hidden="true" fill="none"${attribute('stroke', colour('paper'))} stroke-width="3" stroke-linejoin="round"`,
        )
      : '') + letters(shape, attribute('fill', colour(shape.ink ?? 'ink')) + roleText(shape.role))

  const groupShape = (shape: GroupShape): string => {
    const tag = shape.href === undefined ? 'g' : 'a'
    return (
      `<${tag}${attribute('href', shape.href)}${roleText(shape.role)}>` +
      (shape.title === undefined ? '' : `<title>${escapeXml(shape.title)}</title>`) +
      `${shape.shapes.map(shapeText).join('')}</${tag}>`
    )
  }

  const shapeText = (shape: Shape): string => {
    switch (shape.kind) {
      case 'path':
        return `<path d="${pathData(shape.segments)}"${paintText(shape)}${roleText(shape.role)}/>`
      case 'ellipse':
        return (
          `<ellipse cx="${px(shape.cx)}" cy="${px(shape.cy)}" rx="${px(shape.rx)}" ry="${px(shape.ry)}"` +
          (shape.turn ? ` transform="rotate(${px(shape.turn)} ${px(shape.cx)} ${px(shape.cy)})"` : '') +
          `${paintText(shape)}${roleText(shape.role)}/>`
        )
      case 'rect':
        return (
          `<rect x="${px(shape.x)}" y="${px(shape.y)}" width="${px(shape.w)}" height="${px(shape.h)}"` +
          `${attribute('rx', shape.radius)}${paintText(shape)}${roleText(shape.role)}/>`
        )
      case 'text':
        return textShape(shape)
      case 'group':
        return groupShape(shape)
    }
  }

  return (
    `<svg xmlns="http://www.w3.org/2000/svg" ${size} viewBox="0 0 ${px(drawing.width)} ${px(drawing.height)}"` +
    ` role="img" aria-label="${escapeXml(drawing.label)}"><title>${escapeXml(drawing.label)}</title>` +
    (drawing.description === undefined ? '' : `<desc>${escapeXml(drawing.description)}</desc>`) +
    (ground ? `<rect width="100%" height="100%" fill="${theme.paper}"/>` : '') +
    `${drawing.shapes.map(shapeText).join('')}</svg>`
  )
}
