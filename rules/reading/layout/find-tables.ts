import type { Cell, SheetGrid } from '../cell-grid';
import { cutColumns, cutRows, type Region } from './cut-regions';
import { belongsToHeading, isHeadingRow } from './heading-rows';
import { inheritNames } from './inherit-names';
import { joinContinued } from './join-tables';
import type { Surroundings, Table, TableRow } from './table';

/** Cuts a sheet at its blank bands and at its heading rows. */
export function findTables(sheet: SheetGrid, around: Surroundings): Table[] {
  const merges = mergeStarts(sheet);
  const regions = cutRows(sheet.cells).flatMap((band) => cutColumns(band, around));
  const tables: Table[] = [];
  let titles: Cell[] = [];
  for (const region of regions) {
    const found = tablesOf(region, around, merges);
    const [first] = found;
    if (first) first.titles = [...titles, ...first.titles];
    titles = found.length === 0 ? [...titles, ...region.flatMap(({ cells }) => cells)] : [];
    tables.push(...found);
  }
  const left = titles.map((cell) => ({ row: cell.row, cells: [cell] }));
  const last: Table[] =
    left.length === 0 ? [] : [{ titles: [], headings: [], rows: left, firstColumn: 1, lastColumn: 1 }];
  return [...inheritNames(joinContinued(tables, around), around), ...last];
}

function mergeStarts(sheet: SheetGrid): Map<string, number> {
  const columns = new Map<string, number>();
  for (const merge of sheet.merges) {
    const match = /^([A-Z]+\d+):([A-Z]+)\d+$/.exec(merge);
    if (match?.[1] && match[2]) columns.set(match[1], columnNumber(match[2]));
  }
  return columns;
}

function columnNumber(letters: string): number {
  let column = 0;
  for (const letter of letters) column = column * 26 + letter.charCodeAt(0) - 64;
  return column;
}

function tablesOf(region: Region, around: Surroundings, merges: Map<string, number>): Table[] {
  const tables: Table[] = [];
  let table: Table | null = null;
  let titles: Cell[] = [];
  const firstColumn = Math.min(...region.map(({ cells }) => cells[0]?.column ?? 1));
  for (const [at, row] of region.entries()) {
    const next = region[at + 1];
    if (isTitle(row, next, { around, merges, firstColumn })) {
      if (
        table &&
        table.rows.length + table.headings.length > 0 &&
        !opensTable(region, at + 1, table, around)
      )
        table.rows.push(row);
      else {
        if (table) table = null;
        titles.push(...row.cells);
      }
      continue;
    }
    const opens: boolean =
      table === null ||
      (table.rows.length > 0 && isHeadingRow(row, next, around, table)) ||
      widens(table, row, next, around);
    if (opens) {
      table = { titles, headings: [], rows: [], firstColumn, lastColumn: firstColumn };
      titles = [];
      tables.push(table);
    }
    const current = table as Table;
    if (current.rows.length === 0 && belongsToHeading(row, next, current, around)) current.headings.push(row);
    else current.rows.push(row);
    current.lastColumn = Math.max(current.lastColumn, row.cells.at(-1)?.column ?? 1);
  }
  return tables;
}

/** Under lines of label and value a wider row of heads begins the table that they speak for. */
function widens(table: Table, row: TableRow, next: TableRow | undefined, around: Surroundings): boolean {
  const isList =
    table.headings.length === 0 &&
    table.rows.length > 0 &&
    table.rows.every(({ cells }) => cells.length <= 2);
  if (!isList || row.cells.length < 3 || !next || next.cells.length < 3) return false;
  const first = around.kinds.of(row.cells[0] as Cell);
  if (first !== 'text' || !next.cells.some((cell) => around.kinds.of(cell) === 'value')) return false;
  return belongsToHeading(row, next, { ...table, rows: [], headings: [] }, around);
}

/** One text alone in its row; over columns to the right of the first it heads them instead. */
function isTitle(
  { cells }: TableRow,
  next: TableRow | undefined,
  { around, merges, firstColumn }: { around: Surroundings; merges: Map<string, number>; firstColumn: number },
): boolean {
  const [cell] = cells;
  if (cells.length !== 1 || !cell || around.kinds.of(cell) !== 'text') return false;
  if (cell.column > firstColumn && next && next.cells.length > 1) {
    const last = merges.get(cell.address) ?? cell.column;
    return !(last > cell.column || next.cells.some(({ column }) => column > cell.column));
  }
  return true;
}

function opensTable(region: Region, from: number, table: Table, around: Surroundings): boolean {
  for (let at = from; at < region.length; at += 1) {
    const row = region[at] as TableRow;
    const isAlone = row.cells.length === 1 && around.kinds.of(row.cells[0] as Cell) === 'text';
    if (!isAlone) return isHeadingRow(row, region[at + 1], around, table);
  }
  return false;
}
