import type { Cell } from '../cell-grid';
import type { SheetIndex } from '../sheet-index';
import { columnUnder, headingCells } from './column-heads';
import { decideKind } from './column-kind';
import { keepCorrected, takeTargets } from './rival-columns';
import { keepTellingKeys, nameRows, nameShares } from './row-names';
import type { Surroundings, Table } from './table';
import type { TableColumn } from './table-column';

export function tableColumns(
  table: Table,
  index: SheetIndex,
  around: Surroundings,
): Map<number, TableColumn> {
  const columns = new Map<number, TableColumn>();
  const numbers = new Set<number>();
  for (const { cells } of [...table.headings, ...table.rows])
    for (const { column } of cells) numbers.add(column);
  const heads = headingCells(table, index, around);
  const below = cellsByColumn(table);
  const hasDocuments = table.headings.some(({ cells }) =>
    cells.some(({ text }) => around.labels.read(text).keys.includes('document')),
  );
  for (const column of [...numbers].sort((a, b) => a - b)) {
    const described = columnUnder(column, heads.get(column) ?? [], around);
    const before = [...columns.values()];
    decideKind(described, below.get(column) ?? [], {
      around,
      hasDocuments,
      isFirst: before.length === 0,
      isBehindValues: before.some(({ kind }) => kind === 'value'),
    });
    columns.set(column, described);
  }
  takeTargets(columns);
  keepCorrected(columns);
  keepTellingKeys(columns, below);
  nameRows(columns, below, around);
  nameShares(columns, below);
  return columns;
}

export function cellsByColumn(table: Table): Map<number, Cell[]> {
  const below = new Map<number, Cell[]>();
  for (const { cells } of table.rows) {
    if (cells.length === 1 && table.lastColumn > table.firstColumn + 1) continue;
    for (const cell of cells) {
      const known = below.get(cell.column);
      if (known) known.push(cell);
      else below.set(cell.column, [cell]);
    }
  }
  return below;
}
