import type { Cell } from './cell-grid';
import type { MappingRule } from './mapping';
import type { HeaderMatch, SheetIndex } from './sheet-index';

/** The filled cells that a rule's range holds from one anchor on, in reading order. */
export function valueCells(
  index: SheetIndex,
  rule: MappingRule,
  anchor: HeaderMatch,
  nextRow: number | null,
): Cell[] {
  const { cell } = anchor;
  const span = index.spanOf(cell);
  const most = rule.range.most ?? Number.POSITIVE_INFINITY;
  if (rule.axis === 'right') {
    const first = cell.column + span.columns + rule.range.skip;
    const last = Math.min(index.sheet.columnCount, first + most - 1);
    return cellsBetween(index, cell.row, cell.row, first, last);
  }
  const keyRows = rule.axis === 'cross' ? 1 : 0;
  const first = cell.row + span.rows + keyRows + rule.range.skip;
  const end = nextRow === null ? index.sheet.rowCount : nextRow - 1;
  const lastColumn = rule.axis === 'cross' ? cell.column + span.columns - 1 : cell.column;
  return cellsBetween(index, first, Math.min(end, first + most - 1), cell.column, lastColumn);
}

/** A merged cell counts once, at its own place. */
function cellsBetween(index: SheetIndex, top: number, bottom: number, left: number, right: number): Cell[] {
  const cells: Cell[] = [];
  for (let column = left; column <= right; column += 1) {
    cells.push(...index.columnCells(column).filter((cell) => cell.row >= top && cell.row <= bottom));
  }
  return cells.sort((a, b) => a.row - b.row || a.column - b.column);
}
