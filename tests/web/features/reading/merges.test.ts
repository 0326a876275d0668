import { describe, expect, it } from 'vitest';
import { mergesInSight, mergesOf, wholeCell } from '../../../../web/features/reading/lib/merges';

const sheet = { rowCount: 23, columnCount: 12 };
const cells = (fromRow: number, fromColumn: number, toRow: number, toColumn: number) => ({
  from: { row: fromRow, column: fromColumn },
  to: { row: toRow, column: toColumn },
});

describe('merged cells', () => {
  it('follows a merge of whole columns only as far as the sheet holds something', () => {
    expect(mergesOf({ ...sheet, merges: ['A1:B1048576'] })).toEqual([cells(1, 1, 23, 2)]);
  });

  it('takes a place inside a merge for the whole of it, and any other for itself', () => {
    const merges = mergesOf({ ...sheet, merges: ['D4:F5'] });
    expect(wholeCell(merges, { row: 5, column: 6 })).toEqual(cells(4, 4, 5, 6));
    expect(wholeCell(merges, { row: 6, column: 6 })).toEqual(cells(6, 6, 6, 6));
  });

  it('draws a merge where it begins and nothing at the places it covers', () => {
    const drawn = mergesInSight(mergesOf({ ...sheet, merges: ['D4:E5'] }), cells(1, 1, 23, 12));
    expect(drawn.get(4)?.get(4)).toEqual({ rows: 2, columns: 2, shows: 'D4' });
    expect(drawn.get(4)?.get(5)).toBeNull();
    expect(drawn.get(5)?.get(4)).toBeNull();
    expect(drawn.get(6)).toBeUndefined();
  });

  it('cuts a merge that begins above what is in sight to its rows that are, so that no column shifts', () => {
    const drawn = mergesInSight(mergesOf({ ...sheet, merges: ['A2:A20'] }), cells(10, 1, 15, 12));
    expect(drawn.get(10)?.get(1)).toEqual({ rows: 6, columns: 1, shows: 'A2' });
    expect(drawn.get(15)?.get(1)).toBeNull();
    expect(drawn.get(16)).toBeUndefined();
  });

  it('cuts a merge that begins left of what is in sight', () => {
    const drawn = mergesInSight(mergesOf({ ...sheet, merges: ['A1:L1'] }), cells(1, 5, 9, 8));
    expect(drawn.get(1)?.get(5)).toEqual({ rows: 1, columns: 4, shows: 'A1' });
  });
});
