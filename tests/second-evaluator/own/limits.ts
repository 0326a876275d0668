import type { Bound, Limit } from '#rules/rule-sets/limit';
import { compare, type Exact, exact, minus, plus } from './exact';
import { isOne } from './interval';
import { knownOf } from './known';
import { meanAt } from './quantity-value';
import { decimalsOf } from './rounding';
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
  /** What the value is judged in: a table's own unit where one gives a limit. Null where there is none. */
  unit: string | null;
}

export type Resolved<T> =
  | { is: 'resolved'; value: T }
  | { is: 'not shown' }
  | { is: 'undecided' }
  /** Where a table sets no limit, nothing is asked of the mix. */
  | { is: 'not applicable' };

export interface Place {
  world: World;
  sieve?: number | undefined;
  /** Unit of what is judged, where it has one; a number that stands in the rule is in it. */
  unit: string | null;
}

interface Written extends End {
  unit: string | null;
  isOfTable: boolean;
}

const ENDS = ['min', 'max', 'target', 'tolerance'] as const;

/** Min and max for this mix; a target and its tolerance become both. */
export function limitsOf(place: Place, limit: Limit): Resolved<Limits> {
  const found: Partial<Record<(typeof ENDS)[number], Written>> = {};
  let unit = place.unit;
  let hasUnit = false;
  for (const name of ENDS) {
    const bound = limit[name];
    if (bound === undefined) continue;
    const end = writtenEnd(place, bound, limit.exclusive ?? false);
    if (end.is !== 'resolved') return end;
    if (end.value === null) continue;
    found[name] = end.value;
    if (end.value.isOfTable && end.value.unit !== null && !hasUnit) {
      unit = end.value.unit;
      hasUnit = true;
    }
  }
  const isTarget = limit.target !== undefined;
  const isEmpty = isTarget
    ? found.target === undefined || found.tolerance === undefined
    : found.min === undefined && found.max === undefined;
  if (isEmpty) return { is: 'not applicable' };
  const moved = inOneUnit(found, place.unit, unit);
  return moved === null ? { is: 'undecided' } : inOrder(asEnds(moved, unit));
}

type Found = Partial<Record<(typeof ENDS)[number], End>>;

function inOneUnit(
  found: Partial<Record<(typeof ENDS)[number], Written>>,
  own: string | null,
  unit: string | null,
): Found | null {
  const moved: Found = {};
  for (const name of ENDS) {
    const end = found[name];
    if (end === undefined) continue;
    const from = end.unit ?? own;
    const value = from === null || unit === null ? end.value : converted(end.value, from, unit);
    const origin = from === null || unit === null ? exact(0) : converted(exact(0), from, unit);
    if (value === null || origin === null) return null;
    moved[name] = { ...end, value: name === 'tolerance' ? minus(value, origin) : value };
  }
  return moved;
}

function asEnds({ min = undefined, max = undefined, target, tolerance }: Found, unit: string | null): Limits {
  if (target === undefined || tolerance === undefined) return { min: min ?? null, max: max ?? null, unit };
  const end = {
    isExclusive: target.isExclusive || tolerance.isExclusive,
    decimals: Math.max(target.decimals, tolerance.decimals),
  };
  return {
    min: { ...end, value: minus(target.value, tolerance.value) },
    max: { ...end, value: plus(target.value, tolerance.value) },
    unit,
  };
}

/** Two ends that contradict each other for this mix decide nothing. */
function inOrder(limits: Limits): Resolved<Limits> {
  const { min, max } = limits;
  const isCrossed = min !== null && max !== null && compare(min.value, max.value) > 0;
  return isCrossed ? { is: 'undecided' } : { is: 'resolved', value: limits };
}

/** One end as it is written; null where a table sets no limit there. */
function writtenEnd(place: Place, bound: Bound, byLimit: boolean): Resolved<Written | null> {
  if (typeof bound !== 'object') return literal(bound, byLimit);
  const isExclusive = bound.exclusive ?? byLimit;
  if ('value' in bound) return literal(bound.value, isExclusive);
  if ('table' in bound) return fromTable(place, bound, isExclusive);
  const other = meanAt(place.world, bound.quantity, bound.at);
  if (other.is === 'missing') return { is: 'not shown' };
  if (other.is === 'doubtful' || !isOne(other.value)) return { is: 'undecided' };
  const value = plus(other.value.low, exact(bound.plus));
  const { unit } = knownOf(bound.quantity);
  return resolved({ value, isExclusive, decimals: decimalsOf(bound.plus), unit, isOfTable: false });
}

function fromTable(
  place: Place,
  { table: id, column }: { table: string; column: string },
  isExclusive: boolean,
): Resolved<Written | null> {
  const table = tableOf(place.world, id);
  const found = rowFor(place.world, table, place.sieve);
  if (found.is === 'no row') return { is: 'undecided' };
  const cell = found.row[column];
  if (cell === null || cell === undefined) return { is: 'resolved', value: null };
  if (typeof cell !== 'number' && typeof cell !== 'string') return { is: 'undecided' };
  const unit = table.columns.find(({ name }) => name === column)?.unit ?? null;
  return resolved({ value: exact(cell), isExclusive, decimals: decimalsOf(cell), unit, isOfTable: true });
}

function literal(value: number | string, isExclusive: boolean): Resolved<Written> {
  return resolved({
    value: exact(value),
    isExclusive,
    decimals: decimalsOf(value),
    unit: null,
    isOfTable: false,
  });
}

function resolved<T>(value: T): { is: 'resolved'; value: T } {
  return { is: 'resolved', value };
}

/** Which side a value is on: under the min, over the max, or inside. */
export function sideOf(value: Exact, { min, max }: Pick<Limits, 'min' | 'max'>): 'under' | 'inside' | 'over' {
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
