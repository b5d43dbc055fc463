import { fireEvent, render, screen } from '@testing-library/react'
import { describe, expect, it, vi } from 'vitest'
import { StaffBrush } from '@/app/_ui/charts/StaffBrush'
import { staffBrush } from '@/lib/domain/charts/staff-brush'
import type { LotWindow } from '@/lib/domain/charts/staff-chart'
import { sampleChart } from '@/test/support/staff-chart-sample'

const frame = { x: 138, w: 764, compact: false }
const input = sampleChart({})
const { xAt } = staffBrush(input, frame, 964)

function brush(window: LotWindow = { from: 20, to: 39 }) {
  const onWindow = vi.fn<(window: LotWindow) => void>()
  render(<StaffBrush input={input} window={window} onWindow={onWindow} frame={frame} width={964} />)
  const grip = (name: string) => screen.getByRole('slider', { name })
  return { onWindow, grip }
}

describe('StaffBrush', () => {
  it('names its window and its ends for those who cannot see it', () => {
    const { grip } = brush()
    expect(screen.getByRole('region', { name: 'All 60 lots' })).toBeDefined()
    expect(grip('First lot shown').getAttribute('aria-valuetext')).toBe('LA-321')
    expect(grip('Last lot shown').getAttribute('aria-valuetext')).toBe('LA-340')
    expect(grip('Lots shown').getAttribute('aria-valuetext')).toBe('LA-321 to LA-340')
    for (const name of ['First lot shown', 'Last lot shown', 'Lots shown']) {
      expect(grip(name).getAttribute('aria-valuemin')).toBe('1')
      expect(grip(name).getAttribute('aria-valuemax')).toBe('60')
    }
    expect(grip('Last lot shown').getAttribute('aria-valuenow')).toBe('40')
  })

  it('moves by arrow keys, pages, Home and End', () => {
    const { onWindow, grip } = brush()
    for (const key of ['ArrowLeft', 'ArrowRight', 'PageUp', 'PageDown', 'Home', 'End'])
      fireEvent.keyDown(grip('Lots shown'), { key })
    expect(onWindow.mock.calls.map(([window]) => window)).toEqual([
      { from: 19, to: 38 },
      { from: 21, to: 40 },
      { from: 10, to: 29 },
      { from: 30, to: 49 },
      { from: 0, to: 19 },
      { from: 40, to: 59 },
    ])
    expect(fireEvent.keyDown(grip('Lots shown'), { key: 'a' })).toBe(true)
    expect(onWindow).toHaveBeenCalledTimes(6)
  })

  it('moves one end, never nearer than eight lots to the other', () => {
    const { onWindow, grip } = brush()
    fireEvent.keyDown(grip('First lot shown'), { key: 'ArrowRight' })
    fireEvent.keyDown(grip('First lot shown'), { key: 'End' })
    fireEvent.keyDown(grip('Last lot shown'), { key: 'Home' })
    expect(onWindow.mock.calls.map(([window]) => window)).toEqual([
      { from: 21, to: 39 },
      { from: 32, to: 39 },
      { from: 20, to: 27 },
    ])
  })

  it('is dragged as a whole and by its ends, and lets go', () => {
    const { onWindow, grip } = brush()
    const drag = (name: string, fromLot: number, toLot: number) => {
      fireEvent.pointerDown(grip(name), { clientX: xAt(fromLot), pointerId: 1 })
      fireEvent.pointerMove(grip(name), { clientX: xAt(toLot), pointerId: 1 })
      fireEvent.pointerUp(grip(name), { pointerId: 1 })
    }
    drag('Lots shown', 30, 35)
    drag('First lot shown', 20, 12)
    drag('Last lot shown', 39, 50)
    expect(onWindow.mock.calls.map(([window]) => window)).toEqual([
      { from: 25, to: 44 },
      { from: 12, to: 39 },
      { from: 20, to: 50 },
    ])
    fireEvent.pointerMove(grip('Lots shown'), { clientX: xAt(5), pointerId: 1 })
    expect(onWindow).toHaveBeenCalledTimes(3)
  })

  it('jumps to where the overview is pressed, but not from the words beside it', () => {
    const { onWindow } = brush()
    const region = screen.getByRole('region', { name: 'All 60 lots' })
    fireEvent.pointerDown(region, { clientX: xAt(50) })
    expect(onWindow.mock.calls.map(([window]) => window)).toEqual([{ from: 40, to: 59 }])
    fireEvent.pointerDown(region, { clientX: 30 })
    expect(onWindow).toHaveBeenCalledTimes(1)
  })
})
