import { describe, expect, it } from 'vitest';
import { lintEdition } from '#rules/authoring/lint/lint-edition';
import type { LintRemark } from '#rules/authoring/lint/remark';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { aReading } from '#tests/builders/a-reading';
import { aRecord } from '#tests/builders/a-record';
import { aLayer, anEdition, aRule } from '#tests/builders/a-rule-set';

const traffic = { name: 'designTraffic', type: 'number', unit: 'million ESAL' } as const;
const source = { title: 'Standard specifications', section: '900', origin: 'agency' } as const;

/** The value is the limit itself, 14.0. */
const atLimit = {
  id: 'at-limit',
  title: 'At the limit',
  record: aRecord({
    readings: [aReading({ quantity: 'voids-in-mineral-aggregate', value: 14, unit: '%' })],
  }),
  expected: [{ rule: 'vma', outcome: 'pass' as const }],
};

const sound = (rule: Partial<RuleInput> = {}) => aRule({ source, ...rule });

function remarksOn(set: Partial<RuleSetInput>, check: LintRemark['check']): LintRemark[] {
  return lintEdition(anEdition({ cases: [atLimit], ...set })).filter((each) => each.check === check);
}

const partsOf = (remarks: LintRemark[]) => remarks.map(({ part }) => part);

describe('an edition with nothing to look at', () => {
  it('has no remark', () => {
    expect(lintEdition(anEdition({ rules: [sound()], cases: [atLimit] }))).toEqual([]);
  });
});

describe('a condition', () => {
  const where = (when: RuleInput['when'], more: Partial<RuleSetInput> = {}) => ({
    rules: [sound(), sound({ id: 'other', clause: '1.2', title: 'Other', limit: { min: '13.0' }, when })],
    ...more,
  });
  const mixType = (operator: 'equal' | 'notEqual', value: string) => ({ fact: 'mixType', operator, value });
  const esal = (
    operator: 'lessThan' | 'greaterThan' | 'greaterThanInclusive' | 'lessThanInclusive',
    value: number,
  ) => ({
    fact: 'designTraffic',
    operator,
    value,
  });

  it('that no mix meets makes an error', () => {
    const set = where({ all: [mixType('equal', 'dense-graded'), mixType('equal', 'open-graded')] });
    expect(remarksOn(set, 'never applies')).toMatchObject([{ level: 'error', part: 'rules/other' }]);
  });

  it('between two numbers that leave nothing between them makes an error, and one value makes none', () => {
    const none = where({ all: [esal('greaterThan', 3), esal('lessThan', 3)] });
    expect(partsOf(remarksOn(none, 'never applies'))).toEqual(['rules/other']);
    const open = where({ all: [esal('greaterThan', 3), esal('lessThan', 3.001)] });
    expect(remarksOn(open, 'never applies')).toEqual([]);
    const one = where({ all: [esal('greaterThanInclusive', 3), esal('lessThanInclusive', 3)] });
    expect(remarksOn(one, 'never applies')).toEqual([]);
  });

  it('that a closed list cannot meet makes an error', () => {
    const attributes = [{ name: 'mixType', values: ['dense-graded', 'open-graded'] }];
    const when = { all: [mixType('notEqual', 'dense-graded'), mixType('notEqual', 'open-graded')] };
    expect(partsOf(remarksOn(where(when, { attributes }), 'never applies'))).toEqual(['rules/other']);
    expect(remarksOn(where(when), 'never applies')).toEqual([]);
  });

  it('that every mix meets makes a warning', () => {
    const set = where({ any: [esal('lessThan', 3), esal('greaterThanInclusive', 3)] });
    expect(remarksOn(set, 'always applies')).toMatchObject([{ level: 'warning', part: 'rules/other' }]);
  });

  it('and its opposite never hold together', () => {
    const set = where({ all: [mixType('equal', 'open-graded'), { not: mixType('equal', 'open-graded') }] });
    expect(partsOf(remarksOn(set, 'never applies'))).toEqual(['rules/other']);
  });
});

describe('a limit', () => {
  it('that no reading can reach makes an error: 140 % voids', () => {
    const set = { rules: [sound({ limit: { min: '140' } })], cases: [] };
    expect(remarksOn(set, 'always fails')).toMatchObject([{ level: 'error', part: 'rules/vma' }]);
  });

  it('that excludes both of its equal ends makes an error, and one that includes them makes none', () => {
    const limit = { min: '14.0', max: '14.0' };
    const set = (exclusive: boolean) => ({ rules: [sound({ limit: { ...limit, exclusive } })], cases: [] });
    expect(partsOf(remarksOn(set(true), 'always fails'))).toEqual(['rules/vma']);
    expect(remarksOn(set(false), 'always fails')).toEqual([]);
  });

  it.each([
    ['13.9', []],
    ['14.0', []],
    ['13.8', ['rules/other']],
  ])('at least 13.9 contradicts at most %s of the same value: %j', (max, parts) => {
    const rules = [sound({ limit: { min: '13.9' } }), sound({ id: 'other', clause: '1.2', limit: { max } })];
    expect(partsOf(remarksOn({ rules }, 'contradiction'))).toEqual(parts);
  });

  it('contradicts no other where their conditions exclude each other', () => {
    const where = (value: string) => ({ fact: 'mixType', operator: 'equal' as const, value });
    const rules = [
      sound({ limit: { min: '15.0' }, when: where('dense-graded') }),
      sound({ id: 'other', clause: '1.2', limit: { max: '14.0' }, when: where('open-graded') }),
    ];
    expect(remarksOn({ rules, cases: [] }, 'contradiction')).toEqual([]);
  });

  it.each([
    ['14.0', 0.1, []],
    ['14.0', 0.05, ['rules/vma']],
    ['14', 0.1, ['rules/vma']],
    ['14.00', 0.1, []],
  ])('written %s and rounded to %s makes the warning %j', (min, to, parts) => {
    const rules = [sound({ limit: { min }, rounding: { method: 'rounding', to } })];
    expect(partsOf(remarksOn({ rules }, 'rounding'))).toEqual(parts);
  });
});

describe('a table', () => {
  const table = (...ranges: { from?: number; below?: number }[]) => ({
    attributes: [traffic],
    tables: [
      {
        id: 'vma-min',
        title: 'Minimum VMA',
        keys: ['designTraffic'],
        columns: [{ name: 'min', unit: '%' }],
        rows: ranges.map((designTraffic) => ({ designTraffic, min: '14.0' })),
      },
    ],
    rules: [sound({ limit: { min: { table: 'vma-min', column: 'min' } } })],
    cases: [],
  });

  it('with a hole between two ranges makes a warning that names it', () => {
    const [remark] = remarksOn(table({ below: 3 }, { from: 10, below: 30 }), 'gap');
    expect(remark).toMatchObject({ level: 'warning', part: 'tables/vma-min' });
    expect(remark?.detail).toContain('from 3 to below 10 million ESAL');
  });

  it('whose ranges touch makes none', () => {
    expect(remarksOn(table({ below: 3 }, { from: 3, below: 30 }, { from: 30 }), 'gap')).toEqual([]);
  });

  it('without a row for a declared value makes a warning', () => {
    const nominal = {
      name: 'nominalMaximumSize',
      type: 'number' as const,
      unit: 'mm',
      values: [9.5, 12.5, 19],
    };
    const rows = [9.5, 19].map((nominalMaximumSize) => ({ nominalMaximumSize, min: '14.0' }));
    const set = table();
    const tables = [{ ...set.tables[0]!, keys: ['nominalMaximumSize'], rows }];
    const remarks = remarksOn({ ...set, attributes: [nominal], tables }, 'gap');
    expect(remarks[0]?.detail).toContain('12.5 mm');
  });

  it('that no rule uses makes a warning, and so does an attribute', () => {
    const set = { ...table({ below: 3 }), rules: [sound()] };
    expect(partsOf(remarksOn(set, 'unused'))).toEqual(['tables/vma-min']);
    expect(partsOf(remarksOn({ ...set, tables: [] }, 'unused'))).toEqual(['attributes/designTraffic']);
  });
});

describe('a source', () => {
  it('that is missing makes a warning; the agency’s own says so', () => {
    expect(partsOf(remarksOn({ rules: [aRule()] }, 'missing source'))).toEqual(['rules/vma']);
    expect(remarksOn({ rules: [aRule({ source: { origin: 'agency' } })] }, 'missing source')).toEqual([]);
  });

  it('from memory makes a warning until the rule is verified', () => {
    const memory = { title: 'A published standard', origin: 'memory' as const };
    expect(partsOf(remarksOn({ rules: [aRule({ source: memory })] }, 'from memory'))).toEqual(['rules/vma']);
    const verified = aRule({ source: memory, verifiedBy: 'Joaquim Vale, 2026-01-03' });
    expect(remarksOn({ rules: [verified] }, 'from memory')).toEqual([]);
  });

  it('clause that two rules share makes a warning at the second', () => {
    const rules = [sound(), sound({ id: 'other' })];
    expect(partsOf(remarksOn({ rules }, 'clause used twice'))).toEqual(['rules/other']);
  });
});

describe('a case', () => {
  it('that does not give what it expects makes an error', () => {
    const wrong = { ...atLimit, expected: [{ rule: 'vma', outcome: 'fail' as const }] };
    expect(remarksOn({ rules: [sound()], cases: [wrong] }, 'case')).toMatchObject([
      { level: 'error', part: 'cases/at-limit' },
    ]);
  });

  it('at the limit is missed where there is none', () => {
    expect(partsOf(remarksOn({ rules: [sound()], cases: [] }, 'no case at the limit'))).toEqual([
      'rules/vma',
    ]);
  });
});

describe('a layer', () => {
  it('is looked at for what it brings itself', () => {
    const layer = aLayer({ add: { rules: [aRule({ id: 'added', clause: '1.9', title: 'Added' })] } });
    const edition = anEdition({ rules: [aRule()] }, [layer]);
    const own = lintEdition(edition, { own: 'Supplement 1, 1' });
    expect(new Set(partsOf(own))).toEqual(new Set(['rules/added']));
    expect(own.length).toBeGreaterThan(0);
  });
});
