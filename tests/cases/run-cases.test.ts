import { describe, expect, it } from 'vitest';
import { runCase } from '#rules/authoring/run-case';
import type { Finding, Outcome } from '#rules/engine/finding';
import { outcomeSchema } from '#rules/engine/finding';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { Layer, RuleSet, RuleSetCase } from '#rules/rule-sets/schema';
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

function differences(each: RuleSetCase, edition: ResolvedEdition): string[] {
  const { unmet, unlisted } = runCase(each, edition);
  return [
    ...unmet.map(
      ({ expected, found }) =>
        `expected ${JSON.stringify(expected)}, found ${found.map(inShort).join(' | ')}`,
    ),
    ...unlisted.map((finding) => `not listed: ${inShort(finding)}`),
  ];
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
