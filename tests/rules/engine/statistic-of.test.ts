import { describe, expect, it } from 'vitest';
import { decide, listCondition, satisfies } from '#rules/engine/decide';
import type { Sample, SampleItem } from '#rules/engine/sample';
import { judgeableOf, statisticOf } from '#rules/engine/statistic';
import type { Statistic } from '#rules/rule-sets/measure';
import type { Condition } from '#rules/rule-sets/when';

type Qualifier = SampleItem['qualifier'];

function anItem(
  value: number | null,
  qualifier: Qualifier = null,
  at: SampleItem['at'] = {},
  unit = '%',
): SampleItem {
  return {
    value,
    qualifier,
    at,
    specimen: null,
    evidence: { quantity: 'x', value, unit, origin: 'measured', source: null },
  } as SampleItem;
}

function of(statistic: Statistic, items: SampleItem[], overrides: Partial<Sample> = {}, hasMin = true) {
  const sample: Sample = {
    items,
    meanOnly: false,
    count: items.length,
    interpolated: false,
    recomputed: null,
    ...overrides,
  };
  return statisticOf({ sample, statistic, within: null, hasMin });
}

const four = [14.2, 13.1, 15, 14.1].map((value) => anItem(value));

describe('the statistic of plain values, by hand', () => {
  it.each([
    ['mean', 14.1],
    ['min', 13.1],
    ['max', 15],
    ['range', 1.9],
    // Without 13.1 and 15: (14.1 + 14.2)/2.
    ['trimmed-mean', 14.15],
    ['count', 4],
  ] as const)('%s is %d', (statistic, value) => {
    expect(of(statistic, four)).toEqual({ ok: true, judgeable: { value, text: null, allowed: null } });
  });

  it('standard deviation has n − 1 below it: Σd² of 0.1, −1, 0.9, 0 is 1.82, of three 0.606667', () => {
    expect(of('standard-deviation', four)).toMatchObject({
      ok: true,
      judgeable: { value: expect.closeTo(Math.sqrt(1.82 / 3), 9) },
    });
  });

  it.each([
    ['a range of one', of('range', [anItem(3)]), /range needs at least two/, /second specimen/],
    ['a deviation of one', of('standard-deviation', [anItem(3)]), /^A standard.*two values\.$/, /further/],
    ['a trimmed mean of two', of('trimmed-mean', four.slice(0, 2)), /^A trimmed mean.*\.$/, /further/],
    ['a share without limits', of('percent-within-limits', four), /limits to be within/, null],
    ['a mean of no number', of('mean', [anItem(Number.NaN)]), /not a number/, null],
    ['a least of no number', of('min', [anItem(1), anItem(Number.POSITIVE_INFINITY)]), /not a number/, null],
    ['a mean of nothing', of('mean', []), /not a number/, null],
    [
      'a range of an interpolated value',
      of('range', four, { interpolated: true }),
      /interpolated/,
      /Compact/,
    ],
    ['each of an interpolated value', of('each', four, { interpolated: true }), /interpolated/, /Compact/],
    ['a range of a mean', of('range', [anItem(4)], { meanOnly: true, count: 3 }), /Only the mean/, /each/],
    ['each of a mean', of('each', [anItem(4)], { meanOnly: true, count: 3 }), /Only the mean/, /each/],
  ])('%s is undecided', (_, result, reason, act) => {
    expect(result).toMatchObject({ ok: false, outcome: 'undecided', reason: expect.stringMatching(reason) });
    if (act !== null) expect(result).toMatchObject({ wouldDecide: expect.stringMatching(act) });
  });

  it('the mean alone, and a mean of one specimen, are known where only the mean is', () => {
    expect(of('mean', [anItem(4)], { meanOnly: true, count: 3 })).toMatchObject({ judgeable: { value: 4 } });
    expect(of('mean', [anItem(4)], { interpolated: true, count: 3 })).toMatchObject({
      judgeable: { value: 4 },
    });
    expect(of('min', [anItem(4)], { meanOnly: true, count: 1 })).toMatchObject({ judgeable: { value: 4 } });
    expect(of('count', [anItem(4)], { meanOnly: true, count: 3 })).toMatchObject({ judgeable: { value: 3 } });
  });
});

describe('one value that is no plain number', () => {
  it.each([
    ['<5', anItem(5, '<'), false, { value: 5, text: '<5', allowed: { low: -Infinity, high: 5 } }],
    ['>5', anItem(5, '>'), false, { value: 5, text: '>5', allowed: { low: 5, high: Infinity } }],
    [
      '<20,000',
      anItem(20000, '<'),
      false,
      { value: 20000, text: '<20,000', allowed: { low: -Infinity, high: 20000 } },
    ],
    [
      'none against a most',
      anItem(null, 'none'),
      false,
      { value: 0, text: 'none', isWord: true, allowed: null },
    ],
    [
      'non-plastic against a least',
      anItem(null, 'non-plastic'),
      true,
      { value: 0, text: 'non-plastic', isWord: true, allowed: { low: -Infinity, high: Infinity } },
    ],
    [
      'none in 20,000 passes',
      anItem(null, 'none', { passes: 20000 }, 'passes'),
      false,
      { value: 20000, text: 'none', isWord: true, allowed: { low: 20000, high: Infinity } },
    ],
    [
      'no depth after 20,000 passes',
      anItem(null, 'none', { passes: 20000 }, 'mm'),
      false,
      { value: 0, text: 'none', isWord: true, allowed: null },
    ],
    ['a plain number', anItem(5), true, { value: 5, text: null, allowed: null }],
  ] as const)('%s', (_, item, hasMin, expected) => {
    expect(judgeableOf(item, hasMin)).toEqual(expected);
  });
});

describe('several values of which one is censored', () => {
  const allowed = (statistic: Statistic, items: SampleItem[]) => {
    const result = of(statistic, items);
    return result.ok ? result.judgeable.allowed : result.reason;
  };

  it.each([
    // (4 + x)/2 with x below 6, above 6.
    [
      'mean',
      [anItem(4), anItem(6, '<')],
      { low: -Infinity, high: 5, lowIncluded: false, highIncluded: false },
    ],
    [
      'mean',
      [anItem(4), anItem(6, '>')],
      { low: 5, high: Infinity, lowIncluded: false, highIncluded: false },
    ],
    // The least of 4 and something above 3 lies above 3, and may be 4 itself.
    ['min', [anItem(4), anItem(3, '>')], { low: 3, high: 4, lowIncluded: false, highIncluded: true }],
    [
      'min',
      [anItem(4), anItem(3, '<')],
      { low: -Infinity, high: 3, lowIncluded: false, highIncluded: false },
    ],
    // The most of 4 and something below 6 is at least 4, and lies below 6.
    ['max', [anItem(4), anItem(6, '<')], { low: 4, high: 6, lowIncluded: true, highIncluded: false }],
    ['max', [anItem(4), anItem(6, '>')], { low: 6, high: Infinity, lowIncluded: false, highIncluded: false }],
  ] as const)('%s', (statistic, items, expected) => {
    expect(allowed(statistic, [...items])).toEqual(expected);
  });

  it('is settled where the censored value cannot be the one that counts', () => {
    expect(of('min', [anItem(4), anItem(6, '>')])).toEqual({
      ok: true,
      judgeable: { value: 4, text: null, allowed: null },
    });
  });

  it('is written as a workbook would state it', () => {
    const text = (items: SampleItem[]) => {
      const result = of('mean', items);
      return result.ok ? result.judgeable.text : result.reason;
    };
    expect(text([anItem(4), anItem(6, '<')])).toBe('<5');
    expect(text([anItem(30000), anItem(10000, '>')])).toBe('>20,000');
    expect(text([anItem(4, '<'), anItem(6, '>')])).toBe('a value without bounds');
  });

  it('of one censored value alone is that value, but it has no spread', () => {
    for (const statistic of ['mean', 'min', 'max', 'each'] as const) {
      expect(of(statistic, [anItem(6, '<')])).toMatchObject({ ok: true, judgeable: { text: '<6' } });
    }
    expect(of('standard-deviation', [anItem(4), anItem(6, '<')])).toMatchObject({
      outcome: 'undecided',
      reason: 'A standard deviation cannot be taken over a value that is only known as <6.',
      wouldDecide: expect.stringMatching(/until the result is a number/),
    });
    expect(of('each', [anItem(4), anItem(6, '<')])).toMatchObject({ outcome: 'undecided' });
  });
});

describe('each comparison below, at and above its value', () => {
  it.each([
    ['lessThan', true, false, false],
    ['lessThanInclusive', true, true, false],
    ['greaterThan', false, false, true],
    ['greaterThanInclusive', false, true, true],
    ['equal', false, true, false],
    ['notEqual', true, false, true],
  ] as const)('%s', (operator, ...expected) => {
    const truth = (value: number | string, limit: number | string) =>
      decide({ fact: 'x', operator, value: limit } as Condition, () => ({ kind: 'value', value }));
    expect([2, 3, 4].map((value) => truth(value, 3))).toEqual(expected.map(String));
    expect(['2026-01-31', '2026-02-01', '2026-02-02'].map((day) => truth(day, '2026-02-01'))).toEqual(
      expected.map(String),
    );
  });

  it.each([
    ['atLeast', false, true, true],
    ['moreThan', false, false, true],
    ['atMost', true, true, false],
    ['lessThan', true, false, false],
  ] as const)('%s of a limit', (operator, ...expected) => {
    const limit = { all: [{ fact: 'judged', operator, value: 3 } as const] };
    expect([2, 3, 4].map((value) => satisfies(limit, value))).toEqual(expected);
  });

  it('a list holds what is named in it, whatever lists came before', () => {
    expect(satisfies(listCondition(['PG 64-22', 'PG 70-22']), 'pg 64 22')).toBe(true);
    for (let i = 0; i < 600; i += 1)
      expect(satisfies(listCondition([`grade ${i}`]), `grade ${i}`)).toBe(true);
    expect(satisfies(listCondition(['PG 64-22', 'PG 70-22']), 'PG 76-22')).toBe(false);
    const either = (operator: 'in' | 'notIn', value: number) =>
      decide({ fact: 'x', operator, value: [1, 3] } as Condition, () => ({ kind: 'value', value }));
    expect([either('in', 3), either('in', 2), either('notIn', 2), either('notIn', 1)]).toEqual([
      'true',
      'false',
      'true',
      'false',
    ]);
  });

  it.each([
    ['text against a number', 'x', 3],
    ['a number against text', 3, 'x'],
    ['text against a date', 'x', '2026-02-01'],
    ['a date against text', '2026-02-01', 'x'],
    ['a date with more behind it', '2026-02-01T00', '2026-02-01'],
    ['a date with more before it', 'x2026-02-01', '2026-02-01'],
  ])('has no order for %s', (_, value, limit) => {
    const condition = { fact: 'x', operator: 'lessThan', value: limit } as Condition;
    expect(() => decide(condition, () => ({ kind: 'value', value }))).toThrow(/cannot be put in order/);
  });

  it('has no order for a limit that is no finite number, and knows no other operators', () => {
    const against = (operator: string, value: number) => () =>
      decide({ fact: 'x', operator, value } as Condition, () => ({ kind: 'value', value: 3 }));
    expect(against('lessThan', Number.POSITIVE_INFINITY)).toThrow(/no finite number/);
    expect(against('resembles', 3)).toThrow(/operator resembles is not known/);
  });
});
