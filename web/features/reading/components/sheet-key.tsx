import type { SheetGrid } from '#rules/reading/cell-grid';
import type { ReadingView } from '#shared/contracts/readings';

/** What the tints mean, and how many cells of the sheet carry each. */
export function SheetKey({
  reading,
  sheet,
  grid,
}: {
  reading: ReadingView;
  sheet: string;
  grid: SheetGrid | null;
}) {
  const counts = reading.sheets.find(({ name }) => name === sheet);
  const hides = grid !== null && grid.hiddenRows.length + grid.hiddenColumns.length > 0;
  return (
    <p className="sheet-key">
      <span className="key-read">{counts?.read ?? 0} read, with certainty</span>
      <span className="key-doubt">{counts?.doubts ?? 0} in doubt: answer at the letter</span>
      <span className="key-unused">{counts?.unused ?? 0} not used</span>
      {hides ? <span className="key-hidden">hidden in the workbook, read all the same</span> : null}
      <span className="key-words">
        Choose any cell to see or change what it was taken for. Your file is never changed.
      </span>
    </p>
  );
}
