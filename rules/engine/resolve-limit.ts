import Decimal from 'decimal.js';
import { decimalsOf } from '../numerics/round';
import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import { measuredUnit } from '../rule-sets/check-rule';
import type { Bound } from '../rule-sets/limit';
import { allowedWords } from '../rule-sets/limit-words';
import type { ResolvedRule } from '../rule-sets/resolve';
import type { ResolvedLimit } from './finding';
import { type FoundRow, findRow, numberOfCell } from './look-up';
import { notApplicable, type Obstacle, undecided } from './obstacle';
import { quantityValue } from './quantity-value';
import type { World } from './world';

export type LimitResult = { ok: true; limit: ResolvedLimit } | Obstacle;

interface ResolvedBound {
  value: number;
  decimals: number;
  unit: string | null;
  exclusive: boolean;
  found: FoundRow | null;
}

/** The limits of a rule for this mix and subject, with the document and table row that gave them. */
export function resolveLimit(world: World, rule: ResolvedRule, at: Conditions): LimitResult {
  const { limit } = rule;
  if (limit.present) return { ok: true, limit: emptyLimit(world, rule) };
  if (limit.oneOf !== undefined) return resolveOneOf(world, rule, at);
  const bounds: Partial<Record<'min' | 'max' | 'target' | 'tolerance', ResolvedBound>> = {};
  for (const end of ['min', 'max', 'target', 'tolerance'] as const) {
    const bound = limit[end];
    if (bound === undefined) continue;
    const resolved = resolveBound(world, bound, limit.exclusive ?? false, at);
    if (!resolved.ok) return resolved;
    if (resolved.bound !== null) bounds[end] = resolved.bound;
  }
  return composed(world, rule, bounds);
}

export interface IntervalUnits {
  /** Unit of a number that stands in the rule itself. */
  written: string;
  wanted: string;
}

export interface ResolvedInterval {
  min: number | null;
  max: number | null;
  minExclusive: boolean;
  maxExclusive: boolean;
}

/** `where`, `alsoEach` or `within` for this mix, in the unit that the values stand in. */
export function resolveInterval(
  world: World,
  interval: { min?: Bound | undefined; max?: Bound | undefined },
  at: Conditions,
  units: IntervalUnits,
): { ok: true; interval: ResolvedInterval } | Obstacle {
  const ends: ResolvedInterval = { min: null, max: null, minExclusive: false, maxExclusive: false };
  for (const end of ['min', 'max'] as const) {
    const bound = interval[end];
    if (bound === undefined) continue;
    const resolved = resolveBound(world, bound, false, at);
    if (!resolved.ok) return resolved;
    if (resolved.bound === null) continue;
    const inUnit = boundInUnit(resolved.bound, units.written, units.wanted, 'point');
    if (!inUnit.ok) return inUnit;
    ends[end] = inUnit.value;
    ends[`${end}Exclusive`] = resolved.bound.exclusive;
  }
  return { ok: true, interval: ends };
}

function composed(
  world: World,
  rule: ResolvedRule,
  bounds: Partial<Record<'min' | 'max' | 'target' | 'tolerance', ResolvedBound>>,
): LimitResult {
  const all = Object.values(bounds);
  const table = all.find(({ found }) => found !== null)?.found ?? null;
  const { target, tolerance } = bounds;
  const isTarget = rule.limit.target !== undefined;
  if (all.length === 0 || (isTarget && (!target || !tolerance))) {
    return notApplicable(`${table?.table.title ?? tableTitleOf(world, rule)} sets no limit here.`);
  }
  const decimals = Math.max(...all.map((bound) => bound.decimals));
  const base = emptyLimit(world, rule);
  const unit = all.find(({ found, unit: own }) => found !== null && own !== null)?.unit ?? base.unit;
  const limit: ResolvedLimit = { ...base, unit, decimals, from: provenance(rule, table) };
  const values: Partial<Record<keyof typeof bounds, number>> = {};
  for (const end of ['min', 'max', 'target', 'tolerance'] as const) {
    const bound = bounds[end];
    if (bound === undefined) continue;
    const inUnit = boundInUnit(bound, base.unit, unit, end === 'tolerance' ? 'distance' : 'point');
    if (!inUnit.ok) return inUnit;
    values[end] = inUnit.value;
  }
  if (values.target !== undefined && values.tolerance !== undefined) {
    limit.target = values.target;
    limit.tolerance = values.tolerance;
    limit.min = new Decimal(values.target).minus(values.tolerance).toNumber();
    limit.max = new Decimal(values.target).plus(values.tolerance).toNumber();
    limit.minExclusive = limit.maxExclusive = (tolerance?.exclusive || target?.exclusive) ?? false;
  } else {
    limit.min = values.min ?? null;
    limit.max = values.max ?? null;
    limit.minExclusive = bounds.min?.exclusive ?? false;
    limit.maxExclusive = bounds.max?.exclusive ?? false;
  }
  if (limit.min !== null && limit.max !== null && limit.min > limit.max) {
    return undecided(
      `The limits contradict each other for this mix: at least ${limit.min} and at most ${limit.max}.`,
    );
  }
  return { ok: true, limit };
}

/** A tolerance is a distance: it moves by the step of the scale, not by its offset. */
function boundInUnit(
  bound: ResolvedBound,
  written: string,
  wanted: string,
  kind: 'point' | 'distance',
): { ok: true; value: number } | Obstacle {
  const own = bound.unit ?? written;
  if (own === wanted) return { ok: true, value: bound.value };
  const converted = convert(bound.value, own, wanted);
  const origin = kind === 'distance' ? convert(0, own, wanted) : { ok: true as const, value: 0 };
  if (!converted.ok || !origin.ok) {
    return undecided(`One limit is in ${own} and the value in ${wanted}, which do not compare.`);
  }
  return { ok: true, value: new Decimal(converted.value).minus(origin.value).toNumber() };
}

function resolveBound(
  world: World,
  bound: Bound,
  exclusiveByLimit: boolean,
  at: Conditions,
): { ok: true; bound: ResolvedBound | null } | Obstacle {
  if (typeof bound !== 'object') return { ok: true, bound: literal(bound, exclusiveByLimit) };
  const exclusive = bound.exclusive ?? exclusiveByLimit;
  if ('value' in bound) return { ok: true, bound: literal(bound.value, exclusive) };
  if ('quantity' in bound) {
    const other = quantityValue(world, bound.quantity, bound.at);
    if (!other.ok) return other;
    const value = new Decimal(other.value).plus(bound.plus).toNumber();
    const entry = world.view.quantity(bound.quantity);
    const decimals = Math.max(entry?.decimals ?? 0, decimalsOf(bound.plus));
    const unit = entry?.unit ?? null;
    return { ok: true, bound: { value, decimals, unit, exclusive, found: null } };
  }
  const row = findRow(world, bound.table, at);
  if (!row.ok) return row;
  const { found } = row;
  const cell = numberOfCell(found.row[bound.column]);
  if (cell === 'unusable')
    return undecided(`${found.table.title ?? found.table.id} has no number in ${bound.column}.`);
  if (cell === null) return { ok: true, bound: null };
  const unit = found.table.columns.find((column) => column.name === bound.column)?.unit ?? null;
  return {
    ok: true,
    bound: { value: cell.value, decimals: decimalsOf(cell.written), unit, exclusive, found },
  };
}

function resolveOneOf(world: World, rule: ResolvedRule, at: Conditions): LimitResult {
  const { oneOf } = rule.limit;
  const base = emptyLimit(world, rule);
  if (oneOf === undefined) return { ok: true, limit: base };
  if (Array.isArray(oneOf)) return { ok: true, limit: { ...base, oneOf: oneOf.map(String) } };
  const row = findRow(world, oneOf.table, at);
  if (!row.ok) return row;
  const cell = row.found.row[oneOf.column];
  if (cell === undefined || cell === null) {
    return notApplicable(`${row.found.table.title ?? row.found.table.id} sets no limit here.`);
  }
  const allowed = Array.isArray(cell) ? cell : typeof cell === 'object' ? [] : [allowedWords(cell)];
  return { ok: true, limit: { ...base, oneOf: allowed, from: provenance(rule, row.found) } };
}

function literal(written: number | string, exclusive: boolean): ResolvedBound {
  return { value: Number(written), decimals: decimalsOf(written), unit: null, exclusive, found: null };
}

function emptyLimit(world: World, rule: ResolvedRule): ResolvedLimit {
  return {
    min: null,
    max: null,
    minExclusive: false,
    maxExclusive: false,
    target: null,
    tolerance: null,
    oneOf: null,
    decimals: 0,
    unit: measuredUnit(rule, world.view) ?? '1',
    from: provenance(rule, null),
  };
}

function provenance(rule: ResolvedRule, found: FoundRow | null): NonNullable<ResolvedLimit['from']> {
  const { document, displaced } = rule.supplied;
  if (found === null) return { document, table: null, tableTitle: null, row: null, displaced };
  return {
    document: found.supplied.document,
    table: found.table.id,
    tableTitle: found.table.title ?? found.table.id,
    row: found.keys,
    displaced: [...displaced, ...found.supplied.displaced],
  };
}

function tableTitleOf(world: World, rule: ResolvedRule): string {
  for (const bound of [rule.limit.min, rule.limit.max, rule.limit.target, rule.limit.tolerance]) {
    if (typeof bound === 'object' && 'table' in bound) return world.view.tableTitle(bound.table);
  }
  return 'The table';
}
