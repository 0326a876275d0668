import { type KeyboardEvent, useEffect, useId, useMemo, useRef, useState } from 'react';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import type { SheetRows } from '../hooks/use-sheet-rows';
import { addressOf, parseAddress } from '../lib/cell-address';
import { columnWidths } from '../lib/column-widths';
import type { Place } from '../lib/first-place';
import { mergedCells } from '../lib/merged-cells';
import { isCursorKey, moveCursor } from '../lib/move-cursor';
import { type RowWindow, rowWindow } from '../lib/row-window';
import { ColumnHeads, numbersBetween, SheetRow } from './sheet-rows';

const rowRem = 26 / 14;
const rowNumberRem = 36 / 14;
const fewestRows = 12;

/** A sheet in place with its own letters and numbers. Only the rows in sight are drawn, so a long sheet stays fast. */
export function SheetGridView({
  rows,
  window: shown,
  onWindow,
  cursor,
  onCursor,
  letters,
}: {
  rows: SheetRows;
  window: RowWindow;
  onWindow: (window: RowWindow) => void;
  cursor: Place;
  onCursor: (place: Place) => void;
  letters: ReadonlyMap<string, string>;
}) {
  const scroller = useRef<HTMLDivElement>(null);
  const idPrefix = `${useId()}-`;
  const { sheet } = rows;
  const rowCount = Math.max(sheet?.rowCount ?? 0, fewestRows);
  const widths = columnWidths(sheet ?? { columnCount: 0, columnWidths: {} });
  const columnCount = widths.length;
  const merged = useMemo(
    () =>
      mergedCells(sheet?.merges ?? [], {
        rowCount: sheet?.rowCount ?? 0,
        columnCount: sheet?.columnCount ?? 0,
      }),
    [sheet],
  );
  const rowPx = useRowPx();
  useCursorInSight(scroller, cursor, rowPx);
  if (!sheet) return <WithoutSheet rows={rows} name={cursor.sheet} />;

  const last = Math.min(shown.last, rowCount);
  const first = Math.min(shown.first, last);
  const onKeyDown = (event: KeyboardEvent) => {
    if (!isCursorKey(event.key) || event.altKey || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    const from = parseAddress(cursor.cell) ?? { row: 1, column: 1 };
    const next = moveCursor({ from, key: event.key, sheet: { rowCount, columnCount }, merged });
    onCursor({ sheet: cursor.sheet, cell: addressOf(next) });
  };
  const drawing = { ...rows, sheet, merged, letters, selected: cursor.cell, idPrefix };
  return (
    <>
      <p className="print-only small py-1">
        Printed: rows {first} to {last} of the {rowCount} of sheet {sheet.name}.
      </p>
      <div
        ref={scroller}
        className="sheet-scroll"
        onScroll={({ currentTarget }) =>
          onWindow(
            rowWindow({
              scrollPx: currentTarget.scrollTop,
              heightPx: currentTarget.clientHeight,
              rowPx,
              rowCount,
            }),
          )
        }
      >
        <table
          className="sheet sheet-whole"
          // biome-ignore lint/a11y/noNoninteractiveElementToInteractiveRole: the sheet is a grid whose cursor the arrow keys move.
          role="grid"
          aria-label={`Sheet ${sheet.name}`}
          aria-rowcount={rowCount + 1}
          aria-colcount={columnCount + 1}
          aria-activedescendant={`${idPrefix}${cursor.cell}`}
          tabIndex={0}
          onKeyDown={onKeyDown}
          style={{ minWidth: `${rowNumberRem + widths.reduce((sum, width) => sum + width, 0) / 14}rem` }}
        >
          <colgroup>
            <col style={{ width: `${rowNumberRem}rem` }} />
            {widths.map((width, index) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: a column is its place.
              <col key={index} style={{ width: `${width / 14}rem` }} />
            ))}
          </colgroup>
          <thead>
            <ColumnHeads sheet={sheet} to={columnCount} />
          </thead>
          <tbody>
            <Spacer rows={first - 1} />
            {numbersBetween(first, last).map((row) => (
              <SheetRow
                key={row}
                row={row}
                toColumn={columnCount}
                lastRow={last}
                drawing={drawing}
                onCell={(cell) => onCursor({ sheet: cursor.sheet, cell })}
              />
            ))}
            <Spacer rows={rowCount - last} />
          </tbody>
        </table>
      </div>
    </>
  );
}

/** Rows that are not drawn keep their height, so that the scroll bar tells the truth. */
function Spacer({ rows }: { rows: number }) {
  if (rows <= 0) return null;
  return (
    <tr className="sheet-spacer">
      <td style={{ height: `${rows * rowRem}rem` }} />
    </tr>
  );
}

function WithoutSheet({ rows, name }: { rows: SheetRows; name: string }) {
  if (rows.error) {
    return <ProblemNotice problem={asProblem(rows.error)} unaffected="What was read of it still stands." />;
  }
  return <LoadingBars what={`Opening sheet ${name}.`} rows={8} />;
}

function useRowPx(): number {
  const [rowPx, setRowPx] = useState(26);
  useEffect(() => {
    const rootPx = Number.parseFloat(getComputedStyle(document.documentElement).fontSize);
    if (Number.isFinite(rootPx)) setRowPx(rowRem * rootPx);
  }, []);
  return rowPx;
}

/** The cursor may be sent to a row that is not drawn, so the scroll position is reckoned, not looked up. */
function useCursorInSight(
  scroller: React.RefObject<HTMLDivElement | null>,
  cursor: Place,
  rowPx: number,
): void {
  useEffect(() => {
    const element = scroller.current;
    const place = parseAddress(cursor.cell);
    if (!element || !place) return;
    const top = (place.row - 1) * rowPx;
    const head = rowPx;
    if (top < element.scrollTop) element.scrollTop = Math.max(top - rowPx, 0);
    const bottom = top + 2 * rowPx + head;
    if (bottom > element.scrollTop + element.clientHeight) element.scrollTop = bottom - element.clientHeight;
    element
      .querySelector('[aria-selected="true"]')
      ?.scrollIntoView({ block: 'nearest', inline: 'nearest', behavior: 'instant' });
  }, [scroller, cursor, rowPx]);
}
