import type { Rule } from '#rules/rule-sets/schema';
import { asNumber, compare, type Exact, exact, least, magnitude, minus } from './exact';
import { type Allowed, isOne } from './interval';
import { type Limits, limitsOf, type Place, type Resolved, sideOf } from './limits';
import { type RoundingMethod, rounded, stepOfDecimals, toTwelveDigits } from './rounding';
import { rowFor, tableOf } from './table';
import type { Verdict } from './world';

export type Judgement = Omit<Verdict, 'rule' | 'subject'>;

/** A rule's limits and rounding for this mix. */
export interface Measures {
  limits: Limits;
  method: RoundingMethod;
  step: Exact;
}

export function measuresOf(place: Place, rule: Rule): Resolved<Measures> {
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return limits;
  const method = rule.rounding?.method ?? 'absolute';
  const step = method === 'absolute' ? exact(1) : stepFor(place, rule.rounding, limits.value);
  if (step === null) return { is: 'undecided' };
  return { is: 'resolved', value: { limits: limits.value, method, step } };
}

/** One statistic against its limits; undecided where two values that it allows would part. */
export function judged(value: Allowed, measures: Measures, precision: Exact | null): Judgement {
  const { limits, method, step } = measures;
  const low = rounded(value.low, method, step);
  const side = sideOf(low, limits);
  const figures = { rounded: null, margin: null, borderline: false, figuresAreLaidDown: false };
  if (side !== sideOf(rounded(value.high, method, step), limits)) return { outcome: 'undecided', ...figures };
  const outcome = side === 'inside' ? 'pass' : 'fail';
  if (!isOne(value)) return { outcome, ...figures };
  const margin = marginOf(low, limits);
  return {
    outcome,
    rounded: asNumber(low),
    margin: margin === null ? null : asNumber(margin),
    borderline: margin !== null && precision !== null && compare(magnitude(margin), precision) <= 0,
    figuresAreLaidDown: true,
  };
}

/** The rule's own precision, else 1.96 standard deviations of a mean where the method publishes one. */
export function precisionOf(rule: Rule, deviation: number | undefined, count: number): Exact | null {
  if (rule.precision !== undefined) return exact(rule.precision.value);
  return deviation === undefined ? null : toTwelveDigits((1.96 * deviation) / Math.sqrt(count));
}

/** Signed, to the nearest limit; below zero is outside. */
function marginOf(value: Exact, { min, max }: Limits): Exact | null {
  const margins: Exact[] = [];
  if (min !== null) margins.push(minus(value, min.value));
  if (max !== null) margins.push(minus(max.value, value));
  return margins.length === 0 ? null : least(margins);
}

/** Null where a table that gives the step has no row for this mix. */
function stepFor(place: Place, rounding: Rule['rounding'], limits: Limits): Exact | null {
  const to = rounding?.to;
  if (to === undefined || to === 'limit') {
    return stepOfDecimals(Math.max(limits.min?.decimals ?? 0, limits.max?.decimals ?? 0));
  }
  if (typeof to !== 'object') return exact(to);
  const found = rowFor(place.world, tableOf(place.world, to.table), place.sieve);
  const cell = found.is === 'row' ? found.row[to.column] : undefined;
  return typeof cell === 'number' || typeof cell === 'string' ? exact(cell) : null;
}
