import { fireEvent, render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import { StaffChart } from '@/app/_ui/charts/StaffChart'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { valueText } from '@/lib/domain/charts/readout'
import { marksIn } from '@/test/support/drawing'
import { sampleChart } from '@/test/support/staff-chart-sample'

const pointer = () => screen.getByRole('slider', { name: 'Lot read on all staves' })

describe('StaffChart', () => {
  it('opens on the newest 52 lots and draws the marks that the file has, at the same places', () => {
    const { container } = render(<StaffChart input={sampleChart({})} width={964} />)
    const file = drawStaffChart(
      layoutStaffChart(buildStaffChart({ ...sampleChart({}), window: { from: 8, to: 59 } }), 964),
    )
    const places = (mark: string): string[] =>
      [...container.querySelectorAll(`.recharts-surface ellipse[data-mark="${mark}"]`)].map((head) =>
        [
          head.getAttribute('data-lot'),
          head.getAttribute('data-stave'),
          Math.round(Number(head.getAttribute('cx'))),
          Math.round(Number(head.getAttribute('cy'))),
        ].join(' '),
      )
    const expected = marksIn(file.shapes, 'note').map((head) =>
      head.kind === 'ellipse'
        ? [head.role?.lot, head.role?.stave, Math.round(head.cx), Math.round(head.cy)].join(' ')
        : '',
    )
    expect(expected).toHaveLength(207)
    expect(places('note').sort()).toEqual(expected.sort())
    expect(container.innerHTML).not.toContain('NaN')
  })

  it('reads all staves by arrow keys, Home and End, and says so', async () => {
    const user = userEvent.setup()
    const { container } = render(<StaffChart input={sampleChart({})} width={964} />)
    expect(pointer().getAttribute('aria-valuetext')).toBe('no lot read yet')
    expect(pointer().getAttribute('aria-valuemax')).toBe('60')
    pointer().focus()
    await user.keyboard('{ArrowLeft}')
    expect(pointer().getAttribute('aria-valuetext')).toMatch(
      /^LA-360, \d+ Oct: Diameter 255\.73, \+4\.3\u00a0σ; Mass per metre, weighed .*; Closure .*; Spread within the lot /,
    )
    expect(pointer().getAttribute('aria-valuenow')).toBe('60')
    expect(container.querySelectorAll('.staff-over ellipse[data-mark="pointer"]')).toHaveLength(4)
    await user.keyboard('{ArrowLeft}{ArrowLeft}{ArrowRight}')
    expect(pointer().getAttribute('aria-valuenow')).toBe('59')
    await user.keyboard('{PageUp}')
    expect(pointer().getAttribute('aria-valuenow')).toBe('49')
    await user.keyboard('{PageDown}')
    expect(pointer().getAttribute('aria-valuenow')).toBe('59')
    await user.keyboard('{Home}')
    expect(pointer().getAttribute('aria-valuetext')).toMatch(/^LA-309,/)
    await user.keyboard('{End}')
    expect(pointer().getAttribute('aria-valuetext')).toMatch(/^LA-360,/)
    await user.keyboard('{ArrowRight}')
    expect(pointer().getAttribute('aria-valuenow')).toBe('60')
  })

  it('takes the window along past its edge', async () => {
    const user = userEvent.setup()
    render(<StaffChart input={sampleChart({})} width={964} />)
    pointer().focus()
    await user.keyboard('{Home}{ArrowLeft}')
    expect(pointer().getAttribute('aria-valuetext')).toMatch(/^LA-308,/)
    expect(screen.getByRole('slider', { name: 'First lot shown' }).getAttribute('aria-valuetext')).toBe(
      'LA-308',
    )
    expect(screen.getByRole('slider', { name: 'Last lot shown' }).getAttribute('aria-valuetext')).toBe(
      'LA-359',
    )
  })

  it('opens the lot by Enter, and lets go by Escape', async () => {
    const user = userEvent.setup()
    const onOpen = vi.fn()
    const { container } = render(<StaffChart input={sampleChart({})} width={964} onOpen={onOpen} />)
    pointer().focus()
    await user.keyboard('{Enter}')
    expect(onOpen).not.toHaveBeenCalled()
    await user.keyboard('{End}{ArrowLeft}{Enter}')
    expect(onOpen.mock.calls).toEqual([['LA-359']])
    await user.keyboard('{Escape}')
    expect(pointer().getAttribute('aria-valuetext')).toBe('no lot read yet')
    expect(container.querySelectorAll('.staff-over [data-mark="pointer"]')).toHaveLength(0)
    await user.keyboard('{Enter}')
    expect(onOpen).toHaveBeenCalledTimes(1)
  })

  it('leaves other keys to the page', () => {
    render(<StaffChart input={sampleChart({})} width={964} />)
    expect(fireEvent.keyDown(pointer(), { key: 'Tab' })).toBe(true)
    expect(fireEvent.keyDown(pointer(), { key: 'ArrowLeft' })).toBe(false)
  })

  it('reads the lot under the mouse and tells the page', () => {
    const onPointer = vi.fn()
    const { container } = render(<StaffChart input={sampleChart({})} width={964} onPointer={onPointer} />)
    const plot = container.querySelector('.staff-plot')
    if (!plot) throw new Error('no plot')
    const { frame } = layoutStaffChart(
      buildStaffChart({ ...sampleChart({}), window: { from: 8, to: 59 } }),
      964,
    )
    fireEvent.pointerMove(plot, { clientX: frame.xAt(39) + 2, clientY: 100 })
    expect(pointer().getAttribute('aria-valuetext')).toMatch(/^LA-340,/)
    expect(onPointer.mock.calls).toEqual([[39]])
    fireEvent.pointerMove(plot, { clientX: frame.xAt(39) - 3, clientY: 300 })
    expect(onPointer).toHaveBeenCalledTimes(1)
    // Beside the plot stand names and values: nothing is read there.
    fireEvent.pointerMove(plot, { clientX: 40, clientY: 100 })
    expect(pointer().getAttribute('aria-valuetext')).toMatch(/^LA-340,/)
  })

  it('leads from every note to its lot, and says which run a slur is', () => {
    const onSignal = vi.fn()
    const { container } = render(<StaffChart input={sampleChart({})} width={964} onSignal={onSignal} />)
    const note = container.querySelector('.recharts-surface ellipse[data-lot="LA-340"][data-stave="mass"]')
    expect(note?.parentElement?.getAttribute('href')).toBe('/lots/LA-340')
    const slur = container.querySelector('.recharts-surface [data-mark="slur"][data-stave="diameter"]')
    if (!slur) throw new Error('no slur')
    fireEvent.click(slur)
    expect(onSignal.mock.calls).toEqual([['diameter-run-35']])
  })

  it('shows window and pointer that the page keeps', () => {
    const onWindow = vi.fn()
    render(
      <StaffChart
        input={sampleChart({})}
        width={964}
        window={{ from: 10, to: 29 }}
        pointer={20}
        onWindow={onWindow}
      />,
    )
    expect(pointer().getAttribute('aria-valuetext')).toMatch(/^LA-321,/)
    expect(screen.getByRole('slider', { name: 'Lots shown' }).getAttribute('aria-valuetext')).toBe(
      'LA-311 to LA-330',
    )
    fireEvent.keyDown(screen.getByRole('slider', { name: 'Lots shown' }), { key: 'ArrowRight' })
    expect(onWindow.mock.calls).toEqual([[{ from: 11, to: 30 }]])
  })

  it('says all of it in words and as a table with every value of the window', () => {
    const input = sampleChart({ window: { from: 30, to: 59 } })
    const { container } = render(<StaffChart input={input} width={964} />)
    expect(
      screen.getByRole('figure', { name: 'Staff chart of Larch 254 on drawing machine 1' }),
    ).toBeDefined()
    expect(container.querySelector('figcaption')?.textContent).toContain('30 lots, LA-331 to LA-360')
    const rows = within(screen.getByRole('table', { hidden: true })).getAllByRole('row', { hidden: true })
    expect(rows).toHaveLength(31)
    rows.slice(1).forEach((row, offset) => {
      const cells = [...row.querySelectorAll('th, td')].map(({ textContent }) => textContent)
      expect(cells[0]).toBe(`LA-${331 + offset}`)
      input.staves.forEach((stave, place) => {
        expect(cells[place + 2]?.startsWith(valueText(stave.values[30 + offset], stave))).toBe(true)
      })
      expect(row.querySelector('a')?.getAttribute('href')).toBe(`/lots/LA-${331 + offset}`)
    })
  })

  it('draws none, one and two lots without a pointer or an overview where there is nothing to point at', () => {
    for (const [lots, sliders] of [
      [0, 0],
      [1, 1],
      [2, 4],
    ] as const) {
      const { container, unmount } = render(<StaffChart input={sampleChart({ lots })} width={600} />)
      expect(screen.queryAllByRole('slider')).toHaveLength(sliders)
      expect(container.querySelectorAll('.recharts-surface ellipse[data-mark="note"]')).toHaveLength(4 * lots)
      expect(container.innerHTML).not.toMatch(/NaN|Infinity|undefined/)
      if (lots === 0) expect(screen.getByText('no lots yet')).toBeDefined()
      unmount()
    }
  })

  it('waits for its place on the page without a width, and takes up its room', () => {
    const { container } = render(<StaffChart input={sampleChart({})} />)
    const waits = container.querySelector<HTMLElement>('.staff-waits')
    expect(Number.parseInt(waits?.style.height ?? '', 10)).toBeGreaterThan(400)
    expect(container.querySelector('.recharts-surface')).toBeNull()
  })
})
