import { describe, expect, it } from 'vitest';
import { mergesOf } from '../../../../web/features/reading/lib/merges';
import { isCursorKey, moveCursor, moveReach } from '../../../../web/features/reading/lib/move-cursor';

const sheet = { rowCount: 23, columnCount: 12 };

describe('the cell cursor', () => {
  it('moves by one cell with the arrow keys', () => {
    const from = { row: 12, column: 7 };
    expect(moveCursor({ from, key: 'ArrowDown', sheet, merges: [] })).toEqual({ row: 13, column: 7 });
    expect(moveCursor({ from, key: 'ArrowLeft', sheet, merges: [] })).toEqual({ row: 12, column: 6 });
  });

  it('stays inside the sheet at every edge', () => {
    expect(moveCursor({ from: { row: 1, column: 1 }, key: 'ArrowUp', sheet, merges: [] })).toEqual({
      row: 1,
      column: 1,
    });
    expect(moveCursor({ from: { row: 23, column: 12 }, key: 'ArrowRight', sheet, merges: [] })).toEqual({
      row: 23,
      column: 12,
    });
    expect(moveCursor({ from: { row: 20, column: 2 }, key: 'PageDown', sheet, merges: [] })).toEqual({
      row: 23,
      column: 2,
    });
  });

  it('goes to the first and last column of its row', () => {
    expect(moveCursor({ from: { row: 4, column: 5 }, key: 'Home', sheet, merges: [] }).column).toBe(1);
    expect(moveCursor({ from: { row: 4, column: 5 }, key: 'End', sheet, merges: [] }).column).toBe(12);
  });

  it('steps past the whole of a merged cell', () => {
    const merges = mergesOf({ ...sheet, merges: ['D4:F4'] });
    expect(moveCursor({ from: { row: 4, column: 4 }, key: 'ArrowRight', sheet, merges })).toEqual({
      row: 4,
      column: 7,
    });
  });

  it('lands on the cell that shows for a merge, from any side', () => {
    const merges = mergesOf({ ...sheet, merges: ['D4:F5'] });
    expect(moveCursor({ from: { row: 6, column: 5 }, key: 'ArrowUp', sheet, merges })).toEqual({
      row: 4,
      column: 4,
    });
    expect(moveCursor({ from: { row: 4, column: 7 }, key: 'ArrowLeft', sheet, merges })).toEqual({
      row: 4,
      column: 4,
    });
  });

  it('stretches a block cell by cell, through merges too', () => {
    expect(moveReach({ from: { row: 4, column: 4 }, key: 'ArrowRight', sheet })).toEqual({
      row: 4,
      column: 5,
    });
    expect(moveReach({ from: { row: 23, column: 4 }, key: 'ArrowDown', sheet })).toEqual({
      row: 23,
      column: 4,
    });
  });

  it('leaves letters and digits to the page', () => {
    expect(isCursorKey('ArrowUp')).toBe(true);
    expect(isCursorKey('1')).toBe(false);
    expect(isCursorKey('j')).toBe(false);
  });
});
