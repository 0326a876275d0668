import { describe, expect, it } from 'vitest';
import { changeParts, type DraftDocument, partHash, partsOf } from '#rules/authoring/document-parts';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';
import { aLayer, aRule, aRuleSet } from '#tests/builders/a-rule-set';

const draft = (): DraftDocument => ({ ...aRuleSet({ rules: [aRule(), aRule({ id: 'va' })] }) });
const hashIn = (document: DraftDocument, part: string) => partHash(partsOf(document).get(part));
const idsOf = (document: DraftDocument) => (document.rules as { id: string }[]).map(({ id }) => id);

function changed(document: DraftDocument, changes: Parameters<typeof changeParts>[1]): DraftDocument {
  const result = changeParts(document, changes);
  if (!result.ok) throw new Error(JSON.stringify(result));
  return result.document;
}

describe('a draft', () => {
  it.each(shippedRuleSets)('made of the parts of $file is the same document', ({ document }) => {
    const given = document as DraftDocument;
    const parts = partsOf(given);
    const head = parts.get('head') as DraftDocument;
    const lists = [...parts.keys()].filter((part) => part.startsWith('order/'));
    const empty = { ...head };
    const adding = [...parts]
      .filter(([part]) => part !== 'head' && !part.startsWith('order/'))
      .map(([part, after]) => ({ part, before: null, after }));
    const rebuilt = changed(empty, adding);
    expect(lists.length).toBeGreaterThan(0);
    for (const [part, value] of parts) expect(partsOf(rebuilt).get(part), part).toEqual(value);
  });

  it('changes one rule and nothing else', () => {
    const before = draft();
    const after = aRule({ id: 'va', title: 'Air voids' });
    const result = changed(before, [{ part: 'rules/va', before: hashIn(before, 'rules/va'), after }]);
    expect(result).toEqual({ ...before, rules: [aRule(), after] });
  });

  it('takes a new rule at its place, or at the end where none is named', () => {
    const added = aRule({ id: 'vfa' });
    const at = (position?: number) =>
      idsOf(changed(draft(), [{ part: 'rules/vfa', before: null, after: added, position }]));
    expect(at(0)).toEqual(['vfa', 'vma', 'va']);
    expect(at(1)).toEqual(['vma', 'vfa', 'va']);
    expect(at()).toEqual(['vma', 'va', 'vfa']);
    expect(at(99)).toEqual(['vma', 'va', 'vfa']);
  });

  it('moves rules by their order', () => {
    const before = draft();
    const move = { part: 'order/rules', before: hashIn(before, 'order/rules'), after: ['va', 'vma'] };
    expect(idsOf(changed(before, [move]))).toEqual(['va', 'vma']);
  });

  it('loses a rule that is taken out', () => {
    const before = draft();
    const removal = { part: 'rules/vma', before: hashIn(before, 'rules/vma'), after: null };
    expect(idsOf(changed(before, [removal]))).toEqual(['va']);
  });

  it('is renamed in its head without touching a rule', () => {
    const before = draft();
    const head = { ...(partsOf(before).get('head') as object), edition: '2028' };
    const result = changed(before, [{ part: 'head', before: hashIn(before, 'head'), after: head }]);
    expect(result).toEqual({ ...before, edition: '2028' });
  });

  it('of a layer has the rules that it adds and replaces as parts', () => {
    const layer: DraftDocument = { ...aLayer({ replace: { rules: [aRule()] } }) };
    const after = aRule({ id: 'new' });
    const result = changed(layer, [{ part: 'add.rules/new', before: null, after }]);
    expect(result).toEqual({ ...layer, add: { rules: [after] } });
    expect(partsOf(result).get('replace.rules/vma')).toEqual(aRule());
  });
});

describe('two authors', () => {
  it('who change different rules both have their change', () => {
    const seen = draft();
    const one = aRule({ title: 'One' });
    const other = aRule({ id: 'va', title: 'Other' });
    const first = changed(seen, [{ part: 'rules/vma', before: hashIn(seen, 'rules/vma'), after: one }]);
    const both = changed(first, [{ part: 'rules/va', before: hashIn(seen, 'rules/va'), after: other }]);
    expect(both.rules).toEqual([one, other]);
  });

  it('who change the same rule: the second is told of the first one’s, and nothing of theirs is kept', () => {
    const seen = draft();
    const one = aRule({ title: 'One' });
    const first = changed(seen, [{ part: 'rules/vma', before: hashIn(seen, 'rules/vma'), after: one }]);
    const result = changeParts(first, [
      { part: 'rules/va', before: hashIn(seen, 'rules/va'), after: aRule({ id: 'va', title: 'Kept?' }) },
      { part: 'rules/vma', before: hashIn(seen, 'rules/vma'), after: aRule({ title: 'Two' }) },
    ]);
    expect(result).toEqual({ ok: false, conflicts: [{ part: 'rules/vma', present: one }], faults: [] });
  });

  it('of whom one removes what the other changes meet as well', () => {
    const seen = draft();
    const gone = changed(seen, [{ part: 'rules/vma', before: hashIn(seen, 'rules/vma'), after: null }]);
    const change = { part: 'rules/vma', before: hashIn(seen, 'rules/vma'), after: aRule({ title: 'Two' }) };
    expect(changeParts(gone, [change])).toMatchObject({ conflicts: [{ part: 'rules/vma', present: null }] });
  });

  it('who add a rule of the same id meet', () => {
    const seen = draft();
    const add = (title: string) => ({ part: 'rules/x', before: null, after: aRule({ id: 'x', title }) });
    const result = changeParts(changed(seen, [add('One')]), [add('Two')]);
    expect(result).toMatchObject({ ok: false, conflicts: [{ part: 'rules/x', present: { title: 'One' } }] });
  });
});

describe('a change that means nothing', () => {
  it.each([
    ['names no part', 'vma'],
    ['names a list that no draft has', 'findings/vma'],
    ['names the order of no list', 'order/findings'],
  ])('%s and is told so', (_, part) => {
    expect(changeParts(draft(), [{ part, before: null, after: {} }])).toMatchObject({
      ok: false,
      faults: [{ part }],
    });
  });

  it('gives an entry under another name and is told so', () => {
    const change = { part: 'rules/vma', before: null, after: aRule({ id: 'va' }) };
    expect(changeParts(draft(), [change])).toMatchObject({
      ok: false,
      faults: [{ fix: 'Give it the id vma.' }],
    });
  });
});
