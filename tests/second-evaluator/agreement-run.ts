import fc from 'fast-check';
import { judgeTwice } from './agreement';
import { caseOf, choices } from './seeded-cases';
import { smallest } from './smallest';
import { Tally } from './tally';

export interface AgreementRun {
  seed: number;
  cases: number;
  /** Called now and then with how many cases were judged. */
  onProgress?: (cases: number, tally: Tally) => void;
}

/** Judges drawn cases twice; throws the smallest form of the first on which the two evaluators part. */
export function runAgreement({ seed, cases, onProgress }: AgreementRun): Tally {
  const tally = new Tally();
  let judged = 0;
  const property = fc.property(choices, (numbers) => {
    const drawn = caseOf(numbers);
    const { disagreements, findings } = judgeTwice(drawn);
    if (disagreements.length > 0) {
      const least = smallest(drawn, (smaller) => judgeTwice(smaller).disagreements.length > 0);
      throw new Error(`${judgeTwice(least).disagreements.join('\n')}\n${JSON.stringify(least)}`);
    }
    tally.add(findings);
    judged += 1;
    if (judged % 1000 === 0) onProgress?.(judged, tally);
  });
  // The case itself is made smaller, which says more than fewer choices.
  fc.assert(property, { seed, numRuns: cases, endOnFailure: true });
  return tally;
}
