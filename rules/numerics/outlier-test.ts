import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { decimalDifference } from './decimal-sum';
import { cannot, known, type NumericResult } from './numeric-result';
import { unroundedSpread } from './spread';
import { squared } from './transcendental';

export interface OutlierTest {
  /** (largest − mean)/s and (mean − smallest)/s. */
  high: number;
  low: number;
  critical: number;
  /** The end that lies beyond the critical value, the farther one where both do. */
  outlier: 'high' | 'low' | null;
}

/**
 * One outlying value among replicates. T = |x − x̄|/s of the farthest value, against a one-sided critical value.
 *
 * Source: ASTM E178, single outlier; critical values computed, not copied. Domain: at least three finite values with
 * some spread, significance strictly between 0 and 1 (for either end together, half of it).
 *
 * @example outlierTest([96.6, 97.55, 99.3, 98.35], 0.05) // T 1.174 at the high end, none beyond 1.463
 */
export function outlierTest(
  values: readonly number[],
  significance: number,
): { ok: true; test: OutlierTest } | { ok: false; reason: string } {
  const critical = criticalOutlier(values.length, significance);
  if (!critical.ok) return critical;
  if (!values.every(Number.isFinite)) return cannot('one of the values is not a number');
  const first = values[0] ?? Number.NaN;
  const { meanFromFirst, deviation } = unroundedSpread(values);
  if (deviation === 0) return cannot('values without spread have no outlier');
  const high = (decimalDifference(Math.max(...values), first) - meanFromFirst) / deviation;
  const low = (meanFromFirst - decimalDifference(Math.min(...values), first)) / deviation;
  const isBeyond = Math.max(high, low) > critical.value;
  const outlier = isBeyond ? (high >= low ? 'high' : 'low') : null;
  return { ok: true, test: { high, low, critical: critical.value, outlier } };
}

/**
 * Critical T of a single outlier among n values, one-sided.
 *
 * T = (n − 1)/√n·√(t²/(n − 2 + t²)), t the upper α/n quantile of Student's t with n − 2 degrees of freedom.
 *
 * Source: ASTM E178, critical values for T; exact where T ≥ √((n − 1)(n − 2)/(2n)), else a bound that is too large by
 * less than about 0.002 for n to 25. Domain: n of 3 or more, α strictly between 0 and 1.
 *
 * @example criticalOutlier(4, 0.05) // 1.463
 */
export function criticalOutlier(count: number, significance: number): NumericResult {
  if (!Number.isInteger(count) || count < 3) return cannot('an outlier test needs at least three values');
  if (!(significance > 0 && significance < 1)) return cannot('a significance lies between 0 and 1');
  const t = tQuantile(1 - significance / count, count - 2);
  return known(((count - 1) / Math.sqrt(count)) * Math.sqrt(squared(t) / (count - 2 + squared(t))));
}
