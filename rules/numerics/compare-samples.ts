import fDistribution from '@stdlib/stats-base-dists-f-cdf';
import tDistribution from '@stdlib/stats-base-dists-t-cdf';
import { mean } from './mean';
import { cannot, known } from './numeric-result';
import { sampleStandardDeviation } from './spread';
import { squared } from './transcendental';

export interface SampleComparison {
  /** The larger variance over the smaller. */
  F: number;
  /** Degrees of freedom of the larger variance, then of the smaller. */
  degreesOfF: [number, number];
  /** Two-sided probability of an F as large where the variances are the same. */
  probabilityF: number;
  sameVariance: boolean;
  t: number;
  degreesOfT: number;
  /** Two-sided probability of a t as far from zero where the means are the same. */
  probabilityT: number;
  sameMean: boolean;
}

type Comparison = { ok: true; comparison: SampleComparison } | { ok: false; reason: string };

/**
 * Two laboratories' independent results: F test on their variances, then t test on their means.
 *
 * F = s²larger/s²smaller with n − 1 degrees of freedom each. Variances taken for the same: t = (x̄1 − x̄2)/√(sp²·(1/n1 +
 * 1/n2)), sp² the pooled variance, n1 + n2 − 2 degrees. Else t = (x̄1 − x̄2)/√(s1²/n1 + s2²/n2), with Welch's degrees of
 * freedom (n − 1 form). Both tests are two-sided at the significance given.
 *
 * Source: FHWA-RD-02-095 (2003), appendix F, F test then t test (read). Domain: at least two finite values each, both
 * with some spread, significance strictly between 0 and 1.
 *
 * @example compareSamples([5.42, 5.51, 5.37, 5.6, 5.48], [5.36, 5.47, 5.35, 5.52, 5.45], 0.01) // same, same
 */
export function compareSamples(
  first: readonly number[],
  second: readonly number[],
  significance: number,
): Comparison {
  if (!(significance > 0 && significance < 1)) return cannot('a significance lies between 0 and 1');
  const one = summarise(first);
  if (!one.ok) return one;
  const other = summarise(second);
  if (!other.ok) return other;
  if (one.variance === 0 || other.variance === 0) return cannot('a sample without spread cannot be compared');
  const [larger, smaller] = one.variance >= other.variance ? [one, other] : [other, one];
  const F = larger.variance / smaller.variance;
  const degreesOfF: [number, number] = [larger.count - 1, smaller.count - 1];
  const probabilityF = Math.min(1, 2 * (1 - fDistribution(F, ...degreesOfF)));
  const sameVariance = probabilityF > significance;
  const { t, degreesOfT } = sameVariance ? pooled(one, other) : unequal(one, other);
  const probabilityT = twoSided(t, degreesOfT);
  return {
    ok: true,
    comparison: {
      F,
      degreesOfF,
      probabilityF,
      sameVariance,
      t,
      degreesOfT,
      probabilityT,
      sameMean: probabilityT > significance,
    },
  };
}

export interface PairComparison {
  meanDifference: number;
  t: number;
  degreesOfT: number;
  probabilityT: number;
  sameMean: boolean;
}

/**
 * Split samples tested by two laboratories: paired t test. t = d̄/(s_d/√n), n − 1 degrees of freedom, two-sided.
 *
 * Source: textbook definition; agencies use it for split samples. Domain: two or more pairs whose differences have some
 * spread, significance strictly between 0 and 1.
 *
 * @example comparePairs([5.42, 5.51, 5.37, 5.6, 5.48], [5.36, 5.47, 5.35, 5.52, 5.45], 0.01) // t 4.271, same
 */
export function comparePairs(
  first: readonly number[],
  second: readonly number[],
  significance: number,
): { ok: true; comparison: PairComparison } | { ok: false; reason: string } {
  if (!(significance > 0 && significance < 1)) return cannot('a significance lies between 0 and 1');
  if (first.length !== second.length) return cannot('the two laboratories have not as many results');
  // Binary noise in a difference would pass for spread.
  const differences = first.map((value, place) => {
    const difference = known(value - second[place]!);
    return difference.ok ? difference.value : Number.NaN;
  });
  const summary = summarise(differences);
  if (!summary.ok) return summary;
  if (summary.variance === 0) return cannot('differences without spread cannot be tested');
  const t = summary.mean / Math.sqrt(summary.variance / summary.count);
  const degreesOfT = summary.count - 1;
  const probabilityT = twoSided(t, degreesOfT);
  const sameMean = probabilityT > significance;
  return { ok: true, comparison: { meanDifference: summary.mean, t, degreesOfT, probabilityT, sameMean } };
}

interface Summary {
  ok: true;
  count: number;
  mean: number;
  variance: number;
}

function summarise(values: readonly number[]): Summary | { ok: false; reason: string } {
  const deviation = sampleStandardDeviation(values);
  if (!deviation.ok) return deviation;
  const centre = mean(values);
  if (!centre.ok) return centre;
  return { ok: true, count: values.length, mean: centre.value, variance: squared(deviation.value) };
}

function pooled(one: Summary, other: Summary): { t: number; degreesOfT: number } {
  const degreesOfT = one.count + other.count - 2;
  const variance = ((one.count - 1) * one.variance + (other.count - 1) * other.variance) / degreesOfT;
  return { t: (one.mean - other.mean) / Math.sqrt(variance * (1 / one.count + 1 / other.count)), degreesOfT };
}

function unequal(one: Summary, other: Summary): { t: number; degreesOfT: number } {
  const a = one.variance / one.count;
  const b = other.variance / other.count;
  const degreesOfT = squared(a + b) / (squared(a) / (one.count - 1) + squared(b) / (other.count - 1));
  return { t: (one.mean - other.mean) / Math.sqrt(a + b), degreesOfT };
}

function twoSided(t: number, degrees: number): number {
  return 2 * (1 - tDistribution(Math.abs(t), degrees));
}
