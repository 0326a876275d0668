import type { ResolvedEdition } from '../../rule-sets/resolve';
import { caseHolds, runCase } from '../run-case';
import type { LintRemark } from './remark';

/** Cases that do not give what they expect, and rules with a number for a limit that no case meets exactly. */
export function lintCases(edition: ResolvedEdition): LintRemark[] {
  const remarks: LintRemark[] = [];
  const atLimit = new Set<string>();
  for (const each of edition.cases) {
    const result = runCase(each, edition);
    for (const { rule, margin } of result.findings) if (margin === 0) atLimit.add(rule);
    if (caseHolds(result)) continue;
    remarks.push({
      level: 'error',
      check: 'case',
      part: `cases/${each.id}`,
      detail: `The case “${each.title}” does not give what it expects.`,
      fix: 'Correct the rule or the case.',
    });
  }
  for (const { id, title, limit } of edition.rules) {
    if (limit.present !== undefined || limit.oneOf !== undefined || atLimit.has(id)) continue;
    remarks.push({
      level: 'warning',
      check: 'no case at the limit',
      part: `rules/${id}`,
      detail: `${title} has no case whose value is the limit itself.`,
      fix: 'Add a case at the limit: it shows whether the limit is met there.',
    });
  }
  return remarks;
}
