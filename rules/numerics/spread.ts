import { decimalDifference } from './decimal-sum';
import { mean } from './mean';
import { cannot, known, type NumericResult } from './numeric-result';
import { squared } from './transcendental';

/**
 * Sample standard deviation. s = √(Σ(x − x̄)²/(n − 1)).
 *
 * Source: textbook definition, n − 1 divisor, as quality-assurance specifications use it
 * (Washington State DOT, Amendments 1-06.2(2)D5). Domain: at least two finite values.
 *
 * @example sampleStandardDeviation([4.2, 4.6, 3.9, 5.1, 4.4, 4.0]) // 0.44121
 */
export function sampleStandardDeviation(values: readonly number[]): NumericResult {
  if (values.length < 2) return cannot('a standard deviation needs at least two values');
  if (!values.every(Number.isFinite)) return cannot('one of the values is not a number');
  return known(unroundedSpread(values).deviation);
}

/**
 * Sample standard deviation, and the mean as a distance from the first value: steps of a further calculation, which a
 * rounding in between would cost half its digits. Counted from the first value, equal values have no spread at all.
 *
 * Source: textbook definition. Domain: at least two finite values.
 *
 * @example unroundedSpread([4, 4, 7]) // the mean is 4 + 1, the deviation √3
 */
export function unroundedSpread(values: readonly number[]): { meanFromFirst: number; deviation: number } {
  const first = values[0] ?? Number.NaN;
  const distances = values.map((value) => decimalDifference(value, first));
  const meanFromFirst = distances.reduce((sum, distance) => sum + distance, 0) / values.length;
  const squares = distances.reduce((sum, distance) => sum + squared(distance - meanFromFirst), 0);
  return { meanFromFirst, deviation: Math.sqrt(squares / (values.length - 1)) };
}

/**
 * Range: the largest value less the smallest, on their decimal forms: of 66.15 and 66.16 it is 0.01, not a hair less.
 *
 * Source: textbook definition. Domain: at least one finite value; of a single value it is 0.
 *
 * @example range([4.2, 4.6, 3.9, 5.1, 4.4, 4.0]) // 1.2
 */
export function range(values: readonly number[]): NumericResult {
  if (values.length === 0) return cannot('there are no values');
  if (!values.every(Number.isFinite)) return cannot('one of the values is not a number');
  return known(decimalDifference(Math.max(...values), Math.min(...values)));
}

/**
 * Coefficient of variation in percent. CV = 100·s/|x̄|.
 *
 * Source: textbook definition. Domain: at least two finite values whose mean is not zero.
 *
 * @example coefficientOfVariation([4.2, 4.6, 3.9, 5.1, 4.4, 4.0]) // 10.1041 %
 */
export function coefficientOfVariation(values: readonly number[]): NumericResult {
  const deviation = sampleStandardDeviation(values);
  if (!deviation.ok) return deviation;
  const centre = mean(values);
  if (!centre.ok) return centre;
  if (centre.value === 0) return cannot('a coefficient of variation needs a mean that is not zero');
  return known((100 * deviation.value) / Math.abs(centre.value));
}
