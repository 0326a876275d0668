import type { KeyboardEvent } from 'react';
import type { GridActs } from '../components/sheet-grid';
import { addressOf, type CellRange, parseAddress } from '../lib/cell-address';
import type { Place } from '../lib/first-place';
import { isCursorKey, moveCursor, moveReach } from '../lib/move-cursor';

/** Arrows move the cursor, with Shift they choose a block from it, Enter asks what it is, Escape lets the block go. */
export function useGridKeys({
  cursor,
  reach,
  size,
  merges,
  acts,
}: {
  cursor: Place;
  reach: string | null;
  size: { rowCount: number; columnCount: number };
  merges: readonly CellRange[];
  acts: GridActs;
}): (event: KeyboardEvent) => void {
  return (event) => {
    const { key } = event;
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const start = parseAddress(cursor.cell) ?? { row: 1, column: 1 };
    if (isCursorKey(key) && event.shiftKey) {
      const from = (reach && parseAddress(reach)) || start;
      acts.onReach(addressOf(moveReach({ from, key, sheet: size })));
    } else if (isCursorKey(key)) {
      const cell = addressOf(moveCursor({ from: start, key, sheet: size, merges }));
      acts.onCursor({ sheet: cursor.sheet, cell });
    } else if (key === 'Enter') {
      acts.onOpen();
    } else if (key === 'Escape' && reach !== null) {
      acts.onReach(null);
    } else return;
    event.preventDefault();
  };
}
