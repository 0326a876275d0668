import { isMaterial } from './materials';
import type { ValueReading } from './read-value';
import type { TableContext } from './table-context';

/** The quantity that row, column, group and titles name between them; null where none does or two differ. */
export function quantitiesOf(
  { column, group, labels }: Pick<ValueReading, 'column' | 'group' | 'labels'>,
  context: TableContext,
): string[] | null {
  const label = labels.findLast(({ quantities }) => quantities.length > 0) ?? null;
  if (column.raw || labels.at(-1)?.raw) return null;
  if (label && column.quantities.length > 0) {
    const both = label.quantities.filter((id) => column.quantities.includes(id));
    if (both.length > 0) return both;
    if (column.weak && !label.weak) return label.quantities;
    if (label.weak && !column.weak) return column.quantities;
    return null;
  }
  if (label) return label.quantities;
  if (column.quantities.length > 0) return column.quantities;
  const hasSieve = [...context.columns.values()].some(
    ({ key, at }) => key === 'sieve' || at.sieve !== undefined,
  );
  const over = [group.meaning, ...context.titles.toReversed()].find(
    (meaning) =>
      meaning &&
      meaning.quantities.length > 0 &&
      !isMaterial(meaning.quantities) &&
      // A common word over a row that has a name of its own does not say what the row is.
      !(meaning.weak && labels.some(({ words }) => words > 0)),
  );
  if (hasSieve) {
    const told = over?.quantities.filter((id) => gradation.includes(id)) ?? [];
    if (told.length > 0) return told;
    return column.unit === null || column.unit === '%' ? gradation : null;
  }
  const isCross =
    Object.keys(column.at).length > 0 ||
    [...context.columns.values()].some(({ kind }) => kind === 'key') ||
    column.heads.length === 0;
  return over && isCross ? over.quantities : null;
}

const gradation = ['percent-passing', 'percent-retained', 'cumulative-percent-retained'];
