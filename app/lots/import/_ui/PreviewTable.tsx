import { Fragment } from 'react'
import { nameOf } from '@/lib/input/bench-file/layout'
import type { ImportPreview } from '@/lib/services/get-import'

/** The first rows as they stand in the file, each column under what it is read as; refused cells say why. */
export function PreviewTable({ preview }: { readonly preview: ImportPreview }) {
  const { headers, options, rows } = preview
  return (
    // Reached by the keyboard, as it scrolls sideways.
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a scrolling region has to take the focus
    <section className="table-frame import-preview" aria-label="First rows of the file" tabIndex={0}>
      <table className="table dense">
        <caption className="visually-hidden">The first {rows.length} rows and how they are read</caption>
        <thead>
          <tr>
            <th scope="col">Line</th>
            {headers.map((header, index) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: columns have their places, and may share a name
              <th scope="col" key={index}>
                {header}
                <span className="import-read-as">{readAs(header, nameOf(options.columns, header))}</span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ cells, line, problems }) => (
            <Fragment key={line}>
              <tr data-refused={problems.length > 0 || undefined}>
                <th scope="row">{line}</th>
                {headers.map((header, index) => (
                  // biome-ignore lint/suspicious/noArrayIndexKey: columns have their places, and may share a name
                  <td key={index} data-refused={problems.some(({ where }) => where === header) || undefined}>
                    {cells[index] ?? ''}
                  </td>
                ))}
              </tr>
              {problems.length > 0 ? (
                <tr className="import-why">
                  <td colSpan={headers.length + 1}>
                    <p>
                      {problems
                        .map(({ mend, message, where }) => [where && `${where}:`, message, mend])
                        .map((parts) => parts.filter(Boolean).join(' '))
                        .join(' ')}
                    </p>
                  </td>
                </tr>
              ) : null}
            </Fragment>
          ))}
        </tbody>
      </table>
    </section>
  )
}

/** What a column is read as, where that is not its own name. */
const readAs = (header: string, name: string | undefined): string =>
  name === undefined || name === 'as-note'
    ? 'note'
    : name === 'leave-out'
      ? 'left out'
      : name === header.toLowerCase()
        ? ''
        : name
