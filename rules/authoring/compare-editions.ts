import { sourceWords } from '../engine/make-finding';
import { naturalOrder } from '../engine/natural-order';
import { type EditionView, viewOf } from '../rule-sets/edition-view';
import type { ResolvedEdition } from '../rule-sets/resolve';
import type { Rule } from '../rule-sets/schema';
import { cellWords, ruleSentence } from '../rule-sets/sentences';
import type { LimitTable, RuleSource, TableCell } from '../rule-sets/table';
import { tablesOf } from '../rule-sets/tables-of';
import { capitalised, numberWords } from '../rule-sets/words';

/** One thing that reads otherwise: null where one side says nothing. */
export interface Wording {
  /** "Sentence", "Applies", "Rounding"… */
  what: string;
  before: string | null;
  after: string | null;
}

export interface RuleDifference {
  id: string;
  kind: 'added' | 'removed' | 'changed';
  clause: string;
  title: string;
  wordings: Wording[];
}

export interface TableDifference {
  id: string;
  kind: 'added' | 'removed' | 'changed';
  title: string;
  /** Rows by their keys in words. */
  rows: Wording[];
  /** Rules of either edition that use it. */
  usedBy: string[];
}

export interface EditionComparison {
  rules: RuleDifference[];
  tables: TableDifference[];
  /** Design point, room to move, attributes, quantities and documents. */
  others: Wording[];
  /** Rules that say the same in both. */
  unchanged: number;
}

interface Side {
  edition: ResolvedEdition;
  view: EditionView;
  /** Names of both editions. */
  names: readonly string[];
}

/** What one edition says otherwise than another, rule by rule in the order of clauses. */
export function compareEditions(before: ResolvedEdition, after: ResolvedEdition): EditionComparison {
  const names = [before.edition, after.edition];
  const left: Side = { edition: before, view: viewOf(before), names };
  const right: Side = { edition: after, view: viewOf(after), names };
  const tables = tableDifferences(left, right);
  const pairs = pairsOf(before.rules, after.rules, ({ id }) => id);
  const rules = pairs.flatMap(([old, now]) => ruleDifference(old, now, { left, right }));
  return {
    rules: rules.toSorted((a, b) => naturalOrder(a.clause, b.clause)),
    tables,
    others: otherDifferences(left, right),
    unchanged: pairs.length - rules.length,
  };
}

type Sides = { left: Side; right: Side };

function ruleDifference(old: Rule | null, now: Rule | null, { left, right }: Sides): RuleDifference[] {
  const rule = now ?? old;
  if (rule === null) return [];
  const before = old === null ? new Map() : wordingsOf(old, left);
  const after = now === null ? new Map() : wordingsOf(now, right);
  const wordings = differing(before, after);
  if (wordings.length === 0) return [];
  const kind = old === null ? 'added' : now === null ? 'removed' : 'changed';
  return [{ id: rule.id, kind, clause: rule.clause, title: rule.title, wordings }];
}

/** Everything of a rule that decides a finding or is read by a person; who encoded it is neither. */
function wordingsOf(rule: Rule, { view, names }: Side): Words {
  const { measure, limit, when, source } = rule;
  return new Map([
    ['Clause', rule.clause],
    ['Title', rule.title],
    ['Severity', rule.severity],
    ['Sentence', ruleSentence(rule, view)],
    ['Precision', rule.precision === undefined ? null : `± ${numberWords(rule.precision.value)}`],
    ['Advice', rule.advice ?? null],
    ['Source', sourceText(source ?? null, names)],
    ...fieldsOf({ measure, limit, when: when ?? null }, ''),
  ]);
}

/** A source that names one of the two editions moves with them and is no change of the rule. */
function sourceText(source: RuleSource | null, names: readonly string[]): string | null {
  const isOwn = typeof source?.edition === 'string' && names.includes(source.edition);
  return sourceWords(isOwn ? { ...source, edition: null } : source);
}

type Words = Map<string, string | null>;

/**
 * Fields under their own names. They stand beside the sentence only where it reads the same on both sides: some, as
 * the model of a fit, decide a finding and are in no sentence.
 */
function fieldsOf(value: unknown, path: string): [string, string | null][] {
  if (typeof value !== 'object' || value === null) return [[path, value === null ? null : String(value)]];
  return Object.entries(value).flatMap(([name, inner]) =>
    fieldsOf(inner, path === '' ? name : `${path}.${name}`),
  );
}

function differing(before: Words, after: Words): Wording[] {
  const names = [...new Set([...before.keys(), ...after.keys()])];
  const all = names
    .map((what) => ({ what, before: before.get(what) ?? null, after: after.get(what) ?? null }))
    .filter(({ before: old, after: now }) => old !== now);
  const inWords = all.filter(({ what }) => isWord(what));
  return inWords.some(({ what }) => what === 'Sentence') ? inWords : all;
}

function isWord(what: string): boolean {
  return what.charAt(0) !== what.charAt(0).toLowerCase();
}

function tableDifferences(left: Side, right: Side): TableDifference[] {
  return pairsOf(left.edition.tables, right.edition.tables, ({ id }) => id).flatMap(([old, now]) => {
    const table = now ?? old;
    if (table === null) return [];
    const rows = differing(rowsOf(old, left), rowsOf(now, right));
    if (rows.length === 0) return [];
    const users = [...left.edition.rules, ...right.edition.rules].filter((rule) =>
      tablesOf(rule).has(table.id),
    );
    return [
      {
        id: table.id,
        kind: old === null ? 'added' : now === null ? 'removed' : 'changed',
        title: table.title ?? table.id,
        rows,
        usedBy: [...new Set(users.map(({ id }) => id))],
      },
    ];
  });
}

function rowsOf(table: LimitTable | null, { view, names }: Side): Words {
  if (table === null) return new Map();
  return new Map([
    ['Title', table.title ?? table.id],
    ['Source', sourceText(table.source ?? null, names)],
    ...table.rows.map((row): [string, string] => [
      capitalised(table.keys.map((key) => keyWords(key, row[key], view)).join(', ')),
      table.columns.map(({ name, unit }) => `${name} ${cellWords(row[name], unit)}`).join(', '),
    ]),
  ]);
}

function keyWords(key: string, cell: TableCell | undefined, view: EditionView): string {
  const label = key === 'sieve' ? 'sieve' : view.attributeLabel(key);
  const unit = key === 'sieve' ? 'mm' : view.attribute(key)?.unit;
  return `${label} ${cellWords(cell, unit ?? undefined)}`;
}

function otherDifferences(left: Side, right: Side): Wording[] {
  return differing(othersOf(left.edition), othersOf(right.edition)).map((each) => ({
    ...each,
    what: capitalised(each.what),
  }));
}

function othersOf({
  designPoint,
  roomToMove,
  reportedTolerance,
  attributes,
  quantities,
  documents,
}: ResolvedEdition): Words {
  const named = (word: string, name: string, entry: object): [string, string] => {
    const { supplied: _, ...content } = entry as { supplied?: unknown };
    return [
      `${word} ${name}`,
      fieldsOf(content, '')
        .map(([field, value]) => `${field} ${value}`)
        .join(', '),
    ];
  };
  return new Map([
    ['design point', `${designPoint.targetAirVoids} % air voids, ${designPoint.fit} fit`],
    ['room to move', roomToMove.join(', ')],
    ...Object.entries(reportedTolerance).map(([id, value]): [string, string] => [
      `tolerance of ${id}`,
      String(value),
    ]),
    ...attributes.map((each) => named('attribute', each.label ?? each.name, each)),
    ...quantities.map((each) => named('quantity', each.label, each)),
    ...documents.map((each) => named('document', each.label ?? each.type, each)),
  ]);
}

/** Entries of the same name side by side, in the order of the later list with those that went at their place. */
function pairsOf<Entry>(
  before: readonly Entry[],
  after: readonly Entry[],
  nameOf: (entry: Entry) => string,
): [Entry | null, Entry | null][] {
  const now = new Map(after.map((entry) => [nameOf(entry), entry]));
  const old = new Map(before.map((entry) => [nameOf(entry), entry]));
  const names = [...new Set([...old.keys(), ...now.keys()])];
  return names.map((name) => [old.get(name) ?? null, now.get(name) ?? null]);
}
