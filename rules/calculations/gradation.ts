import { cannot, known, type NumericResult } from '../numerics/numeric-result';
import { power } from '../numerics/transcendental';
import type { Share } from './combined-gravity';

/** Percent passing at a sieve. */
export interface SievePoint {
  openingMm: number;
  passingPercent: number;
}

/**
 * Combined percent passing of a blend at one sieve. P = Σ(ai·Pi)/100.
 *
 * Symbols: ai share of stockpile i in the aggregate, %; Pi its percent passing at the sieve, %.
 * Source: Asphalt Institute MS-2 (1995), blending equation.
 * Domain: shares that sum to 100 within 0.1. Others are refused: dividing by their sum would hide a missing
 * stockpile.
 *
 * @example combinedPassing([{ share: 25, value: 8 }, { share: 28, value: 82 }, { share: 32, value: 100 }, { share: 15, value: 100 }]) // 71.96 %
 */
export function combinedPassing(shares: readonly Share[]): NumericResult {
  if (!shares.every(({ share, value }) => Number.isFinite(share) && Number.isFinite(value))) {
    return cannot('a share or a percent passing is not a number');
  }
  const total = shares.reduce((sum, { share }) => sum + share, 0);
  if (Math.abs(total - 100) > shareClosurePercent + 1e-9)
    return cannot('the stockpile shares do not sum to 100');
  return known(shares.reduce((sum, { share, value }) => sum + share * value, 0) / 100);
}

/** How far stockpile shares may be off 100 before a blend is refused, in percentage points. */
export const shareClosurePercent = 0.1;

/**
 * Nominal maximum aggregate size, mm: one sieve larger than the first sieve to retain more than 10 percent.
 *
 * Source: AASHTO M 323, definitions; from memory, verify. The answer depends on the sieve series, so the series
 * is that of the gradation given. Other definitions exist (California CT 382) and give other sizes.
 * Domain: at least two sieves, one of which retains more than 10 %; exactly 10 is not more than 10.
 *
 * @example nominalMaximumSize of 19.0: 100, 12.5: 95, 9.5: 89 // 12.5
 */
export function nominalMaximumSize(gradation: readonly SievePoint[]): NumericResult {
  const coarseToFine = gradation.toSorted((a, b) => b.openingMm - a.openingMm);
  const first = coarseToFine.findIndex(({ passingPercent }) => 100 - passingPercent > 10);
  if (first === -1) return cannot('no sieve retains more than 10 percent');
  if (first === 0) return cannot('the coarsest sieve given already retains more than 10 percent');
  return known(coarseToFine[first - 1]!.openingMm);
}

/**
 * Fineness modulus: the sum of cumulative percent retained on the standard sieves, divided by 100.
 *
 * Sieves: 150, 75, 37.5, 19, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3 and 0.15 mm; no others belong to the sum.
 * Source: ASTM C136; from memory, verify. Domain: every sieve of the series from the coarsest that retains
 * anything down to 0.15 mm; coarser ones than the coarsest given count as retaining nothing, and only if that one
 * passes 100. A sieve missing in between is refused, because what it would add is not known.
 *
 * @example 40: 90, 20: 50, 10: 20, 4.75 and finer: 0 passing, read as 37.5, 19, 9.5, 4.75 … // 7.4
 */
export function finenessModulus(gradation: readonly SievePoint[]): NumericResult {
  const passing = new Map(gradation.map(({ openingMm, passingPercent }) => [openingMm, passingPercent]));
  const coarsest = Math.max(...passing.keys());
  let sum = 0;
  for (const sieve of finenessSievesMm) {
    const value = passing.get(sieve);
    if (value !== undefined) sum += 100 - value;
    else if (sieve < coarsest || passing.get(coarsest) !== 100)
      return cannot(`the ${sieve} mm sieve is missing`);
  }
  return known(sum / 100);
}

const finenessSievesMm = [150, 75, 37.5, 19, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15];

/**
 * Percent passing of the maximum density line at a sieve. P = 100·(d/D)^0.45.
 *
 * Symbols: d opening of the sieve, D maximum size (one sieve above the nominal maximum), both mm.
 * Source: FHWA (Bureau of Public Roads) 0.45-power chart, 1962; from memory, verify.
 * Domain: both above zero; at and above D the line stays at 100.
 *
 * @example maximumDensityLine(4.75, 19) // 53.589 %
 */
export function maximumDensityLine(openingMm: number, maximumSizeMm: number): NumericResult {
  if (!(openingMm > 0) || !(maximumSizeMm > 0)) return cannot('a sieve opening must be above zero');
  return known(openingMm >= maximumSizeMm ? 100 : 100 * power(openingMm / maximumSizeMm, 0.45));
}
