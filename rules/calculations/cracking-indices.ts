import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';

export interface CrackingToleranceInputs {
  /** Specimen thickness, mm. */
  t: number;
  /** Specimen diameter, mm. */
  D: number;
  /** Fracture energy, J/m². */
  Gf: number;
  /** Displacement at 75 % of the peak load after the peak, mm. */
  l75: number;
  /** Post-peak slope around 75 % of the peak load, kN/mm; its sign does not matter. */
  m75: number;
}

/**
 * Cracking tolerance index. CT = (t/62)·(l75/D)·(Gf/|m75|)·10⁶, with |m75| in N/m.
 *
 * Symbols as in the inputs; 62 mm is the standard thickness. Here |m75| comes in kN/mm, which is 10⁶ N/m, so the
 * two factors of a million cancel.
 * Source: ASTM D8225; from memory, verify. Domain: all above zero, m75 not zero.
 *
 * @example crackingToleranceIndex({ t: 62, D: 150, Gf: 6000, l75: 3, m75: -2 }) // (3/150)·(6000/2) = 60
 */
export function crackingToleranceIndex({ t, D, Gf, l75, m75 }: CrackingToleranceInputs): NumericResult {
  const fault = unusable({ t, D, Gf, l75, 'm75 without its sign': Math.abs(m75) }, 'positive');
  return fault ? cannot(fault) : known((t / 62) * (l75 / D) * (Gf / Math.abs(m75)));
}

/**
 * Flexibility index. FI = 0.01·Gf/|m|.
 *
 * Symbols: Gf fracture energy, J/m²; m slope at the inflection point after the peak, kN/mm, sign ignored.
 * Source: AASHTO T 393; from memory, verify. Domain: Gf above zero, m not zero.
 *
 * @example flexibilityIndex({ Gf: 1800, m: -2 }) // 9
 */
export function flexibilityIndex({ Gf, m }: { Gf: number; m: number }): NumericResult {
  const fault = unusable({ Gf, 'm without its sign': Math.abs(m) }, 'positive');
  return fault ? cannot(fault) : known((0.01 * Gf) / Math.abs(m));
}
