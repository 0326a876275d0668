import type { Bound, Limit } from '#rules/rule-sets/limit';
import type { Rule } from '#rules/rule-sets/schema';
import { compare, type Exact, exact, minus, plus } from './exact';
import { isOne } from './interval';
import { knownOf } from './known';
import { meanAt } from './quantity-value';
import { decimalsOf, stepOfDecimals } from './rounding';
import { rowFor, tableOf } from './table';
import { converted } from './units';
import type { World } from './world';

export interface End {
  value: Exact;
  isExclusive: boolean;
  decimals: number;
}

export interface Limits {
  min: End | null;
  max: End | null;
}

export type Resolved<T> = { is: 'resolved'; value: T } | { is: 'missing' } | { is: 'doubtful' };

interface Place {
  world: World;
  sieve?: number | undefined;
  /** Unit of what is judged, where it has one. */
  unit: string | null;
}

/** Min and max for this mix; a target and its tolerance become both. */
export function limitsOf(place: Place, limit: Limit): Resolved<Limits> {
  const parts: Record<'min' | 'max' | 'target' | 'tolerance', End | null> = {
    min: null,
    max: null,
    target: null,
    tolerance: null,
  };
  let isMissing = false;
  for (const name of ['min', 'max', 'target', 'tolerance'] as const) {
    const bound = limit[name];
    if (bound === undefined) continue;
    const end = endOf(place, bound, limit.exclusive ?? false);
    if (end.is === 'doubtful') return end;
    if (end.is === 'missing') isMissing = true;
    else parts[name] = end.value;
  }
  if (isMissing) return { is: 'missing' };
  const { target, tolerance } = parts;
  if (target === null || tolerance === null) {
    return { is: 'resolved', value: { min: parts.min, max: parts.max } };
  }
  const decimals = Math.max(target.decimals, tolerance.decimals);
  const isExclusive = limit.exclusive ?? false;
  return {
    is: 'resolved',
    value: {
      min: { value: minus(target.value, tolerance.value), isExclusive, decimals },
      max: { value: plus(target.value, tolerance.value), isExclusive, decimals },
    },
  };
}

/** One end; null where a table sets no limit there. */
export function endOf(place: Place, bound: Bound, isExclusive: boolean): Resolved<End | null> {
  if (typeof bound !== 'object') return written(bound, isExclusive);
  const ownExclusive = bound.exclusive ?? isExclusive;
  if ('value' in bound) return written(bound.value, ownExclusive);
  if ('table' in bound) return fromTable(place, bound, ownExclusive);
  const other = meanAt(place.world, bound.quantity, bound.at);
  if (other.is !== 'value') return other;
  if (!isOne(other.value)) return { is: 'doubtful' };
  const value = inUnit(other.value.low, knownOf(bound.quantity).unit, place.unit);
  if (value === null) return { is: 'doubtful' };
  const decimals = decimalsOf(bound.plus);
  const moved = plus(value, exact(bound.plus));
  return { is: 'resolved', value: { value: moved, isExclusive: ownExclusive, decimals } };
}

/** Step that results are rounded to; null where a table that gives it has no row for this mix. */
export function stepFor(place: Place, rounding: Rule['rounding'], limits: Limits): Exact | null {
  const to = rounding?.to;
  if (to === undefined || to === 'limit') {
    const decimals = [limits.min, limits.max].map((end) => end?.decimals ?? 0);
    return stepOfDecimals(Math.max(...decimals));
  }
  if (typeof to !== 'object') return exact(to);
  const found = rowFor(place.world, tableOf(place.world, to.table), place.sieve);
  const cell = found.is === 'row' ? found.row[to.column] : undefined;
  return typeof cell === 'number' || typeof cell === 'string' ? exact(cell) : null;
}

function fromTable(
  place: Place,
  { table: id, column }: { table: string; column: string },
  isExclusive: boolean,
): Resolved<End | null> {
  const table = tableOf(place.world, id);
  const found = rowFor(place.world, table, place.sieve);
  if (found.is === 'no row') return { is: 'doubtful' };
  const cell = found.row[column];
  if (cell === null || cell === undefined) return { is: 'resolved', value: null };
  if (typeof cell !== 'number' && typeof cell !== 'string') return { is: 'doubtful' };
  const unit = table.columns.find(({ name }) => name === column)?.unit ?? null;
  const value = unit === null ? exact(cell) : inUnit(exact(cell), unit, place.unit);
  if (value === null) return { is: 'doubtful' };
  return { is: 'resolved', value: { value, isExclusive, decimals: decimalsOf(cell) } };
}

function inUnit(value: Exact, from: string, to: string | null): Exact | null {
  return to === null ? value : converted(value, from, to);
}

function written(value: number | string, isExclusive: boolean): Resolved<End> {
  return { is: 'resolved', value: { value: exact(value), isExclusive, decimals: decimalsOf(value) } };
}

/** Which side a value is on: under the min, over the max, or inside. */
export function sideOf(value: Exact, { min, max }: Limits): 'under' | 'inside' | 'over' {
  if (min !== null) {
    const order = compare(value, min.value);
    if (order < 0 || (order === 0 && min.isExclusive)) return 'under';
  }
  if (max !== null) {
    const order = compare(value, max.value);
    if (order > 0 || (order === 0 && max.isExclusive)) return 'over';
  }
  return 'inside';
}
