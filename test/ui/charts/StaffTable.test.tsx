import { render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { StaffTable } from '@/app/_ui/charts/StaffTable'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { staffChartTable } from '@/lib/domain/charts/staff-chart-table'
import { sampleChart } from '@/test/support/staff-chart-sample'

describe('StaffTable', () => {
  it('opens to a table with heads for rows and columns, and every cell of it', async () => {
    const chart = buildStaffChart(sampleChart({}))
    const { container } = render(<StaffTable chart={chart} />)
    expect(container.querySelector('details')?.open).toBe(false)
    await userEvent.setup().click(screen.getByText('As a table'))
    expect(container.querySelector('details')?.open).toBe(true)
    const table = within(screen.getByRole('table'))
    const { head, rows } = staffChartTable(chart)
    expect(table.getAllByRole('columnheader').map(({ textContent }) => textContent)).toEqual(head)
    expect(table.getAllByRole('rowheader').map(({ textContent }) => textContent)).toEqual(
      rows.map(({ code }) => code),
    )
    expect(table.getAllByRole('cell').map(({ textContent }) => textContent)).toEqual(
      rows.flatMap(({ cells }) => cells),
    )
    expect(screen.getByRole('region', { name: 'Lots of Larch 254 on drawing machine 1' }).tabIndex).toBe(0)
  })
})
