import type { Statistic } from '#rules/rule-sets/measure';
import { exact } from './exact';
import { type Allowed, greatestOf, isOne, leastOf, meanOf, one, rangeOf, trimmedOf } from './interval';
import type { Limits } from './limits';
import { percentWithinLimits, standardDeviation } from './statistics';

/** One statistic of all values, or null where there are too few or too little is known of them. */
export function statisticOf(values: Allowed[], statistic: Statistic, within: Limits | null): Allowed | null {
  if (statistic === 'mean') return meanOf(values);
  if (statistic === 'min') return leastOf(values);
  if (statistic === 'max') return greatestOf(values);
  if (statistic === 'count') return one(exact(values.length));
  if (statistic === 'trimmed-mean') return trimmedOf(values);
  if (statistic === 'range') return values.length < 2 ? null : rangeOf(values);
  if (!values.every(isOne)) return null;
  const numbers = values.map(({ low }) => low);
  const result =
    statistic === 'standard-deviation'
      ? standardDeviation(numbers)
      : percentWithinLimits(numbers, within?.min?.value ?? null, within?.max?.value ?? null);
  return result === null ? null : one(result);
}
