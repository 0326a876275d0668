import { describe, expect, it } from 'vitest';
import { interpolate } from '#rules/numerics/interpolate';
import { leastSquares, polynomialAt } from '#rules/numerics/least-squares';
import { fallingRoot, rootsAtTarget } from '#rules/numerics/roots-at-target';
import fc from '#tests/builders/seeded-fast-check';

// Trial points and their parabola by numpy (reference record MAR-07).
const contents = [4, 4.5, 5, 5.5, 6];
const voids = [6.4, 5.1, 3.9, 2.9, 2.1];

describe('least squares', () => {
  it('finds the parabola of the worked example', () => {
    const fit = leastSquares(contents, voids, 2);
    expect(fit.ok && fit.coefficients[0]).toBeCloseTo(23.28, 6);
    expect(fit.ok && fit.coefficients[1]).toBeCloseTo(-5.588571, 6);
    expect(fit.ok && fit.coefficients[2]).toBeCloseTo(0.342857, 6);
  });

  it('recovers a known parabola whatever the order of its points', () => {
    const coefficient = fc.double({ min: -20, max: 20, noNaN: true });
    fc.assert(
      fc.property(coefficient, coefficient, coefficient, (c0, c1, c2) => {
        const x = [6, 4, 5.5, 4.5, 5];
        const fit = leastSquares(
          x,
          x.map((place) => polynomialAt([c0, c1, c2], place)),
          2,
        );
        expect(fit.ok && polynomialAt(fit.coefficients, 4.75)).toBeCloseTo(
          polynomialAt([c0, c1, c2], 4.75),
          7,
        );
        expect(fit.ok && Math.max(...fit.residuals.map(Math.abs))).toBeLessThan(1e-8);
      }),
    );
  });

  it.each([
    ['fewer places than coefficients', [4, 4, 5], [1, 2, 3], 2],
    ['uneven lists', [4, 5], [1], 1],
    ['what is no number', [4, 5], [1, Number.NaN], 1],
  ] as const)('says why it cannot: %s', (_, x, y, degree) => {
    expect(leastSquares(x, y, degree)).toEqual({ ok: false, reason: expect.stringMatching(/\w/) });
  });

  it('tells the residuals in the order given, the share explained and the range tested', () => {
    // By hand: x̄ = 2, ȳ = 2, slope 1/2, so 1.5, 2, 2.5 at 1, 2, 3; Σr² = 1.5 of Σ(y − ȳ)² = 2.
    const fit = leastSquares([2, 1, 3], [3, 1, 2], 1);
    if (!fit.ok) throw new Error(fit.reason);
    expect(fit.residuals.map((each) => Number(each.toFixed(12)))).toEqual([1, -0.5, -0.5]);
    expect(fit.rSquared).toBeCloseTo(0.25, 12);
    expect([fit.from, fit.to]).toEqual([1, 3]);
    expect(fit.coefficients[0]).toBeCloseTo(1, 12);
    expect(fit.coefficients[1]).toBeCloseTo(0.5, 12);
  });

  it('explains everything where there is nothing to explain', () => {
    expect(leastSquares([1, 2, 3], [0, 0, 0], 1)).toMatchObject({ ok: true, rSquared: 1 });
  });

  it('fits a straight line to two points exactly', () => {
    const fit = leastSquares([1, 3], [2, 6], 1);
    // y = 2·x.
    for (const x of [1, 2, 3]) expect(fit.ok && polynomialAt(fit.coefficients, x)).toBeCloseTo(2 * x, 9);
  });
});

describe('interpolation', () => {
  it('goes along the line between the neighbours, and takes a given place as it is', () => {
    expect(interpolate([5, 4.5], [3.9, 5.1], 4.75)).toEqual({ ok: true, value: 4.5 });
    expect(interpolate([4.5, 5], [5.1, 3.9], 5)).toEqual({ ok: true, value: 3.9 });
    expect(interpolate([5, 5], [3.9, 4.1], 5)).toEqual({ ok: true, value: 4 });
  });

  it('goes between the nearest places, in any order, and by the mean of several values at one place', () => {
    // Between 4.5 (1) and 5 (3), not between 4 and 6.
    expect(interpolate([6, 4, 5, 4.5], [100, -100, 3, 1], 4.75)).toEqual({ ok: true, value: 2 });
    // (1 + 3)/2 = 2 at 4, 4 at 5 (by hand: halfway is 3).
    expect(interpolate([4, 4, 5], [1, 3, 4], 4.5)).toEqual({ ok: true, value: 3 });
    expect(interpolate([4, 5, 5], [2, 3, 5], 4.5)).toEqual({ ok: true, value: 3 });
  });

  it('never goes beyond the points', () => {
    expect(interpolate([4.5, 5], [5.1, 3.9], 5.01).ok).toBe(false);
    expect(interpolate([4.5, 5], [5.1, 3.9], 4.49).ok).toBe(false);
    expect(interpolate([], [], 5).ok).toBe(false);
  });
});

describe('roots at a target', () => {
  const parabola = [23.28, -5.588571428571, 0.342857142857];

  it('finds the place of the worked example', () => {
    const roots = rootsAtTarget(parabola, 4, 4, 6);
    expect(roots).toHaveLength(1);
    expect(roots[0]).toBeCloseTo(4.95795, 5);
  });

  it('includes both ends of the range and nothing beyond', () => {
    // x² − 10·x + 24 is zero at 4 and 6.
    expect(rootsAtTarget([24, -10, 1], 0, 4, 6)).toEqual([4, 6]);
    expect(rootsAtTarget([24, -10, 1], 0, 4.1, 5.9)).toEqual([]);
    expect(fallingRoot([24, -10, 1], [4, 6])).toBe(4);
    expect(fallingRoot([24, -10, 1], [6])).toBeNull();
  });

  it('come in rising order, whichever way the curve opens', () => {
    // 2·(x − 1)·(x − 3) and −(x − 1)·(x − 3).
    expect(rootsAtTarget([6, -8, 2], 0, 0, 10)).toEqual([1, 3]);
    expect(rootsAtTarget([-3, 4, -1], 0, 0, 10)).toEqual([1, 3]);
    expect(rootsAtTarget([-4, 0, 1], 0, -10, 10)).toEqual([-2, 2]);
    // The vertex touches the target once: (x − 2)², and x².
    expect(rootsAtTarget([4, -4, 1], 0, 0, 10)).toEqual([2]);
    expect(rootsAtTarget([0, 0, 1], 0, -10, 10)).toEqual([0]);
    expect(rootsAtTarget([7, -4, 1], 3, 0, 10)).toEqual([2]);
  });

  it('of a falling property are the ones where it falls, not where it stands', () => {
    // −x² + 4·x rises to 2 and falls after; at 2 it stands.
    expect(fallingRoot([0, 4, -1], [1, 2, 3])).toBe(3);
    expect(fallingRoot([0, 4, -1], [1, 2])).toBeNull();
    expect(fallingRoot([9, -1], [5])).toBe(5);
    expect(fallingRoot([], [5])).toBeNull();
    expect(rootsAtTarget([4], 3, 0, 10)).toEqual([]);
    expect(rootsAtTarget([4], 4, 0, 10)).toEqual([]);
  });

  it('keep the digits of a small root beside a large one', () => {
    // x² − (10⁸ + 10⁻⁸)·x + 1 = (x − 10⁸)·(x − 10⁻⁸).
    const [small, large] = rootsAtTarget([1, -(1e8 + 1e-8), 1], 0, 0, 1e9);
    expect(small! * 1e8).toBeCloseTo(1, 9);
    expect(large! / 1e8).toBeCloseTo(1, 9);
  });

  it('are held within a range that they miss by binary noise only', () => {
    // 0.3/0.1 is 2.9999999999999996 in doubles.
    expect(rootsAtTarget([-0.3, 0.1], 0, 3, 6)).toEqual([3]);
    expect(rootsAtTarget([-0.3, 0.1], 0, 3.000001, 6)).toEqual([]);
    expect(rootsAtTarget([-6.000001, 1], 0, 3, 6)).toEqual([]);
    // Noise grows with the numbers: a root at 1,000,000 less a ten-millionth is still on the range.
    expect(rootsAtTarget([-(1e6 - 1e-7), 1], 0, 1e6, 2e6)).toEqual([1e6]);
  });

  it('has none where the curve misses the target or is constant', () => {
    expect(rootsAtTarget([25, -10, 1], -1, 0, 10)).toEqual([]);
    expect(rootsAtTarget([4, 0, 0], 4, 0, 10)).toEqual([]);
    expect(rootsAtTarget([8, -2, 0], 4, 0, 10)).toEqual([2]);
  });
});
