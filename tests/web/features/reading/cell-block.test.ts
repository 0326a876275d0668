import { describe, expect, it } from 'vitest';
import {
  blockBetween,
  blockText,
  cellCount,
  isInBlock,
  parseBlock,
} from '../../../../web/features/reading/lib/cell-block';

describe('a block of cells', () => {
  it('reaches between two cells whichever was first', () => {
    const block = blockBetween({ row: 9, column: 6 }, { row: 4, column: 4 }, []);
    expect(blockText(block)).toBe('D4:F9');
    expect(cellCount(block)).toBe(18);
  });

  it('is one cell where both ends are the same', () => {
    const place = { row: 12, column: 7 };
    expect(blockText(blockBetween(place, place, []))).toBe('G12');
  });

  it('takes in the whole of a merge that it touches, and what that touches', () => {
    const merges = [
      { from: { row: 4, column: 4 }, to: { row: 4, column: 6 } },
      { from: { row: 4, column: 6 }, to: { row: 8, column: 6 } },
    ];
    const block = blockBetween({ row: 3, column: 4 }, { row: 4, column: 4 }, merges);
    expect(blockText(block)).toBe('D3:F8');
  });

  it('is read as it is typed, corners in any order and letters in any case', () => {
    const typed = parseBlock(' f9:d4 ');
    expect(typed && blockText(typed)).toBe('D4:F9');
    expect(parseBlock('somewhere')).toBeNull();
  });

  it('holds its corners and nothing beside them', () => {
    const block = { from: { row: 4, column: 4 }, to: { row: 9, column: 6 } };
    expect(isInBlock(block, { row: 4, column: 4 })).toBe(true);
    expect(isInBlock(block, { row: 9, column: 6 })).toBe(true);
    expect(isInBlock(block, { row: 10, column: 6 })).toBe(false);
    expect(isInBlock(block, { row: 9, column: 7 })).toBe(false);
  });
});
