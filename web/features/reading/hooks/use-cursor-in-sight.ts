import { type RefObject, useEffect, useState } from 'react';
import { parseAddress } from '../lib/cell-address';
import type { Place } from '../lib/first-place';
import { rowNumberRem, rowRem } from '../lib/sheet-measures';

export function useRowPx(): number {
  const [rowPx, setRowPx] = useState(26);
  useEffect(() => {
    const rootPx = Number.parseFloat(getComputedStyle(document.documentElement).fontSize);
    if (Number.isFinite(rootPx)) setRowPx(rowRem * rootPx);
  }, []);
  return rowPx;
}

/** The cursor may be sent to a cell that is not drawn, so the scroll position is reckoned, not looked up. */
export function useCursorInSight({
  scroller,
  cursor,
  reach,
  rowPx,
  widths,
}: {
  scroller: RefObject<HTMLDivElement | null>;
  cursor: Place;
  /** The moving end of a block is what stays in sight while one is chosen. */
  reach: string | null;
  rowPx: number;
  widths: readonly number[];
}): void {
  const cell = reach ?? cursor.cell;
  useEffect(() => {
    const element = scroller.current;
    const place = parseAddress(cell);
    if (!element || !place) return;
    const top = (place.row - 1) * rowPx;
    if (top < element.scrollTop) element.scrollTop = Math.max(top - rowPx, 0);
    const bottom = top + 3 * rowPx;
    if (bottom > element.scrollTop + element.clientHeight) element.scrollTop = bottom - element.clientHeight;
    const scale = rowPx / (rowRem * 14);
    const left = sum(widths.slice(0, place.column - 1)) * scale;
    const right = left + (widths[place.column - 1] ?? 0) * scale;
    const numbersPx = rowNumberRem * 14 * scale;
    if (left < element.scrollLeft) element.scrollLeft = left;
    const sightPx = element.clientWidth - numbersPx;
    if (right > element.scrollLeft + sightPx) element.scrollLeft = right - sightPx;
  }, [scroller, cell, rowPx, widths]);
}

function sum(widths: readonly number[]): number {
  return widths.reduce((total, width) => total + width, 0);
}
