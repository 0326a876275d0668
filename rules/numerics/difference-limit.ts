import tDistribution from '@stdlib/stats-base-dists-t-cdf';
import { cannot, known, type NumericResult } from './numeric-result';
import { exp, power } from './transcendental';

/**
 * How far apart n results may lie: their acceptable range, in the unit of the standard deviation.
 *
 * limit = multiplier·s, the multiplier the 95 % quantile of the range of n results in standard deviations.
 *
 * Source: ASTM C670, difference limits from a precision statement's one-sigma limit (1s) to d2s; from memory, verify.
 * Statements printed before it use 2.83·1s for two results. Domain: s above zero, 2 to 10 results.
 *
 * @example differenceLimit(0.004, 2) // 0.0111
 */
export function differenceLimit(standardDeviation: number, count: number): NumericResult {
  if (!(standardDeviation > 0)) return cannot('a difference limit needs a standard deviation above zero');
  const multiplier = rangeMultiplier(count);
  return multiplier.ok ? known(multiplier.value * standardDeviation) : multiplier;
}

/**
 * 95 % quantile of the range of n results from one normal distribution of known standard deviation.
 *
 * P(range ≤ q) = n·∫φ(z)·(Φ(z) − Φ(z − q))^(n − 1) dz, solved for P = 0.95.
 *
 * Source: studentised range with infinite degrees of freedom, textbook definition. Domain: n from 2 to 10. For two it is
 * 1.959964·√2 = 2.772.
 *
 * @example rangeMultiplier(3) // 3.314
 */
export function rangeMultiplier(count: number): NumericResult {
  if (!Number.isInteger(count) || count < 2 || count > MOST_RESULTS)
    return cannot(`a difference limit is for 2 to ${MOST_RESULTS} results`);
  const kept = multipliers.get(count);
  if (kept !== undefined) return known(kept);
  let [low, high] = [1, 8];
  while (high - low > 1e-9) {
    const middle = (low + high) / 2;
    if (probabilityOfRange(middle, count) < 0.95) low = middle;
    else high = middle;
  }
  multipliers.set(count, high);
  return known(high);
}

const MOST_RESULTS = 10;
const multipliers = new Map<number, number>();

/** Simpson's rule over ±8 standard deviations; beyond them lies less than 1e-14. */
function probabilityOfRange(q: number, count: number): number {
  const steps = 160;
  const width = 16 / steps;
  let sum = 0;
  for (let i = 0; i <= steps; i += 1) {
    const z = -8 + i * width;
    const weight = i === 0 || i === steps ? 1 : i % 2 === 1 ? 4 : 2;
    const density = exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
    sum += weight * density * power(normal(z) - normal(z - q), count - 1);
  }
  return (count * sum * width) / 3;
}

/** The kept library has no normal distribution function; Student's with so many degrees is it to 1e-10. */
function normal(z: number): number {
  return tDistribution(z, 1e10);
}
