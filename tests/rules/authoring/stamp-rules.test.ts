import { describe, expect, it } from 'vitest';
import type { DraftDocument } from '#rules/authoring/document-parts';
import { stampRules } from '#rules/authoring/stamp-rules';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aLayer, aRule, aRuleSet } from '#tests/builders/a-rule-set';

const stamps = { encodedBy: 'Tamsin Brook, 2026-01-02', verifiedBy: 'Joaquim Vale, 2026-01-03' };
const by = { by: 'Ada Holm', on: '2026-03-09' };
const withRules = (...rules: RuleInput[]): DraftDocument => ({ ...aRuleSet({ rules }) });

describe('a rule of a draft', () => {
  it('that changed carries who encoded it, and is verified no more', () => {
    const before = withRules(aRule(stamps));
    const after = withRules(aRule({ ...stamps, title: 'VMA' }));
    const { document, parts } = stampRules({ before, after, ...by });
    const stamped = { ...aRule(), title: 'VMA', encodedBy: 'Ada Holm, 2026-03-09', verifiedBy: null };
    expect(document.rules).toEqual([stamped]);
    expect([...parts]).toEqual([['rules/vma', stamped]]);
  });

  it('that is new carries who encoded it', () => {
    const { document } = stampRules({ before: withRules(), after: withRules(aRule()), ...by });
    expect(document.rules).toEqual([{ ...aRule(), encodedBy: 'Ada Holm, 2026-03-09', verifiedBy: null }]);
  });

  it('that did not change keeps its stamps', () => {
    const document = withRules(aRule(stamps));
    const result = stampRules({ before: document, after: structuredClone(document), ...by });
    expect(result.document).toEqual(document);
    expect(result.parts.size).toBe(0);
  });

  it('cannot be called verified by whoever changes it', () => {
    const after = withRules(aRule({ title: 'VMA', verifiedBy: 'Joaquim Vale, 2026-03-09' }));
    const { document } = stampRules({ before: withRules(aRule()), after, ...by });
    expect(document.rules).toMatchObject([{ verifiedBy: null }]);
  });

  it('whose table changed is verified no more, and its encoder stays', () => {
    const limit = { min: { table: 'vma-min', column: 'min' } };
    const table = (min: string) => ({
      id: 'vma-min',
      keys: [],
      columns: [{ name: 'min', unit: '%' }],
      rows: [{ min }],
    });
    const of = (min: string): DraftDocument => ({
      ...withRules(aRule({ ...stamps, limit }), aRule({ ...stamps, id: 'va' })),
      tables: [table(min)],
    });
    const { document } = stampRules({ before: of('14.0'), after: of('13.0'), ...by });
    expect(document.rules).toMatchObject([
      { id: 'vma', encodedBy: stamps.encodedBy, verifiedBy: null },
      { id: 'va', ...stamps },
    ]);
  });

  it('in a layer is stamped in its place', () => {
    const before: DraftDocument = { ...aLayer() };
    const after: DraftDocument = { ...aLayer({ replace: { rules: [aRule()] } }) };
    const { document } = stampRules({ before, after, ...by });
    expect(document.replace).toEqual({
      rules: [{ ...aRule(), encodedBy: 'Ada Holm, 2026-03-09', verifiedBy: null }],
    });
  });
});
