import { lotHref } from '@/lib/domain/charts/draw-notes'
import type { StaffChart } from '@/lib/domain/charts/staff-chart'
import { staffChartTable } from '@/lib/domain/charts/staff-chart-table'

/** The chart's lots as a table: for screen readers, and for those who would rather read figures. */
export function StaffTable({ chart }: { readonly chart: StaffChart }) {
  const { head, rows } = staffChartTable(chart)
  return (
    <details className="staff-table">
      <summary>As a table</summary>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: a box that scrolls must be reachable by keyboard */}
      <section aria-label={`Lots of ${chart.title}`} tabIndex={0}>
        <table>
          <thead>
            <tr>
              {head.map((name) => (
                <th key={name} scope="col">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ code, cells }) => (
              <tr key={code}>
                <th scope="row">
                  <a href={lotHref(code)}>{code}</a>
                </th>
                {cells.map((cell, place) => (
                  <td key={head[place + 1]}>{cell}</td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </section>
    </details>
  )
}
