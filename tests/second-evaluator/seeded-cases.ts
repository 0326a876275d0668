import fc from 'fast-check';
import { drawCase } from './generated/case';
import { CHOICES, drawFrom } from './generated/draw';
import type { GeneratedCase } from './generated/parts';

/** The choices that a case is drawn from. Plain numbers alike: small ones are no more telling than others. */
export const choices = fc.noBias(
  fc.array(fc.nat({ max: 0xfffff }), { minLength: CHOICES, maxLength: CHOICES }),
);

export function caseOf(numbers: readonly number[]): GeneratedCase {
  return drawCase(drawFrom(numbers));
}

/** The same cases for the same seed. */
export function seededCases(seed: number, count: number): GeneratedCase[] {
  return fc.sample(choices, { seed, numRuns: count }).map(caseOf);
}
