import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { plainText } from '../plain-text';
import { placeOf } from '../reading-log';
import type { Domain } from '../words/context-words';
import type { LabelMeaning } from './label-meaning';
import { keyConditions } from './name-conditions';
import { nameKeyOf } from './name-key';
import type { SheetContext } from './sheet-context';
import type { Table, TableRow } from './table';
import { isConditionKey, type TableColumn } from './table-column';
import { tableColumns } from './table-columns';
import { hasWeighings, weighingOf } from './weighings';

/** Everything that speaks for a whole table. */
export interface TableContext extends SheetContext {
  table: Table;
  number: number;
  columns: Map<number, TableColumn>;
  /** What names of columns without a word for their kind stand for. */
  nameKey: ConditionName;
  titles: LabelMeaning[];
  /** Said by titles over the table, and further off by the sheet. */
  far: Conditions;
  tableDomains: Domain[];
  /** Conditions that a list of properties states in lines of its own, with the test that each stands under. */
  scoped: { outer: string | null; at: Conditions }[];
  tableSubset: 'dry' | 'conditioned' | null;
}

export function tableContext(table: Table, sheet: SheetContext): TableContext {
  const titles = table.titles.map(({ text }) => sheet.labels.read(text));
  const columns = tableColumns(table, sheet.index, sheet);
  const far: Conditions = { ...sheet.ambient };
  for (const [at, title] of titles.entries()) {
    Object.assign(far, farConditions(title), writtenKey(table.titles[at] as Cell, sheet));
  }
  sheet.nextTable += 1;
  const context: TableContext = {
    ...sheet,
    table,
    number: sheet.nextTable,
    columns,
    nameKey: 'specimen',
    scoped: [],
    titles,
    far,
    tableDomains: [...titles.toReversed().flatMap(({ domains }) => domains), ...sheet.domains],
    tableSubset: titles.findLast(({ subset }) => subset !== null)?.subset ?? sheet.subset,
  };
  if (hasWeighings(table, sheet)) nameWeighings(context);
  for (const column of columns.values()) column.allDomains = [...column.domains, ...context.tableDomains];
  context.nameKey = nameKeyOf(context);
  return context;
}

/** "Stockpile: No. 8 Chip" over a table says whose it is. */
function writtenKey(cell: Cell, { labels, decimal }: SheetContext): Conditions {
  const match = /^([^:=]{1,40}?)\s*[:=]\s*(\S.{0,40})$/.exec(plainText(cell.text));
  if (!match?.[1] || !match[2]) return {};
  const meaning = labels.read(match[1]);
  const key =
    meaning.quantities.length === 0 && meaning.unknown.length === 0
      ? meaning.keys.find(isConditionKey)
      : undefined;
  if (key === undefined || key === 'variant' || key === 'sieve') return {};
  const said: Cell = { ...cell, kind: 'text', value: match[2], text: match[2] };
  const understood = keyConditions(key, said, { labels, unit: meaning.unit, decimal });
  return understood.state === 'value' ? understood.value : {};
}

function nameWeighings(context: TableContext): void {
  const { columns, labels } = context;
  for (const column of columns.values()) {
    const head = column.heads.findLast(({ kind }) => kind === 'text');
    const quantity = head ? weighingOf(head.text) : null;
    if (!quantity || column.kind === 'label') continue;
    Object.assign(column, {
      kind: 'value',
      key: null,
      quantities: [quantity],
      weak: false,
      name: null,
      nameCell: null,
      role: null,
      subset: null,
    });
  }
  context.labels = { read: (text) => weighed(labels.read(text)) };
}

function weighed(meaning: LabelMeaning): LabelMeaning {
  const quantity = weighingOf(meaning.text);
  return quantity ? { ...meaning, quantities: [quantity], weak: false, keys: [], subset: null } : meaning;
}

/** A report's title is full of words like "design"; only a short one names what stands under it. */
export function farConditions(title: LabelMeaning): Conditions {
  const { trial, ...rest } = title.at;
  if (trial === undefined) return rest;
  if (trial !== 'design') return title.at;
  const isReport =
    /report|submittal|form\b|worksheet|summary of|bericht|rapport|informe|mix design\b|design mix|mezclas?\b.*diseño|étude|erstprüfung/i.test(
      title.text,
    );
  return isReport || title.unknown.length > 1 ? rest : title.at;
}

export function unitBeside(row: TableRow, { columns, kinds, labels }: TableContext): string | null {
  const cell = row.cells.find(
    (each) => columns.get(each.column)?.kind === 'unit' || kinds.of(each) === 'unit',
  );
  return cell ? labels.read(`x (${plainText(cell.text)})`).unit : null;
}

export function mark({ reading, index }: SheetContext, cell: Cell, words: string): void {
  reading.log.use(placeOf(index.sheet, cell), 'label', words);
}
