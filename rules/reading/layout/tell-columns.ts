import type { TableContext } from './table-context';
import type { Told } from './told';

/**
 * A column that is said to hold results is no column of keys, and one without results is none of either. Single cells
 * that were told something leave their column what it is.
 */
export function tellColumns({ table, columns, kinds, told, index }: TableContext): void {
  if (told.size === 0) return;
  for (const column of columns.values()) {
    const values = table.rows.flatMap(({ cells }) =>
      cells.filter((cell) => cell.column === column.column && kinds.of(cell) === 'value'),
    );
    const said = values.map((cell) => told.at(index.sheet.name, cell)).filter((each) => each !== null);
    if (said.length === 0 || said.length * 2 <= values.length) continue;
    const quantity = onlyQuantity(said);
    if (quantity === null && said.some(({ says }) => says.kind === 'reading')) continue;
    const isValue = quantity !== null;
    Object.assign(column, {
      kind: isValue ? 'value' : 'aside',
      key: null,
      quantities: isValue ? [quantity] : [],
      weak: false,
      raw: false,
      attribute: null,
      role: null,
      name: null,
      nameCell: null,
      nameKey: null,
      isTold: true,
    });
  }
}

function onlyQuantity(said: Told[]): string | null {
  const quantities = new Set(said.map(({ says }) => (says.kind === 'reading' ? says.quantity : null)));
  const [only] = quantities;
  return quantities.size === 1 ? (only ?? null) : null;
}
