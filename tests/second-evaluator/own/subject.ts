import type { Conditions } from '#rules/record';
import { knownOf } from './known';

/** `design point`, `12.5 mm` for a sieve, `stockpile <name>`, else `mix`. */
export function subjectOf(quantity: string, at: Conditions): string {
  if (at.stockpile === 'each') return 'mix';
  if (at.stockpile !== undefined) return `stockpile ${at.stockpile}`;
  if (at.sieve !== undefined) return `${at.sieve} mm`;
  const isDesign = at.trial === 'design' || (at.trial === undefined && knownOf(quantity).of === 'mix');
  return isDesign ? 'design point' : 'mix';
}
