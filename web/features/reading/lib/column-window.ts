export interface ColumnWindow {
  first: number;
  last: number;
}

/** Up to so many columns are drawn whole; a wider sheet is drawn as far as it is in sight. */
const drawnWhole = 40;
const beyondColumns = 4;

export function columnWindow(options: {
  widthsPx: readonly number[];
  scrollPx: number;
  sightPx: number;
}): ColumnWindow {
  const { widthsPx, scrollPx, sightPx } = options;
  const count = widthsPx.length;
  if (count <= drawnWhole) return { first: 1, last: count };
  let right = 0;
  let first = count;
  let last = count;
  for (const [index, width] of widthsPx.entries()) {
    right += width;
    if (right > scrollPx) first = Math.min(first, index + 1);
    if (right >= scrollPx + sightPx) {
      last = index + 1;
      break;
    }
  }
  return { first: Math.max(first - beyondColumns, 1), last: Math.min(last + beyondColumns, count) };
}
