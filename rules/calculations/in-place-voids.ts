import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';

/**
 * In-place air voids from field density against maximum specific gravity, %. 100 − %Gmm.
 *
 * Symbols: %Gmm field density, % of Gmm. Source: Texas DOT, Pavement Manual, section 8.2.
 * Domain: a finite percentage above zero. One point less of compaction is exactly one point more of voids.
 *
 * @example inPlaceVoidsFromMaximum(92) // 8 %
 */
export function inPlaceVoidsFromMaximum(percentGmm: number): NumericResult {
  const fault = unusable({ '%Gmm': percentGmm }, 'positive');
  return fault ? cannot(fault) : known(100 - percentGmm);
}

/**
 * In-place air voids from compaction against laboratory density, %. 100 − C·(100 − Va)/100.
 *
 * Symbols: C compaction, % of laboratory bulk density; Va air voids of the laboratory specimen, %.
 * Source: identity, %Gmm = C·(100 − Va)/100. Domain: C above zero, Va below 100.
 *
 * @example inPlaceVoidsFromLaboratory({ C: 98, Va: 4 }) // 5.92 %
 */
export function inPlaceVoidsFromLaboratory({ C, Va }: { C: number; Va: number }): NumericResult {
  const fault = unusable({ C }, 'positive') ?? unusable({ Va });
  if (fault) return cannot(fault);
  return Va >= 100 ? cannot('Va must be below 100') : known(100 - (C * (100 - Va)) / 100);
}

/**
 * Rule of thumb: one point less of compaction is one point more of voids, %. Va + 100 − C.
 *
 * For showing beside the exact value only; against laboratory density it is too high by (100 − C)·Va/100.
 * Source: common practice, no source.
 *
 * @example pointForPointVoids({ C: 98, Va: 4 }) // 6 %
 */
export function pointForPointVoids({ C, Va }: { C: number; Va: number }): NumericResult {
  const fault = unusable({ C }, 'positive') ?? unusable({ Va });
  return fault ? cannot(fault) : known(Va + 100 - C);
}
