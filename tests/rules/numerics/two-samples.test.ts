import { describe, expect, it } from 'vitest';
import { comparePairs, compareSamples } from '#rules/numerics/compare-samples';
import { differenceLimit, rangeMultiplier } from '#rules/numerics/difference-limit';
import { criticalOutlier, outlierTest } from '#rules/numerics/outlier-test';
import fc from '#tests/builders/seeded-fast-check';

const first = [5.42, 5.51, 5.37, 5.6, 5.48];
const second = [5.36, 5.47, 5.35, 5.52, 5.45];
const result = results(fc.double({ min: 4, max: 6, noNaN: true }));

function results(value: fc.Arbitrary<number>): fc.Arbitrary<number[]> {
  return fc.array(value, { minLength: 3, maxLength: 10 });
}

describe('comparing two laboratories', () => {
  it('takes the worked example for the same in variance and mean at 1 %', () => {
    const compared = compareSamples(first, second, 0.01);
    expect(compared).toMatchObject({ ok: true, comparison: { sameVariance: true, sameMean: true } });
  });

  it('goes by each variance where the two differ: t 2.1293 with 6.792 degrees (by hand)', () => {
    // Contractor: mean 5.48, s² 0.006222, n 10; agency: mean 5.374, s² 0.00928, n 5. At 60 % their variances differ.
    const contractor = [5.42, 5.51, 5.37, 5.6, 5.48, 5.55, 5.44, 5.39, 5.58, 5.46];
    const agency = [5.3, 5.52, 5.41, 5.28, 5.36];
    const compared = compareSamples(contractor, agency, 0.6);
    if (!compared.ok) throw new Error(compared.reason);
    expect(compared.comparison.sameVariance).toBe(false);
    expect(compared.comparison.t).toBeCloseTo(2.1293, 4);
    expect(compared.comparison.degreesOfT).toBeCloseTo(6.792, 3);
  });

  it('says the same of both, whichever comes first', () => {
    fc.assert(
      fc.property(result, result, (one, other) => {
        const forward = compareSamples(one, other, 0.05);
        const back = compareSamples(other, one, 0.05);
        expect(forward.ok).toBe(back.ok);
        if (!forward.ok || !back.ok) return;
        expect(forward.comparison.t).toBeCloseTo(-back.comparison.t, 6);
        expect(forward.comparison.sameMean).toBe(back.comparison.sameMean);
        expect(forward.comparison.sameVariance).toBe(back.comparison.sameVariance);
      }),
    );
  });

  it('gives probabilities between 0 and 1', () => {
    fc.assert(
      fc.property(result, result, (one, other) => {
        const compared = compareSamples(one, other, 0.05);
        if (!compared.ok) return;
        const { probabilityF, probabilityT } = compared.comparison;
        for (const each of [probabilityF, probabilityT]) {
          expect(each).toBeGreaterThanOrEqual(0);
          expect(each).toBeLessThanOrEqual(1);
        }
      }),
    );
  });

  it.each([
    ['one value', [5.4], second, 0.01],
    ['no spread', [5.4, 5.4, 5.4], second, 0.01],
    ['something that is no number', [5.4, Number.NaN], second, 0.01],
    ['a significance of 0', first, second, 0],
    ['a significance of 1', first, second, 1],
  ])('cannot with %s', (_, one, other, significance) => {
    expect(compareSamples(one, other, significance).ok).toBe(false);
  });

  it('compares pairs: t 4.271 with 4 degrees (by hand: 0.046/(0.02408/√5))', () => {
    const compared = comparePairs(first, second, 0.01);
    if (!compared.ok) throw new Error(compared.reason);
    expect(compared.comparison.t).toBeCloseTo(4.271, 3);
    expect(compared.comparison.sameMean).toBe(true);
    expect(comparePairs(first, second, 0.05)).toMatchObject({ comparison: { sameMean: false } });
  });

  it.each([
    ['pairs that lack a partner', first.slice(1), second, 0.01],
    ['one pair', [5.4], [5.3], 0.01],
    ['differences that are all the same', [5.4, 5.5, 5.6], [5.3, 5.4, 5.5], 0.01],
    ['a significance of 1', first, second, 1],
  ])('cannot with %s', (_, one, other, significance) => {
    expect(comparePairs(one, other, significance).ok).toBe(false);
  });
});

describe('a single outlier', () => {
  it('finds none in the worked example: (99.3 − 97.95)/1.14964 = 1.174 at both ends, 1.463 critical', () => {
    const tested = outlierTest([96.6, 97.55, 99.3, 98.35], 0.05);
    if (!tested.ok) throw new Error(tested.reason);
    expect(tested.test.high).toBeCloseTo(1.174, 3);
    expect(tested.test.low).toBeCloseTo(1.174, 3);
    // Printed to 0.001; the formula gives 1.4625.
    expect(Math.abs(tested.test.critical - 1.463)).toBeLessThanOrEqual(0.001);
    expect(tested.test.outlier).toBeNull();
  });

  it('finds a value far above and one far below', () => {
    const near = [2.4, 2.401, 2.402, 2.4, 2.399, 2.401];
    expect(outlierTest([...near, 2.45], 0.05)).toMatchObject({ test: { outlier: 'high' } });
    expect(outlierTest([...near, 2.35], 0.05)).toMatchObject({ test: { outlier: 'low' } });
  });

  it.each([
    ['two values', [2.4, 2.5], 0.05],
    ['no spread', [2.4, 2.4, 2.4], 0.05],
    ['something that is no number', [2.4, 2.5, Number.NaN], 0.05],
    ['a significance of 0', [2.4, 2.5, 2.6], 0],
  ])('cannot with %s', (_, values, significance) => {
    expect(outlierTest(values, significance).ok).toBe(false);
  });

  it('is never farther out than (n − 1)/√n standard deviations', () => {
    fc.assert(
      fc.property(result, (values) => {
        const tested = outlierTest(values, 0.05);
        if (!tested.ok) return;
        const most = (values.length - 1) / Math.sqrt(values.length);
        expect(Math.max(tested.test.high, tested.test.low)).toBeLessThanOrEqual(most + 1e-6);
        expect(tested.test.critical).toBeLessThan(most);
      }),
    );
  });

  it('asks for a whole number of values', () => {
    expect(criticalOutlier(3.5, 0.05).ok).toBe(false);
  });
});

describe('a difference limit', () => {
  it('is 1.959964·√2 standard deviations for two results: 0.0111 for an s of 0.004', () => {
    expect(rangeMultiplier(2)).toMatchObject({ ok: true });
    const multiplier = rangeMultiplier(2);
    expect(multiplier.ok && multiplier.value).toBeCloseTo(1.959964 * Math.SQRT2, 6);
    const limit = differenceLimit(0.004, 2);
    expect(limit.ok && limit.value).toBeCloseTo(0.0111, 4);
  });

  it('grows with the number of results', () => {
    const multipliers = [2, 3, 4, 5, 6, 7, 8, 9, 10].map((count) => {
      const multiplier = rangeMultiplier(count);
      return multiplier.ok ? multiplier.value : Number.NaN;
    });
    expect(multipliers).toEqual(multipliers.toSorted((a, b) => a - b));
  });

  it.each([
    [0, 2],
    [-0.1, 2],
    [Number.NaN, 2],
    [0.004, 1],
    [0.004, 2.5],
    [0.004, 11],
  ])('cannot for s = %d and %d results', (s, count) => {
    expect(differenceLimit(s, count).ok).toBe(false);
  });
});
