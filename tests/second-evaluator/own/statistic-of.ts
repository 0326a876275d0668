import type { Statistic } from '#rules/rule-sets/measure';
import { exact } from './exact';
import { type Allowed, greatestOf, isOne, leastOf, meanOf, one } from './interval';
import type { Limits } from './limits';
import type { Value } from './quantity-value';
import { percentWithinLimits, range, standardDeviation, trimmedMean } from './statistics';

type Interval = Pick<Limits, 'min' | 'max'>;

/** One statistic of all values, or null where there are too few or too little is known of them. */
export function statisticOf(values: Value[], statistic: Statistic, within: Interval | null): Allowed | null {
  const allowed = values.map((value) => value.allowed);
  if (statistic === 'count') return one(exact(values.length));
  if (statistic === 'mean') return meanOf(allowed);
  if (statistic === 'min') return leastOf(allowed);
  if (statistic === 'max') return greatestOf(allowed);
  if (values.some(({ isWord }) => isWord) || !allowed.every(isOne)) return null;
  const numbers = allowed.map(({ low }) => low);
  const result = ofNumbers(numbers, statistic, within);
  return result === null ? null : one(result);
}

function ofNumbers(
  numbers: Allowed['low'][],
  statistic: Statistic,
  within: Interval | null,
): Allowed['low'] | null {
  if (statistic === 'trimmed-mean') return trimmedMean(numbers);
  if (statistic === 'range') return numbers.length < 2 ? null : range(numbers);
  if (statistic === 'standard-deviation') return standardDeviation(numbers);
  return percentWithinLimits(numbers, within?.min?.value ?? null, within?.max?.value ?? null);
}
