import type { Cell } from './cell-grid';
import type { MappingReference } from './mapping';
import type { HeaderMatch, SheetIndex } from './sheet-index';

/** Finds, for a value's place, the cell that a reference means; null where the layout has none. */
export interface Locator {
  /** Header that the reference names, where it names one. */
  header: HeaderMatch | null;
  required: boolean;
  cellFor(value: { row: number; column: number }): Cell | null;
  /** Address of the cell, also where it is empty. */
  placeFor(value: { row: number; column: number }): { row: number; column: number } | null;
}

/**
 * Headers are looked for where the anchor stands: in its row for columns of values, in its column or crossing
 * its row for values to the right.
 */
export function locate(
  index: SheetIndex,
  anchor: Cell,
  axis: 'down' | 'right' | 'cross',
  reference: MappingReference,
): Locator {
  if ('below' in reference) {
    return locatorOf(index, null, false, ({ column }) => ({ row: anchor.row + reference.below, column }));
  }
  if ('key' in reference) {
    const keyRow = anchor.row + index.spanOf(anchor).rows;
    return locatorOf(index, null, true, ({ column }) => ({ row: keyRow, column }));
  }
  const matches = index.findHeader(reference.header);
  if (axis !== 'right') {
    const lastRow = anchor.row + index.spanOf(anchor).rows - 1;
    const header = matches.find((match) => match.cell.row >= anchor.row && match.cell.row <= lastRow) ?? null;
    return locatorOf(index, header, reference.required, ({ row }) =>
      header === null ? null : { row, column: header.cell.column },
    );
  }
  const beside = matches.find((match) => match.cell.column === anchor.column);
  const above = matches
    .filter((match) => match.cell.row < anchor.row && match.cell.column > anchor.column)
    .at(-1);
  const header = beside ?? above ?? null;
  return locatorOf(index, header, reference.required, ({ column }) => {
    if (header === null) return null;
    return header === beside
      ? { row: header.cell.row, column }
      : { row: anchor.row, column: header.cell.column };
  });
}

function locatorOf(
  index: SheetIndex,
  header: HeaderMatch | null,
  required: boolean,
  placeFor: Locator['placeFor'],
): Locator {
  return {
    header,
    required,
    placeFor,
    cellFor: (value) => {
      const place = placeFor(value);
      return place === null ? null : index.cellAt(place.row, place.column);
    },
  };
}
