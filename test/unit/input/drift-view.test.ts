import { describe, expect, it } from 'vitest'
import { chartId, defaultCharts, offeredCharts, parseChartId, parseStaves } from '@/lib/input/drift-view'

describe('charts in an address', () => {
  it('reads back every chart that is offered', () => {
    expect(offeredCharts.map(chartId).map(parseChartId)).toEqual(offeredCharts)
    expect(new Set(offeredCharts.map(chartId)).size).toBe(offeredCharts.length)
  })

  it('knows no chart of a name that is none', () => {
    for (const id of ['', 'Diameter', 'spread-of-', 'spread-of-mass', 'constructor', '__proto__'])
      expect(parseChartId(id)).toBeUndefined()
  })

  it('takes staves once each, in the order of the chart, and leaves out what it does not know', () => {
    expect(parseStaves('closure, diameter,closure,colour').map(chartId)).toEqual(['diameter', 'closure'])
  })

  it('shows the usual staves when none that it knows is asked for', () => {
    for (const text of [undefined, '', ',,', 'colour']) expect(parseStaves(text)).toBe(defaultCharts)
  })

  it('shows no stave by default that is not offered', () => {
    expect(offeredCharts).toEqual(expect.arrayContaining([...defaultCharts]))
  })
})
