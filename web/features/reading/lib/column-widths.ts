import type { SheetGrid } from '#rules/reading/cell-grid';

const usualCharacters = 8.43;
const pixelsPerCharacter = 7;
const paddingPx = 12;
const narrowestPx = 32;
const widestPx = 360;

/** A sheet narrower than this is drawn with empty columns beside it, as any sheet has. */
const fullPx = 860;
const mostEmptyColumns = 12;

/** Widths of the columns to draw, in px at the default text size, from the sheet's own where it sets them. */
export function columnWidths(sheet: Pick<SheetGrid, 'columnCount' | 'columnWidths'>): number[] {
  const widths: number[] = [];
  const widthOf = (column: number) => clamp(sheet.columnWidths[String(column)] ?? usualCharacters);
  for (let column = 1; column <= sheet.columnCount; column++) widths.push(widthOf(column));
  const emptyPx = clamp(usualCharacters);
  for (let empty = 0; empty < mostEmptyColumns; empty++) {
    if (widths.reduce((sum, width) => sum + width, 0) + emptyPx > fullPx) break;
    widths.push(emptyPx);
  }
  return widths;
}

function clamp(characters: number): number {
  const px = Math.round(characters * pixelsPerCharacter + paddingPx);
  return Math.min(Math.max(px, narrowestPx), widestPx);
}
