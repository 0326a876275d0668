import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import { plainText } from '../plain-text';
import type { Role } from '../words/key-words';
import type { TableRow } from './table';
import type { TableContext } from './table-context';

/**
 * Rows told apart by their binder content only, at steps that trials are made at: it names the trials. Contents
 * that differ by a few hundredths are results of one mix, and name nothing.
 */
export function trialsByBinder(
  context: TableContext,
): ((row: TableRow, role: Role | null) => Conditions) | null {
  const { columns, table, far, kinds } = context;
  const all = [...columns.values()];
  const binder = all.find(
    ({ kind, quantities, role }) =>
      kind === 'value' && role === null && quantities.includes('binder-content'),
  );
  if (
    !binder ||
    far.trial !== undefined ||
    all.some(({ key, at }) => key === 'trial' || at.trial !== undefined)
  )
    return null;
  if (
    all.some(({ kind, quantities }) => kind === 'label' && quantities.length === 0) &&
    all.every(({ key }) => key === null)
  ) {
    const label = all.find(({ kind }) => kind === 'label');
    if (
      label &&
      table.rows.some(({ cells }) =>
        cells.some(
          (cell) =>
            cell.column === label.column &&
            kinds.of(cell) === 'text' &&
            context.labels.read(cell.text).role === null,
        ),
      )
    )
      return null;
  }
  const texts = new Map<string, number>();
  for (const { cells } of table.rows) {
    const cell = cells.find(({ column }) => column === binder.column);
    const value =
      cell && kinds.of(cell) === 'value'
        ? Number(plainText(cell.text).replace(',', '.').replace(/\s*%$/, ''))
        : Number.NaN;
    if (cell && Number.isFinite(value)) texts.set(binderText(cell), value);
  }
  const steps = [...texts.values()].sort((a, b) => a - b);
  // Specimens that each have their own content are results of one mix unless the steps are those of a design.
  const hasSpecimens = all.some(({ key }) => key === 'specimen') && steps.length >= table.rows.length - 1;
  const least = hasSpecimens ? 0.29 : 0.195;
  const isLadder =
    steps.length > 1 && steps.every((value, at) => at === 0 || value - (steps[at - 1] as number) > least);
  if (!isLadder) return null;
  let last: string | null = null;
  return ({ cells }, role) => {
    const cell = cells.find(({ column }) => column === binder.column);
    if (cell && role === null && kinds.of(cell) === 'value') last = binderText(cell);
    return last === null ? {} : { trial: last };
  };
}

export function binderText(cell: Cell): string {
  return plainText(cell.text).replace(',', '.').replace(/\s*%$/, '');
}
