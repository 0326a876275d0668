import { describe, expect, it } from 'vitest';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aReading, replicates } from '#tests/builders/a-reading';
import { findingOf } from './check-with';

/** Mean texture depth: nothing that the registry knows. */
const textureDepth = {
  id: 'texture-depth',
  symbol: 'MTD',
  label: 'mean texture depth',
  unit: 'mm',
  acceptedUnits: ['mm', 'in'],
  decimals: 2,
  subject: 'specimen' as const,
};

function check(readings: Parameters<typeof findingOf>[0]['record'], rule: Partial<RuleInput> = {}) {
  return findingOf({
    edition: { quantities: [textureDepth] },
    rule: {
      measure: { kind: 'reading', quantity: 'texture-depth' },
      limit: { min: '1.00' },
      rounding: { method: 'rounding', to: 0.01 },
      ...rule,
    },
    record: readings ?? {},
  });
}

describe('a quantity that the rule set declares itself', () => {
  it('is judged like any other: inside, on and outside its limit', () => {
    const outcomes = [1.2, 1.0, 0.99].map(
      (value) => check({ readings: [aReading({ quantity: 'texture-depth', value, unit: 'mm' })] }).outcome,
    );
    expect(outcomes).toEqual(['pass', 'pass', 'fail']);
  });

  it('is called by its own label and unit', () => {
    const finding = check({ readings: [aReading({ quantity: 'texture-depth', value: 1.2, unit: 'mm' })] });
    expect(finding.sentence).toMatch(/^Mean texture depth is 1\.20 mm/);
  });

  it('is converted from a unit that it accepts', () => {
    // 0.05 in = 1.27 mm.
    const finding = check({ readings: [aReading({ quantity: 'texture-depth', value: 0.05, unit: 'in' })] });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { rounded: 1.27 } });
  });

  it('is undecided in a unit that does not convert, and not shown without a reading', () => {
    const inGrams = check({ readings: [aReading({ quantity: 'texture-depth', value: 2, unit: 'g' })] });
    expect(inGrams.outcome).toBe('undecided');
    expect(check({}).outcome).toBe('not shown');
  });

  it('takes statistics over specimens', () => {
    const readings = replicates('texture-depth', [0.9, 1.1, 1.3], { unit: 'mm' });
    const range: Partial<RuleInput> = {
      measure: { kind: 'reading', quantity: 'texture-depth', statistic: 'range' },
      limit: { max: '0.30' },
    };
    expect(check({ readings }).observed).toMatchObject({ rounded: 1.1, count: 3 });
    expect(check({ readings }, range)).toMatchObject({ outcome: 'fail', observed: { rounded: 0.4 } });
  });
});
