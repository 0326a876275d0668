import { useMemo, useState } from 'react';
import type { ReadingView } from '#shared/contracts/readings';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import type { ChosenCells } from '../hooks/use-chosen-cells';
import { contentAt, useSheetRows } from '../hooks/use-sheet-rows';
import { parseAddress } from '../lib/cell-address';
import type { Place } from '../lib/first-place';
import { type RowWindow, rowWindow } from '../lib/row-window';
import { FormulaLine } from './formula-line';
import { SheetGridView } from './sheet-grid';
import { SheetKey } from './sheet-key';
import { SheetTabs } from './sheet-tabs';

const rowsBefore = 20;
const rowsShown = 60;

/** The uploaded sheet in place: formula line, grid, the workbook's own tabs, and what the tints mean. */
export function SheetView({
  params,
  reading,
  chosen,
  onOpen,
}: {
  params: RevisionParams;
  reading: ReadingView;
  chosen: ChosenCells;
  /** Asks what the chosen cells are. */
  onOpen: () => void;
}) {
  const { cursor, reach, block, setCursor, setReach } = chosen;
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
  const onWindow = (next: RowWindow) =>
    setScrolled((now) =>
      now?.sheet === cursor.sheet && now.window.first === next.first && now.window.last === next.last
        ? now
        : { sheet: cursor.sheet, window: next },
    );
  return (
    <section className="sheet-view" aria-label="The workbook as uploaded">
      <FormulaLine
        cursor={cursor}
        onCursor={setCursor}
        block={reach === null ? null : block}
        content={contentAt(rows, cursor.cell)}
        reading={reading}
        onOpen={reading.abilities.answer ? onOpen : null}
      />
      <SheetGridView
        key={cursor.sheet}
        rows={rows}
        window={window}
        onWindow={onWindow}
        cursor={cursor}
        reach={reach}
        block={reach === null ? null : block}
        letters={letters}
        acts={{ onCursor: setCursor, onReach: setReach, onOpen }}
      />
      <SheetTabs params={params} sheets={reading.sheets} current={cursor.sheet} />
      <SheetKey reading={reading} sheet={cursor.sheet} grid={rows.sheet} />
    </section>
  );
}

/** Before the first scroll: the rows around the cursor. */
function windowAround(cursor: Place): RowWindow {
  const row = parseAddress(cursor.cell)?.row ?? 1;
  const from = Math.max(row - rowsBefore, 0);
  return rowWindow({ scrollPx: from, heightPx: rowsShown, rowPx: 1, rowCount: Number.MAX_SAFE_INTEGER });
}
