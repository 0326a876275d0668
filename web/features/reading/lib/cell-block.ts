import { addressOf, type CellPlace, type CellRange, parseRange } from './cell-address';
import { wholeCell } from './merges';

/** The block between two cells; a merge that it touches belongs to it whole, as in any sheet. */
export function blockBetween(one: CellPlace, other: CellPlace, merges: readonly CellRange[]): CellRange {
  let block = around(wholeCell(merges, one), wholeCell(merges, other));
  for (;;) {
    const wider = merges.filter((merge) => touches(merge, block)).reduce(around, block);
    if (blockText(wider) === blockText(block)) return block;
    block = wider;
  }
}

/** `D6:F20`, or `D6` where it is one cell. */
export function blockText({ from, to }: CellRange): string {
  const first = addressOf(from);
  const last = addressOf(to);
  return first === last ? first : `${first}:${last}`;
}

/** A block as it was typed, its corners in the order of the sheet; null for what names none. */
export function parseBlock(text: string): CellRange | null {
  const range = parseRange(text.trim());
  return range && around(range, range);
}

export function isInBlock({ from, to }: CellRange, { row, column }: CellPlace): boolean {
  return row >= from.row && row <= to.row && column >= from.column && column <= to.column;
}

export function cellCount({ from, to }: CellRange): number {
  return (to.row - from.row + 1) * (to.column - from.column + 1);
}

function around(one: CellRange, other: CellRange): CellRange {
  const rows = [one.from.row, one.to.row, other.from.row, other.to.row];
  const columns = [one.from.column, one.to.column, other.from.column, other.to.column];
  return {
    from: { row: Math.min(...rows), column: Math.min(...columns) },
    to: { row: Math.max(...rows), column: Math.max(...columns) },
  };
}

function touches(one: CellRange, other: CellRange): boolean {
  return (
    one.from.row <= other.to.row &&
    one.to.row >= other.from.row &&
    one.from.column <= other.to.column &&
    one.to.column >= other.from.column
  );
}
