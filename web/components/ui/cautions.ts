/** Words that the product itself shows wherever findings or shipped rule sets stand. */
export const cautions = {
  findings: 'Findings assist a qualified person and decide nothing by themselves.',
  contract: 'The contract documents and local codes govern; acceptance is the agency’s licensed engineer’s.',
  startingPoint: 'Starting point: check every limit against the agency’s current specification.',
} as const;
