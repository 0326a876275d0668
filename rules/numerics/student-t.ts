import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { cannot, known, type NumericResult } from './numeric-result';

/**
 * Half the width of a two-sided interval in standard errors: the t quantile at (1 + confidence)/2.
 *
 * Source: Student's t distribution, from a kept library; held against a printed table by a test. Domain:
 * confidence strictly between 0 and 1, at least one degree of freedom.
 *
 * @example twoSidedT(0.95, 7) // 2.365
 */
export function twoSidedT(confidence: number, degreesOfFreedom: number): NumericResult {
  if (!(confidence > 0 && confidence < 1)) return cannot('a confidence lies between 0 and 1');
  if (!(degreesOfFreedom >= 1)) return cannot('an interval needs at least one degree of freedom');
  const key = `${confidence} ${degreesOfFreedom}`;
  const kept = quantiles.get(key);
  if (kept !== undefined) return kept;
  const result = known(tQuantile((1 + confidence) / 2, degreesOfFreedom));
  if (quantiles.size >= KEPT) quantiles.clear();
  quantiles.set(key, result);
  return result;
}

/** The quantile is solved for by iteration, and a curve asks for the same one at every place. */
const KEPT = 500;
const quantiles = new Map<string, NumericResult>();
