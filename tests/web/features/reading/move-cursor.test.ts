import { describe, expect, it } from 'vitest';
import { mergedCells } from '../../../../web/features/reading/lib/merged-cells';
import { isCursorKey, moveCursor } from '../../../../web/features/reading/lib/move-cursor';

const sheet = { rowCount: 23, columnCount: 12 };
const plain = mergedCells([], sheet);

describe('the cell cursor', () => {
  it('moves by one cell with the arrow keys', () => {
    const from = { row: 12, column: 7 };
    expect(moveCursor({ from, key: 'ArrowDown', sheet, merged: plain })).toEqual({ row: 13, column: 7 });
    expect(moveCursor({ from, key: 'ArrowLeft', sheet, merged: plain })).toEqual({ row: 12, column: 6 });
  });

  it('stays inside the sheet at every edge', () => {
    expect(moveCursor({ from: { row: 1, column: 1 }, key: 'ArrowUp', sheet, merged: plain })).toEqual({
      row: 1,
      column: 1,
    });
    expect(moveCursor({ from: { row: 23, column: 12 }, key: 'ArrowRight', sheet, merged: plain })).toEqual({
      row: 23,
      column: 12,
    });
    expect(moveCursor({ from: { row: 20, column: 2 }, key: 'PageDown', sheet, merged: plain })).toEqual({
      row: 23,
      column: 2,
    });
  });

  it('goes to the first and last column of its row', () => {
    expect(moveCursor({ from: { row: 4, column: 5 }, key: 'Home', sheet, merged: plain }).column).toBe(1);
    expect(moveCursor({ from: { row: 4, column: 5 }, key: 'End', sheet, merged: plain }).column).toBe(12);
  });

  it('steps past the whole of a merged cell', () => {
    const merged = mergedCells(['D4:F4'], sheet);
    expect(moveCursor({ from: { row: 4, column: 4 }, key: 'ArrowRight', sheet, merged })).toEqual({
      row: 4,
      column: 7,
    });
  });

  it('lands on the cell that shows for a merge, from any side', () => {
    const merged = mergedCells(['D4:F5'], sheet);
    expect(moveCursor({ from: { row: 6, column: 5 }, key: 'ArrowUp', sheet, merged })).toEqual({
      row: 4,
      column: 4,
    });
    expect(moveCursor({ from: { row: 4, column: 7 }, key: 'ArrowLeft', sheet, merged })).toEqual({
      row: 4,
      column: 4,
    });
  });

  it('leaves letters and digits to the page', () => {
    expect(isCursorKey('ArrowUp')).toBe(true);
    expect(isCursorKey('1')).toBe(false);
    expect(isCursorKey('j')).toBe(false);
  });
});

describe('merged cells', () => {
  it('follows a merge of whole columns only as far as the sheet holds something', () => {
    const merged = mergedCells(['A1:B1048576'], sheet);
    expect(merged.spans.get('A1')).toEqual({ rows: 23, columns: 2 });
    expect(merged.covered.get('B23')).toBe('A1');
    expect(merged.covered.size).toBe(45);
  });
});
