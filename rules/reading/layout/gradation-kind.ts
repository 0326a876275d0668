/** How a run of percentages over sieves behaves, from the coarsest sieve to the finest. */
export type GradationKind = 'percent-passing' | 'percent-retained' | 'cumulative-percent-retained';

/**
 * What a column of percentages can be by arithmetic alone: passing falls towards the fines, cumulative retained
 * rises, individual retained does neither and sums to about 100. Null where the figures do not tell.
 */
export function gradationKind(points: { sieve: number; value: number }[]): GradationKind | null {
  if (points.length < 4) return null;
  const values = points.toSorted((a, b) => b.sieve - a.sieve).map(({ value }) => value);
  const first = values[0] as number;
  const last = values.at(-1) as number;
  const steps = values.slice(1).map((value, at) => value - (values[at] as number));
  const falls = steps.every((step) => step <= 0.05);
  const rises = steps.every((step) => step >= -0.05);
  if (falls && !rises && first > 60 && last < 40) return 'percent-passing';
  if (rises && !falls && first < 40 && last > 60) return 'cumulative-percent-retained';
  if (falls || rises) return null;
  const sum = values.reduce((total, value) => total + value, 0);
  return sum > 60 && sum < 100.6 ? 'percent-retained' : null;
}
