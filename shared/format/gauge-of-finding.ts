import type { Finding } from '#rules/engine/finding';
import type { GaugeInput } from './gauge-geometry';
import { decimalsOf, formatSigned } from './numbers';

/** What a finding's gauge shows; null for one that has none: not applicable, categorical, present or absent. */
export function gaugeOfFinding(
  finding: Finding,
  options: { widthPx: number; otherLimits?: readonly number[] },
): GaugeInput | null {
  const { limit, observed, gauge } = finding;
  if (!limit || finding.outcome === 'not applicable') return null;
  if (limit.min === null && limit.max === null) return null;
  const shown = finding.outcome !== 'not shown';
  const evidence = finding.evidence[0];
  return {
    min: limit.min,
    max: limit.max,
    target: limit.target,
    decimals: limit.decimals,
    unit: limit.unit,
    span: gauge?.span ?? defaultSpan(limit.min ?? limit.max ?? 0),
    scale: gauge?.scale ?? 'linear',
    outcome: finding.outcome,
    value: shown ? (observed?.rounded ?? null) : null,
    precision: shown ? (finding.precision?.value ?? null) : null,
    reported: shown && evidence?.reported ? reportedWhereItDiffers(finding) : null,
    ...(options.otherLimits ? { otherLimits: options.otherLimits } : {}),
    widthPx: options.widthPx,
  };
}

/** The margin as written: signed, in the judged value's decimals, unitless; empty where there is none. */
export function marginText(finding: Pick<Finding, 'margin' | 'observed' | 'limit'>): string {
  if (finding.margin === null) return '';
  const written = finding.observed ? decimalsOf(finding.observed.text) : 0;
  return formatSigned(
    finding.margin,
    Math.max(written, finding.observed ? 0 : (finding.limit?.decimals ?? 0)),
  );
}

/** The row's own sentence with value, limits and margin, in place of the drawing. */
export function gaugeText(finding: Finding): string {
  const margin = marginText(finding);
  return margin === '' ? finding.sentence : `${finding.sentence} Margin ${margin}.`;
}

/** A quantity without a registry entry of its own shows a fifth of its limit on either side. */
function defaultSpan(limit: number): number {
  return Math.abs(limit) / 5 || 1;
}

/** The wedge stands only where the workbook's value is not the judged one at its own written digits. */
function reportedWhereItDiffers(finding: Finding): number | null {
  const reported = finding.evidence[0]?.reported;
  if (!reported) return null;
  const judged = finding.observed?.value;
  if (judged === null || judged === undefined) return reported.value;
  const halfDigit = 0.5 * 10 ** -decimalsOf(reported.text);
  return Math.abs(reported.value - judged) > halfDigit * 1.000001 ? reported.value : null;
}
