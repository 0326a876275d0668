import type { Conditions } from '../record';
import type { Provenance } from '../rule-sets/resolve';
import { cellWords } from '../rule-sets/sentences';
import type { LimitTable, TableCell } from '../rule-sets/table';
import { keyCovers } from '../rule-sets/table-keys';
import { andList, uncapitalised } from '../rule-sets/words';
import { attributeFact, attributeText } from './attribute-fact';
import { type Obstacle, undecided } from './obstacle';
import type { World } from './world';

export interface FoundRow {
  table: LimitTable;
  row: LimitTable['rows'][number];
  supplied: Provenance;
  /** Keys and their cells in words, for the evidence. */
  keys: Record<string, string>;
}

export type RowResult = { ok: true; found: FoundRow } | Obstacle;

/** The one row of a table that matches this mix (and sieve); no such row leaves the rule undecided. */
export function findRow(world: World, tableId: string, at: Conditions): RowResult {
  const key = `${tableId} ${at.sieve ?? ''}`;
  const kept = world.rows.get(key);
  if (kept) return kept;
  const result = oneRow(world, tableId, at);
  world.rows.set(key, result);
  return result;
}

function oneRow(world: World, tableId: string, at: Conditions): RowResult {
  const rows = matchingRows(world, tableId, { sieve: at.sieve });
  if (!rows.ok) return rows;
  const [found, ...others] = rows.found;
  if (found && others.length === 0) return { ok: true, found };
  const title = world.view.tableTitle(tableId);
  if (found) return undecided(`Several rows of ${title} match this mix.`);
  const words = keyWords(world, tableId, at);
  return undecided(`${title} has no row for ${words}.`, `Correct ${words}, or have a row added to ${title}.`);
}

/** Rows that match the attributes; without a sieve given, of every sieve. */
export function matchingRows(
  world: World,
  tableId: string,
  at: { sieve: number | undefined },
): { ok: true; found: FoundRow[] } | Obstacle {
  const table = world.tables.get(tableId);
  if (!table) return undecided(`The table ${tableId} is not part of the edition.`);
  const values = new Map<string, number | string | boolean>();
  for (const key of table.keys) {
    if (key === 'sieve') {
      if (at.sieve !== undefined) values.set(key, at.sieve);
      continue;
    }
    const fact = attributeFact(world, key);
    if (fact.kind !== 'value')
      return undecided(
        `Which row of ${table.title ?? table.id} applies is not known: ${fact.reason}.`,
        fact.wouldDecide,
      );
    values.set(key, fact.value);
  }
  const found = table.rows.flatMap((row, i): FoundRow[] => {
    const matches = [...values].every(([key, value]) => keyCovers(row[key], value));
    if (!matches) return [];
    const keys = Object.fromEntries(
      table.keys.map((key) => [key, cellWords(row[key], unitOfKey(world, key))]),
    );
    return [{ table, row, supplied: table.rowsSupplied[i] ?? table.supplied, keys }];
  });
  return { ok: true, found };
}

/** A number from a cell, with the decimals it is written with; null where the cell sets no limit. */
export function numberOfCell(
  cell: TableCell | undefined,
): { value: number; written: string } | null | 'unusable' {
  if (cell === undefined || cell === null) return null;
  const isNumber = typeof cell === 'number' || (typeof cell === 'string' && /^-?\d+(\.\d+)?$/.test(cell));
  return isNumber ? { value: Number(cell), written: String(cell) } : 'unusable';
}

function keyWords(world: World, tableId: string, at: Conditions): string {
  const table = world.view.table(tableId);
  const words = (table?.keys ?? []).map((key) => {
    if (key === 'sieve') return at.sieve === undefined ? 'sieve' : `sieve ${at.sieve} mm`;
    const fact = attributeFact(world, key);
    const value = fact.kind === 'value' ? ` ${attributeText(world, key, fact.value)}` : '';
    return `${uncapitalised(world.view.attributeLabel(key))}${value}`;
  });
  return andList(words);
}

function unitOfKey(world: World, key: string): string | undefined {
  return key === 'sieve' ? 'mm' : world.view.attribute(key)?.unit;
}
