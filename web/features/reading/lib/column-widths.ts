import type { SheetGrid } from '#rules/reading/cell-grid';

const usualCharacters = 8.43;
const pixelsPerCharacter = 7;
const paddingPx = 12;
const narrowestPx = 32;
const widestPx = 360;

/** Widths of columns 1 to `columnCount` in px at the default text size, from the sheet's own where it sets them. */
export function columnWidths(sheet: Pick<SheetGrid, 'columnCount' | 'columnWidths'>): number[] {
  return Array.from({ length: sheet.columnCount }, (_, index) => {
    const characters = sheet.columnWidths[String(index + 1)] ?? usualCharacters;
    const px = Math.round(characters * pixelsPerCharacter + paddingPx);
    return Math.min(Math.max(px, narrowestPx), widestPx);
  });
}
