import { evaluate } from '../engine/evaluate';
import type { Finding } from '../engine/finding';
import type { ResolvedEdition } from '../rule-sets/resolve';
import type { ExpectedFinding, RuleSetCase } from '../rule-sets/schema';

export interface CaseResult {
  findings: Finding[];
  /** What the case expects and did not get, with what was found for that rule instead. */
  unmet: { expected: ExpectedFinding; found: Finding[] }[];
  /** Findings of its rules that it does not list. */
  unlisted: Finding[];
}

/**
 * Judges a case's record by an edition and holds the findings of the rules that it names against what it expects. A
 * case that names subjects may leave out those that its small record does not show.
 */
export function runCase(each: RuleSetCase, edition: ResolvedEdition): CaseResult {
  const { findings } = evaluate(each.record, edition, each.context);
  const result: CaseResult = { findings, unmet: [], unlisted: [] };
  for (const rule of new Set(each.expected.map((expectation) => expectation.rule))) {
    const found = findings.filter((finding) => finding.rule === rule);
    const expected = each.expected.filter((expectation) => expectation.rule === rule);
    for (const expectation of expected) {
      if (!found.some((finding) => meets(finding, expectation)))
        result.unmet.push({ expected: expectation, found });
    }
    const namesSubjects = expected.every(({ subject }) => subject !== undefined);
    result.unlisted.push(
      ...found
        .filter(({ outcome }) => !(namesSubjects && outcome === 'not shown'))
        .filter((finding) => !expected.some((expectation) => meets(finding, expectation))),
    );
  }
  return result;
}

export function caseHolds({ unmet, unlisted }: Pick<CaseResult, 'unmet' | 'unlisted'>): boolean {
  return unmet.length === 0 && unlisted.length === 0;
}

function meets(finding: Finding, expected: ExpectedFinding): boolean {
  const { subject, outcome, borderline, rounded, margin, limit } = expected;
  return (
    finding.outcome === outcome &&
    (subject === undefined || finding.subject === subject) &&
    (borderline === undefined || finding.borderline === borderline) &&
    (rounded === undefined || (finding.observed?.rounded ?? null) === rounded) &&
    (margin === undefined || finding.margin === margin) &&
    (limit?.min === undefined || (finding.limit?.min ?? null) === limit.min) &&
    (limit?.max === undefined || (finding.limit?.max ?? null) === limit.max)
  );
}
