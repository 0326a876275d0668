import betaDistribution from '@stdlib/stats-base-dists-beta-cdf';
import { decimalDifference } from './decimal-sum';
import { cannot, known, type NumericResult } from './numeric-result';
import { unroundedSpread } from './spread';

export interface QualityOptions {
  values: readonly number[];
  /** Lower specification limit, or null where there is none. */
  lower: number | null;
  /** Upper specification limit, or null where there is none. */
  upper: number | null;
}

/**
 * Percent within limits, by the exact beta distribution.
 *
 * QU = (U − x̄)/s, QL = (x̄ − L)/s; P = 100·(1 − I(X; a, a)) with a = (n − 2)/2 and
 * X = 0.5 − Q·√n/(2·(n − 1)), X held within 0 and 1; PWL = PU + PL − 100. I is the regularised incomplete beta
 * function, n the number of values, s their sample standard deviation.
 *
 * Source: AASHTO R 9 and FHWA-RD-02-095 (2003), percent within limits; from memory, verify. Agrees with
 * FHWA Technical Advisory T 5080.12 (1989), table 1B, in all cells but one misprint.
 * Domain: at least three finite values and at least one limit, lower not above upper. Values that are all the
 * same have no spread: then 100 where they lie within the limits, both included, else 0.
 *
 * @example percentWithinLimits({ values: [2, 6, 4], lower: 3, upper: 5 }) // 28.51 %
 */
export function percentWithinLimits({ values, lower, upper }: QualityOptions): NumericResult {
  if (lower === null && upper === null) return cannot('percent within limits needs a limit');
  if (lower !== null && upper !== null && lower > upper)
    return cannot('the lower limit lies above the upper');
  if (values.length < 3) return cannot('percent within limits needs at least three values');
  if (!values.every(Number.isFinite)) return cannot('one of the values is not a number');
  const first = values[0] ?? Number.NaN;
  const { meanFromFirst, deviation: s } = unroundedSpread(values);
  const overLower = lower === null ? 0 : decimalDifference(first, lower) + meanFromFirst;
  const underUpper = upper === null ? 0 : decimalDifference(upper, first) - meanFromFirst;
  if (s === 0) return known(overLower >= 0 && underUpper >= 0 ? 100 : 0);
  const above = lower === null ? 100 : percentOneSided(overLower / s, values.length);
  const below = upper === null ? 100 : percentOneSided(underUpper / s, values.length);
  return known(above + below - 100);
}

/**
 * Percent on the good side of one limit for a quality index Q of n values (n ≥ 3).
 *
 * Source and formula: as percent within limits. For n = 4 it is linear, 50 + 100·Q/3, within 0 and 100.
 *
 * @example percentOneSided(2, 6) // 99.97 %
 */
export function percentOneSided(qualityIndex: number, count: number): number {
  const shape = (count - 2) / 2;
  const position = 0.5 - (qualityIndex * Math.sqrt(count)) / (2 * (count - 1));
  return 100 * (1 - betaDistribution(Math.min(1, Math.max(0, position)), shape, shape));
}
