import { describe, expect, it } from 'vitest';
import { mean, trimmedMean } from '#rules/numerics/mean';
import { percentOneSided, percentWithinLimits } from '#rules/numerics/percent-within-limits';
import { coefficientOfVariation, range, sampleStandardDeviation } from '#rules/numerics/spread';
import fc from '#tests/builders/seeded-fast-check';

// Descriptive figures by hand for these six (n − 1 divisor); the same set as the reference record QA-20.
const six = [4.2, 4.6, 3.9, 5.1, 4.4, 4];

function numberOf(result: { ok: true; value: number } | { ok: false; reason: string }): number {
  return result.ok ? result.value : Number.NaN;
}

describe('worked examples', () => {
  it('mean 4.36667, trimmed 4.3, s 0.44121, range 1.2, CV 10.1041 %', () => {
    expect(numberOf(mean(six))).toBeCloseTo(4.36667, 5);
    expect(numberOf(trimmedMean(six, 1))).toBe(4.3);
    expect(numberOf(sampleStandardDeviation(six))).toBeCloseTo(0.44121, 5);
    expect(numberOf(range(six))).toBe(1.2);
    expect(numberOf(coefficientOfVariation(six))).toBeCloseTo(10.1041, 4);
  });

  it('carries no noise of binary sums into a mean', () => {
    // (0.1 + 0.2)/2 is 0.15, in doubles 0.15000000000000002.
    expect(mean([0.1, 0.2])).toEqual({ ok: true, value: 0.15 });
  });

  it('percent within limits is linear for four values: 50 + 100·Q/3', () => {
    for (const q of [-2, -1.5, -0.6, 0, 0.3, 0.9, 1.5, 2]) {
      expect(percentOneSided(q, 4)).toBeCloseTo(Math.min(100, Math.max(0, 50 + (100 * q) / 3)), 9);
    }
  });

  it('percent within limits of 2, 6, 4 between 3 and 5 is 28.51 (closed form for three, arc sine)', () => {
    const side = 100 * (0.5 + Math.asin((0.5 * Math.sqrt(3)) / 2) / Math.PI);
    expect(numberOf(percentWithinLimits({ values: [2, 6, 4], lower: 3, upper: 5 }))).toBeCloseTo(
      2 * side - 100,
      9,
    );
  });
});

describe('what cannot be had says why', () => {
  it.each([
    ['mean of nothing', mean([])],
    ['mean of what is no number', mean([1, Number.NaN])],
    ['trimmed mean that leaves nothing', trimmedMean([1, 2], 1)],
    ['trimmed mean with half a value', trimmedMean([1, 2, 3], 0.5)],
    ['standard deviation of one', sampleStandardDeviation([1])],
    ['range of nothing', range([])],
    ['range of what is no number', range([Number.NaN])],
    ['coefficient of variation about zero', coefficientOfVariation([-1, 1])],
    ['percent within no limits', percentWithinLimits({ values: [1, 2, 3], lower: null, upper: null })],
    ['percent within limits that cross', percentWithinLimits({ values: [1, 2, 3], lower: 5, upper: 3 })],
    ['percent within limits of two', percentWithinLimits({ values: [1, 2], lower: 0, upper: 3 })],
  ])('%s', (_, result) => {
    expect(result).toEqual({ ok: false, reason: expect.stringMatching(/\w/) });
  });
});

describe('at the limit', () => {
  it('one limit alone is enough, and both may be the same', () => {
    // Of four values P = 50 + 100·Q/3: 1, 2, 3, 4 have x̄ 2.5 and s 1.290994; Q to 1 is 1.161895, to 3.5 0.774597.
    const values = [1, 2, 3, 4];
    const of = (lower: number | null, upper: number | null) =>
      numberOf(percentWithinLimits({ values, lower, upper }));
    expect(of(1, null)).toBeCloseTo(50 + (100 * 1.161895) / 3, 4);
    expect(of(null, 3.5)).toBeCloseTo(50 + (100 * 0.774597) / 3, 4);
    expect(of(1, 3.5)).toBeCloseTo((100 * (1.161895 + 0.774597)) / 3, 4);
    expect(of(2, 2)).toBeCloseTo(0, 9);
    expect(numberOf(percentWithinLimits({ values: [3, 3, 3], lower: 3, upper: 3 }))).toBe(100);
    expect(numberOf(percentWithinLimits({ values: [3, 3, 3], lower: 3, upper: null }))).toBe(100);
    expect(numberOf(percentWithinLimits({ values: [3, 3, 3], lower: 3.1, upper: null }))).toBe(0);
    expect(numberOf(percentWithinLimits({ values: [3, 3, 3], lower: null, upper: 3 }))).toBe(100);
    expect(numberOf(percentWithinLimits({ values: [3, 3, 3], lower: null, upper: 2.9 }))).toBe(0);
  });

  it('a trimmed mean that drops none is the mean', () => {
    expect(trimmedMean([1, 2, 6], 0)).toEqual({ ok: true, value: 3 });
  });

  it('equal values on the limit are within it', () => {
    expect(numberOf(percentWithinLimits({ values: [3, 3, 3], lower: 3, upper: 5 }))).toBe(100);
    expect(numberOf(percentWithinLimits({ values: [5, 5, 5], lower: 3, upper: 5 }))).toBe(100);
    expect(numberOf(percentWithinLimits({ values: [5.01, 5.01, 5.01], lower: 3, upper: 5 }))).toBe(0);
  });
});

describe('properties', () => {
  const values = fc.array(fc.double({ min: -100, max: 100, noNaN: true }), { minLength: 3, maxLength: 9 });

  it('order does not matter, a constant shifts the mean and leaves the spread', () => {
    fc.assert(
      fc.property(values, fc.double({ min: -50, max: 50, noNaN: true }), (sample, shift) => {
        const shifted = sample.map((value) => value + shift).toReversed();
        expect(numberOf(mean(shifted))).toBeCloseTo(numberOf(mean(sample)) + shift, 6);
        expect(numberOf(sampleStandardDeviation(shifted))).toBeCloseTo(
          numberOf(sampleStandardDeviation(sample)),
          6,
        );
        expect(numberOf(trimmedMean(sample.toReversed()))).toBe(numberOf(trimmedMean(sample)));
      }),
    );
  });

  it('percent within limits does not depend on the unit', () => {
    fc.assert(
      fc.property(values, fc.constantFrom(10, 145.0377, 6.894757), (sample, scale) => {
        const limits = { lower: -20, upper: 30 };
        const own = numberOf(percentWithinLimits({ values: sample, ...limits }));
        const scaled = percentWithinLimits({
          values: sample.map((value) => value * scale),
          lower: limits.lower * scale,
          upper: limits.upper * scale,
        });
        expect(own).toBeGreaterThanOrEqual(-1e-9);
        expect(own).toBeLessThanOrEqual(100);
        // Equal values have no spread; scaling may leave binary noise of one where there was none.
        if (new Set(sample).size > 1) expect(numberOf(scaled)).toBeCloseTo(own, 4);
      }),
    );
  });
});
