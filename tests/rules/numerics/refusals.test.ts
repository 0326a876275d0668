import { describe, expect, it } from 'vitest';
import { comparePairs, compareSamples } from '#rules/numerics/compare-samples';
import { differenceLimit, rangeMultiplier } from '#rules/numerics/difference-limit';
import { interpolate } from '#rules/numerics/interpolate';
import { leastSquares } from '#rules/numerics/least-squares';
import { mean, trimmedMean } from '#rules/numerics/mean';
import { cannot, known, unusable } from '#rules/numerics/numeric-result';
import { criticalOutlier, outlierTest } from '#rules/numerics/outlier-test';
import { percentWithinLimits } from '#rules/numerics/percent-within-limits';
import { coefficientOfVariation, range, sampleStandardDeviation } from '#rules/numerics/spread';
import { twoSidedT } from '#rules/numerics/student-t';

const some = [5.4, 5.5, 5.7];
const NONE = Number.NaN;

/** Each refusal names its own cause: a reader who is told another one repairs the wrong thing. */
describe('what cannot be had names the cause', () => {
  it.each([
    ['a mean of nothing', mean([]), /no values/],
    ['a mean of what is no number', mean([1, NONE]), /not a number/],
    ['a mean of numbers and infinity', mean([1, Number.POSITIVE_INFINITY]), /not a number/],
    ['a trimmed mean that drops half a value', trimmedMean(some, 0.5), /whole number/],
    ['a trimmed mean that drops fewer than none', trimmedMean(some, -1), /whole number/],
    ['a trimmed mean that leaves nothing', trimmedMean([1, 2], 1), /drops 1 at each end.*more than 2 values/],
    ['a trimmed mean of four that drops two', trimmedMean([1, 2, 3, 4], 2), /drops 2 .*more than 4 values/],
    ['a deviation of one value', sampleStandardDeviation([1]), /at least two/],
    ['a deviation of what is no number', sampleStandardDeviation([1, 2, NONE]), /not a number/],
    ['a range of nothing', range([]), /no values/],
    ['a range of what is no number', range([1, NONE]), /not a number/],
    ['a variation about zero', coefficientOfVariation([-1, 1]), /mean that is not zero/],
    ['a variation of one value', coefficientOfVariation([3]), /at least two/],
    ['a line through uneven lists', interpolate([1, 2], [1], 1), /as many values as places/],
    ['a line through nothing', interpolate([], [], 1), /no points/],
    ['a line through what is no number', interpolate([1, NONE], [1, 2], 1), /not a number/],
    ['a place that is no number', interpolate([1, 2], [1, 2], NONE), /not a number/],
    ['a value that is no number', interpolate([1, 2], [1, NONE], 1), /not a number/],
    ['a place before the points', interpolate([1, 2], [1, 2], 0.5), /beyond the points/],
    ['a place after the points', interpolate([1, 2], [1, 2], 2.5), /beyond the points/],
    ['a fit of uneven lists', leastSquares([1, 2, 3], [1, 2], 1), /as many values as places/],
    ['a fit of what is no number', leastSquares([1, 2, NONE], [1, 2, 3], 1), /not a number/],
    ['a parabola through two places', leastSquares([1, 2, 2], [1, 2, 3], 2), /degree 2 needs 3 different/],
    ['a line through one place', leastSquares([2, 2, 2], [1, 2, 3], 1), /degree 1 needs 2 different/],
    ['no limit', percentWithinLimits({ values: some, lower: null, upper: null }), /needs a limit/],
    ['limits that cross', percentWithinLimits({ values: some, lower: 5, upper: 3 }), /above the upper/],
    ['limits for two values', percentWithinLimits({ values: [1, 2], lower: 0, upper: 3 }), /at least three/],
    ['limits for none', percentWithinLimits({ values: [1, 2, NONE], lower: 0, upper: 3 }), /not a number/],
    ['a confidence of 0', twoSidedT(0, 5), /confidence/],
    ['a confidence of 1', twoSidedT(1, 5), /confidence/],
    ['half a degree of freedom', twoSidedT(0.95, 0.5), /degree of freedom/],
    ['an outlier of two', criticalOutlier(2, 0.05), /at least three/],
    ['an outlier of three and a half', criticalOutlier(3.5, 0.05), /at least three/],
    ['an outlier at no significance', criticalOutlier(3, 0), /significance/],
    ['an outlier at every significance', criticalOutlier(3, 1), /significance/],
    ['an outlier among equals', outlierTest([2, 2, 2], 0.05), /without spread/],
    ['an outlier among two', outlierTest([2, 3], 0.05), /at least three/],
    ['an outlier that is no number', outlierTest([2, 3, NONE], 0.05), /not a number/],
    ['a limit for no deviation', differenceLimit(0, 2), /deviation above zero/],
    ['a limit for one result', differenceLimit(0.1, 1), /2 to 10 results/],
    ['a limit for eleven results', rangeMultiplier(11), /2 to 10 results/],
    ['a limit for two and a half results', rangeMultiplier(2.5), /2 to 10 results/],
    ['samples at no significance', compareSamples(some, some, 0), /significance/],
    ['samples at every significance', compareSamples(some, some, 1), /significance/],
    ['a first sample of one', compareSamples([5], some, 0.05), /at least two/],
    ['a second sample of one', compareSamples(some, [5], 0.05), /at least two/],
    ['a first sample without spread', compareSamples([5, 5], some, 0.05), /without spread/],
    ['a second sample without spread', compareSamples(some, [5, 5], 0.05), /without spread/],
    ['pairs at no significance', comparePairs(some, some, 0), /significance/],
    ['pairs at every significance', comparePairs(some, some, 1), /significance/],
    ['pairs without a partner', comparePairs(some, [1, 2], 0.05), /as many results/],
    ['one pair', comparePairs([5], [6], 0.05), /at least two/],
    ['pairs that all differ alike', comparePairs(some, [5.3, 5.4, 5.6], 0.05), /without spread/],
    ['a number beyond all numbers', known(Number.POSITIVE_INFINITY), /finite/],
  ])('%s', (_, result, reason) => {
    expect(result).toEqual({ ok: false, reason: expect.stringMatching(reason) });
  });

  it('names the first input that cannot be used, and what is wrong with it', () => {
    expect(unusable({ Gmb: 2.4, Gmm: NONE, Pb: NONE })).toBe('Gmm is not a number');
    expect(unusable({ Gmb: 2.4, Gmm: 0 })).toBeNull();
    expect(unusable({ Gmb: 2.4, Gmm: 0 }, 'positive')).toBe('Gmm must be above zero');
    expect(unusable({ Gmb: -1 }, 'positive')).toBe('Gmb must be above zero');
    expect(unusable({ Gmb: 1e-9 }, 'positive')).toBeNull();
    expect(unusable({ Gmb: Number.NEGATIVE_INFINITY }, 'positive')).toBe('Gmb is not a number');
    expect(cannot('of this')).toEqual({ ok: false, reason: 'of this' });
  });

  it('keeps twelve digits of a result, and no negative zero', () => {
    expect(known(100 * ((2.5 - 2.4) / 2.5))).toEqual({ ok: true, value: 4 });
    // 1/3 to twelve digits, and to no fewer.
    expect(known(1 / 3)).toEqual({ ok: true, value: 0.333333333333 });
    expect(known(-0)).toEqual({ ok: true, value: 0 });
  });
});
