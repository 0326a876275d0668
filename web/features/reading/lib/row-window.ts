/** The server sends a sheet in blocks of this many rows; a block is fetched once and kept. */
export const blockRows = 200;

export interface RowWindow {
  first: number;
  last: number;
}

/** Rows to draw for a scroll position, with some beyond each edge so that a moving page shows no gap. */
export function rowWindow(options: {
  scrollPx: number;
  heightPx: number;
  rowPx: number;
  rowCount: number;
  beyondRows?: number;
}): RowWindow {
  const beyond = options.beyondRows ?? 12;
  const last = Math.max(options.rowCount, 1);
  const top = Math.floor(Math.max(options.scrollPx, 0) / options.rowPx) + 1;
  const shown = Math.ceil(options.heightPx / options.rowPx) + 1;
  return {
    first: Math.min(Math.max(top - beyond, 1), last),
    last: Math.min(top + shown + beyond, last),
  };
}

const rowsAStep = 10;

/** The window in whole steps: drawing rows costs more than scrolling them, so most frames of a scroll draw none. */
export function inSteps({ first, last }: RowWindow): RowWindow {
  return {
    first: Math.floor((first - 1) / rowsAStep) * rowsAStep + 1,
    last: Math.ceil(last / rowsAStep) * rowsAStep,
  };
}

/** First rows of the blocks that a window touches: rows 1 to 200 are block 1, 201 to 400 block 201. */
export function blocksOf(window: RowWindow): number[] {
  const blocks: number[] = [];
  for (let from = blockStart(window.first); from <= window.last; from += blockRows) blocks.push(from);
  return blocks;
}

export function blockStart(row: number): number {
  return Math.floor((row - 1) / blockRows) * blockRows + 1;
}
