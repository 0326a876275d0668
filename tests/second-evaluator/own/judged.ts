import type { Rule } from '#rules/rule-sets/schema';
import { asNumber, compare, type Exact, exact, least, magnitude, minus } from './exact';
import { type Allowed, isOne } from './interval';
import { type Limits, sideOf } from './limits';
import { rounded } from './rounding';
import type { Verdict } from './world';

export interface Judging {
  limits: Limits;
  method: NonNullable<Rule['rounding']>['method'];
  step: Exact;
  /** ± precision of the judged value, null where none is known. */
  precision: Exact | null;
}

/** One statistic against its limits; undecided where two values that it allows would part. */
export function judged(value: Allowed, { limits, method, step, precision }: Judging): Judgement {
  const low = rounded(value.low, method, step);
  const high = rounded(value.high, method, step);
  const side = sideOf(low, limits);
  const figures = { rounded: null, margin: null, borderline: false, figuresAreLaidDown: false };
  if (side !== sideOf(high, limits)) return { outcome: 'undecided', ...figures };
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

export type Judgement = Omit<Verdict, 'rule' | 'subject'>;

/** Signed, to the nearest limit; below zero is outside. */
export function marginOf(value: Exact, { min, max }: Limits): Exact | null {
  const margins: Exact[] = [];
  if (min !== null) margins.push(minus(value, min.value));
  if (max !== null) margins.push(minus(max.value, value));
  return margins.length === 0 ? null : least(margins);
}

/** The rule's own precision, else 1.96 standard deviations of a mean where the method publishes one. */
export function precisionOf(rule: Rule, deviation: number | undefined, count: number): Exact | null {
  if (rule.precision !== undefined) return exact(rule.precision.value);
  return deviation === undefined ? null : exact((1.96 * deviation) / Math.sqrt(count));
}
