import { sameValue } from './match-value';
import { isKeyRange, type KeyRange, type LimitTable, type TableCell } from './table';

type Row = LimitTable['rows'][number];

/** Whether a key cell covers a value: equal, or inside the range (`from` inclusive, `below` exclusive). */
export function keyCovers(cell: TableCell | undefined, value: number | string | boolean): boolean {
  if (cell === undefined || cell === null || Array.isArray(cell)) return false;
  if (!isKeyRange(cell)) return sameValue(numberIfWritten(cell, value), value);
  if (typeof value !== 'number') return false;
  return (cell.from === undefined || value >= cell.from) && (cell.below === undefined || value < cell.below);
}

/** Whether two rows could both match one mix. */
export function rowsOverlap(table: LimitTable, left: Row, right: Row): boolean {
  return table.keys.every((key) => cellsOverlap(left[key], right[key]));
}

function cellsOverlap(left: TableCell | undefined, right: TableCell | undefined): boolean {
  if (isKeyRange(left) && isKeyRange(right)) return rangesOverlap(left, right);
  if (isKeyRange(left)) return isScalar(right) && keyCovers(left, asNumber(right));
  if (isKeyRange(right)) return isScalar(left) && keyCovers(right, asNumber(left));
  return isScalar(left) && isScalar(right) && sameValue(asNumber(left), asNumber(right));
}

function rangesOverlap(left: KeyRange, right: KeyRange): boolean {
  const from = Math.max(left.from ?? -Infinity, right.from ?? -Infinity);
  const below = Math.min(left.below ?? Infinity, right.below ?? Infinity);
  return from < below;
}

function isScalar(cell: TableCell | undefined): cell is number | string | boolean {
  return typeof cell === 'number' || typeof cell === 'string' || typeof cell === 'boolean';
}

function asNumber(cell: number | string | boolean): number | string | boolean {
  return typeof cell === 'string' && /^-?\d+(\.\d+)?$/.test(cell) ? Number(cell) : cell;
}

/** A key written in quotes, `"12.5"`, still covers the number 12.5. */
function numberIfWritten(
  cell: number | string | boolean,
  value: number | string | boolean,
): number | string | boolean {
  return typeof value === 'number' ? asNumber(cell) : cell;
}
