import { act, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { useWidth } from '@/app/_ui/charts/use-width'

function Box() {
  const [ref, width] = useWidth<HTMLDivElement>()
  return <div ref={ref}>{width === undefined ? 'not yet' : `${width} px`}</div>
}

describe('useWidth', () => {
  afterEach(() => {
    vi.unstubAllGlobals()
    vi.restoreAllMocks()
  })

  it('is undefined where there is no layout', () => {
    render(<Box />)
    expect(screen.getByText('not yet')).toBeDefined()
  })

  it('is the element’s width in whole px, follows it, and stops when it goes', () => {
    let width = 963.7
    let told: () => void = () => undefined
    const disconnect = vi.fn()
    vi.spyOn(HTMLElement.prototype, 'clientWidth', 'get').mockImplementation(() => width)
    vi.stubGlobal(
      'ResizeObserver',
      class {
        constructor(changed: () => void) {
          told = changed
        }
        observe(): void {}
        unobserve(): void {}
        disconnect = disconnect
      },
    )
    const { unmount } = render(<Box />)
    expect(screen.getByText('963 px')).toBeDefined()
    width = 358
    act(() => told())
    expect(screen.getByText('358 px')).toBeDefined()
    unmount()
    expect(disconnect).toHaveBeenCalledTimes(1)
  })
})
