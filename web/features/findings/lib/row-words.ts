import type { Finding } from '#rules/engine/finding';

const markedOrigins = new Set(['fitted', 'interpolated', 'extrapolated', 'converted', 'typed']);

/** What qualifies an outcome: borderline, how the judged value came about, advisory. */
export function outcomeQualifiers(finding: Finding): string[] {
  const qualifiers: string[] = [];
  if (finding.borderline) qualifiers.push('borderline');
  const origin = finding.evidence[0]?.origin;
  if (origin && markedOrigins.has(origin) && finding.outcome !== 'not shown') qualifiers.push(origin);
  if (finding.severity === 'advisory' && finding.outcome !== 'not applicable') qualifiers.push('advisory');
  return qualifiers;
}

/** How a row is named in a heading or a button: its clause, or its title where it has none. */
export function nameOfFinding(finding: Pick<Finding, 'clause' | 'title' | 'subject'>): string {
  return finding.clause ?? finding.title;
}

/** Words stand in the observed column as they are; a number leaves its unit a slot of its own. */
export function isWords(finding: Finding): boolean {
  return finding.observed !== null && finding.observed.rounded === null;
}
