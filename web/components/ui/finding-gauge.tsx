import type { Finding } from '#rules/engine/finding';
import { gaugeOfFinding, gaugeText } from '#shared/format/gauge-of-finding';
import { Gauge } from './gauge';
import { WordGauge } from './word-gauge';

/** The gauge that fits a finding, or nothing where it has none. Widths are drawn, never scaled: 208, 150, 132. */
export function FindingGauge({
  finding,
  widthPx = 208,
  otherLimits,
}: {
  finding: Finding;
  widthPx?: 208 | 150 | 132;
  otherLimits?: readonly number[];
}) {
  if (finding.outcome === 'not applicable') return null;
  const allowed = finding.limit?.oneOf;
  if (allowed && allowed.length > 0) {
    return (
      <WordGauge
        allowed={allowed}
        observed={finding.outcome === 'not shown' ? null : (finding.observed?.text ?? null)}
        outcome={finding.outcome}
        text={gaugeText(finding)}
        widthPx={widthPx}
      />
    );
  }
  const input = gaugeOfFinding(finding, { widthPx, ...(otherLimits ? { otherLimits } : {}) });
  return input ? <Gauge input={input} text={gaugeText(finding)} /> : null;
}
