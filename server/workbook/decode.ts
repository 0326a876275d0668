import type { CellGrid } from '#rules/reading/cell-grid';
import { decodeCsv } from './decode-csv';
import { decodeXlsx } from './decode-xlsx';
import { guardWorkbook, type WorkbookKind } from './guard';
import { type WorkbookLimits, workbookLimits } from './limits';
import { type WorkbookProblem, WorkbookRefusal } from './refusal';

export type DecodeResult =
  | { ok: true; kind: WorkbookKind; grid: CellGrid }
  | { ok: false; problem: WorkbookProblem };

export interface DecodeWorkbookOptions {
  /** Sheets done, and sheets in all. */
  onProgress?: (done: number, total: number) => void;
  limits?: WorkbookLimits;
}

/** Guards the bytes, then turns them into the cell grid. Pure of time and place: the same bytes give the same grid. */
export async function decodeWorkbook(
  bytes: Buffer,
  fileName: string,
  { onProgress = () => {}, limits = workbookLimits }: DecodeWorkbookOptions = {},
): Promise<DecodeResult> {
  const guarded = await guardWorkbook(bytes, fileName, limits);
  if (!guarded.ok) return guarded;
  try {
    const options = { fileName, limits, onProgress };
    const grid = guarded.kind === 'csv' ? decodeCsv(bytes, options) : await decodeXlsx(bytes, options);
    return { ok: true, kind: guarded.kind, grid };
  } catch (error) {
    if (error instanceof WorkbookRefusal) return { ok: false, problem: error.problem };
    throw error;
  }
}
