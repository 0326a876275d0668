import { describe, expect, it } from 'vitest';
import { aReturnItem, aReturnView } from '#tests/builders/a-return-view';
import { letterGroups } from '../../../../web/features/return/lib/letter-groups';
import { reasonWanted, returnValues, sameValues } from '../../../../web/features/return/lib/return-values';

describe('the form of a return', () => {
  it('holds only the keys that may be left out, for the letter carries the rest anyway', () => {
    const view = aReturnView({
      items: [
        aReturnItem({ key: 'vma~design point', optional: false, included: true }),
        aReturnItem({ key: 'vfa~design point', optional: true, included: true }),
        aReturnItem({ key: 'dust~design point', optional: true, included: false }),
      ],
    });
    expect(returnValues(view).included).toEqual(['vfa~design point']);
  });

  it('is the same whatever the order in which items were ticked', () => {
    const values = returnValues(aReturnView());
    expect(sameValues({ ...values, included: ['a', 'b'] }, { ...values, included: ['b', 'a'] })).toBe(true);
  });

  it('is not the same once a recipient changes', () => {
    const values = returnValues(aReturnView());
    const moved = {
      ...values,
      to: [{ name: 'Dele Fairweather', email: 'dele@brightwater.example', function: '' }],
    };
    expect(sameValues(values, moved)).toBe(false);
  });
});

describe('the reason of a decision', () => {
  it('may stay empty where the decision is the recommended one', () => {
    expect(reasonWanted({ disposition: 'approved', reason: '' }, 'approved')).toBeNull();
  });

  it('is wanted where the decision is another', () => {
    expect(reasonWanted({ disposition: 'approved', reason: '  ' }, 'revise and resubmit')).toContain(
      'revise and resubmit',
    );
    expect(reasonWanted({ disposition: 'approved', reason: 'The waiver covers it.' }, 'rejected')).toBeNull();
  });
});

describe('the groups of the letter', () => {
  it('stand in the order of what to do next, without empty ones', () => {
    const items = [
      aReturnItem({ key: 'a', group: 'for information' }),
      aReturnItem({ key: 'b', group: 'send' }),
      aReturnItem({ key: 'c', group: 'put right' }),
    ];
    expect(letterGroups(items).map(({ title }) => title)).toEqual([
      'Put right',
      'Send',
      'For your information',
    ]);
  });
});
