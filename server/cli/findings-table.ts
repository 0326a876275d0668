import type { CheckResult, Finding } from '#rules/engine/finding';
import type { ReadingResult } from '#rules/reading/reading-result';
import { marginText } from '#shared/format/margin';

/** The findings as a table for a terminal, in the engine's order, with what could not be read under it. */
export function findingsTable(check: CheckResult, reading: ReadingResult): string {
  const rows = check.findings.filter(({ outcome }) => outcome !== 'not applicable').map(rowOf);
  const lines = table([['Clause', 'Outcome', 'Margin', 'Finding'], ...rows]);
  const folded = check.findings.length - rows.length;
  return [
    ...lines,
    ...(folded > 0 ? ['', `${folded} findings are not applicable.`] : []),
    ...section(
      'Not as the mapping knows it',
      reading.departures.map(({ sheet, cell, text }) =>
        `${placeOf(sheet ?? '', cell ?? '')}  ${text}`.trim(),
      ),
    ),
    ...section(
      'In doubt',
      reading.doubts.map(({ sheet, cell, text, reason }) => `${placeOf(sheet, cell)}  ${text}  ${reason}`),
    ),
    ...section(
      'Not used',
      reading.unread.map(({ sheet, cell, text, reason }) => `${placeOf(sheet, cell)}  ${text}  ${reason}`),
    ),
    '',
    summaryLine(check),
    `Recommended: ${check.summary.recommended}. Findings assist a qualified person and decide nothing by themselves.`,
    `Seal ${check.seal.seal}`,
  ].join('\n');
}

function rowOf(finding: Finding): string[] {
  const outcome = [finding.outcome, ...(finding.borderline ? ['borderline'] : [])].join(', ');
  const advisory = finding.severity === 'advisory' ? ' (advisory)' : '';
  const needsReason =
    finding.outcome === 'not shown' || finding.outcome === 'undecided' || finding.clause === null;
  const told =
    needsReason && finding.reason !== '' ? `${finding.sentence} ${finding.reason}` : finding.sentence;
  return [
    finding.clause ?? 'does not add up',
    `${outcome}${advisory}`,
    finding.clause === null ? '' : marginText(finding),
    told,
  ];
}

function table(rows: string[][]): string[] {
  const widths = (rows[0] ?? []).map((_, at) => Math.max(...rows.map((row) => (row[at] ?? '').length)));
  return rows.map((row) =>
    row.map((text, at) => (at === row.length - 1 ? text : text.padEnd(widths[at] ?? 0))).join('  '),
  );
}

function section(title: string, lines: string[]): string[] {
  return lines.length === 0 ? [] : ['', `${title}: ${lines.length}`, ...lines.map((line) => `  ${line}`)];
}

function placeOf(sheet: string, cell: string): string {
  return sheet === '' ? cell : `${sheet} ${cell}`;
}

function summaryLine({ summary }: CheckResult): string {
  const { pass, fail, notShown, undecided, borderline, doesNotAddUp } = summary;
  return `${pass} pass, ${fail} fail, ${notShown} not shown, ${undecided} undecided; ${borderline} borderline, ${doesNotAddUp} do not add up.`;
}
