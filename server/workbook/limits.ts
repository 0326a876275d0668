import { limits } from '#shared/limits';

export interface WorkbookLimits {
  fileBytes: number;
  /** All parts of the zip together, inflated. */
  inflatedBytes: number;
  zipEntries: number;
  sheets: number;
  /** Cells that hold something, over all sheets. */
  cells: number;
}

export const workbookLimits: WorkbookLimits = {
  fileBytes: limits.workbookBytes,
  inflatedBytes: 400 * 1024 * 1024,
  zipEntries: 2000,
  sheets: 250,
  cells: 500_000,
};
