/** A row of a drawn sheet, and its numbers at the left edge. */
export const rowRem = 26 / 14;
export const rowNumberRem = 36 / 14;

export const sheetGridId = 'sheet-grid';
