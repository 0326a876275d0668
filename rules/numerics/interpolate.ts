import { cannot, known, type NumericResult } from './numeric-result';

/**
 * Straight line between the two neighbours of a place. y = y1 + (y2 − y1)·(x − x1)/(x2 − x1).
 *
 * Source: textbook. Domain: finite points, in any order; never beyond the outermost ones; at a given place the
 * value there, or the mean of the values there where there are several.
 *
 * @example interpolate([4.5, 5], [5.1, 3.9], 4.95833) // 4.0
 */
export function interpolate(x: readonly number[], y: readonly number[], at: number): NumericResult {
  if (x.length !== y.length) return cannot('there are not as many values as places');
  if (x.length === 0) return cannot('there are no points');
  if (![...x, ...y, at].every(Number.isFinite)) return cannot('one of the points is not a number');
  const there = y.filter((_, index) => x[index] === at);
  if (there.length > 0) return known(there.reduce((sum, value) => sum + value, 0) / there.length);
  const before = nearest(x, (place) => place < at, Math.max);
  const after = nearest(x, (place) => place > at, Math.min);
  if (before === null || after === null) return cannot('the place lies beyond the points');
  const start = averageAt(x, y, before);
  const end = averageAt(x, y, after);
  return known(start + ((end - start) * (at - before)) / (after - before));
}

function nearest(
  x: readonly number[],
  side: (place: number) => boolean,
  pick: typeof Math.max,
): number | null {
  const places = x.filter(side);
  return places.length === 0 ? null : pick(...places);
}

function averageAt(x: readonly number[], y: readonly number[], place: number): number {
  const there = y.filter((_, index) => x[index] === place);
  return there.reduce((sum, value) => sum + value, 0) / there.length;
}
