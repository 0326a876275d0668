import { parseAddress } from '../cell-address';
import type { Cell } from '../cell-grid';
import type { Correction } from '../correction';
import type { SheetIndex } from '../sheet-index';
import type { CellKinds } from './cell-kind';
import type { ToldCells } from './told';

/** What people said of cells of this very workbook; what was said last of a cell holds. */
export function tellCorrections(
  told: ToldCells,
  corrections: readonly Correction[],
  { indexes, kinds }: { indexes: readonly SheetIndex[]; kinds: CellKinds },
): void {
  for (const correction of corrections.toReversed()) {
    const index = indexes.find(({ sheet }) => sheet.name === correction.sheet);
    if (!index) continue;
    for (const cell of cellsOf(correction, index, kinds)) {
      told.tell({ says: correction.says, by: 'correction', sheet: index.sheet.name, cell });
    }
  }
}

/** The cells that a correction means: words within a block of results are its headings and keys. */
export function cellsOf(
  { range, says }: Pick<Correction, 'range' | 'says'>,
  index: SheetIndex,
  kinds: CellKinds,
): Cell[] {
  const block = blockOf(range);
  if (block === null) return [];
  const cells = index.sheet.cells.filter(
    ({ row, column }) =>
      row >= block.top && row <= block.bottom && column >= block.left && column <= block.right,
  );
  if (says.kind !== 'reading' || cells.length < 2) return cells;
  return cells.filter((cell) => kinds.of(cell) === 'value' || kinds.of(cell) === 'none');
}

export interface Block {
  top: number;
  bottom: number;
  left: number;
  right: number;
}

/** The rows and columns of `C5` or `C5:D14`; null where it is no range. */
export function blockOf(range: string): Block | null {
  const [start = '', end = start] = range.split(':');
  const first = parseAddress(start);
  const last = parseAddress(end);
  if (!first || !last) return null;
  return {
    top: Math.min(first.row, last.row),
    bottom: Math.max(first.row, last.row),
    left: Math.min(first.column, last.column),
    right: Math.max(first.column, last.column),
  };
}
