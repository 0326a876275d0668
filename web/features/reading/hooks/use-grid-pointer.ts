import { type DOMAttributes, useRef } from 'react';
import type { GridActs } from '../components/sheet-grid';
import type { Place } from '../lib/first-place';

/** A press chooses a cell, a drag or a press with Shift a block. A finger scrolls, so it chooses by tapping alone. */
export function useGridPointer(
  cursor: Place,
  acts: GridActs,
): Pick<
  DOMAttributes<HTMLElement>,
  'onPointerDown' | 'onPointerOver' | 'onPointerUp' | 'onClick' | 'onDoubleClick'
> {
  const isDragging = useRef(false);
  return {
    onPointerDown: (event) => {
      const cell = cellOf(event.target);
      if (cell === null || event.pointerType !== 'mouse' || event.button !== 0) return;
      if (event.shiftKey) return acts.onReach(cell);
      isDragging.current = true;
      acts.onCursor({ sheet: cursor.sheet, cell });
    },
    onPointerOver: (event) => {
      if (event.buttons !== 1) isDragging.current = false;
      const cell = isDragging.current ? cellOf(event.target) : null;
      if (cell !== null) acts.onReach(cell === cursor.cell ? null : cell);
    },
    onPointerUp: () => {
      isDragging.current = false;
    },
    onClick: (event) => {
      const cell = cellOf(event.target);
      const isMouse = 'pointerType' in event.nativeEvent && event.nativeEvent.pointerType === 'mouse';
      if (cell !== null && !isMouse && !event.shiftKey) acts.onCursor({ sheet: cursor.sheet, cell });
    },
    onDoubleClick: (event) => {
      if (cellOf(event.target) !== null) acts.onOpen();
    },
  };
}

function cellOf(target: EventTarget): string | null {
  if (!(target instanceof Element)) return null;
  return target.closest<HTMLElement>('[data-cell]')?.dataset.cell ?? null;
}
