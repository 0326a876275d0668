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

  it('puts the first on top where both spread alike, and no probability above 1', () => {
    // Both have s² = 1 (Σ(x − 2)² is 2 of three and 4 of five values): F is 1 whichever comes first.
    const three = [1, 2, 3];
    const five = [1, 1, 2, 3, 3];
    expect(compareSamples(three, five, 0.05)).toMatchObject({ comparison: { F: 1, degreesOfF: [2, 4] } });
    // P(F(4, 2) ≥ 1) is more than a half, and twice that is no probability.
    expect(compareSamples(five, three, 0.05)).toMatchObject({
      comparison: { F: 1, degreesOfF: [4, 2], probabilityF: 1 },
    });
  });

  it('takes them for the same only where the probability lies above the significance, not on it', () => {
    // Of the same variance at any significance, so that only the means are asked about; and the other way round.
    const five = [1, 1, 2, 3, 3];
    const means = compareSamples(five, [2, 3, 4], 0.5);
    const variances = compareSamples(first, [5.2, 5.47, 5.1, 5.52, 5.3], 0.5);
    const pairs = comparePairs(first, second, 0.5);
    if (!means.ok || !variances.ok || !pairs.ok) throw new Error('They can be compared.');
    expect(compareSamples(five, [2, 3, 4], means.comparison.probabilityT)).toMatchObject({
      comparison: { sameVariance: true, sameMean: false },
    });
    expect(
      compareSamples(first, [5.2, 5.47, 5.1, 5.52, 5.3], variances.comparison.probabilityF),
    ).toMatchObject({ comparison: { sameVariance: false } });
    expect(comparePairs(first, second, pairs.comparison.probabilityT)).toMatchObject({
      comparison: { sameMean: false },
    });
  });

  it('pools variances by degrees of freedom: 6 of them for five and three values (by hand)', () => {
    // s² = 1 of five and 4 of three: sp² = (4·1 + 2·4)/6 = 2, t = (2 − 4)/√(2·(1/5 + 1/3)).
    const compared = compareSamples([1, 1, 2, 3, 3], [2, 4, 6], 0.05);
    if (!compared.ok) throw new Error(compared.reason);
    expect(compared.comparison).toMatchObject({ sameVariance: true, degreesOfT: 6 });
    expect(compared.comparison.t).toBeCloseTo(-2 / Math.sqrt(2 * (1 / 5 + 1 / 3)), 9);
  });

  it('cannot where the values are too large to be added', () => {
    const large = [1.7e308, 1.7e308];
    const reason = expect.stringMatching(/finite/);
    expect(compareSamples(large, second, 0.05)).toEqual({ ok: false, reason });
    expect(compareSamples(first, large, 0.05)).toEqual({ ok: false, reason });
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

  it('names the farther end, the high one where both are as far, and none on the critical value itself', () => {
    // Six values: x̄ = 2, s² = 2·9/5; both ends lie 3/√3.6 = 1.5811 from it, critical at 10 % each is below 1.73.
    const tied = outlierTest([2, -1, 2, 5, 2, 2], 0.2);
    if (!tied.ok) throw new Error(tied.reason);
    expect(tied.test.high).toBeCloseTo(3 / Math.sqrt(3.6), 9);
    expect(tied.test.low).toBeCloseTo(3 / Math.sqrt(3.6), 9);
    const critical = criticalOutlier(3, 0.5);
    if (!critical.ok) throw new Error(critical.reason);
    // (n − 1)/√n = 2/√3 is the farthest that one of three values can lie.
    expect(outlierTest([0, 0, 1], 0.05)).toMatchObject({
      ok: true,
      test: { high: expect.closeTo(2 / Math.sqrt(3), 9) },
    });
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

  // Studentised range at 5 % with infinite degrees of freedom, as printed in textbook tables; from memory, verify.
  it.each([
    [3, 3.31],
    [4, 3.63],
    [5, 3.86],
    [10, 4.47],
  ])('is for %d results that of the studentised range, %d', (count, printed) => {
    const multiplier = rangeMultiplier(count);
    expect(multiplier.ok && Number(multiplier.value.toFixed(2))).toBe(printed);
    // And the same again when asked a second time.
    expect(rangeMultiplier(count)).toEqual(multiplier);
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
