import { describe, expect, it } from 'vitest';
import { caseHolds, runCase } from '#rules/authoring/run-case';
import type { ExpectedFinding, RuleSetCase } from '#rules/rule-sets/schema';
import { aReading } from '#tests/builders/a-reading';
import { aRecord } from '#tests/builders/a-record';
import { anEdition } from '#tests/builders/a-rule-set';

/** At least 14.0, rounded to 0.1; reported 14.0 is the limit itself. */
const edition = anEdition();

function aCase(...expected: ExpectedFinding[]): RuleSetCase {
  const reading = aReading({ quantity: 'voids-in-mineral-aggregate', value: 14, unit: '%' });
  return {
    id: 'at-the-limit',
    title: 'At the limit',
    record: aRecord({ readings: [reading] }),
    context: { submittedOn: null, lettingOn: null, facts: {} },
    expected,
  };
}

describe('a case', () => {
  it('holds where its findings are what it expects', () => {
    const result = runCase(aCase({ rule: 'vma', outcome: 'pass', rounded: 14, margin: 0 }), edition);
    expect(caseHolds(result)).toBe(true);
  });

  it.each<[string, Partial<ExpectedFinding>]>([
    ['outcome', { outcome: 'fail' }],
    ['judged value', { rounded: 14.1 }],
    ['margin', { margin: 0.1 }],
    ['limit', { limit: { min: 13 } }],
    ['subject', { subject: 'mix' }],
    ['mark as borderline', { borderline: true }],
  ])('does not hold for another %s', (_, wrong) => {
    const result = runCase(aCase({ rule: 'vma', outcome: 'pass', ...wrong }), edition);
    expect(caseHolds(result)).toBe(false);
    expect(result.unmet).toMatchObject([{ expected: wrong, found: [{ rule: 'vma', outcome: 'pass' }] }]);
  });

  it('does not hold where a finding of its rule is not listed', () => {
    const result = runCase(aCase({ rule: 'vma', outcome: 'fail' }), edition);
    expect(result.unlisted).toMatchObject([{ rule: 'vma', outcome: 'pass' }]);
  });

  it('says nothing of rules that it does not name', () => {
    expect(caseHolds(runCase(aCase(), edition))).toBe(true);
  });
});
