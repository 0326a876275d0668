import { cannot, known, type NumericResult } from '../numerics/numeric-result';
import type { SievePoint } from './gradation';

/**
 * Surface area of an aggregate, m²/kg. SA = 0.41 + Σ(f·P/100).
 *
 * Symbols: P percent passing, %; f the sieve's factor, m²/kg: 0.41 at 4.75 mm, 0.82 at 2.36, 1.64 at 1.18, 2.87 at
 * 0.6, 6.14 at 0.3, 12.29 at 0.15, 32.77 at 0.075. The constant 0.41 stands for the maximum size.
 * Source: Asphalt Institute MS-2 (1995), surface-area factors; from memory, verify. The same factors to more
 * digits in UFC 3-250-03 (2001), table C-1, which takes 0.409·P9.5/100 in place of the constant.
 * Domain: all seven sieves, each between 0 and 100; one missing sieve is refused, never interpolated.
 *
 * @example 4.75: 70.1, 2.36: 42.4, 1.18: 27.2, 0.6: 19.8, 0.3: 12.4, 0.15: 8.3, 0.075: 6.3 // 5.9054 m²/kg
 */
export function surfaceArea(gradation: readonly SievePoint[]): NumericResult {
  let sum = maximumSizeFactor;
  for (const [openingMm, factor] of surfaceAreaFactors) {
    const point = gradation.find((sieve) => sieve.openingMm === openingMm);
    if (point === undefined) return cannot(`percent passing ${openingMm} mm is missing`);
    if (!(point.passingPercent >= 0 && point.passingPercent <= 100)) {
      return cannot(`percent passing ${openingMm} mm is not between 0 and 100`);
    }
    sum += (factor * point.passingPercent) / 100;
  }
  return known(sum);
}

/** m²/kg per unit fraction passing, by opening in mm. */
export const surfaceAreaFactors: readonly (readonly [number, number])[] = [
  [4.75, 0.41],
  [2.36, 0.82],
  [1.18, 1.64],
  [0.6, 2.87],
  [0.3, 6.14],
  [0.15, 12.29],
  [0.075, 32.77],
];

const maximumSizeFactor = 0.41;
