import { Link } from 'react-router-dom';
import type { RuleSetView, TableView } from '#shared/contracts/rule-sets';
import { slug } from '#shared/format/finding-key';
import { Sideways } from '../../../components/ui/sideways';

/** Limits keyed by attributes, as printed; a row that a layer changed shows what stood there. */
export function LimitTable({ table, view }: { table: TableView; view: RuleSetView }) {
  const layered = table.rows.some((row) => row.displaced !== null);
  const users = view.ruleViews.filter((rule) => table.usedBy.includes(rule.id));
  return (
    <section id={`table-${slug(table.id)}`} tabIndex={-1} className="limit-table" aria-label={table.title}>
      <p className="limit-table-head">
        <b>{table.title}</b>{' '}
        <span className="small mute">
          used by{' '}
          {users.map((rule, index) => (
            <span key={rule.id}>
              {index > 0 ? ', ' : ''}
              <Link to={{ hash: `rule-${slug(rule.id)}` }}>{rule.clause}</Link>
            </span>
          ))}
        </span>
      </p>
      <Sideways label={table.title}>
        <table className="table">
          <caption className="hidden-text">{table.title}</caption>
          <thead>
            <tr>
              {table.columns.map((column) => (
                <th key={column.name} scope="col" className={column.key ? undefined : 'number'}>
                  {column.label}
                  {column.unit ? `, ${column.unit}` : ''}
                </th>
              ))}
              {layered ? <th scope="col">Changed</th> : null}
            </tr>
          </thead>
          <tbody>
            {table.rows.map((row) => (
              <tr key={row.cells.join('\n')}>
                {row.cells.map((cell, index) => {
                  const column = table.columns[index];
                  return column?.key ? (
                    <td key={column.name}>{cell}</td>
                  ) : (
                    <td
                      key={column?.name ?? index}
                      className={`number${row.displaced ? ' changed-new' : ''}`}
                    >
                      {cell}
                    </td>
                  );
                })}
                {layered ? (
                  <td>
                    {row.displaced ? (
                      <>
                        <del className="changed-old">{row.displaced}</del> {row.document}
                      </>
                    ) : null}
                  </td>
                ) : null}
              </tr>
            ))}
          </tbody>
        </table>
      </Sideways>
    </section>
  );
}
