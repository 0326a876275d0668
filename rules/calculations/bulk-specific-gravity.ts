import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';

export interface SpecimenMasses {
  /** Dry mass in air, g. */
  A: number;
  /** Saturated surface-dry mass, g. */
  B: number;
  /** Mass in water, g. */
  C: number;
}

/**
 * Bulk specific gravity of a compacted specimen. Gmb = A/(B − C).
 *
 * Symbols: A dry mass in air, B saturated surface-dry mass, C mass in water, all g; Gmb has no unit.
 * Source: AASHTO T 166, method A; from memory, verify.
 * Domain: all above zero and B above C. B may equal A (no water taken up); B below A is impossible and refused.
 *
 * @example bulkSpecificGravity({ A: 4835.2, B: 4841.6, C: 2820 }) // 4835.2/2021.6 = 2.39177
 */
export function bulkSpecificGravity({ A, B, C }: SpecimenMasses): NumericResult {
  const fault = faultOf({ A, B, C });
  return fault ? cannot(fault) : known(A / (B - C));
}

/**
 * Water taken up by a compacted specimen, percent by volume. 100·(B − A)/(B − C).
 *
 * Symbols and source as bulk specific gravity. Above 2 % the method asks for a sealed specimen (AASHTO T 166,
 * from memory, verify); the calculation itself does not judge that.
 *
 * @example specimenAbsorption({ A: 4835.2, B: 4841.6, C: 2820 }) // 640/2021.6 = 0.31658 %
 */
export function specimenAbsorption({ A, B, C }: SpecimenMasses): NumericResult {
  const fault = faultOf({ A, B, C });
  return fault ? cannot(fault) : known((100 * (B - A)) / (B - C));
}

function faultOf(masses: SpecimenMasses): string | null {
  const fault = unusable({ ...masses }, 'positive');
  if (fault) return fault;
  if (masses.B <= masses.C) return 'the surface-dry mass must be above the mass in water';
  if (masses.B < masses.A) return 'the surface-dry mass must not be below the dry mass';
  return null;
}
