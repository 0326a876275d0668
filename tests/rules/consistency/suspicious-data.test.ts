import { describe, expect, it } from 'vitest';
import { checkConsistency } from '#rules/consistency/check-consistency';
import { checkLimitsMet } from '#rules/consistency/check-limits-met';
import { analyse } from '#rules/engine/analyse';
import { evaluate } from '#rules/engine/evaluate';
import { type Finding, findingSchema } from '#rules/engine/finding';
import { mixRecordSchema, type Reading } from '#rules/record';
import { aFinding } from '#tests/builders/a-finding';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition } from '#tests/builders/a-rule-set';
import { aggregateReadings, reading, reported, trialReadings } from '../engine/analysis-record';

function observe(readings: Reading[], submittedOn: string | null = null) {
  const record = mixRecordSchema.parse({ readings });
  return checkConsistency(record, analyse(record, { targetAirVoids: 4, fit: 'quadratic' }), { submittedOn });
}

const names = (readings: Reading[]) => observe(readings).map(({ name, severity }) => `${name} ${severity}`);

const gravities = (trial: string, values: number[]) =>
  values.map((value, place) =>
    reading(
      'bulk-specific-gravity-mix',
      value,
      { trial, specimen: `${place + 1}` },
      { text: value.toFixed(3) },
    ),
  );

describe('too little scatter', () => {
  it('is less than a twentieth of the published standard deviation over all trials', () => {
    // Squares about the means: 0.667e-6 each; pooled √(1.333e-6/4) = 0.00058, below 0.0124/20 = 0.00062.
    const found = observe([...gravities('A', [2.39, 2.391, 2.39]), ...gravities('B', [2.4, 2.4, 2.401])]);
    expect(found.map(({ name }) => name)).toEqual(['too-little-scatter']);
    expect(found[0]?.observed).toBeCloseTo(0.00057735, 8);
    expect(found[0]?.limit?.min).toBeCloseTo(0.00062, 10);
    // 2e-6 and 0.667e-6: pooled 0.00082.
    expect(names([...gravities('A', [2.39, 2.391, 2.392]), ...gravities('B', [2.4, 2.4, 2.401])])).toEqual(
      [],
    );
  });

  it('is not said of few specimens, nor of a quantity without a published figure', () => {
    expect(names(gravities('A', [2.39, 2.391, 2.39]))).toEqual([]);
    const equivalents = [54.1, 54.2, 54.1, 54.2, 54.1, 54.2].map((value, place) =>
      reading('abrasion-loss', value, { specimen: `${place}` }),
    );
    expect(names(equivalents)).toEqual([]);
  });
});

describe('copied columns', () => {
  const masses = (trial: string, values: number[], laboratory?: 'agency') =>
    values.map((value, place) =>
      reading('mass-in-air', value, {
        trial,
        specimen: `${trial}${place + 1}`,
        ...(laboratory ? { laboratory } : {}),
      }),
    );
  const own = [4711.7, 4715.2, 4709.3];

  it('are three specimens of one trial that stand again under another', () => {
    const [found, ...others] = observe([...masses('A', own), ...masses('B', own)]);
    expect(others).toEqual([]);
    expect(found).toMatchObject({ name: 'copied-column', severity: 'advisory' });
    expect(found?.sentence).toBe('The 3 values of dry mass in air of trial A are those of trial B.');
    expect(names([...masses('A', own), ...masses('B', [4711.7, 4715.2, 4709.4])])).toEqual([]);
    expect(names([...masses('A', own.slice(1)), ...masses('B', own.slice(1))])).toEqual([]);
  });

  it('are the contractor’s values given as the agency’s', () => {
    expect(names([...masses('A', own), ...masses('A', own, 'agency')])).toEqual(['copied-column advisory']);
  });

  it('are gradations of two stockpiles, but not the sieves that all passes or nothing does', () => {
    const gradation = (stockpile: string, values: number[]) =>
      values.map((value, place) =>
        reading('percent-passing', value, { stockpile, sieve: [19, 12.5, 9.5, 4.75, 2.36, 0.075][place]! }),
      );
    const first = gradation('chip', [100, 92, 70, 34, 12, 3.1]);
    expect(names([...first, ...gradation('stone', [100, 92, 70, 34, 12, 3.1])])).toEqual([
      'copied-column advisory',
    ]);
    expect(names([...first, ...gradation('stone', [100, 92, 70, 34, 12, 3.2])])).toEqual([]);
    const open = [100, 100, 100, 34, 12, 0];
    expect(names([...gradation('a', open), ...gradation('b', open)])).toEqual([]);
  });
});

describe('digit preference', () => {
  /** Dry masses of which so many end in 0 or 5; the others end in the remaining digits in turn. */
  const masses = (preferred: number, all: number) =>
    Array.from({ length: all }, (_, place) => {
      const digit = place < preferred ? (place % 2) * 5 : [1, 2, 3, 4, 6, 7, 8, 9][place % 8]!;
      const value = 4700 + place + digit / 10;
      return reading('mass-in-air', value, { specimen: `${place}` }, { text: value.toFixed(1) });
    });

  it('is seen from twenty values on, where three in five end in 0 or 5', () => {
    const [found] = observe(masses(12, 20));
    expect(found).toMatchObject({ name: 'digit-preference', severity: 'advisory' });
    expect(found?.sentence).toBe(
      'Of 20 values of dry mass in air, 12 end in 0 or 5; one in five would by chance.',
    );
    expect(names(masses(11, 20))).toEqual([]);
    expect(names(masses(19, 19))).toEqual([]);
  });
});

describe('values on the limit', () => {
  const read = (value: number, overrides: Partial<Finding> = {}) =>
    findingSchema.parse({
      ...aFinding(),
      rule: `rule-${value}`,
      outcome: 'pass',
      observed: { value, rounded: value, text: String(value), unit: '%', statistic: 'mean', count: 1 },
      limit: { min: 45, max: null, decimals: 0, unit: '%' },
      evidence: [{ quantity: 'sand-equivalent', value, unit: '%', origin: 'measured', source: null }],
      ...overrides,
    });
  const on = (count: number) => Array.from({ length: count }, () => read(45));
  const off = (count: number) => Array.from({ length: count }, () => read(52));

  it('is four measured results or more, and a third of all, exactly on their limits', () => {
    const [found] = checkLimitsMet([...on(4), ...off(8)]);
    expect(found).toMatchObject({ name: 'values-on-the-limit', severity: 'advisory' });
    expect(found?.sentence).toBe('4 of 12 measured results are exactly on their limit: 412.03(b).');
    expect(checkLimitsMet([...on(4), ...off(9)])).toEqual([]);
    expect(checkLimitsMet(on(3))).toEqual([]);
  });

  it('does not count what is calculated, nor what has to be exactly so much', () => {
    const calculated = Array.from({ length: 4 }, () => read(45, { evidence: aFinding().evidence }));
    const exactly = Array.from({ length: 4 }, () =>
      read(100, { limit: { ...read(100).limit!, min: 100, max: 100 } }),
    );
    expect(checkLimitsMet([...calculated, ...exactly])).toEqual([]);
  });
});

describe('a reported chain from rounded values', () => {
  const sound = [...trialReadings('B'), ...aggregateReadings()];
  const printed = [
    reported('voids-in-mineral-aggregate', 14.2, { trial: 'B' }, '14.2'),
    reported('air-voids', 4, { trial: 'B' }, '4.0'),
  ];

  it('is said where the printed inputs alone give the printed digits', () => {
    // Unrounded 100·(14.1961 − 4.0128)/14.1961 = 71.73; of the printed ones 100·(14.2 − 4.0)/14.2 = 71.83.
    const found = observe([
      ...sound,
      ...printed,
      reported('voids-filled-with-asphalt', 71.8, { trial: 'B' }),
    ]);
    expect(found.map(({ name, subject, severity }) => [name, subject, severity])).toEqual([
      ['reported-from-rounded-values', 'voids filled with asphalt of trial B', 'advisory'],
    ]);
    expect(found[0]?.sentence).toBe(
      'Voids filled with asphalt of trial B are reported as 71.8 %, which follows from voids in the mineral aggregate and air voids as printed; unrounded it comes to 71.73.',
    );
  });

  it('is not said where the unrounded value shows the same digits', () => {
    expect(
      names([...sound, ...printed, reported('voids-filled-with-asphalt', 71.7, { trial: 'B' })]),
    ).toEqual([]);
  });
});

describe('a design beyond the trials', () => {
  const trials = [4.8, 5.3, 5.8].flatMap((content, place) => [
    reading('binder-content', content, { trial: `T${place}` }),
    reading('maximum-specific-gravity', 2.5, { trial: `T${place}` }),
    reading('bulk-specific-gravity-mix', 2.4 + place / 100, { trial: `T${place}` }),
  ]);
  const beyond = (declared: number, ...others: Reading[]) =>
    observe([...trials, reading('binder-content', declared), ...others])
      .map(({ name }) => name)
      .filter((name) => name === 'design-beyond-trials');

  it('is said from the first hundredth beyond what a trial stands for', () => {
    expect(beyond(5.8)).toEqual([]);
    // The last trial stands for the design within 0.05.
    expect(beyond(5.85)).toEqual([]);
    expect(beyond(5.86)).toEqual(['design-beyond-trials']);
    expect(beyond(4.74)).toEqual(['design-beyond-trials']);
  });

  it('is not said of a design with specimens of its own', () => {
    const own = [
      reading('maximum-specific-gravity', 2.45, { trial: 'design' }),
      reading('bulk-specific-gravity-mix', 2.4, { trial: 'design' }),
    ];
    expect(beyond(6.2, ...own)).toEqual([]);
  });
});

describe('dates out of order', () => {
  it('are tests after the day of submission; that day itself is in order', () => {
    const tested = (testedOn: string) => [reading('sand-equivalent', 60, {}, { testedOn })];
    expect(observe(tested('2026-03-10'), '2026-03-09').map(({ name }) => name)).toEqual([
      'dates-out-of-order',
    ]);
    expect(observe(tested('2026-03-09'), '2026-03-09')).toEqual([]);
    expect(observe(tested('2026-03-10'), null)).toEqual([]);
  });

  it('reach a check by its context', () => {
    const record = aRecord({ readings: [reading('sand-equivalent', 60, {}, { testedOn: '2026-03-10' })] });
    const { findings } = evaluate(record, anEdition(), aContext({ submittedOn: '2026-03-09' }));
    expect(findings.filter(({ kind }) => kind === 'consistency').map(({ rule }) => rule)).toEqual([
      'consistency/dates-out-of-order',
    ]);
  });
});
