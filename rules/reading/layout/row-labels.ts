import { placeOf } from '../reading-log';
import type { LabelMeaning } from './label-meaning';
import type { TableRow } from './table';
import type { TableContext } from './table-context';

export function rowLabels(row: TableRow, context: TableContext, outer: LabelledRow['outer']): LabelledRow {
  const { columns, kinds, labels, index } = context;
  const found: { column: number; meaning: LabelMeaning }[] = [];
  for (const cell of row.cells) {
    if (columns.get(cell.column)?.kind !== 'label' || kinds.of(cell) !== 'text') continue;
    found.push({ column: cell.column, meaning: labels.read(cell.text) });
    context.reading.log.use(placeOf(index.sheet, cell), 'label', 'A label.');
  }
  if (found.length === 0) found.push(...mergedLabels(row, context));
  const [first] = found;
  const labelColumns = [...columns.values()]
    .filter(({ kind }) => kind === 'label')
    .map(({ column }) => column);
  // Over several levels of labels the outer one is written once for the rows under it.
  const outermost = labelColumns[0];
  const hasLevels = labelColumns.length > 1 && labelColumns[1] === (outermost ?? 0) + 1;
  let above = outer;
  if (hasLevels && first && first.column === outermost)
    above = { label: first.meaning, column: first.column };
  return {
    outer: above,
    documents: row.cells.some((cell) => columns.get(cell.column)?.kind === 'document'),
    labelsAt: (column) => {
      const nearest = found.findLast((each) => each.column < column) ?? found.at(-1);
      if (!nearest) return hasLevels && above ? [above.label] : [];
      const beside = found.filter((each) => each.column === nearest.column - 1).map(({ meaning }) => meaning);
      const upper =
        hasLevels && above && beside.length === 0 && nearest.column !== above.column ? [above.label] : [];
      return [...upper, ...beside, nearest.meaning];
    },
  };
}

export interface LabelledRow {
  /** Labels that speak for a column: the nearest to its left. */
  labelsAt: (column: number) => LabelMeaning[];
  outer: { label: LabelMeaning; column: number } | null;
  documents: boolean;
}

/** A label that is merged over several rows speaks for each of them. */
function mergedLabels(row: TableRow, { columns, kinds, labels, index }: TableContext) {
  return [...columns.values()].flatMap(({ kind, column }) => {
    const cell = kind === 'label' ? index.cellAt(row.row, column) : null;
    const isMerged = cell !== null && cell.row < row.row && kinds.of(cell) === 'text';
    return isMerged ? [{ column, meaning: labels.read(cell.text) }] : [];
  });
}
