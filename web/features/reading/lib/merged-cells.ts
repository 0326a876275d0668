import { addressOf, parseRange } from './cell-address';

export interface MergedCells {
  /** How far the cell at an address reaches; only cells that start a merge are listed. */
  spans: Map<string, { rows: number; columns: number }>;
  /** Addresses that a merge covers, to the address that shows for them. */
  covered: Map<string, string>;
}

/** A merge of whole columns would cover a million addresses, so each is followed only as far as the sheet holds something. */
export function mergedCells(
  merges: readonly string[],
  sheet: { rowCount: number; columnCount: number },
): MergedCells {
  const spans: MergedCells['spans'] = new Map();
  const covered: MergedCells['covered'] = new Map();
  for (const merge of merges) {
    const range = parseRange(merge);
    if (!range) continue;
    const lastRow = Math.min(range.to.row, Math.max(sheet.rowCount, range.from.row));
    const lastColumn = Math.min(range.to.column, Math.max(sheet.columnCount, range.from.column));
    const first = addressOf(range.from);
    spans.set(first, { rows: lastRow - range.from.row + 1, columns: lastColumn - range.from.column + 1 });
    for (let row = range.from.row; row <= lastRow; row++) {
      for (let column = range.from.column; column <= lastColumn; column++) {
        const address = addressOf({ row, column });
        if (address !== first) covered.set(address, first);
      }
    }
  }
  return { spans, covered };
}
