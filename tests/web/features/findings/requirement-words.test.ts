import { describe, expect, it } from 'vitest';
import { requirementParts } from '../../../../web/features/findings/lib/requirement-words';

const key = (requirement: string, title = 'Something else') => requirementParts({ requirement, title }).key;

describe('the key words of a requirement', () => {
  it.each([
    ['Air voids at design gyrations are 4.0 %, within 0.5.', 'Air voids'],
    ['Degree of saturation, each specimen, is 70 to 80 %.', 'Degree of saturation'],
    ['Percent passing 0.075 mm is 2 to 10 %.', 'Percent passing 0.075 mm'],
    ['Deleterious materials of stockpile 12.5 mm stone are at most 1.0 %.', 'Deleterious materials'],
    ['A binder certificate not older than 12 months is enclosed.', 'binder certificate'],
  ])('of “%s” are “%s”', (requirement, expected) => {
    expect(key(requirement)).toBe(expected);
  });

  it('are the title where the sentence begins with it', () => {
    expect(key('A binder certificate is enclosed.', 'Binder certificate')).toBe('binder certificate');
  });

  it('never lose a word of the sentence', () => {
    const requirement = 'Relative density at maximum gyrations is at most 98.0 %.';
    const { before, key: words, after } = requirementParts({ requirement, title: 'Density' });
    expect(before + words + after).toBe(requirement);
  });
});
