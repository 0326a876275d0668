import { roundTo } from '../numerics/round';
import type { ResolvedLimit } from './finding';
import type { Rounder } from './judge';

/** Where a value lies by the rule that judges it. */
export type Side = 'below' | 'inside' | 'above';

/** After the rule's own rounding, as a finding is judged. A value that cannot be had is outside. */
export function sideOf(value: number | null, limit: ResolvedLimit, rounder: Rounder): Side {
  if (value === null || !Number.isFinite(value)) return 'below';
  const far = farSideOf(value, limit, farthestMove(rounder));
  if (far !== null) return far;
  const rounded = roundTo({ value, ...rounder });
  if (limit.min !== null && (limit.minExclusive ? rounded <= limit.min : rounded < limit.min)) return 'below';
  if (limit.max !== null && (limit.maxExclusive ? rounded >= limit.max : rounded > limit.max)) return 'above';
  return 'inside';
}

/** How far rounding can move a value, and a whisker more for binary arithmetic. */
function farthestMove({ method, to }: Rounder): number {
  if (method === 'absolute') return 0;
  return method === 'truncate' ? to * (1 + 1e-9) : to * (0.5 + 1e-9);
}

/** Farther from either limit than rounding reaches, its side needs no rounding. */
function farSideOf(value: number, { min, max }: ResolvedLimit, step: number): Side | null {
  if (min !== null && value < min - step) return 'below';
  if (max !== null && value > max + step) return 'above';
  const isOverMin = min === null || value > min + step;
  return isOverMin && (max === null || value < max - step) ? 'inside' : null;
}

/** The last of a run of places that are alike, found by halving; the first is known to be. */
export function lastAlike(first: number, last: number, isAlike: (place: number) => boolean): number {
  if (isAlike(last)) return last;
  let alike = first;
  let other = last;
  while (other - alike > 1) {
    const middle = Math.floor((alike + other) / 2);
    if (isAlike(middle)) alike = middle;
    else other = middle;
  }
  return alike;
}
