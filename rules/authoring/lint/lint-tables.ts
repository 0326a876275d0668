import type { Scalar } from '../../rule-sets/attribute';
import { type EditionView, viewOf } from '../../rule-sets/edition-view';
import type { ResolvedEdition } from '../../rule-sets/resolve';
import { isKeyRange, type LimitTable } from '../../rule-sets/table';
import { keyCovers } from '../../rule-sets/table-keys';
import { tablesOf } from '../../rule-sets/tables-of';
import { numberWords, withUnit } from '../../rule-sets/words';
import type { LintRemark } from './remark';

/** Mixes that a table has no row for, and tables and own names that no rule uses. */
export function lintTables(edition: ResolvedEdition): LintRemark[] {
  const view = viewOf(edition);
  return [...edition.tables.flatMap((table) => gapRemarks(table, view)), ...unused(edition)];
}

/** A stretch of mixes that no row of a table covers: a value or a range for each key. */
export interface TableGap {
  key: string;
  value: Scalar | { from: number; below: number };
}

/** More combinations than this are not looked at. */
const MOST_CELLS = 50_000;

/**
 * Every combination of keys between the table's own ends that no row covers. The sieve is no key here: each row has
 * its own. Beyond the first and the last range nothing is said: a table may well begin somewhere.
 */
export function gapsOf(table: LimitTable, view: EditionView): TableGap[][] {
  const keys = table.keys.filter((key) => key !== 'sieve');
  let cells: TableGap[][] = [[]];
  for (const key of keys) {
    const values = stretchesOf(table, key, view);
    if (cells.length * values.length > MOST_CELLS) return [];
    cells = cells.flatMap((cell) => values.map((value) => [...cell, { key, value }]));
  }
  return cells.filter(
    (cell) => !table.rows.some((row) => cell.every(({ key, value }) => covers(row[key], value))),
  );
}

function covers(cell: LimitTable['rows'][number][string] | undefined, value: TableGap['value']): boolean {
  return keyCovers(cell, typeof value === 'object' ? middleOf(value) : value);
}

function middleOf({ from, below }: { from: number; below: number }): number {
  return (from + below) / 2;
}

/** The values that a key is told apart by; between two ends of ranges, the stretch. */
function stretchesOf(table: LimitTable, key: string, view: EditionView): TableGap['value'][] {
  const cells = table.rows.map((row) => row[key]);
  const ends = new Set<number>();
  const values = new Map<string, Scalar>();
  for (const cell of cells) {
    if (isKeyRange(cell)) for (const end of [cell.from, cell.below]) if (end !== undefined) ends.add(end);
    if (typeof cell === 'number' || typeof cell === 'string' || typeof cell === 'boolean') {
      values.set(String(cell), cell);
    }
  }
  const declared = view.attribute(key)?.values ?? [];
  for (const entry of declared) {
    const value = typeof entry === 'object' ? entry.value : entry;
    values.set(String(value), value);
  }
  const sorted = [...ends].toSorted((a, b) => a - b);
  const stretches = sorted.slice(1).map((below, index) => ({ from: sorted[index] as number, below }));
  return ends.size > 0 ? stretches : [...values.values()];
}

function gapRemarks(table: LimitTable, view: EditionView): LintRemark[] {
  const gaps = gapsOf(table, view);
  if (gaps.length === 0) return [];
  const shown = gaps.slice(0, 3).map((gap) => gap.map((each) => gapWords(each, view)).join(', '));
  const more = gaps.length > shown.length ? `; ${gaps.length - shown.length} more` : '';
  return [
    {
      level: 'warning',
      check: 'gap',
      part: `tables/${table.id}`,
      detail: `${table.title ?? table.id} has no row for ${shown.join('; ')}${more}: such a mix is undecided.`,
      fix: 'Add a row, widen a range, or let the rules that use it leave such mixes out.',
    },
  ];
}

export function gapWords({ key, value }: TableGap, view: EditionView): string {
  const label = view.attributeLabel(key);
  const unit = view.attribute(key)?.unit ?? '';
  if (typeof value !== 'object')
    return `${label} ${withUnit(typeof value === 'number' ? numberWords(value) : String(value), unit)}`;
  return `${label} from ${numberWords(value.from)} to below ${withUnit(numberWords(value.below), unit)}`;
}

function unused(edition: ResolvedEdition): LintRemark[] {
  const tables = new Set(edition.rules.flatMap((rule) => [...tablesOf(rule)]));
  const named = JSON.stringify([edition.rules, edition.tables.map(({ keys }) => keys)]);
  const remark = (part: string, words: string): LintRemark => ({
    level: 'warning',
    check: 'unused',
    part,
    detail: `${words} is used by no rule.`,
    fix: 'Remove it, or let a rule use it.',
  });
  return [
    ...edition.tables
      .filter(({ id }) => !tables.has(id))
      .map(({ id, title }) => remark(`tables/${id}`, `The table ${title ?? id}`)),
    ...edition.attributes
      .filter(({ name }) => !named.includes(JSON.stringify(name)))
      .map(({ name, label }) => remark(`attributes/${name}`, `The attribute ${label ?? name}`)),
    ...edition.quantities
      .filter(({ id, symbol }) => !named.includes(JSON.stringify(id)) && !named.includes(symbol))
      .map(({ id, label }) => remark(`quantities/${id}`, `The quantity ${label}`)),
  ];
}
