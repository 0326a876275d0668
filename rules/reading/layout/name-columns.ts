import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { placeOf } from '../reading-log';
import { keyConditions } from './name-conditions';
import { givesWay } from './name-key';
import { keepScoped } from './scoped-conditions';
import { isConditionKey, type TableColumn } from './table-column';
import { type TableContext, unitBeside } from './table-context';
import { binderText } from './trials-by-binder';

/** Sets what names over columns mean, and takes rows of keys ("Specimen | 1 | 2 | 3") for the columns' own. */
export function nameColumns(context: TableContext): void {
  const { columns, labels, decimal, nameKey, table, kinds } = context;
  nameByCorners(context);
  nameByGroups(context);
  for (const column of columns.values()) {
    if (column.kind !== 'value' || column.name === null || column.nameCell === null) continue;
    const key = column.nameKey ?? nameKey;
    if (labels.read(column.nameCell.text).quantities.length > 0 && !givesWay(column, key)) continue;
    if (column.at[key] !== undefined) continue;
    const understood = keyConditions(key, column.nameCell, { labels, unit: column.unit, decimal });
    if (understood.state !== 'value') continue;
    column.at = { ...column.at, ...understood.value };
    if (givesWay(column, key)) {
      column.quantities = [];
      column.attribute = null;
    }
    if (column.nameKey !== null && column.heads.length > 1 && key !== 'stockpile') column.unit = null;
  }
  nameByBinder(context);
  for (const row of table.rows) {
    const first = row.cells.find((cell) => kinds.of(cell) === 'text');
    const meaning = first ? labels.read(first.text) : null;
    const key =
      meaning && meaning.quantities.length === 0 && meaning.role === null && !meaning.raw
        ? meaning.keys.find(isConditionKey)
        : undefined;
    const kind = first ? columns.get(first.column)?.kind : undefined;
    const own = first ? columns.get(first.column)?.key : undefined;
    if (!first || !meaning || key === undefined || meaning.unknown.length > 0) continue;
    if (
      kind !== 'label' &&
      !(kind === 'key' && own !== key && own !== undefined && own !== null && figures.has(own))
    )
      continue;
    const values = row.cells.filter(
      (cell) => cell.column > first.column && columns.get(cell.column)?.kind === 'value',
    );
    if (values.length < 1) continue;
    const isList =
      [...columns.values()].filter(({ kind, role }) => kind === 'value' && role === null).length === 1;
    if (isList && values.length === 1 && key !== 'trial' && key !== 'specimen' && key !== 'blend') {
      keepScoped(row, { key, meaning, cell: values[0] as Cell }, context);
      continue;
    }
    // Weighings and heights are no names.
    if (
      named.has(key) &&
      values.some(({ kind, value }) => kind === 'number' && !/^\d{1,4}$/.test(value)) &&
      !values.every(({ value }) => /^\d\.\d$/.test(value))
    )
      continue;
    for (const cell of values) {
      const column = columns.get(cell.column) as TableColumn;
      const understood = keyConditions(key, cell, {
        labels,
        unit: meaning.unit ?? unitBeside(row, context),
        decimal,
      });
      if (understood.state !== 'value') continue;
      column.at = { ...column.at, ...understood.value };
      context.reading.log.use(placeOf(context.index.sheet, cell), 'read', `Key: ${key}.`);
    }
  }
  nameByBinder(context);
}

const named: ReadonlySet<ConditionName> = new Set(['trial', 'specimen', 'blend', 'stockpile']);

/** Keys that are figures: words among them are lines of another kind. */
const figures: ReadonlySet<ConditionName> = new Set([
  'sieve',
  'time',
  'temperature',
  'passes',
  'frequency',
  'stress',
]);

/** "Trial | A | A | B | B" over "Sample | 1 | 2 | 1 | 2": each row of heads says itself what it names. */
function nameByCorners({ table, columns, kinds, labels, decimal }: TableContext): void {
  if (table.headings.length < 2) return;
  for (const { row, cells } of table.headings) {
    const [corner] = cells;
    const under = corner ? columns.get(corner.column) : undefined;
    if (!corner || kinds.of(corner) !== 'text' || under?.kind === 'value') continue;
    const meaning = labels.read(corner.text);
    const key =
      meaning.quantities.length === 0 && meaning.unknown.length === 0
        ? meaning.keys.find(isConditionKey)
        : undefined;
    // Where the figures under it are such keys, it speaks of them and not of the heads beside it.
    if (key === undefined || under?.key === key) continue;
    for (const column of columns.values()) {
      if (column.kind !== 'value' || column.isTold) continue;
      const head = column.heads.find(
        (cell) => cell.row === row || (cell.row < row && cell === column.nameCell),
      );
      if (!head || head.column === corner.column || head.row !== row) continue;
      if (labels.read(head.text).quantities.length > 0 || labels.read(head.text).role !== null) continue;
      const understood = keyConditions(key, head, { labels, unit: meaning.unit, decimal });
      if (understood.state !== 'value') continue;
      column.at = { ...understood.value, ...column.at };
      if (column.nameCell === head) column.nameKey = key;
    }
  }
}

/** Columns told apart by their binder content only: it names the trials. */
function nameByBinder(context: TableContext): void {
  const { columns, table, kinds, labels, index } = context;
  for (const column of columns.values()) {
    if (column.binder && column.at.trial === undefined && column.at.blend === undefined)
      column.at = { ...column.at, trial: column.binder.text };
  }
  const open = () =>
    [...columns.values()].filter(
      ({ kind, at, role, quantities }) =>
        kind === 'value' &&
        at.trial === undefined &&
        role === null &&
        quantities.length === 0 &&
        at.stockpile === undefined &&
        at.laboratory === undefined,
    );
  if (open().length < 2) return;
  for (const row of table.rows) {
    const first = row.cells.find((cell) => kinds.of(cell) === 'text');
    if (!first || !labels.read(first.text).quantities.includes('binder-content')) continue;
    const values = open().flatMap((column) => {
      const cell = index.cellAt(row.row, column.column);
      return cell && kinds.of(cell) === 'value' ? [{ column, cell }] : [];
    });
    if (new Set(values.map(({ cell }) => cell.text)).size < 2) continue;
    for (const { column, cell } of values) column.at = { ...column.at, trial: binderText(cell) };
    return;
  }
}

/** Under sieves a group heading that is only a name is a stockpile's. */
function nameByGroups({ columns, labels, decimal }: TableContext): void {
  if (![...columns.values()].some(({ key }) => key === 'sieve')) return;
  for (const column of columns.values()) {
    if (column.kind !== 'value' || column.groupName === null || column.at.stockpile !== undefined) continue;
    // A name under it says more than the group's.
    if (column.nameCell !== null && labels.read(column.nameCell.text).quantities.length === 0) continue;
    const understood = keyConditions('stockpile', column.groupName, { labels, unit: null, decimal });
    if (understood.state === 'value') column.at = { ...understood.value, ...column.at };
  }
}
