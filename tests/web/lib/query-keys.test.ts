import { describe, expect, it } from 'vitest';
import { ruleSetQuery } from '../../../web/features/rule-sets/api/get-rule-set';
import { searchQuery } from '../../../web/features/search/api/search';
import { checkQuery } from '../../../web/lib/queries/check-query';
import { revisionKey, revisionQuery } from '../../../web/lib/queries/revision-query';
import { sheetQuery } from '../../../web/lib/queries/sheet-query';

const params = { submittalId: 's1', number: 2 };

describe('query keys', () => {
  it.each([
    { name: 'revision', keys: [revisionQuery(params), revisionQuery({ ...params, number: 3 })] },
    { name: 'check', keys: [checkQuery(params), checkQuery({ ...params, submittalId: 's2' })] },
    {
      name: 'sheet',
      keys: [
        sheetQuery({ ...params, sheet: 'A' }),
        sheetQuery({ ...params, sheet: 'B' }),
        sheetQuery({ ...params, sheet: 'A', from: 1 }),
        sheetQuery({ ...params, sheet: 'A', from: 1, to: 6 }),
      ],
    },
    {
      name: 'rule set',
      keys: [
        ruleSetQuery({ ruleSetId: 'a', edition: '1', layers: '' }),
        ruleSetQuery({ ruleSetId: 'a', edition: '2', layers: '' }),
        ruleSetQuery({ ruleSetId: 'a', edition: '1', layers: 'x@1' }),
      ],
    },
    { name: 'search', keys: [searchQuery('vma'), searchQuery('vfa')] },
  ])('of a $name hold every input', ({ keys }) => {
    const texts = keys.map((options) => JSON.stringify(options.queryKey));
    expect(new Set(texts).size).toBe(keys.length);
  });

  it('renew everything of a revision by its prefix', () => {
    const prefix = revisionKey(params);
    for (const { queryKey } of [
      revisionQuery(params),
      checkQuery(params),
      sheetQuery({ ...params, sheet: 'A' }),
    ]) {
      expect(queryKey.slice(0, prefix.length)).toEqual(prefix);
    }
  });
});
