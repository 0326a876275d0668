import { describe, expect, it } from 'vitest';
import type { Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aReading, replicates } from '#tests/builders/a-reading';
import { checkWith, findingOf } from './check-with';

/** Gmm 2.500 and Gmb 2.400, 2.375: recomputed air voids are 4.0 and 5.0 %, mean 4.5. */
function voids(reported: [string, string]): Reading[] {
  return [
    aReading({
      quantity: 'maximum-specific-gravity',
      value: 2.5,
      source: { sheet: 'Trials', cell: 'C3', text: '2.500' },
    }),
    ...[2.4, 2.375].map((value, i) =>
      aReading({
        quantity: 'bulk-specific-gravity-mix',
        value,
        at: { trial: 'design', specimen: String(i + 1) },
        source: { sheet: 'Trials', cell: `D${3 + i}`, text: value.toFixed(3) },
      }),
    ),
    ...reported.map((text, i) =>
      aReading({
        quantity: 'air-voids',
        value: Number(text),
        at: { trial: 'design', specimen: String(i + 1) },
        source: { sheet: 'Trials', cell: `E${3 + i}`, text },
      }),
    ),
  ];
}

const measure = { kind: 'reading' as const, quantity: 'air-voids' };
const each: Partial<RuleInput> = { measure: { ...measure, statistic: 'each' }, limit: { max: 6 } };

describe('single specimens that the workbook reports otherwise', () => {
  it('stand as recomputed where the outcome is the same', () => {
    expect(findingOf({ rule: each, record: { readings: voids(['4.0', '5.5']) } }).outcome).toBe('pass');
  });

  it.each([
    ['each', { ...measure, statistic: 'each' as const }, { max: 6 }],
    ['max', { ...measure, statistic: 'max' as const }, { max: 6 }],
    ['range', { ...measure, statistic: 'range' as const }, { max: 2 }],
    ['alsoEach', { ...measure, alsoEach: { max: 6 } }, { max: 5.5 }],
  ])('leave a rule on %s undecided where the outcome would turn', (_, turned, limit) => {
    // Specimen 2 is reported as 6.5: above the limit, with a range of 2.5; the mean, 5.25, would still be inside.
    const result = checkWith({
      rule: { measure: turned, limit },
      record: { readings: voids(['4.0', '6.5']) },
    });
    const finding = result.findings.find(({ rule }) => rule === 'vma');
    expect(finding?.outcome).toBe('undecided');
    expect(finding?.reason).toContain('specimen 2');
    const severities = result.findings
      .filter(({ rule }) => rule === 'consistency/reported-differs')
      .map(({ severity }) => severity);
    expect(severities).toContain('required');
  });
});

describe('a difference between laboratories', () => {
  const rule: Partial<RuleInput> = {
    measure: { kind: 'difference', quantity: 'air-voids', between: ['contractor', 'agency'] },
    limit: { max: 1 },
    rounding: { method: 'rounding', to: 0.1 },
  };
  const agency = aReading({ quantity: 'air-voids', value: 5, at: { trial: 'design', laboratory: 'agency' } });

  it('is undecided where the contractor reports a value that turns the outcome', () => {
    // Recomputed 4.5 is 0.5 apart; the reported mean of 3.0 and 3.2, 3.1, is 1.9 apart.
    const finding = findingOf({ rule, record: { readings: [...voids(['3.0', '3.2']), agency] } });
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toContain('reported otherwise');
  });

  it('stands where the outcome is the same', () => {
    const finding = findingOf({ rule, record: { readings: [...voids(['4.2', '5.0']), agency] } });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { rounded: 0.5 } });
  });

  it('gives a finding for a sieve that only one of them has', () => {
    const passing: Partial<RuleInput> = {
      measure: { kind: 'difference', quantity: 'percent-passing', between: ['contractor', 'agency'] },
      limit: { max: 3 },
    };
    const at = (sieve: number, laboratory?: 'agency') => ({
      trial: 'design',
      sieve,
      ...(laboratory ? { laboratory } : {}),
    });
    const readings = [
      aReading({ quantity: 'percent-passing', value: 40, at: at(2.36) }),
      aReading({ quantity: 'percent-passing', value: 42, at: at(2.36, 'agency') }),
      aReading({ quantity: 'percent-passing', value: 5, at: at(0.075, 'agency') }),
    ];
    const result = checkWith({ rule: passing, record: { readings } });
    const findings = result.findings.filter(({ kind }) => kind === 'difference');
    expect(findings.map(({ subject, outcome }) => [subject, outcome])).toEqual([
      ['0.075 mm', 'not shown'],
      ['2.36 mm', 'pass'],
    ]);
  });
});

describe('a condition on a derived quantity', () => {
  it('looks at the value that a rule on it would judge, not at the mean of its specimens', () => {
    /*
     * VMA 15 and 17, Va 3 and 5.1: VFA of the means is 100·(16 − 4.05)/16 = 74.69, the mean of both VFA
     * 100·(12/15 + 11.9/17)/2 = 75.0. From gravities: Gsb 2.500, Pb 5, Gmb = (100 − VMA)·2.5/95.
     */
    const gmb = [(85 * 2.5) / 95, (83 * 2.5) / 95];
    const readings = [
      aReading({ quantity: 'binder-content', value: 5 }),
      aReading({ quantity: 'bulk-specific-gravity-aggregate', value: 2.5 }),
      aReading({ quantity: 'maximum-specific-gravity', value: gmb[0]! / 0.97 }),
      ...replicates('bulk-specific-gravity-mix', gmb),
    ];
    const vfa = { kind: 'reading' as const, quantity: 'voids-filled-with-asphalt' };
    const judged =
      findingOf({ rule: { measure: vfa, limit: { min: 0 } }, record: { readings } }).observed?.value ?? 0;
    const when = (value: number) => ({
      fact: 'quantity',
      params: { quantity: 'voids-filled-with-asphalt', at: {} },
      operator: 'lessThanInclusive' as const,
      value,
    });
    const applies = (value: number) =>
      findingOf({ rule: { when: when(value), measure: vfa, limit: { min: 0 } }, record: { readings } })
        .outcome;
    expect(applies(judged)).toBe('pass');
    expect(applies(judged - 1e-9)).toBe('not applicable');
  });
});
