/** The words that the product itself, every document and every mail carry: said in one place, so that they are the same. */
export const cautions = {
  findings: 'Findings assist a qualified person and decide nothing by themselves.',
  contract: 'The contract documents and local codes govern; acceptance is the agency’s licensed engineer’s.',
  startingPoint: 'Starting point: check every limit against the agency’s current specification.',
} as const;

/** What the foot of a page says where a check is shown. */
export function checkCautions(startingPoint: boolean): string[] {
  return startingPoint ? [cautions.startingPoint, cautions.findings] : [cautions.findings];
}

/** For a document that stands on its own, away from the product. */
export function cautionsFor({ startingPoint }: { startingPoint: boolean }): string {
  const said: string[] = [cautions.findings, cautions.contract];
  if (startingPoint) said.push(cautions.startingPoint);
  return said.join(' ');
}
