import { describe, expect, it } from 'vitest';
import type { Doubt, Reading } from '#rules/record';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { aReading } from '#tests/builders/a-reading';
import { checkWith, findingsOf } from './check-with';

/** Invented control points at three sieves. */
const tables: RuleSetInput['tables'] = [
  {
    id: 'control-points',
    keys: ['sieve'],
    columns: [
      { name: 'min', unit: '%' },
      { name: 'max', unit: '%' },
    ],
    rows: [
      { sieve: 12.5, min: 90, max: 100 },
      { sieve: 2.36, min: 28, max: 58 },
      { sieve: 0.075, min: 2, max: 10 },
    ],
  },
];
const rule: Partial<RuleInput> = {
  id: 'control',
  measure: { kind: 'gradation', table: 'control-points' },
  limit: { min: { table: 'control-points', column: 'min' }, max: { table: 'control-points', column: 'max' } },
  rounding: { method: 'rounding', to: 1 },
};

function sieved(quantity: string, values: Record<string, number>, at: Reading['at'] = { trial: 'design' }) {
  return Object.entries(values).map(([sieve, value]) =>
    aReading({ quantity, value, at: { ...at, sieve: Number(sieve) } }),
  );
}

function outcomes(readings: Reading[], doubts: Doubt[] = []) {
  return findingsOf({ rule, edition: { tables }, record: { readings, doubts } }).map(
    ({ subject, outcome, observed }) => [subject, outcome, observed?.value ?? null],
  );
}

/** Retained: 5 on 12.5 mm, 55 on 2.36 mm, 36 on 0.075 mm; so passing 95, 40 and 4. */
const individual = { '12.5': 5, '2.36': 55, '0.075': 36 };
const cumulative = { '12.5': 5, '2.36': 60, '0.075': 96 };
const passes = [
  ['0.075 mm', 'pass', 4],
  ['2.36 mm', 'pass', 40],
  ['12.5 mm', 'pass', 95],
];

describe('a job-mix gradation that is stated as retained', () => {
  it('is judged as percent passing, from cumulative percents retained', () => {
    expect(outcomes(sieved('cumulative-percent-retained', cumulative))).toEqual(passes);
  });

  it('is judged as percent passing, from individual percents retained', () => {
    expect(outcomes(sieved('percent-retained', individual))).toEqual(passes);
  });

  it('counts where it names no trial, as a property of the aggregate', () => {
    expect(outcomes(sieved('percent-retained', individual, {}))).toEqual(passes);
  });

  it('gives way to percent passing where the workbook states that', () => {
    const readings = [
      ...sieved('cumulative-percent-retained', cumulative),
      ...sieved('percent-passing', { '2.36': 20 }),
    ];
    expect(outcomes(readings)[1]).toEqual(['2.36 mm', 'fail', 20]);
  });

  it('shows what was retained in the thread, and the formula', () => {
    const [finding] = findingsOf({
      rule,
      edition: { tables },
      record: { readings: sieved('percent-retained', individual) },
    }).filter(({ subject }) => subject === '2.36 mm');
    expect(finding?.evidence[0]).toMatchObject({ origin: 'converted', formula: '100 − ΣR', value: 40 });
    expect(finding?.evidence[0]?.inputs?.map(({ value }) => value)).toEqual([5, 55]);
  });

  it('stands among what was recomputed', () => {
    const { analysis } = checkWith({
      rule,
      edition: { tables },
      record: { readings: sieved('percent-retained', individual) },
    });
    expect(analysis.recomputed.map(({ quantity, value }) => [quantity, value])).toEqual([
      ['percent-passing', 95],
      ['percent-passing', 40],
      ['percent-passing', 4],
    ]);
  });

  it('is not shown at a sieve that it leaves out', () => {
    expect(outcomes(sieved('cumulative-percent-retained', { '12.5': 5, '0.075': 96 }))[1]).toEqual([
      '2.36 mm',
      'not shown',
      null,
    ]);
  });

  it('is undecided from a sieve downwards whose own cell is in doubt', () => {
    const doubt: Doubt = {
      sheet: 'Blend',
      cell: 'C7',
      text: '5?',
      reason: 'the text is not a number',
      alternatives: [],
      about: { quantity: 'percent-retained', at: { trial: 'design', sieve: 2.36 } },
    };
    const readings = sieved('percent-retained', { '12.5': 5, '0.075': 36 });
    expect(outcomes(readings, [doubt]).map(([, outcome]) => outcome)).toEqual([
      'undecided',
      'undecided',
      'pass',
    ]);
  });

  it('is undecided, not absent, where every cell of it is in doubt', () => {
    const doubt: Doubt = {
      sheet: 'Blend',
      cell: 'C7',
      text: '5?',
      reason: 'the text is not a number',
      alternatives: [],
      about: { quantity: 'cumulative-percent-retained', at: { trial: 'design', sieve: 2.36 } },
    };
    expect(outcomes([], [doubt])[1]).toEqual(['2.36 mm', 'undecided', null]);
  });

  it("counts a stockpile's where a rule names each", () => {
    const ofStockpiles: Partial<RuleInput> = {
      measure: { kind: 'reading', quantity: 'percent-passing', at: { stockpile: 'each', sieve: 0.075 } },
      limit: { max: 10 },
    };
    const readings = ['Coarse', 'Fine'].flatMap((stockpile, i) =>
      sieved('cumulative-percent-retained', { '0.075': 95 - 10 * i }, { stockpile }),
    );
    const findings = findingsOf({ rule: ofStockpiles, record: { readings } });
    expect(findings.map(({ subject, outcome }) => [subject, outcome])).toEqual([
      ['stockpile Coarse, 0.075 mm', 'pass'],
      ['stockpile Fine, 0.075 mm', 'fail'],
    ]);
  });
});

describe('a doubt about one sieve', () => {
  it('leaves its neighbours alone', () => {
    const doubt: Doubt = {
      sheet: 'Blend',
      cell: 'C9',
      text: '4?',
      reason: 'the text is not a number',
      alternatives: [],
      about: { quantity: 'percent-passing', at: { trial: 'design', sieve: 0.3 } },
    };
    const readings = sieved('percent-passing', { '12.5': 95, '2.36': 40, '0.075': 4 });
    expect(outcomes(readings, [doubt])).toEqual(passes);
  });
});
