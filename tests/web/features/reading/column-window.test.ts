import { describe, expect, it } from 'vitest';
import { columnWindow } from '../../../../web/features/reading/lib/column-window';

const widths = (count: number) => Array.from({ length: count }, () => 70);

describe('the window of columns', () => {
  it('draws a sheet of 40 columns whole, wherever it stands', () => {
    expect(columnWindow({ widthsPx: widths(40), scrollPx: 1400, sightPx: 900 })).toEqual({
      first: 1,
      last: 40,
    });
  });

  it('draws a wider sheet as far as it is in sight and a little beyond', () => {
    // Columns of 70 px: 7000 px on, column 101 is the first in sight and column 113 reaches past 900 px more.
    expect(columnWindow({ widthsPx: widths(400), scrollPx: 7000, sightPx: 900 })).toEqual({
      first: 97,
      last: 117,
    });
  });

  it('ends with the last column', () => {
    expect(columnWindow({ widthsPx: widths(50), scrollPx: 2600, sightPx: 900 }).last).toBe(50);
  });
});
