import { useId, useMemo } from 'react';
import { LoadingBars } from '../../../components/ui/loading-bars';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useSheetRows } from '../hooks/use-sheet-rows';
import { parseAddress } from '../lib/cell-address';
import type { ReadingDoubt } from '../lib/doubt-answers';
import { mergesInSight, mergesOf } from '../lib/merges';
import { ColumnHeads, numbersBetween, SheetRow } from './sheet-rows';

const rowsBefore = 3;
const rowsAfter = 2;
const columnsBefore = 3;
const columnsAfter = 3;

/** Six rows around a doubted cell, for a page too narrow to show the sheet beside the question. */
export function DoubtExcerpt({ params, doubt }: { params: RevisionParams; doubt: ReadingDoubt }) {
  const idPrefix = `${useId()}-`;
  const place = parseAddress(doubt.cell) ?? { row: 1, column: 1 };
  const first = Math.max(place.row - rowsBefore, 1);
  const last = first + rowsBefore + rowsAfter;
  const rows = useSheetRows(params, doubt.sheet, { first, last });
  const { sheet } = rows;
  const letters = useMemo(() => new Map([[doubt.cell, doubt.letter]]), [doubt.cell, doubt.letter]);
  if (!sheet) return rows.error ? null : <LoadingBars what="Opening the rows around it." rows={2} />;
  const fromColumn = Math.max(place.column - columnsBefore, 1);
  const toColumn = Math.max(Math.min(place.column + columnsAfter, sheet.columnCount), place.column);
  const merges = mergesInSight(mergesOf(sheet), {
    from: { row: first, column: fromColumn },
    to: { row: last, column: toColumn },
  });
  return (
    <div className="sideways">
      <table className="sheet sheet-excerpt" aria-label={`Sheet ${doubt.sheet} around ${doubt.cell}`}>
        <thead>
          <ColumnHeads sheet={sheet} from={fromColumn} to={toColumn} />
        </thead>
        <tbody>
          {numbersBetween(first, last).map((row) => (
            <SheetRow
              key={row}
              row={row}
              fromColumn={fromColumn}
              toColumn={toColumn}
              content={rows.rowAt(row)}
              merges={merges.get(row)}
              isHidden={sheet.hiddenRows.includes(row)}
              letters={letters}
              cursorColumn={row === place.row ? place.column : null}
              block={null}
              idPrefix={idPrefix}
            />
          ))}
        </tbody>
      </table>
    </div>
  );
}
