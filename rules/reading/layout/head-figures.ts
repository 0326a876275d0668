import { sieveFromName } from '../../quantities/sieves';
import type { Cell } from '../cell-grid';
import type { Surroundings, TableRow } from './table';

/** "-20 °C" and "10 Hz" are figures that head what stands under them. */
export function saysCondition(cell: Cell, { labels }: Surroundings): boolean {
  if (cell.kind !== 'text') return false;
  const { at, binder } = labels.read(cell.text);
  return Object.keys(at).length > 0 || binder !== null;
}

/** Figures that head columns: sieves in a run, and texts like "-20 °C" or "19 mm"; one alone is a value. */
export function headFigures(row: TableRow, around: Surroundings): Cell[] {
  const said = row.cells.filter(
    (cell) =>
      saysCondition(cell, around) ||
      (cell.kind === 'text' && around.kinds.of(cell) === 'value' && sieveFromName(cell.text) !== null),
  );
  if (said.length > 1) return said;
  const numbers = row.cells.filter(({ kind }) => kind === 'number');
  const openings = numbers.map(({ value }) => sieveFromName(value));
  const falls = openings.every(
    (opening, at) => opening !== null && (at === 0 || opening < (openings[at - 1] as number)),
  );
  const first = row.cells[0];
  const isNamed =
    first !== undefined &&
    around.kinds.of(first) === 'text' &&
    around.labels.read(first.text).quantities.length === 0;
  return falls && isNamed && numbers.length > 3 ? numbers : [];
}
