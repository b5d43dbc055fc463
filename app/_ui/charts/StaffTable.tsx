'use client'

import { useState } from 'react'
import { lotHref } from '@/lib/domain/charts/draw-notes'
import type { StaffChart } from '@/lib/domain/charts/staff-chart'
import { staffChartTable } from '@/lib/domain/charts/staff-chart-table'

/** Lots told at a time: more rows would make the page slow for those who never open the table. */
const ROWS = 200

/** The chart's lots as a table: for screen readers, and for those who would rather read figures. */
export function StaffTable({ chart }: { readonly chart: StaffChart }) {
  const { from, to } = chart.window
  // Counted from the newest end, so that a window that moves keeps its place.
  const [back, setBack] = useState(0)
  const pages = Math.max(1, Math.ceil((to - from + 1) / ROWS))
  const page = Math.min(back, pages - 1)
  const last = to - page * ROWS
  const part = { from: Math.max(from, last - ROWS + 1), to: last }
  const { head, rows } = staffChartTable(chart, part)
  return (
    <details className="staff-table">
      <summary>As a table</summary>
      {pages > 1 ? (
        <p className="staff-pages">
          <span>
            {chart.lots[part.from]?.code} to {chart.lots[part.to]?.code}, {part.to - part.from + 1} of{' '}
            {to - from + 1} lots
          </span>
          <button
            type="button"
            aria-disabled={page >= pages - 1}
            onClick={() => setBack(Math.min(page + 1, pages - 1))}
          >
            earlier lots
          </button>
          <button type="button" aria-disabled={page === 0} onClick={() => setBack(Math.max(page - 1, 0))}>
            later lots
          </button>
        </p>
      ) : null}
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
