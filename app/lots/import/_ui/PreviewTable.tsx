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
            {headers.map((header) => (
              <th scope="col" key={header}>
                {header}
                <span className="unit">{shownName(options.columns[header])}</span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ cells, line, problems }) => (
            <tr key={line}>
              <th scope="row">
                {line}
                {problems.length > 0 ? (
                  <span className="import-why vermilion">
                    {problems
                      .map(({ message, where }) => (where ? `${where}: ${message}` : message))
                      .join(' ')}
                  </span>
                ) : null}
              </th>
              {headers.map((header, index) => (
                <td key={header} data-refused={problems.some(({ where }) => where === header) || undefined}>
                  {cells[index] ?? ''}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  )
}

const shownName = (name: string | undefined): string =>
  name === undefined || name === 'as-note' ? 'note' : name === 'leave-out' ? 'left out' : name
