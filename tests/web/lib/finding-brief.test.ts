import { describe, expect, it } from 'vitest';
import { findingBrief } from '../../../web/lib/finding-brief';

const limit = {
  min: 80,
  max: null,
  minExclusive: false,
  maxExclusive: false,
  target: null,
  tolerance: null,
  oneOf: null,
  decimals: 0,
  unit: '%',
  from: null,
};
const strengthRatio = {
  title: 'Tensile strength ratio',
  kind: 'reading',
  outcome: 'fail' as const,
  observed: { value: 76.2, rounded: 76, text: '76', unit: '%', statistic: 'mean', count: 6 },
  limit,
  reason: '76 is below 80 by 4.',
  sentence: 'Tensile strength ratio is 76 %, at least 80.',
};

describe('a finding in a few words', () => {
  it('says the value before the limit', () => {
    expect(findingBrief(strengthRatio)).toEqual({
      title: 'Tensile strength ratio',
      rest: '76 %, at least 80',
    });
  });

  it('says what is missing where nothing was shown', () => {
    const absent = {
      ...strengthRatio,
      outcome: 'not shown' as const,
      observed: null,
      reason: 'There is no reading.',
    };
    expect(findingBrief(absent)).toEqual({ title: 'Tensile strength ratio.', rest: 'There is no reading.' });
  });

  it('says what would decide it where nothing is decided, although there is a value', () => {
    const few = {
      ...strengthRatio,
      outcome: 'undecided' as const,
      reason: 'Two more specimens would decide it.',
    };
    expect(findingBrief(few).rest).toBe('Two more specimens would decide it.');
  });

  it('tells what does not add up by its whole sentence', () => {
    const differs = {
      ...strengthRatio,
      kind: 'consistency',
      sentence: 'VMA is reported as 14.3 and comes to 13.9.',
    };
    expect(findingBrief(differs)).toEqual({ title: '', rest: 'VMA is reported as 14.3 and comes to 13.9.' });
  });
});
