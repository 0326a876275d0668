import type { ReadingChoices } from '../api/get-reading-choices';
import type { SheetRows } from '../hooks/use-sheet-rows';
import type { CellRange } from './cell-address';
import type { SayForm } from './say-form';

/** The form as the first cell was taken, so that who corrects one thing need not say the others again. */
export function takenForm(
  empty: SayForm,
  rows: SheetRows,
  { from }: CellRange,
  choices: ReadingChoices | undefined,
): SayForm {
  const use = rows.rowAt(from.row)?.uses.get(from.column);
  if (use?.use !== 'read' || !choices) return empty;
  const names = choices.quantities.flatMap(({ id, label, symbol }) => [
    { id, name: label.toLowerCase() },
    { id, name: symbol.toLowerCase() },
  ]);
  const taken = use.taken.toLowerCase();
  const named = names
    .filter(({ name }) => taken === name || taken.startsWith(`${name},`) || taken.startsWith(`${name} `))
    .sort((one, other) => other.name.length - one.name.length)[0];
  return named ? { ...empty, kind: 'reading', quantity: named.id } : empty;
}
