import { useQueries } from '@tanstack/react-query';
import type { Cell, SheetGrid } from '#rules/reading/cell-grid';
import type { CellUse } from '#rules/reading/reading-result';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { sheetQuery } from '../../../lib/queries/sheet-query';
import { blockRows, blocksOf, type RowWindow } from '../lib/row-window';

export interface SheetRows {
  /** Names, merges and measures of the sheet; null until its first block is there. */
  sheet: SheetGrid | null;
  cells: Map<string, Cell>;
  uses: Map<string, CellUse>;
  isLoading: boolean;
  error: Error | null;
}

/** The rows of a sheet that a window shows, fetched in blocks; the first block always, for what it says of the sheet. */
export function useSheetRows(params: RevisionParams, sheetName: string, window: RowWindow): SheetRows {
  const blocks = [...new Set([1, ...blocksOf(window)])];
  return useQueries({
    queries: blocks.map((from) =>
      sheetQuery({ ...params, sheet: sheetName, from, to: from + blockRows - 1 }),
    ),
    combine: combineBlocks,
  });
}

function combineBlocks(
  results: {
    data?: { sheet: SheetGrid; uses: CellUse[] } | undefined;
    isPending: boolean;
    error: Error | null;
  }[],
): SheetRows {
  const cells = new Map<string, Cell>();
  const uses = new Map<string, CellUse>();
  for (const { data } of results) {
    for (const cell of data?.sheet.cells ?? []) cells.set(cell.address, cell);
    for (const use of data?.uses ?? []) uses.set(use.cell, use);
  }
  return {
    sheet: results[0]?.data?.sheet ?? null,
    cells,
    uses,
    isLoading: results.some((result) => result.isPending),
    error: results.find((result) => result.error)?.error ?? null,
  };
}
