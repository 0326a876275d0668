import type { Cell } from '../cell-grid';
import { placeOf } from '../reading-log';
import { readHeadBinders, readTitleBinder } from './heading-candidates';
import type { LabelMeaning } from './label-meaning';
import { nameColumns } from './name-columns';
import { readDocumentRow } from './read-document-row';
import { readPairs } from './read-pairs';
import { readRow } from './read-row';
import type { Group } from './read-value';
import { readWritten } from './read-written';
import { rowLabels } from './row-labels';
import type { SheetContext } from './sheet-context';
import type { Table, TableRow } from './table';
import { farConditions, mark, type TableContext, tableContext } from './table-context';
import { RowKeys } from './table-rows';
import { tellColumns } from './tell-columns';
import { trialsByBinder } from './trials-by-binder';

/** Reads one table: the keys of its rows and columns, then each value under what they say. */
export function readTable(table: Table, sheet: SheetContext): void {
  const context = tableContext(table, sheet);
  // The first title of a sheet speaks, last of all, for what stands further down.
  if (sheet.domains.length === 0) sheet.domains.push(...context.titles.flatMap(({ domains }) => domains));
  tellColumns(context);
  for (const cell of table.titles) {
    mark(context, cell, 'A title.');
    readWritten(cell, context);
  }
  for (const { cells } of table.headings) for (const cell of cells) markHeading(context, cell);
  if (table.headings.length === 0 && !isMatrix(context)) {
    readPairs(context);
    return;
  }
  nameColumns(context);
  for (const [at, title] of context.titles.entries())
    readTitleBinder(title, table.titles[at] as Cell, context);
  readHeadBinders(context);
  const trialOf = trialsByBinder(context);
  const keys = new RowKeys(context.columns, context);
  let group: Group = { at: {}, meaning: null, subset: null };
  let outer: { label: LabelMeaning; column: number } | null = null;
  for (const row of table.rows) {
    const alone = titleOf(row, context);
    if (alone) {
      group = groupOf(alone, group);
      readTitleBinder(alone, row.cells[0] as Cell, context);
      mark(context, row.cells[0] as Cell, 'A title within the table.');
      readWritten(row.cells[0] as Cell, context);
      continue;
    }
    const facts = keys.read(row);
    if (trialOf !== null && facts.at.trial === undefined) Object.assign(facts.at, trialOf(row, facts.role));
    const labelled = rowLabels(row, context, outer);
    outer = labelled.outer;
    if (labelled.documents) {
      readDocumentRow(row, context);
      continue;
    }
    readRow(
      row,
      { facts, group, labelsAt: facts.label ? () => [facts.label as LabelMeaning] : labelled.labelsAt },
      context,
    );
  }
}

/** Labels with several figures in a run beside each: columns of trials or specimens, also without heads. */
function isMatrix({ table, kinds }: TableContext): boolean {
  const runs = table.rows.filter(({ cells }) => {
    const values = cells.filter((cell) => kinds.of(cell) === 'value' || kinds.of(cell) === 'none');
    const lastText = cells.findLast((cell) => kinds.of(cell) === 'text');
    return (
      values.length > 1 && (lastText === undefined || values.every(({ column }) => column > lastText.column))
    );
  });
  return table.rows.length > 1 && runs.length * 2 > table.rows.length;
}

function titleOf(row: TableRow, { kinds, labels, columns }: TableContext): LabelMeaning | null {
  const [cell] = row.cells;
  if (row.cells.length !== 1 || !cell || kinds.of(cell) !== 'text') return null;
  const column = columns.get(cell.column);
  if (column?.kind === 'document') return null;
  return labels.read(cell.text);
}

function groupOf(meaning: LabelMeaning, before: Group): Group {
  const saysNothing =
    Object.keys(meaning.at).length === 0 && meaning.quantities.length === 0 && meaning.subset === null;
  if (saysNothing && meaning.unknown.length > 2) return before;
  const aged = /^\W*(?:on\s+)?(original|unaged|RTFO|PAV)T?\b/i.exec(meaning.text)?.[1];
  const aging =
    aged === undefined ? {} : { aging: /^[a-z]{5,}$/i.test(aged) ? aged.toLowerCase() : aged.toUpperCase() };
  return { at: { ...farConditions(meaning), ...aging }, meaning, subset: meaning.subset };
}

function markHeading(context: TableContext, cell: Cell): void {
  const isValue = context.kinds.of(cell) === 'value';
  if (!isValue) {
    mark(context, cell, 'A heading.');
    return;
  }
  context.reading.log.use(placeOf(context.index.sheet, cell), 'read', 'Key: the head of a column.');
}
