import { cannot, known, type NumericResult } from './numeric-result';

/**
 * Arithmetic mean. x̄ = Σx/n.
 *
 * Source: textbook definition. Domain: at least one value, all finite; else it cannot be had.
 *
 * @example mean([4.2, 4.6, 3.9, 5.1, 4.4, 4.0]) // 4.36667
 */
export function mean(values: readonly number[]): NumericResult {
  if (values.length === 0) return cannot('there are no values');
  if (!values.every(Number.isFinite)) return cannot('one of the values is not a number');
  return known(sum(values) / values.length);
}

/**
 * Trimmed mean: the mean of what is left when the lowest and the highest `dropped` values are taken away.
 *
 * Source: AASHTO T 322 drops one at each end of six faces; from memory, verify.
 * Domain: more than twice as many values as are dropped at one end; order does not matter.
 *
 * @example trimmedMean([4.2, 4.6, 3.9, 5.1, 4.4, 4.0], 1) // 4.3
 */
export function trimmedMean(values: readonly number[], dropped = 1): NumericResult {
  if (!Number.isInteger(dropped) || dropped < 0) return cannot('the number dropped must be a whole number');
  if (values.length <= 2 * dropped) {
    return cannot(`a trimmed mean that drops ${dropped} at each end needs more than ${2 * dropped} values`);
  }
  const ordered = values.toSorted((a, b) => a - b);
  return mean(ordered.slice(dropped, ordered.length - dropped));
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
