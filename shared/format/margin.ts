import type { Finding } from '#rules/engine/finding';
import { decimalsOf, formatFixed, formatSigned } from './numbers';

/** A value that no rule rounds may be written with every digit of its calculation; more than these say nothing. */
const mostDecimals = 4;

/** The judged value as it is shown: as the rule writes it, without a calculation's idle digits. */
export function observedText({
  text,
  value,
}: Pick<NonNullable<Finding['observed']>, 'text' | 'value'>): string {
  if (value === null || decimalsOf(text) <= mostDecimals) return text;
  return formatFixed(value, mostDecimals);
}

/** The margin as written: signed, in the judged value's decimals, unitless; empty where there is none. */
export function marginText(finding: Pick<Finding, 'margin' | 'observed' | 'limit'>): string {
  if (finding.margin === null) return '';
  const decimals = finding.observed ? decimalsOf(finding.observed.text) : (finding.limit?.decimals ?? 0);
  return formatSigned(finding.margin, Math.min(decimals, mostDecimals));
}

/** The row's own sentence with value, limits and margin, in place of its gauge. */
export function gaugeText(finding: Pick<Finding, 'sentence' | 'margin' | 'observed' | 'limit'>): string {
  const margin = marginText(finding);
  return margin === '' ? finding.sentence : `${finding.sentence} Margin ${margin}.`;
}
