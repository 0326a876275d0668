import { decimalsOf } from '../numerics/round';
import { numberWords } from '../rule-sets/words';
import type { ResolvedLimit } from './finding';
import type { Judgement } from './judge';

/** "13.9 is below 14.0 by 0.1.", "14.0 is on the limit, which is included." */
export function distanceWords(
  { rounded, margin, outcome }: Pick<Judgement, 'rounded' | 'margin' | 'outcome'>,
  limit: ResolvedLimit,
): string {
  const decimals = Math.max(limit.decimals, Math.min(6, decimalsOf(rounded)));
  const value = numberWords(rounded, decimals);
  if (margin === null) return `${value} is ${outcome === 'pass' ? 'inside' : 'outside'} the limit.`;
  if (margin === 0) return `${value} is on the limit, which is ${outcome === 'pass' ? '' : 'not '}included.`;
  const distance = numberWords(Math.abs(margin), Math.max(decimals, Math.min(6, decimalsOf(margin))));
  if (margin > 0) return `${value} is inside the limit by ${distance}.`;
  const isBelow = limit.min !== null && rounded < limit.min;
  const end = isBelow ? limit.min : limit.max;
  return `${value} is ${isBelow ? 'below' : 'above'} ${numberWords(end ?? 0, decimals)} by ${distance}.`;
}
