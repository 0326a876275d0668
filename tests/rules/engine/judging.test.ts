import { describe, expect, it } from 'vitest';
import { addMonths } from '#rules/engine/calendar';
import { canonicalText } from '#rules/engine/canonical-text';
import { distanceWords } from '#rules/engine/distance-words';
import type { ResolvedLimit } from '#rules/engine/finding';
import { judge, marginOf, type Rounder } from '#rules/engine/judge';
import { naturalOrder } from '#rules/engine/natural-order';
import { byClauseThenSubject } from '#rules/engine/order';
import { isBorderline, precisionOf } from '#rules/engine/precision';
import { lastAlike, sideOf } from '#rules/engine/side-of-limit';
import type { AllowedInterval } from '#rules/engine/statistic';
import type { Quantity } from '#rules/quantities/quantity';
import { ruleSchema } from '#rules/rule-sets/schema';
import { aFinding } from '#tests/builders/a-finding';
import { aLimit } from '#tests/builders/a-limit';
import { aRule } from '#tests/builders/a-rule-set';

const toTenth: Rounder = { method: 'rounding', to: 0.1, decimals: 1, stated: true };
const asItIs: Rounder = { method: 'absolute', to: 1, decimals: 1, stated: false };
const between = aLimit({ min: 3, max: 5, decimals: 1 });
const open = aLimit({ min: 3, max: 5, minExclusive: true, maxExclusive: true, decimals: 1 });

function judged(
  value: number,
  limit: ResolvedLimit,
  rounder = toTenth,
  allowed: AllowedInterval | null = null,
) {
  return judge({ value, text: null, allowed }, limit, rounder);
}

describe('a value against its limit', () => {
  it.each([
    // value, limit, outcome, rounded, margin to the nearest end
    [2.94, between, 'fail', 2.9, -0.1],
    [2.95, between, 'pass', 3, 0],
    [3, between, 'pass', 3, 0],
    [4.2, between, 'pass', 4.2, 0.8],
    [3.4, between, 'pass', 3.4, 0.4],
    [5.05, between, 'pass', 5, 0],
    [5.06, between, 'fail', 5.1, -0.1],
    [3, open, 'fail', 3, 0],
    [5, open, 'fail', 5, 0],
    [3.1, open, 'pass', 3.1, 0.1],
  ] as const)('%d is a %s…', (value, limit, outcome, rounded, margin) => {
    expect(judged(value, limit)).toMatchObject({ outcome, rounded, margin });
  });

  it('has its margin to the one end that there is', () => {
    expect(marginOf(4, aLimit({ min: 3 }))).toBe(1);
    expect(marginOf(4, aLimit({ max: 4.5 }))).toBe(0.5);
    expect(marginOf(4, aLimit())).toBeNull();
  });

  it('cannot be judged without any end: nothing could fail', () => {
    expect(() => judged(4, aLimit())).toThrow(/without an end/);
  });

  it('is written in the decimals of its rounding, unrounded with its own up to six', () => {
    expect(judged(4, between).text).toBe('4.0');
    expect(judged(4.25, between, asItIs).text).toBe('4.25');
    expect(judged(4, between, asItIs).text).toBe('4.0');
    expect(judged(4.123456789, between, asItIs).text).toBe('4.123457');
  });
});

describe('every value that a censored one may be', () => {
  const low = aLimit({ min: 3 });
  const high = aLimit({ max: 5 });
  const at = (limit: ResolvedLimit, allowed: AllowedInterval, rounder = asItIs) =>
    judged([allowed.low, allowed.high].find(Number.isFinite) ?? 4, limit, rounder, allowed);

  it.each([
    // less than 3, less than 5, more than 5, more than 3 and their like
    ['below 3 at least 3', low, { low: -Infinity, high: 3 }, 'fail'],
    ['at most 3 at least 3', low, { low: -Infinity, high: 3, highIncluded: true }, 'undecided'],
    ['below 4 at least 3', low, { low: -Infinity, high: 4 }, 'undecided'],
    ['above 3 at least 3', low, { low: 3, high: Infinity }, 'pass'],
    ['from 3 at least 3', low, { low: 3, high: Infinity, lowIncluded: true }, 'pass'],
    ['above 2.9 at least 3', low, { low: 2.9, high: Infinity }, 'undecided'],
    ['above 5 at most 5', high, { low: 5, high: Infinity }, 'fail'],
    ['from 5 at most 5', high, { low: 5, high: Infinity, lowIncluded: true }, 'undecided'],
    ['below 5 at most 5', high, { low: -Infinity, high: 5 }, 'pass'],
    ['at most 5 at most 5', high, { low: -Infinity, high: 5, highIncluded: true }, 'pass'],
    ['below 5.1 at most 5', high, { low: -Infinity, high: 5.1 }, 'undecided'],
    ['above 5 within 3 to 5', between, { low: 5, high: Infinity }, 'fail'],
    ['below 3 within 3 to 5', between, { low: -Infinity, high: 3 }, 'fail'],
    ['above 3 within 3 to 5', between, { low: 3, high: Infinity }, 'undecided'],
    ['3.1 to 4.9 within 3 to 5', between, { low: 3.1, high: 4.9 }, 'pass'],
    ['2 to 6 within 3 to 5', between, { low: 2, high: 6 }, 'undecided'],
    ['anything within 3 to 5', between, { low: -Infinity, high: Infinity }, 'undecided'],
    ['above 3 where 3 is excluded', open, { low: 3, high: 4 }, 'pass'],
    ['from 3 where 3 is excluded', open, { low: 3, high: 4, lowIncluded: true }, 'undecided'],
    ['below 5 where 5 is excluded', open, { low: 4, high: 5 }, 'pass'],
    ['to 5 where 5 is excluded', open, { low: 4, high: 5, highIncluded: true }, 'undecided'],
    ['to 3 where 3 is excluded', open, { low: 2, high: 3, highIncluded: true }, 'fail'],
    ['from 5 where 5 is excluded', open, { low: 5, high: 6, lowIncluded: true }, 'fail'],
  ] as const)('%s', (_, limit, allowed, outcome) => {
    expect(at(limit, allowed)).toMatchObject({ outcome, margin: null });
  });

  it('is rounded before it is judged: below 3.0 may still be 3.0 to a tenth', () => {
    expect(at(low, { low: -Infinity, high: 3 }, toTenth)).toMatchObject({ outcome: 'undecided' });
    expect(at(low, { low: -Infinity, high: 2.9 }, toTenth)).toMatchObject({ outcome: 'fail' });
  });
});

describe('the side of a limit', () => {
  it.each([
    [2.94, between, toTenth, 'below'],
    [2.95, between, toTenth, 'inside'],
    [3, between, toTenth, 'inside'],
    [5.05, between, toTenth, 'inside'],
    [5.06, between, toTenth, 'above'],
    [3.04, open, toTenth, 'below'],
    [3.06, open, toTenth, 'inside'],
    [4.96, open, toTenth, 'above'],
    [2.9999, between, asItIs, 'below'],
    [5.0001, between, asItIs, 'above'],
    [5.09, between, { ...toTenth, method: 'truncate' }, 'inside'],
    [5.1, between, { ...toTenth, method: 'truncate' }, 'above'],
    [2.99, between, { ...toTenth, method: 'truncate' }, 'below'],
    [-50, aLimit({ max: 5 }), toTenth, 'inside'],
    [50, aLimit({ min: 3 }), toTenth, 'inside'],
    [50, aLimit({ max: 5 }), toTenth, 'above'],
    [Number.NaN, between, toTenth, 'below'],
    [null, between, toTenth, 'below'],
  ] as const)('of %s is where the finding would be', (value, limit, rounder, side) => {
    expect(sideOf(value, limit, rounder)).toBe(side);
  });

  it('changes at one place of a run, found by halving', () => {
    for (const border of [0, 1, 2, 7, 8, 15, 16]) {
      expect(lastAlike(0, 16, (place) => place <= border)).toBe(border);
      expect(lastAlike(16, 0, () => true)).toBe(0);
    }
  });
});

describe('the distance in words', () => {
  const words = (rounded: number, margin: number | null, outcome: 'pass' | 'fail', limit = between) =>
    distanceWords({ rounded, margin, outcome }, limit);

  it.each([
    [words(2.9, -0.1, 'fail'), '2.9 is below 3.0 by 0.1.'],
    [words(5.25, -0.25, 'fail'), '5.25 is above 5.00 by 0.25.'],
    [words(4.2, 0.8, 'pass'), '4.2 is inside the limit by 0.8.'],
    [words(3, 0, 'pass'), '3.0 is on the limit, which is included.'],
    [words(3, 0, 'fail', open), '3.0 is on the limit, which is not included.'],
    [words(4, null, 'pass'), '4.0 is inside the limit.'],
    [words(6, null, 'fail'), '6.0 is outside the limit.'],
    [words(2, -1, 'fail', aLimit({ min: 3 })), '2 is below 3 by 1.'],
    [words(6, -1, 'fail', aLimit({ max: 5 })), '6 is above 5 by 1.'],
  ])('%s', (sentence, expected) => {
    expect(sentence).toBe(expected);
  });
});

describe('the precision of a result', () => {
  const quantity = {
    unit: '%',
    methodPrecision: { singleOperatorStandardDeviation: 0.2, source: 'a method', origin: 'memory' },
  } as Quantity;
  const of = (input: Partial<Parameters<typeof precisionOf>[0]>) =>
    precisionOf({
      rule: ruleSchema.parse(aRule()),
      quantity,
      statistic: 'mean',
      count: 4,
      unit: '%',
      ...input,
    });

  it('is 1.96·s/√n of a mean of n: 1.96·0.2/2', () => {
    expect(of({})).toEqual({ value: 0.196, origin: '1.96·s/√n, s from a method; from memory, verify' });
  });

  it.each(['each', 'min', 'max'] as const)(
    'is that of a single result for %s, however many there are',
    (statistic) => {
      expect(of({ statistic })?.value).toBe(0.392);
    },
  );

  it.each([
    ['another statistic', of({ statistic: 'range' })],
    ['a count', of({ statistic: 'count' })],
    ['no result', of({ count: 0 })],
    ['another unit', of({ unit: 'mm' })],
    ['no quantity', of({ quantity: undefined })],
    ['no published deviation', of({ quantity: { ...quantity, methodPrecision: null } })],
  ])('is not known of %s', (_, precision) => {
    expect(precision).toBeNull();
  });

  it("is the rule's own where it has one, and says whose", () => {
    const own = (precision: object) =>
      of({ rule: ruleSchema.parse(aRule({ precision } as Parameters<typeof aRule>[0])) });
    expect(own({ value: '0.4', source: 'a round robin', origin: 'agency' })).toEqual({
      value: 0.4,
      origin: 'a round robin',
    });
    expect(own({ value: '0.4', source: null, origin: 'memory' })?.origin).toBe(
      "the rule's own precision; from memory, verify",
    );
    expect(own({ value: '0.4', source: 'X, from memory', origin: 'memory' })?.origin).toBe('X, from memory');
  });

  it('marks a margin on either side, the precision itself included', () => {
    const precision = { value: 0.4, origin: '' };
    expect([0.4, -0.4, 0.41, -0.41].map((margin) => isBorderline(margin, precision))).toEqual([
      true,
      true,
      false,
      false,
    ]);
    expect(isBorderline(null, precision)).toBe(false);
    expect(isBorderline(0, null)).toBe(false);
  });
});

describe('the order of findings', () => {
  it.each([
    ['412.3', '412.3(a)'],
    ['412.3(A)', '412.3(b)'],
    ['a2', 'b1'],
    ['abc', 'abd'],
    ['(b)', '(aa)'],
    ['(ab)', '(ba)'],
    // Words are no letters of a clause: they go by the alphabet, whatever their length.
    ['stone', 'wax'],
    ['B', 'b'],
    ['2', '10'],
    ['2', 'a'],
  ])('puts %s before %s', (first, second) => {
    expect(naturalOrder(first, second)).toBeLessThan(0);
    expect(naturalOrder(second, first)).toBeGreaterThan(0);
    expect(naturalOrder(first, first)).toBe(0);
  });

  it('puts sieves by their opening, other subjects by their words, then rules', () => {
    const finding = (clause: string | null, subject: string, rule: string) =>
      aFinding({ clause, subject, rule });
    const ordered = [
      finding(null, 'mix', 'a'),
      finding('1', '0.075 mm', 'b'),
      finding('1', '2.36 mm', 'a'),
      finding('1', '12.5 mm', 'a'),
      finding('1', 'mix', 'a'),
      finding('1', 'mix', 'b'),
      finding('2', 'mix', 'a'),
    ];
    expect(ordered.toReversed().toSorted(byClauseThenSubject)).toEqual(ordered);
  });

  it('stays the same after more texts than are remembered', () => {
    for (let i = 0; i < 2100; i += 1) naturalOrder(`${i}.x`, `${i}.y`);
    expect(naturalOrder('412.2', '412.10')).toBeLessThan(0);
  });
});

describe('dates and texts', () => {
  it.each([
    ['2026-04-30', 1, '2026-05-30'],
    ['2026-03-31', 1, '2026-04-30'],
    ['2026-05-31', 1, '2026-06-30'],
    ['2026-08-31', 1, '2026-09-30'],
    ['2026-10-31', 1, '2026-11-30'],
    ['2026-07-31', 1, '2026-08-31'],
    ['2026-01-31', -2, '2025-11-30'],
    ['2099-12-31', 2, '2100-02-28'],
    ['2026-03-05', 0, '2026-03-05'],
    ['0999-12-01', 1, '1000-01-01'],
    ['0998-12-01', 1, '0999-01-01'],
  ])('%s and %s months is %s', (date, months, later) => {
    expect(addMonths(date, months)).toBe(later);
  });

  it.each([
    [undefined, /undefined/],
    [() => 0, /function/],
    [Number.POSITIVE_INFINITY, /not finite/],
  ])('canonical JSON refuses %s', (value, reason) => {
    expect(() => canonicalText(value)).toThrow(reason);
  });

  it('canonical JSON leaves members without a value out, and keeps their place in a list as null', () => {
    expect(canonicalText({ b: undefined, a: 1, c: [undefined, 2] })).toBe('{"a":1,"c":[null,2]}');
    expect(canonicalText({})).toBe('{}');
    expect(canonicalText([])).toBe('[]');
    expect(canonicalText(-0)).toBe('0');
    expect(canonicalText(true)).toBe('true');
    // Sorted by UTF-16 code units: capitals first, and a surrogate pair before U+FB33 (RFC 8785, section 3.2.3).
    expect(canonicalText({ '\ufb33': 3, '\ud83d\ude00': 2, b: 1, B: 0 })).toBe(
      '{"B":0,"b":1,"\ud83d\ude00":2,"\ufb33":3}',
    );
    expect(canonicalText('\ud800')).toBe('"\\ud800"');
  });

  it('canonical JSON tells names apart that have a line break between them or within', () => {
    expect(canonicalText({ 'a\nb': 1 })).toBe('{"a\\nb":1}');
    expect(canonicalText({ a: 1, b: 2 })).toBe('{"a":1,"b":2}');
    expect(canonicalText({ 'a\nb': 1 })).toBe('{"a\\nb":1}');
    for (let i = 0; i < 600; i += 1) canonicalText({ [`name ${i}`]: i });
    expect(canonicalText({ b: 1, a: 2 })).toBe('{"a":2,"b":1}');
  });
});
