import type { Reading } from '../record';
import type { TemplateColumn } from './template-columns';
import { firstDataRow, headerRow, type TemplateTable } from './template-layout';

export interface TemplateCell {
  sheet: string;
  row: number;
  column: number;
  value: string | number | { date: string };
}

/** The cells of a reading on its sheet, or null where the sheet has no place for it. */
export type Place = (reading: Reading) => TemplateCell[] | null;

type Stated = Map<string, string | number>;

/** A row that is being filled: what its keys say (null where they have to stay blank), and which values it has. */
interface Row {
  keys: Map<string, string | number | null>;
  filled: Set<number>;
}

interface Page {
  sheet: TemplateTable;
  rows: Row[];
  /** Test method that a column names, null where its results state none. */
  methods: Map<number, string | null>;
}

/** A fitting column of a page, and the row that its value joins: one beyond the last where it begins its own. */
interface Candidate {
  page: Page;
  column: number;
  row: number;
  keys: Row['keys'];
}

/** The tables of a template: readings that agree in every key share a row. */
export function tablePlaces(sheets: TemplateTable[]): Place {
  const pages = sheets.map((sheet): Page => ({ sheet, rows: [], methods: new Map() }));
  return (reading) => {
    const candidates = pages.flatMap((page) => candidatesOf(page, reading));
    const joins = candidates.find(({ page, row }) => row < page.rows.length);
    const chosen = joins ?? candidates[0];
    return chosen === undefined ? null : take(chosen, reading);
  };
}

function candidatesOf(page: Page, reading: Reading): Candidate[] {
  return page.sheet.columns.flatMap((column, at) => {
    if (column.role !== 'value' || column.quantity !== reading.quantity) return [];
    if (!methodFits(page, at, reading.method ?? null)) return [];
    const keys = keysOf(page.sheet, column, statedBy(reading));
    if (keys === null) return [];
    const joined = page.rows.findIndex((row) => !row.filled.has(at) && agree(row.keys, keys));
    return [{ page, column: at, row: joined < 0 ? page.rows.length : joined, keys }];
  });
}

/** A method stands once over its column. */
function methodFits({ sheet, methods }: Page, column: number, method: string | null): boolean {
  const named = methods.get(column);
  return named === undefined ? method === null || sheet.hasMethods : named === method;
}

function statedBy({ at, testedOn }: Reading): Stated {
  const stated = Object.entries({ ...at, testedOn });
  return new Map(
    stated.flatMap(([name, value]): [string, string | number][] =>
      value === undefined ? [] : [[name, value]],
    ),
  );
}

/** What the key columns have to say beside a value, or null where they cannot say all that its reading states. */
function keysOf(sheet: TemplateTable, column: TemplateColumn, stated: Stated): Row['keys'] | null {
  const left = new Map(stated);
  for (const [name, value] of Object.entries(column.at)) {
    if (value === undefined) continue;
    if (left.get(name) !== value) return null;
    left.delete(name);
  }
  const keys: Row['keys'] = new Map();
  for (const { role, names, required } of sheet.columns) {
    if (role === 'value' || names === null || column.without.includes(names)) continue;
    const value = left.get(names) ?? null;
    if (required && value === null) return null;
    keys.set(names, value);
    left.delete(names);
  }
  return left.size === 0 ? keys : null;
}

function agree(row: Row['keys'], keys: Row['keys']): boolean {
  return [...keys].every(([name, value]) => !row.has(name) || row.get(name) === value);
}

function take({ page, column, row: at, keys }: Candidate, reading: Reading): TemplateCell[] {
  const { sheet, rows, methods } = page;
  const row = rows[at] ?? { keys: new Map(), filled: new Set() };
  rows[at] = row;
  const cell = (where: { row: number; column: number }, value: TemplateCell['value']): TemplateCell => ({
    sheet: sheet.name,
    row: where.row,
    column: where.column + 1,
    value,
  });
  const sheetRow = firstDataRow(sheet) + at;
  const said = sheet.columns.flatMap(({ names }, place) => {
    const value = keys.get(names ?? '') ?? null;
    if (value === null || row.keys.has(names ?? '')) return [];
    return [cell({ row: sheetRow, column: place }, names === 'testedOn' ? { date: String(value) } : value)];
  });
  const method = reading.method ?? null;
  const overColumn =
    method === null || methods.has(column) ? [] : [cell({ row: headerRow + 1, column }, method)];
  for (const [name, value] of keys) row.keys.set(name, value);
  row.filled.add(column);
  methods.set(column, method);
  return [...overColumn, ...said, cell({ row: sheetRow, column }, shownReading(reading))];
}

/** "12.5", "> 20000", "non-plastic" */
export function shownReading({ value, qualifier }: Reading): string | number {
  if (qualifier === undefined) return value ?? '';
  return value === null ? qualifier : `${qualifier} ${value}`;
}
