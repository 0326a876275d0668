import { describe, expect, it } from 'vitest';
import { parseRuleSet } from '#rules/rule-sets/schema';
import { aReading } from '#tests/builders/a-reading';
import { aRuleSet } from '#tests/builders/a-rule-set';
import { ALWAYS, describeShape } from './describe-shape';
import { doubtAbout, rule } from './parts';

const compliance = (temperature: number, points: Record<number, number>) =>
  Object.entries(points).map(([time, value]) =>
    aReading({
      quantity: 'creep-compliance',
      value,
      origin: 'reported',
      at: { trial: 'design', temperature, time: Number(time) },
    }),
  );

/** Invented limits, as in the clause. Tested times are judged as measured; nothing is carried beyond the last. */
describeShape('4.6.1 a temperature and time pair', {
  rules: [
    rule('cold', {
      measure: { kind: 'creep-compliance', temperature: -10, time: 100 },
      limit: { min: '0.08' },
    }),
    rule('mild', {
      measure: { kind: 'creep-compliance', temperature: 0, time: 50 },
      limit: { min: '0.15', max: '0.60' },
    }),
  ],
  cases: [
    {
      title: 'both inside',
      record: {
        readings: [...compliance(-10, { 50: 0.07, 100: 0.09 }), ...compliance(0, { 50: 0.3, 100: 0.4 })],
      },
      expected: { cold: 'pass', mild: 'pass' },
    },
    {
      title: 'both on the limit',
      record: { readings: [...compliance(-10, { 100: 0.08 }), ...compliance(0, { 50: 0.6 })] },
      expected: { cold: 'pass', mild: 'pass' },
    },
    {
      title: 'too stiff, and too soft',
      record: { readings: [...compliance(-10, { 100: 0.079 }), ...compliance(0, { 50: 0.601 })] },
      expected: { cold: 'fail', mild: 'fail' },
    },
    {
      title: 'tested for too short',
      record: {
        readings: [
          ...compliance(-10, { 10: 0.05, 20: 0.06, 50: 0.07 }),
          ...compliance(0, { 10: 0.2, 20: 0.25 }),
        ],
      },
      expected: { cold: 'undecided', mild: 'undecided' },
    },
    {
      title: 'in doubt',
      record: {
        doubts: [
          doubtAbout('creep-compliance', { temperature: -10, time: 100 }),
          doubtAbout('creep-compliance', { temperature: 0, time: 50 }),
        ],
      },
      expected: { cold: 'undecided', mild: 'undecided' },
    },
    { title: 'not tested', record: {}, expected: { cold: 'not shown', mild: 'not shown' } },
  ],
  impossible: { cold: { 'not applicable': ALWAYS }, mild: { 'not applicable': ALWAYS } },
});

describe('4.6.2 the slope between two loading times', () => {
  it('has no form: a formula knows sieves, not loading times, and says so', () => {
    const slope = rule('slope', {
      measure: { kind: 'formula', expression: 'log10(Dt100/Dt10)', at: { temperature: 0 } },
      limit: { min: '0.25' },
    });
    const parsed = parseRuleSet(aRuleSet({ rules: [slope] }));
    expect(parsed.ok ? [] : parsed.problems.map(({ detail }) => detail)).toEqual([
      'Rule slope: in the formula "log10(Dt100/Dt10)", the symbol Dt100 is not known.',
    ]);
  });
});
