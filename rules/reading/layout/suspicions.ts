import type { Quantity } from '../../quantities/quantity';
import { conditionsKey } from '../reading-log';
import { isPercent } from '../understand-number';
import type { Assigned, SettleOptions } from './assigned';

export type Suspicion = { reason: string; alternatives: number[] } | 'fraction';

/** What the cells of one table say against each other: columns changed over, fractions where percentages belong. */
export function suspicions(assigned: Assigned[], _options: SettleOptions): Map<Assigned, Suspicion> {
  const found = new Map<Assigned, Suspicion>();
  const tables = new Map<string, Assigned[]>();
  for (const each of assigned) {
    const key = `${each.index.sheet.name}|${each.table}`;
    const table = tables.get(key);
    if (table) table.push(each);
    else tables.set(key, [each]);
  }
  for (const table of tables.values()) {
    swappedGravities(table, found);
    fractions(table, found);
    sameHeadings(table, found);
  }
  return found;
}

/** No compacted mix is denser than the mix without voids: where it stands so throughout, two columns are changed over. */
function swappedGravities(table: Assigned[], found: Map<Assigned, Suspicion>): void {
  const of = (id: string) =>
    table.filter(
      ({ choices, cell }) => choices.length === 1 && choices[0]?.id === id && cell.kind === 'number',
    );
  const maximum = new Map<string, Assigned>();
  for (const each of of('maximum-specific-gravity')) maximum.set(lineOf(each), each);
  const pairs = of('bulk-specific-gravity-mix').flatMap((bulk) => {
    const max = maximum.get(lineOf(bulk)) ?? null;
    return max ? [{ bulk, max }] : [];
  });
  const wrong = pairs.filter(({ bulk, max }) => Number(bulk.cell.value) >= Number(max.cell.value));
  if (wrong.length === 0 || wrong.length * 2 < pairs.length) return;
  for (const { bulk, max } of pairs) {
    const reason = 'stands the wrong way round: a compacted mix cannot be denser than the mix without voids';
    found.set(bulk, { reason, alternatives: [Number(max.cell.value)] });
    found.set(max, { reason, alternatives: [Number(bulk.cell.value)] });
  }
}

function lineOf({ conditions }: Assigned): string {
  const { gyrations: _, ...rest } = conditions;
  return conditionsKey(rest);
}

/** Least value, in percent, that such a quantity has in practice: below it throughout, a column is in fractions. */
const usualMinimum: Record<string, number> = {
  'air-voids': 0.5,
  'stockpile-share': 1.01,
  'percent-passing': 1.01,
  'percent-retained': 1.01,
  'cumulative-percent-retained': 1.01,
  'water-absorption': 0.06,
  'rap-content': 1,
  'ras-content': 0.5,
  'flat-and-elongated': 0.3,
  'soundness-loss': 0.3,
  'natural-sand-content': 1,
  'in-place-air-voids': 0.5,
  'specimen-absorption': 0.02,
  draindown: 0.004,
};

function fractions(table: Assigned[], found: Map<Assigned, Suspicion>): void {
  const runs = new Map<string, Assigned[]>();
  for (const each of table) {
    const [quantity] = each.choices;
    if (!quantity || each.choices.length > 1 || quantity.unit !== '%' || (each.told?.unit ?? null) !== null)
      continue;
    const key = runKey(each, quantity);
    const run = runs.get(key);
    if (run) run.push(each);
    else runs.set(key, [each]);
  }
  for (const run of runs.values()) {
    const numbers = run.filter(({ cell, written }) => cell.kind === 'number' && written === null);
    if (numbers.length === 0 || numbers.some(({ cell }) => isPercent(cell.format))) continue;
    const least = usualMinimum[run[0]?.choices[0]?.id ?? ''];
    const values = numbers.map(({ cell }) => Number(cell.value));
    const greatest = Math.max(...values);
    if (least === undefined || greatest <= 0 || greatest >= least) continue;
    // One fine sieve with little on it is no column of fractions.
    const isGradation = least === 1.01 && run[0]?.conditions.sieve !== undefined;
    if (isGradation && (values.length < 3 || greatest !== 1)) continue;
    for (const each of numbers) if (Number(each.cell.value) !== 0) found.set(each, 'fraction');
  }
}

function runKey(each: Assigned, quantity: Quantity): string {
  const { sieve: _, specimen: _1, trial: _2, stockpile, ...rest } = each.conditions;
  return `${quantity.id}|${conditionsKey({ ...rest, ...(each.conditions.sieve !== undefined && stockpile !== undefined ? { stockpile } : {}) })}`;
}

/**
 * Two columns that their headings do not tell apart: where they differ anywhere, neither is known to be whose, so a
 * row in which they happen to agree says no more.
 */
function sameHeadings(table: Assigned[], found: Map<Assigned, Suspicion>): void {
  const byKey = new Map<string, Assigned[]>();
  for (const each of table) {
    const [quantity] = each.choices;
    if (!quantity || each.choices.length > 1 || !each.isHeaded) continue;
    const key = `${quantity.id}|${conditionsKey(each.conditions)}`;
    const group = byKey.get(key);
    if (group) group.push(each);
    else byKey.set(key, [each]);
  }
  const clashing = new Set<string>();
  const groups = [...byKey.values()].filter(
    (group) => new Set(group.map(({ cell }) => cell.column)).size > 1,
  );
  for (const group of groups) {
    if (new Set(group.map(({ cell }) => cell.value)).size === 1) continue;
    for (const { choices, cell } of group) clashing.add(`${choices[0]?.id}|${cell.column}`);
  }
  for (const group of groups) {
    for (const each of group) {
      if (!clashing.has(`${each.choices[0]?.id}|${each.cell.column}`) || found.has(each)) continue;
      found.set(each, {
        reason: 'stands under a heading that another column has too, and nothing says whose each is',
        alternatives: [],
      });
    }
  }
}
