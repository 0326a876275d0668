import { describe, expect, it } from 'vitest';
import type { ReadingMeasure } from '#rules/rule-sets/measure';
import { aReading, replicates } from '#tests/builders/a-reading';
import { findingOf } from './check-with';

const gmm = 'maximum-specific-gravity';
const stability = 'marshall-stability';

function observedFor(statistic: ReadingMeasure['statistic'], values: number[], extra = {}) {
  const rule = {
    measure: { kind: 'reading' as const, quantity: stability, statistic, ...extra },
    limit: { min: 0 },
    rounding: { method: 'absolute' as const },
  };
  return findingOf({ rule, record: { readings: replicates(stability, values) } });
}

/** Hand calculation over 4.2, 4.6, 3.9, 5.1, 4.4, 4.0: sum 26.2, n 6; squares of deviations sum to 0.973333. */
const values = [4.2, 4.6, 3.9, 5.1, 4.4, 4.0];

describe('statistics', () => {
  it.each([
    ['mean', 26.2 / 6],
    ['min', 3.9],
    ['max', 5.1],
    ['range', 1.2],
    ['standard-deviation', Math.sqrt(0.9733333333333 / 5)],
    ['trimmed-mean', 17.2 / 4],
    ['count', 6],
  ] as const)('%s', (statistic, expected) => {
    const finding = observedFor(statistic, values);
    expect(finding.observed?.value).toBeCloseTo(expected, 9);
    expect(finding.observed).toMatchObject({ statistic, count: 6 });
  });

  it('percent within limits of values that all lie at the centre is 100', () => {
    const finding = observedFor('percent-within-limits', [5, 5, 5], { within: { min: 4, max: 6 } });
    expect(finding.observed).toMatchObject({ value: 100, unit: '%' });
  });

  it.each([
    ['range', 1],
    ['standard-deviation', 1],
    ['trimmed-mean', 2],
    ['percent-within-limits', 2],
  ] as const)('%s is undecided with only %s', (statistic, count) => {
    const within = statistic === 'percent-within-limits' ? { within: { min: 4 } } : {};
    expect(observedFor(statistic, values.slice(0, count), within).outcome).toBe('undecided');
  });
});

describe('each', () => {
  const each = (values: number[], limit = { min: '70', max: '80' }) =>
    findingOf({
      rule: {
        measure: { kind: 'reading', quantity: 'degree-of-saturation', statistic: 'each' },
        limit,
        rounding: { method: 'rounding', to: 1 },
      },
      record: { readings: replicates('degree-of-saturation', values) },
    });

  it('gives one finding that observes the worst specimen and holds all as evidence', () => {
    const finding = each([72, 69, 79]);
    expect(finding).toMatchObject({ outcome: 'fail', margin: -1, observed: { value: 69, count: 3 } });
    expect(finding.evidence).toHaveLength(3);
    expect(finding.reason).toContain('1 value of 3 outside. Specimen 2 is the worst.');
  });

  it('takes the one nearest to a limit where all are inside', () => {
    expect(each([72, 75, 79])).toMatchObject({ outcome: 'pass', margin: 1, observed: { value: 79 } });
  });

  it('passes at the limit', () => {
    expect(each([70, 75, 80])).toMatchObject({ outcome: 'pass', margin: 0 });
  });
});

describe('a limit for each single value beside the one for the mean', () => {
  const check = (values: number[]) =>
    findingOf({
      rule: {
        measure: { kind: 'reading', quantity: 'tensile-strength-dry', alsoEach: { min: 400 } },
        limit: { min: 440 },
      },
      record: { readings: replicates('tensile-strength-dry', values) },
    });

  it.each([
    ['both inside', [450, 470], 'pass'],
    ['one single value at its limit', [400, 500], 'pass'],
    ['one single value below, the mean inside', [399, 501], 'fail'],
    ['the mean below, every single value inside', [430, 440], 'fail'],
  ] as const)('%s', (_, values, outcome) => {
    expect(check([...values]).outcome).toBe(outcome);
  });
});

describe('specimens that count only under a condition', () => {
  const where = [{ quantity: 'degree-of-saturation', min: 70, max: 80 }];
  const measure = {
    kind: 'reading' as const,
    quantity: 'tensile-strength-conditioned',
    where,
    minimumCount: 2,
  };
  const check = (saturations: (number | null)[]) =>
    findingOf({
      rule: { measure, limit: { min: 440 } },
      record: {
        readings: [
          ...replicates('tensile-strength-conditioned', [400, 450, 500]),
          ...saturations.flatMap((value, i) =>
            value === null
              ? []
              : [
                  aReading({
                    quantity: 'degree-of-saturation',
                    value,
                    at: { trial: 'design', specimen: String(i + 1) },
                  }),
                ],
          ),
        ],
      },
    });

  it('leave the others out', () => {
    expect(check([60, 70, 80])).toMatchObject({ outcome: 'pass', observed: { value: 475, count: 2 } });
  });

  it('are undecided where it is not known of one', () => {
    expect(check([75, 75, null]).outcome).toBe('undecided');
  });

  it('are too few where the rest do not suffice', () => {
    expect(check([60, 60, 75]).outcome).toBe('undecided');
  });

  it('are not shown where none counts', () => {
    expect(check([60, 60, 60]).outcome).toBe('not shown');
  });
});

describe('rounding', () => {
  const vma = (value: number, rounding: object | undefined, min = '14.0') => {
    const readings = [aReading({ quantity: 'voids-in-mineral-aggregate', value })];
    return findingOf({ rule: { limit: { min }, rounding } as object, record: { readings } });
  };

  it.each([
    ['rounding method, half to even', 13.95, { method: 'rounding', to: 0.1 }, 14, 'pass'],
    ['rounding method below the half', 13.94, { method: 'rounding', to: 0.1 }, 13.9, 'fail'],
    ['rounding method, half to the even digit below', 13.85, { method: 'rounding', to: 0.1 }, 13.8, 'fail'],
    ['half-up', 13.95, { method: 'half-up', to: 0.1 }, 14, 'pass'],
    ['truncate', 13.99, { method: 'truncate', to: 0.1 }, 13.9, 'fail'],
    ['absolute', 13.99, { method: 'absolute', to: 0.1 }, 13.99, 'fail'],
    ['none named', 13.99, undefined, 13.99, 'fail'],
    ['the limit’s own decimals', 13.96, { method: 'rounding', to: 'limit' }, 14, 'pass'],
  ] as const)('%s: %s', (_, value, rounding, rounded, outcome) => {
    expect(vma(value, rounding)).toMatchObject({ outcome, observed: { rounded, value } });
  });

  it('takes the decimals that the limit is written with, not its value', () => {
    // Iowa DOT IM 202: 4.25 meets "4" and does not meet "4.0" as a maximum, halves up.
    const check = (max: string) =>
      findingOf({
        rule: {
          measure: { kind: 'reading', quantity: 'water-absorption' },
          limit: { max },
          rounding: { method: 'half-up', to: 'limit' },
        },
        record: { readings: [aReading({ quantity: 'water-absorption', value: 4.25, at: {} })] },
      }).outcome;
    expect([check('4'), check('4.0')]).toEqual(['pass', 'fail']);
  });

  it('says how a value was rounded', () => {
    expect(vma(13.94, { method: 'rounding', to: 0.1 }).roundingSentence).toBe(
      '13.94 becomes 13.9: ASTM E29, rounding method, to 0.1.',
    );
    expect(vma(13.94, undefined).roundingSentence).toBe(
      '13.94 is not rounded: the rule names no rounding, so the absolute method applies.',
    );
  });

  it('takes its step from a table where the rule says so', () => {
    const tables = [
      {
        id: 'steps',
        keys: ['course'],
        columns: [{ name: 'step' }],
        rows: [{ course: 'surface', step: '0.5' }],
      },
    ];
    const rule = {
      id: 'vma',
      clause: '1',
      title: 'VMA',
      severity: 'required' as const,
      measure: { kind: 'reading' as const, quantity: 'voids-in-mineral-aggregate' },
      limit: { min: '14.0' },
      rounding: { method: 'rounding' as const, to: { table: 'steps', column: 'step' } },
    };
    const readings = [aReading({ quantity: 'voids-in-mineral-aggregate', value: 13.8 })];
    const record = { readings, attributes: { course: { value: 'surface', origin: 'reported' as const } } };
    expect(findingOf({ edition: { tables, rules: [rule] }, record })).toMatchObject({
      outcome: 'pass',
      observed: { rounded: 14 },
    });
    expect(findingOf({ edition: { tables, rules: [rule] }, record: { readings } }).outcome).toBe('undecided');
  });

  it('rounds the statistic once and carries the inputs unrounded', () => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: gmm },
      limit: { min: '2.505' },
      rounding: { method: 'rounding' as const, to: 0.001 },
    };
    // (2.5044 + 2.5046)/2 = 2.5045, to 0.001 half to even 2.504; each rounded first would give 2.5045 too, from 2.504 and 2.505.
    const finding = findingOf({ rule, record: { readings: replicates(gmm, [2.5044, 2.5046]) } });
    expect(finding).toMatchObject({ outcome: 'fail', observed: { value: 2.5045, rounded: 2.504 } });
  });
});

describe('censored values and results without a number', () => {
  const check = (
    qualifier: '<' | '>' | 'none' | 'non-plastic',
    value: number | null,
    limit: object,
    extra = {},
  ) =>
    findingOf({
      rule: {
        measure: { kind: 'reading', quantity: 'plasticity-index' },
        limit,
        rounding: { method: 'absolute' },
        ...extra,
      } as object,
      record: { readings: [aReading({ quantity: 'plasticity-index', value, qualifier, at: {} })] },
    });

  it.each([
    ['<4 is at most 4', '<', 4, { max: 4 }, 'pass'],
    ['<5 may or may not be at most 4', '<', 5, { max: 4 }, 'undecided'],
    ['<4 is never at least 4', '<', 4, { min: 4 }, 'fail'],
    ['>4 is never at most 4', '>', 4, { max: 4 }, 'fail'],
    ['>4 is more than 4', '>', 4, { min: 4, exclusive: true }, 'pass'],
    ['>3 may or may not be at least 4', '>', 3, { min: 4 }, 'undecided'],
    ['<10 allows values below, inside and above', '<', 10, { min: 2, max: 4 }, 'undecided'],
    ['>1 allows values inside and above', '>', 1, { min: 0, max: 4 }, 'undecided'],
    ['non-plastic is at most 4', 'non-plastic', null, { max: 4 }, 'pass'],
    ['none is at most 4', 'none', null, { max: 4 }, 'pass'],
    ['none has no number to be at least 4', 'none', null, { min: 4 }, 'undecided'],
  ] as const)('%s', (_, qualifier, value, limit, outcome) => {
    expect(check(qualifier, value, limit)).toMatchObject({ outcome, margin: null, borderline: false });
  });

  it('counts what rounding makes of the nearest allowed value', () => {
    // Just below 4 becomes 4 when rounded to 1: then it is at least 4, and yet 3 is not.
    const extra = { rounding: { method: 'rounding', to: 1 } };
    expect(check('<', 4, { min: 4 }, extra).outcome).toBe('undecided');
  });

  it('says in words what the workbook states', () => {
    expect(check('<', 4, { max: 4 }).sentence).toBe('Plasticity index is less than 4, at most 4.');
    expect(check('non-plastic', null, { max: 4 }).sentence).toBe(
      'Plasticity index is non-plastic, at most 4.',
    );
  });

  it('is never part of a spread', () => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: stability, statistic: 'range' as const },
      limit: { max: 2 },
    };
    const readings = [
      ...replicates(stability, [9, 10]),
      aReading({ quantity: stability, value: 11, qualifier: '>', at: { trial: 'design', specimen: '3' } }),
    ];
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
  });

  it('takes no inflection in so many passes for one beyond them', () => {
    const measure = { kind: 'reading' as const, quantity: 'stripping-inflection-point' };
    const reading = (passes: number) =>
      aReading({
        quantity: 'stripping-inflection-point',
        value: null,
        qualifier: 'none',
        at: { trial: 'design', passes },
      });
    const outcome = (passes: number) =>
      findingOf({ rule: { measure, limit: { min: 10000 } }, record: { readings: [reading(passes)] } })
        .outcome;
    expect([outcome(20000), outcome(10000), outcome(8000)]).toEqual(['pass', 'pass', 'undecided']);
  });
});

describe('borderline', () => {
  const vma = (value: number, precision: number | null) =>
    findingOf({
      rule:
        precision === null ? {} : { precision: { value: precision, source: 'own tests', origin: 'agency' } },
      record: { readings: [aReading({ quantity: 'voids-in-mineral-aggregate', value })] },
    });

  it.each([
    ['inside the precision, passing', 14.4, 0.4, true],
    ['just outside it, passing', 14.5, 0.4, false],
    ['inside the precision, failing', 13.6, 0.4, true],
    ['just outside it, failing', 13.5, 0.4, false],
    ['no precision known', 14.0, null, false],
  ] as const)('%s', (_, value, precision, borderline) => {
    expect(vma(value, precision).borderline).toBe(borderline);
  });

  it('uses 1.96·s/√n where the method’s own deviation is published, and says where from', () => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: gmm },
      limit: { min: '2.500' },
      rounding: undefined,
    };
    // s = 0.0051 (registry): 1.96·0.0051/√4 = 0.004998.
    const finding = findingOf({ rule, record: { readings: replicates(gmm, [2.504, 2.504, 2.504, 2.504]) } });
    expect(finding.precision?.value).toBeCloseTo(0.004998, 9);
    expect(finding.precision?.origin).toContain('from memory, verify');
    expect(finding.borderline).toBe(true);
  });
});
