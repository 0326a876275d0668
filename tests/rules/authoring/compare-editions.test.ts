import { describe, expect, it } from 'vitest';
import { compareEditions } from '#rules/authoring/compare-editions';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { anEdition, aRule } from '#tests/builders/a-rule-set';

const compare = (before: Partial<RuleSetInput>, after: Partial<RuleSetInput>) =>
  compareEditions(anEdition(before), anEdition(after));
const rules = (...rules: RuleInput[]) => ({ rules });

describe('two editions', () => {
  it('that say the same differ in nothing, whoever encoded them', () => {
    const stamped = aRule({ encodedBy: 'Tamsin Brook, 2026-01-02', verifiedBy: 'Joaquim Vale, 2026-01-03' });
    expect(compare(rules(aRule()), rules(stamped))).toEqual({
      rules: [],
      tables: [],
      others: [],
      unchanged: 1,
    });
  });

  it('tell an added, a removed and a changed rule in the order of clauses', () => {
    const before = rules(aRule(), aRule({ id: 'gone', clause: '1.10', title: 'Gone' }));
    const after = rules(aRule({ limit: { min: '14.5' } }), aRule({ id: 'new', clause: '1.2', title: 'New' }));
    const comparison = compare(before, after);
    expect(comparison.rules.map(({ id, kind }) => [id, kind])).toEqual([
      ['vma', 'changed'],
      ['new', 'added'],
      ['gone', 'removed'],
    ]);
    expect(comparison.unchanged).toBe(0);
  });

  it('tell a changed limit by the sentence before and after', () => {
    const [rule] = compare(rules(aRule()), rules(aRule({ limit: { min: '14.5' } }))).rules;
    expect(rule?.wordings.map(({ what }) => what)).toEqual(['Sentence']);
    expect(rule?.wordings[0]?.before).toContain('14.0');
    expect(rule?.wordings[0]?.after).toContain('14.5');
  });

  it.each<[string, Partial<RuleInput>]>([
    ['Severity', { severity: 'advisory' }],
    ['Title', { title: 'VMA' }],
    ['Clause', { clause: '1.3' }],
    ['Advice', { advice: 'Open the gradation.' }],
    ['Precision', { precision: { value: 0.4 } }],
    ['Source', { source: { title: 'Standard specifications', section: '9' } }],
  ])('tell a changed %s', (what, change) => {
    const [rule] = compare(rules(aRule()), rules(aRule(change))).rules;
    expect(rule?.wordings.map((each) => each.what)).toContain(what);
  });

  it('whose rules name their own edition as the source say the same', () => {
    const of = (edition: string) => ({
      edition,
      rules: [aRule({ source: { title: 'Section 900', edition } })],
    });
    expect(compare(of('2026'), of('2027')).rules).toEqual([]);
    const begun = { ...of('2026'), edition: '2027' };
    expect(compare(of('2026'), begun).rules).toEqual([]);
  });

  it('tell a field that is in no sentence under its own name', () => {
    const fitted = (model: 'sigmoid' | 'power') =>
      aRule({
        measure: { kind: 'creep-compliance', temperature: 0, time: 100, model },
        limit: { max: '0.2' },
      });
    const [rule] = compare(rules(fitted('sigmoid')), rules(fitted('power'))).rules;
    expect(rule?.wordings.length).toBeGreaterThan(0);
    expect(JSON.stringify(rule?.wordings)).toContain('power');
  });

  it('tell a changed row of a table, and the rules that use it', () => {
    const set = (min: string) => ({
      attributes: [{ name: 'nominalMaximumSize', type: 'number' as const, unit: 'mm' }],
      tables: [
        {
          id: 'vma-min',
          title: 'Minimum VMA',
          keys: ['nominalMaximumSize'],
          columns: [{ name: 'min', unit: '%' }],
          rows: [
            { nominalMaximumSize: 9.5, min: '15.0' },
            { nominalMaximumSize: 12.5, min },
          ],
        },
      ],
      rules: [aRule({ limit: { min: { table: 'vma-min', column: 'min' } } })],
    });
    const comparison = compare(set('14.0'), set('13.5'));
    expect(comparison.rules).toEqual([]);
    expect(comparison.tables).toEqual([
      {
        id: 'vma-min',
        kind: 'changed',
        title: 'Minimum VMA',
        rows: [{ what: expect.stringContaining('12.5'), before: 'min 14.0 %', after: 'min 13.5 %' }],
        usedBy: ['vma'],
      },
    ]);
  });

  it('tell what else changed: design point, room to move, attributes', () => {
    const after = {
      designPoint: { targetAirVoids: 3.5 },
      roomToMove: ['vma'],
      attributes: [{ name: 'region', values: ['north', 'south'] }],
    };
    expect(compare({}, after).others.map(({ what }) => what)).toEqual([
      'Design point',
      'Room to move',
      'Attribute region',
    ]);
  });
});
