import { cannot, known, type NumericResult } from '../numerics/numeric-result';

export interface Share {
  /** Share of the stockpile in the aggregate, %. Shares need not sum to 100: they are weights. */
  share: number;
  /** The stockpile's own value: a gravity, or an absorption in %. */
  value: number;
}

/**
 * Combined bulk or apparent specific gravity of an aggregate blend. G = ΣPi/Σ(Pi/Gi), the harmonic mean.
 *
 * Symbols: Pi share of stockpile i, %; Gi its gravity (Gsb or Gsa), no unit.
 * Source: AASHTO R 35, Superpave Volumetric Design; from memory, verify. Harmonic because masses are shared
 * and volumes add; an arithmetic mean is a common mistake.
 * Domain: at least one share above zero, none below; gravities above zero. A share of zero is left out.
 *
 * @example combinedGravity([{ share: 47.4, value: 2.716 }, { share: 47.3, value: 2.689 }]) // 2.70245
 */
export function combinedGravity(shares: readonly Share[]): NumericResult {
  const fault = faultOf(shares);
  if (fault) return cannot(fault);
  const used = shares.filter(({ share }) => share > 0);
  if (used.some(({ value }) => value <= 0)) return cannot('a gravity must be above zero');
  return known(total(used) / used.reduce((sum, { share, value }) => sum + share / value, 0));
}

/**
 * Combined water absorption of an aggregate blend. ΣPi·ai/ΣPi, the arithmetic mean by mass.
 *
 * Symbols: Pi share of stockpile i, %; ai its absorption, % of dry mass.
 * Source: AASHTO T 85, section on average values for fractions; from memory, verify.
 * Domain: at least one share above zero, none below.
 *
 * @example combinedAbsorption([{ share: 60, value: 1 }, { share: 40, value: 2 }]) // 1.4 %
 */
export function combinedAbsorption(shares: readonly Share[]): NumericResult {
  const fault = faultOf(shares);
  if (fault) return cannot(fault);
  return known(shares.reduce((sum, { share, value }) => sum + share * value, 0) / total(shares));
}

function faultOf(shares: readonly Share[]): string | null {
  if (!shares.every(({ share, value }) => Number.isFinite(share) && Number.isFinite(value))) {
    return 'a share or a value is not a number';
  }
  if (shares.some(({ share }) => share < 0)) return 'a share must not be below zero';
  return total(shares) > 0 ? null : 'no share is above zero';
}

function total(shares: readonly Share[]): number {
  return shares.reduce((sum, { share }) => sum + share, 0);
}
