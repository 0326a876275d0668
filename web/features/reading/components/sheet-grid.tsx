import { useId, useMemo, useRef, useState } from 'react';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import { useCursorInSight, useRowPx } from '../hooks/use-cursor-in-sight';
import { useGridKeys } from '../hooks/use-grid-keys';
import { useGridPointer } from '../hooks/use-grid-pointer';
import type { SheetRows } from '../hooks/use-sheet-rows';
import { type CellRange, parseAddress } from '../lib/cell-address';
import { columnWidths } from '../lib/column-widths';
import { type ColumnWindow, columnWindow } from '../lib/column-window';
import type { Place } from '../lib/first-place';
import { mergesInSight, mergesOf } from '../lib/merges';
import { inSteps, type RowWindow, rowWindow } from '../lib/row-window';
import { rowNumberRem, rowRem, sheetGridId } from '../lib/sheet-measures';
import { ColumnHeads, numbersBetween, SheetRow } from './sheet-rows';

const fewestRows = 12;

export interface GridActs {
  onCursor: (place: Place) => void;
  /** The far end of a block that begins at the cursor; null for none. */
  onReach: (cell: string | null) => void;
  /** Asks what the cell or block at the cursor is. */
  onOpen: () => void;
}

/** A sheet in place with its own letters and numbers. Only what is in sight is drawn, so a long sheet stays fast. */
export function SheetGridView({
  rows,
  window: shown,
  onWindow,
  cursor,
  reach,
  block,
  letters,
  acts,
}: {
  rows: SheetRows;
  window: RowWindow;
  onWindow: (window: RowWindow) => void;
  cursor: Place;
  reach: string | null;
  /** What is chosen beyond the cell at the cursor. */
  block: CellRange | null;
  letters: ReadonlyMap<string, string>;
  acts: GridActs;
}) {
  const scroller = useRef<HTMLDivElement>(null);
  const idPrefix = `${useId()}-`;
  const { sheet } = rows;
  const rowCount = Math.max(sheet?.rowCount ?? 0, fewestRows);
  const widths = useMemo(() => columnWidths(sheet ?? { columnCount: 0, columnWidths: {} }), [sheet]);
  const columnCount = widths.length;
  const merges = useMemo(() => (sheet ? mergesOf(sheet) : []), [sheet]);
  const hiddenRows = useMemo(() => new Set(sheet?.hiddenRows), [sheet]);
  const rowPx = useRowPx();
  const [seen, setSeen] = useState<ColumnWindow | null>(null);
  useCursorInSight({ scroller, cursor, reach, rowPx, widths });
  const size = { rowCount, columnCount };
  const onKeyDown = useGridKeys({ cursor, reach, size, merges, acts });
  const pointer = useGridPointer(cursor, acts);
  if (!sheet) return <WithoutSheet rows={rows} name={cursor.sheet} />;

  const last = Math.min(shown.last, rowCount);
  const first = Math.min(shown.first, last);
  const columns = seen ?? columnWindow({ widthsPx: widths, scrollPx: 0, sightPx: 1600 });
  const inSight = mergesInSight(merges, {
    from: { row: first, column: columns.first },
    to: { row: last, column: columns.last },
  });
  const at = parseAddress(cursor.cell);
  const onScroll = ({ currentTarget }: React.UIEvent<HTMLElement>) => {
    const { scrollTop, scrollLeft, clientHeight, clientWidth } = currentTarget;
    onWindow(inSteps(rowWindow({ scrollPx: scrollTop, heightPx: clientHeight, rowPx, rowCount })));
    const next = columnWindow({ widthsPx: widths, scrollPx: scrollLeft, sightPx: clientWidth });
    setSeen((now) => (now?.first === next.first && now.last === next.last ? now : next));
  };
  return (
    <>
      <p className="print-only small py-1">
        Printed: rows {first} to {last} of the {rowCount} of sheet {sheet.name}.
      </p>
      <div ref={scroller} className="sheet-scroll" onScroll={onScroll}>
        <table
          id={sheetGridId}
          className="sheet sheet-whole"
          // biome-ignore lint/a11y/noNoninteractiveElementToInteractiveRole: the sheet is a grid whose cursor the arrow keys move.
          role="grid"
          aria-label={`Sheet ${sheet.name}`}
          aria-rowcount={rowCount + 1}
          aria-colcount={columnCount + 1}
          aria-multiselectable="true"
          aria-activedescendant={`${idPrefix}${reach ?? cursor.cell}`}
          tabIndex={0}
          onKeyDown={onKeyDown}
          {...pointer}
          style={{ minWidth: `${rowNumberRem + widths.reduce((sum, width) => sum + width, 0) / 14}rem` }}
        >
          <colgroup>
            <col style={{ minWidth: `${rowNumberRem}rem` }} />
            {widths.map((width, index) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: a column is its place.
              <col key={index} style={{ width: `${width / 14}rem` }} />
            ))}
          </colgroup>
          <thead>
            <ColumnHeads sheet={sheet} from={columns.first} to={columns.last} isGrid />
          </thead>
          <tbody>
            <Spacer rows={first - 1} />
            {numbersBetween(first, last).map((row) => (
              <SheetRow
                key={row}
                row={row}
                fromColumn={columns.first}
                toColumn={columns.last}
                content={rows.rowAt(row)}
                widths={widths}
                merges={inSight.get(row)}
                isHidden={hiddenRows.has(row)}
                letters={letters}
                cursorColumn={at?.row === row ? at.column : null}
                block={block && row >= block.from.row && row <= block.to.row ? block : null}
                idPrefix={idPrefix}
                isGrid
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
