import { render, screen } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { DrawingView } from '@/app/_ui/charts/DrawingView'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import type { Drawing, Shape } from '@/lib/domain/charts/shape'
import { svgText } from '@/lib/domain/charts/svg'
import { sampleChart } from '@/test/support/staff-chart-sample'

const drawing = (shapes: readonly Shape[], more: Partial<Drawing> = {}): Drawing => ({
  width: 40,
  height: 20,
  label: 'A drawing',
  shapes,
  ...more,
})

describe('DrawingView', () => {
  it('is a picture with a name and a description', () => {
    render(<DrawingView drawing={drawing([], { description: 'It shows nothing.' })} />)
    const picture = screen.getByRole('img', { name: 'A drawing. It shows nothing.' })
    expect(picture.getAttribute('viewBox')).toBe('0 0 40 20')
  })

  it('takes colours from the page’s theme', () => {
    const { container } = render(
      <DrawingView
        drawing={drawing([
          {
            kind: 'path',
            segments: [
              ['M', 0, 0],
              ['L', 9, 9],
            ],
            stroke: 'vermilion',
            dash: [7, 4],
            round: true,
          },
          {
            kind: 'text',
            x: 1,
            y: 2,
            text: 'F♯3',
            strong: ' 73.4',
            ink: 'slate',
            weight: 600,
            size: 9.5,
            halo: true,
          },
        ])}
      />,
    )
    const path = container.querySelector('path')
    expect(path?.getAttribute('stroke')).toBe('var(--vermilion)')
    expect(path?.getAttribute('fill')).toBe('none')
    expect(path?.getAttribute('stroke-dasharray')).toBe('7 4')
    const text = container.querySelector('text')
    expect(text?.getAttribute('class')).toBe('chart-text ink-slate size-9-5 weight-600 halo')
    expect(text?.textContent).toBe('F♯3 73.4')
  })

  it('draws the same shapes at the same places as the file', () => {
    const made = drawStaffChart(layoutStaffChart(buildStaffChart(sampleChart({}))))
    const { container } = render(<DrawingView drawing={made} />)
    const file = new DOMParser().parseFromString(svgText(made), 'image/svg+xml')
    const told = (root: ParentNode): string[] =>
      [...root.querySelectorAll('*')]
        .filter(({ nodeName }) => ['path', 'ellipse', 'rect'].includes(nodeName))
        .map((element) =>
          ['d', 'cx', 'cy', 'rx', 'ry', 'x', 'y', 'width', 'height', 'transform', 'data-mark', 'data-lot']
            .map((name) => element.getAttribute(name) ?? '')
            .join('|'),
        )
    expect(told(container).length).toBeGreaterThan(200)
    expect(told(container)).toEqual(told(file))
    const words = (root: ParentNode): (string | null)[] =>
      [...root.querySelectorAll('text')]
        .filter((text) => text.getAttribute('aria-hidden') !== 'true')
        .map(({ textContent }) => textContent)
    expect(words(container)).toEqual(words(file))
  })

  it('leads where its groups lead, out of the way of the Tab key', () => {
    const { container } = render(
      <DrawingView drawing={drawing([{ kind: 'group', href: '/lots/LA-1', title: 'LA-1', shapes: [] }])} />,
    )
    const link = container.querySelector('a')
    expect(link?.getAttribute('href')).toBe('/lots/LA-1')
    expect(link?.getAttribute('tabindex')).toBe('-1')
    expect(link?.querySelector('title')?.textContent).toBe('LA-1')
  })
})
