import { addressOf, type CellPlace, parseAddress } from './cell-address';
import type { MergedCells } from './merged-cells';

export type CursorKey =
  | 'ArrowUp'
  | 'ArrowDown'
  | 'ArrowLeft'
  | 'ArrowRight'
  | 'PageUp'
  | 'PageDown'
  | 'Home'
  | 'End';

const pageRows = 20;

const steps: Record<Exclude<CursorKey, 'Home' | 'End'>, CellPlace> = {
  ArrowUp: { row: -1, column: 0 },
  ArrowDown: { row: 1, column: 0 },
  ArrowLeft: { row: 0, column: -1 },
  ArrowRight: { row: 0, column: 1 },
  PageUp: { row: -pageRows, column: 0 },
  PageDown: { row: pageRows, column: 0 },
};

export function isCursorKey(key: string): key is CursorKey {
  return key in steps || key === 'Home' || key === 'End';
}

/** Where the cell cursor stands after a key: inside the sheet, past the whole of a merged cell, on the cell that shows. */
export function moveCursor(options: {
  from: CellPlace;
  key: CursorKey;
  sheet: { rowCount: number; columnCount: number };
  merged: MergedCells;
}): CellPlace {
  const { from, key, sheet, merged } = options;
  const wanted = target(from, key, merged.spans.get(addressOf(from)), sheet.columnCount);
  const inside = {
    row: clamp(wanted.row, sheet.rowCount),
    column: clamp(wanted.column, sheet.columnCount),
  };
  const shown = merged.covered.get(addressOf(inside));
  return (shown && parseAddress(shown)) || inside;
}

function target(
  from: CellPlace,
  key: CursorKey,
  span: { rows: number; columns: number } | undefined,
  columnCount: number,
): CellPlace {
  if (key === 'Home') return { row: from.row, column: 1 };
  if (key === 'End') return { row: from.row, column: columnCount };
  const step = steps[key];
  const past = {
    row: step.row > 0 ? (span?.rows ?? 1) - 1 : 0,
    column: step.column > 0 ? (span?.columns ?? 1) - 1 : 0,
  };
  return { row: from.row + step.row + past.row, column: from.column + step.column + past.column };
}

function clamp(value: number, last: number): number {
  return Math.min(Math.max(value, 1), Math.max(last, 1));
}
