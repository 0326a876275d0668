import { useMemo, useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useSheetRows } from '../hooks/use-sheet-rows';
import { parseAddress } from '../lib/cell-address';
import type { Place } from '../lib/first-place';
import { type RowWindow, rowWindow } from '../lib/row-window';
import { FormulaLine } from './formula-line';
import { SheetGridView } from './sheet-grid';
import { SheetTabs } from './sheet-tabs';

const rowsBefore = 20;
const rowsShown = 60;

/** The uploaded sheet in place: formula line, grid, the workbook's own tabs, and what the tints mean. */
export function SheetView({
  params,
  reading,
  cursor,
  onCursor,
}: {
  params: RevisionParams;
  reading: ReadingView;
  cursor: Place;
  onCursor: (place: Place) => void;
}) {
  const [scrolled, setScrolled] = useState<{ sheet: string; window: RowWindow } | null>(null);
  const window = scrolled?.sheet === cursor.sheet ? scrolled.window : windowAround(cursor);
  const rows = useSheetRows(params, cursor.sheet, window);
  const letters = useMemo(
    () =>
      new Map(
        reading.doubts
          .filter((doubt) => doubt.sheet === cursor.sheet)
          .map((doubt) => [doubt.cell, doubt.letter] as const),
      ),
    [reading.doubts, cursor.sheet],
  );
  return (
    <section className="sheet-view" aria-label="The workbook as uploaded">
      <FormulaLine
        cursor={cursor}
        onCursor={onCursor}
        cell={rows.cells.get(cursor.cell)}
        use={rows.uses.get(cursor.cell)}
        reading={reading}
      />
      <SheetGridView
        key={cursor.sheet}
        rows={rows}
        window={window}
        onWindow={(next) => setScrolled({ sheet: cursor.sheet, window: next })}
        cursor={cursor}
        onCursor={onCursor}
        letters={letters}
      />
      <SheetTabs params={params} sheets={reading.sheets} current={cursor.sheet} />
      <p className="sheet-key">
        <span className="key-read">read, with certainty</span>
        <span className="key-doubt">read, in doubt: answer at its letter</span>
        <span className="key-unused">not used</span>
        <span className="key-words">
          Choose any cell to see what it was taken for. Your file is never changed.
        </span>
      </p>
    </section>
  );
}

/** Before the first scroll: the rows around the cursor. */
function windowAround(cursor: Place): RowWindow {
  const row = parseAddress(cursor.cell)?.row ?? 1;
  const from = Math.max(row - rowsBefore, 0);
  return rowWindow({ scrollPx: from, heightPx: rowsShown, rowPx: 1, rowCount: Number.MAX_SAFE_INTEGER });
}
