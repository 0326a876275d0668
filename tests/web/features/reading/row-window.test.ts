import { describe, expect, it } from 'vitest';
import { blockStart, blocksOf, inSteps, rowWindow } from '../../../../web/features/reading/lib/row-window';

describe('the window of rows', () => {
  it('starts at the first row and ends with the sheet', () => {
    expect(rowWindow({ scrollPx: 0, heightPx: 520, rowPx: 26, rowCount: 23 })).toEqual({
      first: 1,
      last: 23,
    });
  });

  it('draws only what is in sight and a little beyond, however long the sheet is', () => {
    const window = rowWindow({
      scrollPx: 26 * 5000,
      heightPx: 520,
      rowPx: 26,
      rowCount: 100_000,
      beyondRows: 10,
    });
    expect(window).toEqual({ first: 4991, last: 5032 });
  });

  it('moves on in steps that hold all that is in sight', () => {
    expect(inSteps({ first: 4991, last: 5032 })).toEqual({ first: 4991, last: 5040 });
    expect(inSteps({ first: 4992, last: 5033 })).toEqual({ first: 4991, last: 5040 });
    expect(inSteps({ first: 1, last: 23 })).toEqual({ first: 1, last: 30 });
  });

  it('names the one block of a short sheet', () => {
    expect(blocksOf({ first: 1, last: 23 })).toEqual([1]);
  });

  it('names both blocks where a window crosses their edge', () => {
    expect(blocksOf({ first: 195, last: 230 })).toEqual([1, 201]);
  });

  it('keeps row 200 in the first block and row 201 in the second', () => {
    expect(blockStart(200)).toBe(1);
    expect(blockStart(201)).toBe(201);
  });
});
