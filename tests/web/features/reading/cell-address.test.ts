import { describe, expect, it } from 'vitest';
import {
  addressOf,
  columnLetters,
  parseAddress,
  parseRange,
} from '../../../../web/features/reading/lib/cell-address';

describe('cell addresses', () => {
  it.each([
    [1, 'A'],
    [26, 'Z'],
    [27, 'AA'],
    [52, 'AZ'],
    [53, 'BA'],
    [702, 'ZZ'],
    [703, 'AAA'],
    [16384, 'XFD'],
  ])('names column %i by the letters %s, as spreadsheets do', (column, letters) => {
    expect(columnLetters(column)).toBe(letters);
    expect(parseAddress(`${letters}1`)).toEqual({ row: 1, column });
  });

  it('reads an address with dollar signs or in small letters as the same cell', () => {
    expect(parseAddress('$g$12')).toEqual({ row: 12, column: 7 });
  });

  it.each(['', '12', 'G', 'G0', 'G12x', 'ABCD1'])('refuses %j as an address', (text) => {
    expect(parseAddress(text)).toBeNull();
  });

  it('takes a single cell as a range of one cell', () => {
    expect(parseRange('C4')).toEqual({ from: { row: 4, column: 3 }, to: { row: 4, column: 3 } });
  });

  it('writes a place as letters and row', () => {
    expect(addressOf({ row: 9, column: 28 })).toBe('AB9');
  });
});
