import type { CellPlace, CellRange } from './cell-address';
import { wholeCell } from './merges';

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

interface Step {
  from: CellPlace;
  key: CursorKey;
  sheet: { rowCount: number; columnCount: number };
}

/** Where the cell cursor stands after a key: inside the sheet, past the whole of a merged cell, on the cell that shows. */
export function moveCursor({ merges, ...step }: Step & { merges: readonly CellRange[] }): CellPlace {
  return wholeCell(merges, target(step, wholeCell(merges, step.from))).from;
}

/** Where the far end of a block stands after a key; what it covers is the block's to say. */
export function moveReach(step: Step): CellPlace {
  return target(step, { from: step.from, to: step.from });
}

function target({ key, sheet }: Step, whole: CellRange): CellPlace {
  if (key === 'Home') return { row: whole.from.row, column: 1 };
  if (key === 'End') return { row: whole.from.row, column: Math.max(sheet.columnCount, 1) };
  const step = steps[key];
  return {
    row: clamp((step.row > 0 ? whole.to : whole.from).row + step.row, sheet.rowCount),
    column: clamp((step.column > 0 ? whole.to : whole.from).column + step.column, sheet.columnCount),
  };
}

function clamp(value: number, last: number): number {
  return Math.min(Math.max(value, 1), Math.max(last, 1));
}
