import type { Finding } from '#rules/engine/finding';
import { decimalsOf, formatSigned } from './numbers';

/** The margin as written: signed, in the judged value's decimals, unitless; empty where there is none. */
export function marginText(finding: Pick<Finding, 'margin' | 'observed' | 'limit'>): string {
  if (finding.margin === null) return '';
  const decimals = finding.observed ? decimalsOf(finding.observed.text) : (finding.limit?.decimals ?? 0);
  return formatSigned(finding.margin, decimals);
}

/** The row's own sentence with value, limits and margin, in place of its gauge. */
export function gaugeText(finding: Pick<Finding, 'sentence' | 'margin' | 'observed' | 'limit'>): string {
  const margin = marginText(finding);
  return margin === '' ? finding.sentence : `${finding.sentence} Margin ${margin}.`;
}
