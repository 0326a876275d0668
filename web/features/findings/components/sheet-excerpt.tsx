import type { Outcome } from '#rules/engine/finding';
import type { Excerpt } from '../lib/excerpt';

/** The sheet's own letters and rows, the formula line of the cell, its tint by how it was read, and the ties. */
export function SheetExcerpt({
  excerpt,
  cell,
  outcome,
}: {
  excerpt: Excerpt;
  cell: string;
  outcome: Outcome;
}) {
  const { hit, columns, rows } = excerpt;
  const edge = outcome === 'fail' ? 'is-hit' : 'is-hit is-hit-quiet';
  return (
    <div className="sideways">
      <div className="formula-line">
        <span>{cell}</span>
        <span title={hit?.formula ?? hit?.value}>{formulaText(hit)}</span>
        <span>{hit === null ? 'empty' : `shows ${hit.text}`}</span>
      </div>
      <table className="sheet">
        <caption className="hidden-text">Rows around cell {cell} as uploaded</caption>
        <thead>
          <tr>
            <th className="row-number">
              <span className="hidden-text">Row</span>
            </th>
            {columns.map((column) => (
              <th key={column.name} scope="col" className={column.isLabel ? undefined : 'value-column'}>
                {column.name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.number}>
              <th scope="row" className="row-number">
                {row.number}
              </th>
              {row.cells.map((each) => (
                <td
                  key={each.address}
                  className={[
                    each.isNumber ? 'number' : '',
                    each.use ? `use-${each.use}` : '',
                    each.isHit ? edge : '',
                  ]
                    .filter((name) => name !== '')
                    .join(' ')}
                  title={each.taken ?? undefined}
                >
                  {each.letters.map((letter) => (
                    <span key={letter} className="tie">
                      {letter}
                    </span>
                  ))}
                  <span className="cell-text">{each.text}</span>
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function formulaText(hit: Excerpt['hit']): string {
  if (hit === null) return '';
  if (hit.formula === null) return hit.value;
  return hit.formula.startsWith('=') ? hit.formula : `=${hit.formula}`;
}
