import type { CreepSampleView } from '#shared/contracts/creep';

/** The drawn curve at a time between two of its samples, along straight lines in logarithms; null outside them. */
export function curveAt(samples: readonly CreepSampleView[], time: number): CreepSampleView | null {
  const after = samples.findIndex((sample) => sample.time >= time);
  const next = samples[after];
  if (next === undefined) return null;
  if (next.time === time) return next;
  const previous = samples[after - 1];
  if (previous === undefined) return null;
  const share = Math.log(time / previous.time) / Math.log(next.time / previous.time);
  const between = (one: number, other: number) => one * (other / one) ** share;
  return {
    time,
    estimate: between(previous.estimate, next.estimate),
    lower: previous.lower === null || next.lower === null ? null : between(previous.lower, next.lower),
    upper: previous.upper === null || next.upper === null ? null : between(previous.upper, next.upper),
  };
}
