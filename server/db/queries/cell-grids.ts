import { and, asc, desc, eq, getTableColumns, gte, lte } from 'drizzle-orm';
import type { Cell, CellGrid, SheetGrid } from '#rules/reading/cell-grid';
import type { Database } from '../client';
import { cellBlocks, cellGrids, files } from '../schema/files';
import { ofTenant, type Reader } from './reader';

/** Rows in one block: a window of a sheet reads one or two blocks, and a block stays well below a packet. */
const rowsPerBlock = 200;
const cellsPerBlock = 20_000;

interface StoreGrid {
  reader: Reader;
  fileId: string;
  grid: CellGrid;
  now: Date;
  newId: () => string;
}

/** Keeps a decoded workbook by sheet and row block; a workbook that is kept already stays as it is. */
export async function storeGrid(db: Database, stored: StoreGrid): Promise<void> {
  const { reader, fileId, grid, now, newId } = stored;
  const [kept] = await db
    .select({ id: cellGrids.id })
    .from(cellGrids)
    .innerJoin(files, eq(files.id, cellGrids.fileId))
    .where(and(eq(cellGrids.fileId, fileId), eq(cellGrids.decoder, grid.decoder), ofTenant(files, reader)));
  if (kept !== undefined) return;
  const gridId = newId();
  await db.insert(cellGrids).values({
    id: gridId,
    fileId,
    decoder: grid.decoder,
    date1904: grid.date1904,
    properties: grid.properties,
    sheets: grid.sheets.map(({ cells: _, ...sheet }) => sheet),
    createdAt: now,
  });
  for (const [sheet, { cells }] of grid.sheets.entries()) {
    for (const block of blocksOf(cells)) {
      await db.insert(cellBlocks).values({ id: newId(), gridId, sheet, ...block });
    }
  }
}

/** The whole grid of a workbook by the newest decoder that read it, or null. */
export async function loadGrid(db: Database, reader: Reader, fileId: string): Promise<CellGrid | null> {
  const head = await gridOf(db, reader, fileId);
  if (head === null) return null;
  const blocks = await db
    .select({ sheet: cellBlocks.sheet, cells: cellBlocks.cells })
    .from(cellBlocks)
    .innerJoin(cellGrids, eq(cellGrids.id, cellBlocks.gridId))
    .innerJoin(files, eq(files.id, cellGrids.fileId))
    .where(and(eq(cellBlocks.gridId, head.id), ofTenant(files, reader)))
    .orderBy(asc(cellBlocks.sheet), asc(cellBlocks.fromRow));
  const cells = head.sheets.map((): Cell[] => []);
  for (const block of blocks) for (const cell of block.cells) cells[block.sheet]?.push(cell);
  return {
    decoder: head.decoder,
    date1904: head.date1904,
    properties: head.properties,
    sheets: head.sheets.map((sheet, index) => ({ ...sheet, cells: cells[index] ?? [] })),
  };
}

/** Rows of one sheet, both ends included; null where the workbook has no such sheet. */
export async function loadSheet(
  db: Database,
  reader: Reader,
  { fileId, name, from, to }: { fileId: string; name: string; from: number; to: number },
): Promise<SheetGrid | null> {
  const head = await gridOf(db, reader, fileId);
  const index = head?.sheets.findIndex((sheet) => sheet.name === name) ?? -1;
  const sheet = head?.sheets[index];
  if (head === null || sheet === undefined) return null;
  const blocks = await db
    .select({ cells: cellBlocks.cells })
    .from(cellBlocks)
    .innerJoin(cellGrids, eq(cellGrids.id, cellBlocks.gridId))
    .innerJoin(files, eq(files.id, cellGrids.fileId))
    .where(
      and(
        eq(cellBlocks.gridId, head.id),
        ofTenant(files, reader),
        eq(cellBlocks.sheet, index),
        lte(cellBlocks.fromRow, to),
        gte(cellBlocks.toRow, from),
      ),
    )
    .orderBy(asc(cellBlocks.fromRow));
  const cells = blocks.flatMap((block) => block.cells).filter(({ row }) => row >= from && row <= to);
  return { ...sheet, cells };
}

export async function gridOf(db: Database, reader: Reader, fileId: string) {
  const [head] = await db
    .select(getTableColumns(cellGrids))
    .from(cellGrids)
    .innerJoin(files, eq(files.id, cellGrids.fileId))
    .where(and(eq(cellGrids.fileId, fileId), ofTenant(files, reader)))
    .orderBy(desc(cellGrids.createdAt), desc(cellGrids.id))
    .limit(1);
  return head ?? null;
}

interface CellBlock {
  fromRow: number;
  toRow: number;
  cells: Cell[];
}

/** Whole rows, at most so many, and no further row once a wide sheet has filled the block. */
export function* blocksOf(cells: readonly Cell[]): Generator<CellBlock> {
  let block: CellBlock | null = null;
  for (const cell of cells) {
    const ends =
      block !== null &&
      cell.row !== block.toRow &&
      (cell.row >= block.fromRow + rowsPerBlock || block.cells.length >= cellsPerBlock);
    if (block !== null && ends) yield block;
    if (block === null || ends) block = { fromRow: cell.row, toRow: cell.row, cells: [] };
    block.toRow = cell.row;
    block.cells.push(cell);
  }
  if (block !== null) yield block;
}
