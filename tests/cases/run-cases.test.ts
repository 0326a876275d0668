import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import type { Finding, Outcome } from '#rules/engine/finding';
import { outcomeSchema } from '#rules/engine/finding';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { ExpectedFinding, Layer, RuleSet, RuleSetCase } from '#rules/rule-sets/schema';
import { isLayer } from '#rules/rule-sets/schema';
import { shippedEditions } from '#tests/builders/shipped-editions';
import impossible from './impossible-outcomes.json';

const impossibleOutcomes: Record<string, Record<string, Partial<Record<string, string>>>> = impossible;

describe.each(shippedEditions())('$file', ({ ruleSet, edition }) => {
  it.each(edition.cases.map((each) => [each.title, each] as const))('%s', (_, each) => {
    expect(edition.cases.length).toBeGreaterThan(0);
    expect(differences(each, edition)).toEqual([]);
  });

  it('has a case for every outcome that each rule can have', () => {
    const covered = new Set(
      edition.cases.flatMap(({ expected }) => expected.map((e) => `${e.rule}: ${e.outcome}`)),
    );
    const lacking = rulesToCover(ruleSet).flatMap((rule) =>
      outcomeSchema.options
        .filter((outcome) => impossibleReason(ruleSet, rule, outcome) === undefined)
        .map((outcome) => `${rule}: ${outcome}`)
        .filter((each) => !covered.has(each)),
    );
    expect(lacking).toEqual([]);
  });

  it('calls no outcome impossible that a case shows', () => {
    const shown = edition.cases.flatMap(({ expected }) =>
      expected.filter(({ rule, outcome }) => impossibleReason(ruleSet, rule, outcome) !== undefined),
    );
    expect(shown).toEqual([]);
  });
});

/**
 * What a case expects and did not get, and findings of its rules that it does not list. A case that names subjects
 * may leave out those that its small record does not show.
 */
function differences(each: RuleSetCase, edition: ResolvedEdition): string[] {
  const { findings } = evaluate(each.record, edition, each.context);
  const rules = [...new Set(each.expected.map(({ rule }) => rule))];
  return rules.flatMap((rule) => {
    const found = findings.filter((finding) => finding.rule === rule);
    const expected = each.expected.filter((expectation) => expectation.rule === rule);
    const unmet = expected
      .filter((expectation) => !found.some((finding) => meets(finding, expectation)))
      .map(
        (expectation) => `expected ${JSON.stringify(expectation)}, found ${found.map(inShort).join(' | ')}`,
      );
    const namesSubjects = expected.every(({ subject }) => subject !== undefined);
    const unlisted = found
      .filter(({ outcome }) => !(namesSubjects && outcome === 'not shown'))
      .filter((finding) => !expected.some((expectation) => meets(finding, expectation)))
      .map((finding) => `not listed: ${inShort(finding)}`);
    return [...unmet, ...unlisted];
  });
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

function inShort(finding: Finding): string {
  return `${finding.rule} (${finding.subject}) ${finding.outcome}: ${finding.sentence} ${finding.reason}`;
}

/** A layer answers for the rules that it brings; the base's own are covered by the base's cases. */
function rulesToCover(ruleSet: RuleSet | Layer): string[] {
  return isLayer(ruleSet)
    ? [...ruleSet.add.rules, ...ruleSet.replace.rules].map(({ id }) => id)
    : ruleSet.rules.map(({ id }) => id);
}

function impossibleReason(ruleSet: RuleSet | Layer, rule: string, outcome: Outcome): string | undefined {
  return impossibleOutcomes[`${ruleSet.id}@${ruleSet.edition}`]?.[rule]?.[outcome];
}
