import type { Cell } from '../cell-grid';
import type { CellKinds } from './cell-kind';
import type { LabelMeaning, LabelReader } from './label-meaning';

/** Cells of one row, from the left. */
export interface TableRow {
  row: number;
  cells: Cell[];
}

/** A piece of a sheet that is read as one: titles over it, heading rows, then rows of data. */
export interface Table {
  titles: Cell[];
  headings: TableRow[];
  rows: TableRow[];
  firstColumn: number;
  lastColumn: number;
}

export interface Surroundings {
  kinds: CellKinds;
  labels: Pick<LabelReader, 'read'>;
}

/** A label that a value stands beside: a quantity, an attribute, a fact of the cover. */
export function saysWhat(meaning: LabelMeaning): boolean {
  return (
    meaning.quantities.length > 0 ||
    meaning.attribute !== null ||
    meaning.document !== null ||
    meaning.furniture ||
    meaning.raw
  );
}
