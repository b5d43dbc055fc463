const columns: readonly (readonly [string, string])[] = [
  ['lot', 'code of the lot; a new one is opened when product and made_at are given'],
  ['product, made_at, machine, die, coil, spool, maker, lot_length_m, specification', 'for a new lot'],
  ['specimen', 'its number within the lot, from 1'],
  ['taken_at', 'head, tail or metres'],
  [
    'measured_at, measurer, rig, micrometer, balance, rule, counter',
    'default: when the lot was made, you, the usual set-up',
  ],
  ['d1a_mm, d1b_mm, d2a_mm …', 'diameter at position 1, 2, …, directions a and b at right angles'],
  ['cut_length_mm, cut_mass_mg, weighed_state', 'the weighed piece: slack, or marked under load'],
  [
    'load_kg or load_n, weights, span_mm, frequency_hz',
    'what hung; several plucks in one cell apart by spaces',
  ],
  ['temperature_c, pressure_hpa, humidity_percent, note', 'default: those of the works'],
]

/** What a bench file holds, folded away until somebody asks. */
export function FileFormat() {
  return (
    <details className="import-format">
      <summary>What such a file holds</summary>
      <p>
        One row a specimen, in UTF-8, with commas, semicolons or tabs between the cells and a decimal point or
        comma. A unit stands at the end of a column’s name: <code>d1a_mm</code>, <code>d1a_um</code>,{' '}
        <code>d1a_in</code>, <code>d1a_thou</code>; <code>cut_mass_g</code>; <code>load_lbf</code>;{' '}
        <code>temperature_f</code>. Other columns are kept as notes. <code>lot</code> and{' '}
        <code>specimen</code> are needed, the rest by the plan.{' '}
        <a href="/bench-file-example.csv" download>
          A small example
        </a>
      </p>
      <dl>
        {columns.map(([names, meaning]) => (
          <div key={names}>
            <dt>
              <code>{names}</code>
            </dt>
            <dd>{meaning}</dd>
          </div>
        ))}
      </dl>
    </details>
  )
}
