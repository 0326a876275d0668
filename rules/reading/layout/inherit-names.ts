import type { Cell } from '../cell-grid';
import { isMaterial } from './materials';
import type { Surroundings, Table, TableRow } from './table';

interface Names {
  /** The row as it stands, and those of it that are names. */
  all: Cell[];
  cells: Cell[];
  lastRow: number;
}

/**
 * Names over a block stand for the blocks under it that name no columns of their own: shares under the names of
 * stockpiles, then their gradations, then their gravities.
 */
export function inheritNames(tables: Table[], around: Surroundings): Table[] {
  let names = null as Names | null;
  for (const table of tables) {
    const first = table.headings[0]?.row ?? table.rows[0]?.row ?? 0;
    const lastRow = Math.max(...[...table.headings, ...table.rows].map(({ row }) => row), 0);
    if (names && table.titles.length === 0 && takes(table, names, { first, around })) {
      const cells = table.headings.length > 0 ? names.all.slice(1) : names.all;
      table.headings.unshift({ row: cells[0]?.row ?? 0, cells });
      names = { ...names, lastRow };
      continue;
    }
    if (names && table.headings.length === 0 && table.titles.length === 0 && first - names.lastRow <= 3) {
      names = { ...names, lastRow };
      continue;
    }
    const own = namesIn(table, around);
    names = own && own.cells.length > 1 ? { ...own, lastRow } : null;
  }
  return tables;
}

function takes(
  table: Table,
  names: Names,
  { first, around }: { first: number; around: Surroundings },
): boolean {
  if (first - names.lastRow > 3) return false;
  const columns = names.cells.map(({ column }) => column);
  if (table.headings.length > 0) {
    const [corner] = table.headings[0]?.cells ?? [];
    const isSieve = corner && around.labels.read(corner.text).keys.includes('sieve');
    if (!isSieve || first !== names.lastRow + 1) return false;
    const own = table.headings.flatMap(({ cells }) => cells).filter(({ column }) => columns.includes(column));
    return own.length * 2 <= columns.length && hasValues(table.rows, columns, around);
  }
  const says = table.rows.filter(({ cells }) => {
    const [label] = cells;
    return label !== undefined && !columns.includes(label.column) && around.kinds.of(label) === 'text';
  });
  return (
    says.length === table.rows.length &&
    says.length > 0 &&
    says.some(({ cells }) => around.labels.read(cells[0]?.text ?? '').quantities.length > 0) &&
    hasValues(table.rows, columns, around)
  );
}

/** Most rows hold more than one figure, and all of them stand under the names. */
function hasValues(rows: TableRow[], columns: number[], { kinds }: Surroundings): boolean {
  const run = rows.filter(({ cells }) => {
    const values = cells.filter((cell) => kinds.of(cell) === 'value');
    return values.filter(({ column }) => columns.includes(column)).length > 1;
  });
  return run.length * 2 > rows.length;
}

/** Words over columns that name neither a quantity nor a limit. */
function namesIn({ headings }: Table, { kinds, labels }: Surroundings): Pick<Names, 'all' | 'cells'> | null {
  const row = headings.findLast(({ cells }) => cells.length > 2);
  if (!row) return null;
  const cells = row.cells.slice(1).filter((cell) => {
    if (kinds.of(cell) !== 'text') return false;
    const { quantities, role, raw, keys, attribute, at } = labels.read(cell.text);
    const isName = quantities.length === 0 || isMaterial(quantities);
    const isKey = keys.length > 0 && Object.keys(at).length === 0;
    return isName && role === null && !raw && attribute === null && !isKey;
  });
  return { all: row.cells, cells };
}
