/** The cautions that every document and the product itself carry. */
export const findingsCaution = 'Findings assist a qualified person and decide nothing by themselves.';
export const contractCaution = 'The contract documents and local codes govern.';
export const acceptanceCaution = "Acceptance is the agency's licensed engineer's.";
export const startingPointCaution =
  "The rule set is a starting point and is to be checked against the agency's current specification.";

export function cautionsFor({ startingPoint }: { startingPoint: boolean }): string {
  const cautions = [findingsCaution, contractCaution, acceptanceCaution];
  if (startingPoint) cautions.push(startingPointCaution);
  return cautions.join(' ');
}
