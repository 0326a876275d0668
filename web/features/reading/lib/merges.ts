import { addressOf, type CellPlace, type CellRange, parseRange } from './cell-address';

/** A merge as far as it is drawn: a window of a sheet cuts what reaches out of it. */
export interface DrawnMerge {
  rows: number;
  columns: number;
  /** The cell whose content shows, which may itself be out of sight. */
  shows: string;
}

/** By row, then column: where a merge begins to be drawn, or null where one covers the place. */
export type MergesInSight = ReadonlyMap<number, ReadonlyMap<number, DrawnMerge | null>>;

/** A merge of whole columns would cover a million places, so each is followed only as far as the sheet holds something. */
export function mergesOf(sheet: {
  merges: readonly string[];
  rowCount: number;
  columnCount: number;
}): CellRange[] {
  return sheet.merges.flatMap((text) => {
    const range = parseRange(text);
    if (!range) return [];
    const row = Math.min(range.to.row, Math.max(sheet.rowCount, range.from.row));
    const column = Math.min(range.to.column, Math.max(sheet.columnCount, range.from.column));
    return [{ from: range.from, to: { row, column } }];
  });
}

/** The merge that a place belongs to, or the place alone. */
export function wholeCell(merges: readonly CellRange[], place: CellPlace): CellRange {
  return merges.find((merge) => holds(merge, place)) ?? { from: place, to: place };
}

export function mergesInSight(merges: readonly CellRange[], sight: CellRange): MergesInSight {
  const rows = new Map<number, Map<number, DrawnMerge | null>>();
  for (const merge of merges) {
    const drawn = cut(merge, sight);
    if (!drawn) continue;
    for (let row = drawn.from.row; row <= drawn.to.row; row++) {
      const columns = rows.get(row) ?? new Map<number, DrawnMerge | null>();
      rows.set(row, columns);
      for (let column = drawn.from.column; column <= drawn.to.column; column++) columns.set(column, null);
    }
    rows.get(drawn.from.row)?.set(drawn.from.column, {
      rows: drawn.to.row - drawn.from.row + 1,
      columns: drawn.to.column - drawn.from.column + 1,
      shows: addressOf(merge.from),
    });
  }
  return rows;
}

function cut(range: CellRange, sight: CellRange): CellRange | null {
  const from = {
    row: Math.max(range.from.row, sight.from.row),
    column: Math.max(range.from.column, sight.from.column),
  };
  const to = {
    row: Math.min(range.to.row, sight.to.row),
    column: Math.min(range.to.column, sight.to.column),
  };
  return from.row <= to.row && from.column <= to.column ? { from, to } : null;
}

function holds({ from, to }: CellRange, { row, column }: CellPlace): boolean {
  return row >= from.row && row <= to.row && column >= from.column && column <= to.column;
}
