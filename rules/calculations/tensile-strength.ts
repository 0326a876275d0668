import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';

/**
 * Indirect tensile strength, kPa. S = 2·P/(π·t·D).
 *
 * Symbols: P failure load, kN; t thickness, mm; D diameter, mm. kN over mm² is GPa, hence the factor 10⁶ to kPa.
 * Source: AASHTO T 283; from memory, verify. Domain: all above zero.
 *
 * @example tensileStrength({ P: 11.2, t: 63.4, D: 101.6 }) // 1106.92 kPa
 */
export function tensileStrength({ P, t, D }: { P: number; t: number; D: number }): NumericResult {
  const fault = unusable({ P, t, D }, 'positive');
  return fault ? cannot(fault) : known((2e6 * P) / (Math.PI * t * D));
}

/**
 * Tensile strength ratio, %. TSR = 100·S2/S1.
 *
 * Symbols: S1 mean dry, S2 mean conditioned strength, same unit. A ratio of means, not a mean of ratios: the
 * specimens of the two subsets are not pairs.
 * Source: AASHTO T 283; from memory, verify. Domain: S1 above zero, S2 not below zero.
 *
 * @example tensileStrengthRatio({ S1: 1104.08, S2: 930.77 }) // 84.303 %
 */
export function tensileStrengthRatio({ S1, S2 }: { S1: number; S2: number }): NumericResult {
  const fault = unusable({ S1 }, 'positive') ?? unusable({ S2 });
  if (fault) return cannot(fault);
  return S2 < 0 ? cannot('a strength is below zero') : known((100 * S2) / S1);
}
