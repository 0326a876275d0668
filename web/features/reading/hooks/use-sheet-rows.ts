import { useQueries, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { Cell, SheetGrid } from '#rules/reading/cell-grid';
import type { CellUse } from '#rules/reading/reading-result';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { sheetQuery } from '../../../lib/queries/sheet-query';
import { parseAddress } from '../lib/cell-address';
import { blockRows, blocksOf, type RowWindow } from '../lib/row-window';

/** What a row holds, by column. The same object as long as its block is the same, so that a drawn row stands still. */
export interface RowContent {
  cells: ReadonlyMap<number, Cell>;
  uses: ReadonlyMap<number, CellUse>;
}

interface SheetBlock {
  sheet: SheetGrid;
  uses: CellUse[];
}

export interface SheetRows {
  /** Names, merges and measures of the sheet; null until its first block is there. */
  sheet: SheetGrid | null;
  /** Undefined while the block of the row is not there, or where the row is empty. */
  rowAt: (row: number) => RowContent | undefined;
  isLoading: boolean;
  error: Error | null;
}

/** The rows of a sheet that a window shows, fetched in blocks; the first block always, for what it says of the sheet. */
export function useSheetRows(params: RevisionParams, sheetName: string, window: RowWindow): SheetRows {
  const blocks = [...new Set([1, ...blocksOf(window)])];
  const queryOf = (from: number) =>
    sheetQuery({ ...params, sheet: sheetName, from, to: from + blockRows - 1 });
  const rows = useQueries({ queries: blocks.map(queryOf), combine: combineBlocks });
  useNeighbours(queryOf, window, rows.sheet?.rowCount ?? 0);
  return rows;
}

export function contentAt(rows: SheetRows, address: string): { cell?: Cell; use?: CellUse } {
  const place = parseAddress(address);
  const content = place ? rows.rowAt(place.row) : undefined;
  const cell = place ? content?.cells.get(place.column) : undefined;
  const use = place ? content?.uses.get(place.column) : undefined;
  return { ...(cell ? { cell } : {}), ...(use ? { use } : {}) };
}

/** Fetched before they are in sight, so that a page that moves on shows no gap. */
function useNeighbours(
  queryOf: (from: number) => ReturnType<typeof sheetQuery>,
  window: RowWindow,
  rowCount: number,
): void {
  const client = useQueryClient();
  const near = blocksOf({
    first: Math.max(window.first - blockRows / 2, 1),
    last: Math.min(window.last + blockRows / 2, Math.max(rowCount, 1)),
  });
  const key = near.join(' ');
  // biome-ignore lint/correctness/useExhaustiveDependencies: the blocks near by are all that it goes by.
  useEffect(() => {
    for (const from of near) void client.prefetchQuery(queryOf(from));
  }, [key, client]);
}

function combineBlocks(
  results: { data?: SheetBlock | undefined; isPending: boolean; error: Error | null }[],
): SheetRows {
  const blocks = results.flatMap(({ data }) => (data ? [rowsOfBlock(data)] : []));
  return {
    sheet: results[0]?.data?.sheet ?? null,
    rowAt: (row) => blocks.find((block) => block.has(row))?.get(row),
    isLoading: results.some((result) => result.isPending),
    error: results.find((result) => result.error)?.error ?? null,
  };
}

interface FilledRow extends RowContent {
  cells: Map<number, Cell>;
  uses: Map<number, CellUse>;
}

const rowsByBlock = new WeakMap<SheetBlock, ReadonlyMap<number, RowContent>>();

function rowsOfBlock(block: SheetBlock): ReadonlyMap<number, RowContent> {
  const kept = rowsByBlock.get(block);
  if (kept) return kept;
  const rows = new Map<number, FilledRow>();
  const rowOf = (row: number): FilledRow => {
    const content = rows.get(row) ?? { cells: new Map(), uses: new Map() };
    rows.set(row, content);
    return content;
  };
  for (const cell of block.sheet.cells) rowOf(cell.row).cells.set(cell.column, cell);
  for (const use of block.uses) {
    const place = parseAddress(use.cell);
    if (place) rowOf(place.row).uses.set(place.column, use);
  }
  rowsByBlock.set(block, rows);
  return rows;
}
