import type { Finding } from '#rules/engine/finding';
import { resolvedLimitWords } from '#rules/rule-sets/limit-words';
import { withUnit } from '#shared/format/units';

/** What follows a finding's title where there is room for a few words only: value before limit, or what would decide it. */
export function findingBrief(finding: Pick<Finding, 'outcome' | 'observed' | 'limit' | 'reason'>): string {
  if (finding.outcome === 'not shown' || finding.outcome === 'undecided') return finding.reason;
  if (!finding.observed) return '';
  const value = withUnit(finding.observed.text, finding.observed.unit);
  const limit = finding.limit ? resolvedLimitWords(finding.limit) : '';
  return limit === '' ? value : `${value}, ${limit}`;
}
