import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';

export interface RelativeDensityInputs {
  /** Bulk specific gravity, measured at the reference number of gyrations. */
  Gmb: number;
  Gmm: number;
  /** Height at the reference number of gyrations, mm. */
  hRef: number;
  /** Height at N gyrations, mm. */
  hN: number;
}

/**
 * Relative density at N gyrations, % of Gmm. %Gmm,N = 100·Gmb·h,ref/(Gmm·h,N).
 *
 * Symbols: h,ref height at the gyrations at which Gmb was measured, h,N height at N, both mm.
 * Source: AASHTO T 312 and R 35; from memory, verify. The cross-section is constant, so volumes go as heights.
 * Domain: all above zero. At the reference itself the heights cancel and it is 100 − Va.
 *
 * @example relativeDensity({ Gmb: 2.445, Gmm: 2.563, hRef: 111.3, hN: 127.4 }) // 83.3405 %
 */
export function relativeDensity({ Gmb, Gmm, hRef, hN }: RelativeDensityInputs): NumericResult {
  const fault = unusable({ Gmb, Gmm, hRef, hN }, 'positive');
  return fault ? cannot(fault) : known((100 * Gmb * hRef) / (Gmm * hN));
}
