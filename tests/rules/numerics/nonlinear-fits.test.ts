import { describe, expect, it } from 'vitest';
import { covarianceFactor, covarianceOf, deviationAlong } from '#rules/numerics/covariance-factor';
import { fitFromStarts } from '#rules/numerics/fit-from-starts';
import { type FitProblem, levenbergMarquardt } from '#rules/numerics/levenberg-marquardt';
import { twoSidedT } from '#rules/numerics/student-t';

/** A problem of one parameter, given its residuals and their slopes. */
function ofOne(
  residual: (p: number) => number[],
  slope: (p: number) => number[],
  bounds: { lower?: number; upper?: number } = {},
): FitProblem {
  return {
    parameterCount: 1,
    residualCount: residual(1).length,
    lower: [bounds.lower ?? -1e6],
    upper: [bounds.upper ?? 1e6],
    evaluate(parameters, residuals, jacobian) {
      residuals.set(residual(parameters[0]!));
      jacobian.set(slope(parameters[0]!));
    },
  };
}

/** The straight line a + b·x through points, as residuals. */
function line(points: readonly (readonly [number, number])[]): FitProblem {
  return {
    parameterCount: 2,
    residualCount: points.length,
    lower: [-1e6, -1e6],
    upper: [1e6, 1e6],
    evaluate(parameters, residuals, jacobian) {
      points.forEach(([x, y], i) => {
        residuals[i] = parameters[0]! + parameters[1]! * x - y;
        jacobian[2 * i] = 1;
        jacobian[2 * i + 1] = x;
      });
    },
  };
}

describe('nonlinear least squares', () => {
  it('solves exp(p) = 2 by p = ln 2', () => {
    const fit = levenbergMarquardt(
      ofOne(
        (p) => [Math.exp(p) - 2],
        (p) => [Math.exp(p)],
      ),
      [0],
    );
    expect(fit.converged).toBe(true);
    expect(fit.parameters[0]).toBeCloseTo(Math.LN2, 12);
  });

  it('gives the line of the normal equations where the problem is linear', () => {
    // By hand: x̄ = 2, ȳ = 3, Σ(x − x̄)(y − ȳ) = 9, Σ(x − x̄)² = 10; residuals 0.2, −0.9, 1.9, −1.2.
    const fit = levenbergMarquardt(
      line([
        [0, 1],
        [1, 3],
        [3, 2],
        [4, 6],
      ]),
      [0, 0],
    );
    expect(fit.converged).toBe(true);
    expect(fit.parameters[0]).toBeCloseTo(1.2, 9);
    expect(fit.parameters[1]).toBeCloseTo(0.9, 9);
    expect(fit.sumOfSquares).toBeCloseTo(5.9, 9);
  });

  it('stops on a bound beyond which the sum would fall, and says so', () => {
    const fit = levenbergMarquardt(
      ofOne(
        (p) => [p - 5],
        () => [1],
        { upper: 3 },
      ),
      [0],
    );
    expect(fit).toMatchObject({ converged: true, atBound: [true], parameters: [3] });
  });

  it('starts within the bounds whatever the start', () => {
    const fit = levenbergMarquardt(
      ofOne(
        (p) => [p - 2],
        () => [1],
        { lower: 1, upper: 3 },
      ),
      [99],
    );
    expect(fit).toMatchObject({ converged: true, atBound: [false] });
    expect(fit.parameters[0]).toBeCloseTo(2, 12);
  });

  it('comes to the same parameters whatever the unit of the values', () => {
    const scaled = (unit: number) =>
      levenbergMarquardt(
        ofOne(
          (p) => [1, 2, 4].map((x) => unit * (Math.exp(-p * x) - Math.exp(-0.3 * x) + 0.01 * x)),
          (p) => [1, 2, 4].map((x) => -unit * x * Math.exp(-p * x)),
        ),
        [1],
      ).parameters[0]!;
    expect(scaled(1e-9)).toBeCloseTo(scaled(1), 9);
    expect(scaled(1e9)).toBeCloseTo(scaled(1), 9);
  });

  it('does not converge from where the residuals are no numbers', () => {
    const fit = levenbergMarquardt(
      ofOne(
        (p) => [Math.log(p)],
        (p) => [1 / p],
      ),
      [-1],
    );
    expect(fit).toMatchObject({ converged: false, stop: 'not-finite' });
  });

  it('does not converge where the slopes that it is given are wrong', () => {
    const fit = levenbergMarquardt(
      ofOne(
        (p) => [p - 2],
        () => [-1],
      ),
      [0],
    );
    expect(fit).toMatchObject({ converged: false, stop: 'stalled' });
  });

  it('takes the better of two minima when started beside both', () => {
    // (p² − 4)² + (p − 2)²/4 is zero at p = 2 and has another minimum, above zero, near p = −2.
    const problem = ofOne(
      (p) => [p ** 2 - 4, 0.5 * (p - 2)],
      (p) => [2 * p, 0.5],
    );
    const { best, starts } = fitFromStarts(problem, [[-2.2], [5]]);
    expect(starts).toBe(2);
    expect(best.parameters[0]).toBeCloseTo(2, 9);
  });

  it('counts the starts that lead to the same minimum', () => {
    const problem = ofOne(
      (p) => [p ** 2 - 4],
      (p) => [2 * p],
    );
    expect(fitFromStarts(problem, [[1], [5]])).toMatchObject({ starts: 2, agreeing: 2 });
  });
});

describe('the covariance of fitted parameters', () => {
  it('of a mean of four values is a quarter of their variance', () => {
    const factor = covarianceFactor(Float64Array.of(1, 1, 1, 1), 1, 4);
    expect(covarianceOf(factor)[0]![0]).toBeCloseTo(1, 12);
  });

  it('of a line is that of the textbook', () => {
    // x = 0, 1, 3, 4: Sxx = 10, x̄ = 2; var b = s²/Sxx = 0.1, var a = s²·(1/4 + x̄²/Sxx) = 0.65, cov = −x̄·s²/Sxx.
    const factor = covarianceFactor(Float64Array.of(1, 0, 1, 1, 1, 3, 1, 4), 2, 1);
    const [[a, ab], [, b]] = covarianceOf(factor) as [[number, number], [number, number]];
    expect([a, ab, b].map((value) => Number(value.toFixed(10)))).toEqual([0.65, -0.2, 0.1]);
    expect(deviationAlong([], [])).toBe(0);
    // At x = 2 the line is the mean: s²/4.
    expect(deviationAlong(factor, [1, 2])).toBeCloseTo(0.5, 10);
  });

  it('is a number, too, of a parameter that nothing moves with', () => {
    const factor = covarianceFactor(Float64Array.of(1, 0, 1, 0, 1, 0, 1, 0), 2, 4);
    expect(covarianceOf(factor).flat().every(Number.isFinite)).toBe(true);
    // The other is a mean of four.
    expect(covarianceOf(factor)[0]![0]).toBeCloseTo(1, 9);
  });

  it('is very large, and a number, along a direction that the points say nothing about', () => {
    const factor = covarianceFactor(Float64Array.of(1, 1, 1, 1, 1, 1), 2, 1);
    expect(deviationAlong(factor, [1, -1])).toBeGreaterThan(1e5);
    expect(deviationAlong(factor, [1, 1])).toBeCloseTo(Math.sqrt(1 / 3), 6);
    expect(covarianceOf(factor).flat().every(Number.isFinite)).toBe(true);
  });
});

describe("the quantile of Student's t", () => {
  // Two-sided 5 % points as printed in textbook tables of Student's t.
  it.each([
    [1, 12.706],
    [2, 4.303],
    [7, 2.365],
    [10, 2.228],
    [17, 2.11],
    [30, 2.042],
    [120, 1.98],
  ])('with %i degrees of freedom at 95 %% is %f', (degreesOfFreedom, printed) => {
    const t = twoSidedT(0.95, degreesOfFreedom);
    expect(t.ok && Number(t.value.toFixed(3))).toBe(printed);
  });

  it.each([
    [0, 5],
    [1, 5],
    [0.95, 0],
  ])('is refused for confidence %f and %i degrees of freedom', (confidence, degreesOfFreedom) => {
    expect(twoSidedT(confidence, degreesOfFreedom).ok).toBe(false);
  });
});
