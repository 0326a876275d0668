import { conditionsKey } from '../reading-log';
import { acceptedConditions } from './accepted-conditions';
import type { Assigned } from './assigned';
import { gradationKind } from './gradation-kind';
import type { FindQuantity } from './resolve-quantity';

const kinds = ['percent-passing', 'percent-retained', 'cumulative-percent-retained'];

/**
 * Gradations that no heading calls passing or retained are told by their own figures, a column at a time. A plain
 * "retained" is told individual from cumulative the same way; a clear heading always stands.
 */
export function decideGradations(assigned: Assigned[], find: FindQuantity): void {
  const across = rowsOfSieves(assigned);
  const runs = new Map<string, Assigned[]>();
  for (const each of assigned) {
    const isOpen = each.choices.length > 1 && each.choices.every(({ id }) => kinds.includes(id));
    const isRetained =
      !each.told &&
      each.choices.length === 1 &&
      each.choices[0]?.id === 'percent-retained' &&
      !/indiv|parti|einzel|fraction/i.test(each.heading);
    if (!isOpen && !isRetained) continue;
    const { sieve: _, ...rest } = each.conditions;
    const line = across.has(`${each.table}|${each.cell.row}`)
      ? `row ${each.cell.row}`
      : `column ${each.cell.column}`;
    const key = `${each.table}|${conditionsKey(rest)}|${line}`;
    const run = runs.get(key);
    if (run) run.push(each);
    else runs.set(key, [each]);
  }
  for (const run of runs.values()) {
    const points = run.flatMap(({ conditions, cell }) =>
      conditions.sieve !== undefined && Number.isFinite(figureOf(cell))
        ? [{ sieve: conditions.sieve, value: figureOf(cell) }]
        : [],
    );
    const scaled = points.every(({ value }) => value <= 1)
      ? points.map(({ sieve, value }) => ({ sieve, value: value * 100 }))
      : points;
    const kind = gradationKind(scaled);
    const isRetained = run[0]?.choices.length === 1;
    if (kind === null || (isRetained && kind !== 'cumulative-percent-retained')) continue;
    const quantity = find(kind);
    if (!quantity) continue;
    for (const each of run) {
      each.choices = [quantity];
      each.conditions = acceptedConditions(each, quantity);
    }
  }
}

/** Rows that hold several sieves: there a gradation runs across, elsewhere down. */
function rowsOfSieves(assigned: Assigned[]): Set<string> {
  const first = new Map<string, number>();
  const across = new Set<string>();
  for (const { table, cell, conditions } of assigned) {
    if (conditions.sieve === undefined) continue;
    const row = `${table}|${cell.row}`;
    const known = first.get(row);
    if (known === undefined) first.set(row, conditions.sieve);
    else if (known !== conditions.sieve) across.add(row);
  }
  return across;
}

function figureOf({ kind, value, text }: Assigned['cell']): number {
  return Number(kind === 'number' ? value : text.replace(',', '.').replace(/\s*%$/, '') || Number.NaN);
}
