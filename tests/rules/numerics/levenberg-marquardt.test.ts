import { describe, expect, it } from 'vitest';
import { fitFromStarts } from '#rules/numerics/fit-from-starts';
import { COARSE, FINE, type FitProblem, levenbergMarquardt } from '#rules/numerics/levenberg-marquardt';

/** A problem given by its residuals and their slopes, row by row. */
function aProblem(
  parameterCount: number,
  residuals: (p: number[]) => number[],
  slopes: (p: number[]) => number[],
  bounds: { lower?: number[]; upper?: number[] } = {},
): FitProblem {
  const any = Array(parameterCount).fill(0);
  return {
    parameterCount,
    residualCount: residuals(any.map(() => 1)).length,
    lower: bounds.lower ?? any.map(() => -1e6),
    upper: bounds.upper ?? any.map(() => 1e6),
    evaluate(parameters, into, jacobian) {
      into.set(residuals([...parameters]));
      jacobian.set(slopes([...parameters]));
    },
  };
}

/** p0 + p1 = 3 and p0 − p1 = 1: p0 = 2, p1 = 1. */
function twoLines(bounds: { lower?: number[]; upper?: number[] } = {}): FitProblem {
  return aProblem(
    2,
    ([a, b]) => [a! + b! - 3, a! - b! - 1],
    () => [1, 1, 1, -1],
    bounds,
  );
}

describe('a fit tells what it came to', () => {
  it('with residuals and slopes as they are at the solution, and the sum of squares', () => {
    // A constant through 1, 2, 6: the mean 3, residuals 2, 1, −3, sum 14.
    const fit = levenbergMarquardt(
      aProblem(
        1,
        ([p]) => [p! - 1, p! - 2, p! - 6],
        () => [1, 1, 1],
      ),
      [0],
    );
    expect(fit.parameters[0]).toBeCloseTo(3, 9);
    expect(fit.residuals.map((each) => Number(each.toFixed(6)))).toEqual([2, 1, -3]);
    expect(fit.sumOfSquares).toBeCloseTo(14, 9);
    expect([...fit.jacobian]).toEqual([1, 1, 1]);
    expect(fit).toMatchObject({ converged: true, atBound: [false] });
    expect(['gradient', 'step', 'reduction']).toContain(fit.stop);
    expect(fit.iterations).toBeGreaterThan(1);
    expect(fit.iterations).toBeLessThan(12);
  });

  it('slopes of a curve are those at the solution, not at the start', () => {
    const fit = levenbergMarquardt(
      aProblem(
        1,
        ([p]) => [p! ** 2 - 4],
        ([p]) => [2 * p!],
      ),
      [5],
    );
    expect(fit.parameters[0]).toBeCloseTo(2, 12);
    expect(fit.jacobian[0]).toBeCloseTo(4, 9);
    expect(fit.residuals[0]).toBeCloseTo(0, 9);
  });

  it('exact where the residuals vanish, at once where they do at the start', () => {
    expect(levenbergMarquardt(twoLines(), [2, 1])).toMatchObject({
      stop: 'exact',
      converged: true,
      iterations: 1,
      parameters: [2, 1],
      sumOfSquares: 0,
      atBound: [false, false],
    });
    expect(levenbergMarquardt(twoLines(), [0, 0])).toMatchObject({ stop: 'exact', converged: true });
  });

  it('a gradient of zero where the start is the minimum already', () => {
    const flat = aProblem(
      1,
      ([p]) => [p! - 1, p! + 1],
      () => [1, 1],
    );
    expect(levenbergMarquardt(flat, [0])).toMatchObject({
      stop: 'gradient',
      converged: true,
      iterations: 1,
      parameters: [0],
      sumOfSquares: 2,
    });
  });

  it('no convergence, and no step, where the residuals are no numbers from the start', () => {
    const never = aProblem(
      1,
      () => [Number.NaN],
      () => [1],
    );
    expect(levenbergMarquardt(never, [0])).toMatchObject({
      stop: 'not-finite',
      converged: false,
      iterations: 0,
      sumOfSquares: Number.POSITIVE_INFINITY,
    });
  });

  it('steps back from where the residuals are no numbers', () => {
    // ln p = 0: from p = 4 the whole step, −4·ln 4, leads below zero.
    const fit = levenbergMarquardt(
      aProblem(
        1,
        ([p]) => [Math.log(p!)],
        ([p]) => [1 / p!],
      ),
      [4],
    );
    expect(fit.converged).toBe(true);
    expect(fit.parameters[0]).toBeCloseTo(1, 12);
  });

  it('no convergence where every step makes it worse', () => {
    const wrong = aProblem(
      1,
      ([p]) => [p! - 2],
      () => [-1],
    );
    expect(levenbergMarquardt(wrong, [0])).toMatchObject({
      stop: 'stalled',
      converged: false,
      parameters: [0],
    });
  });

  it('moves no parameter by more than 4 at once, up or down', () => {
    for (const target of [100, -100]) {
      const fit = levenbergMarquardt(
        aProblem(
          1,
          ([p]) => [p! - target],
          () => [1],
        ),
        [0],
      );
      expect(fit.parameters[0]).toBeCloseTo(target, 9);
      // 25 steps of 4, and as many iterations at least; a handful more for the end.
      expect(fit.iterations).toBeGreaterThanOrEqual(25);
      expect(fit.iterations).toBeLessThan(40);
    }
  });

  it('gives up after three hundred iterations: 4 at once does not lead to 5000', () => {
    const far = levenbergMarquardt(
      aProblem(
        1,
        ([p]) => [p! - 5000],
        () => [1],
      ),
      [0],
    );
    expect(far).toMatchObject({ stop: 'iterations', converged: false, iterations: 300 });
    expect(far.parameters[0]).toBeCloseTo(1200, -1);
  });
});

describe('bounds', () => {
  it.each([
    ['an upper one', { upper: [3] }, 5, 3],
    ['a lower one', { lower: [-3] }, -5, -3],
  ])('%s holds a parameter that would go beyond, and is told', (_, bounds, target, end) => {
    const fit = levenbergMarquardt(
      aProblem(
        1,
        ([p]) => [p! - target],
        () => [1],
        bounds,
      ),
      [0],
    );
    expect(fit).toMatchObject({ parameters: [end], atBound: [true], converged: true, stop: 'gradient' });
  });

  it.each([
    ['the upper one', { upper: [3] }, 3],
    ['the lower one', { lower: [-3] }, -3],
  ])('from %s a parameter moves back inside', (_, bounds, start) => {
    const fit = levenbergMarquardt(
      aProblem(
        1,
        ([p]) => [p! - 1],
        () => [1],
        bounds,
      ),
      [start],
    );
    expect(fit.parameters[0]).toBeCloseTo(1, 12);
    expect(fit).toMatchObject({ atBound: [false], converged: true });
  });

  it('a start beyond them is put on them', () => {
    const pinned = (start: number) =>
      levenbergMarquardt(
        aProblem(
          1,
          ([p]) => [p! - 2, 0],
          () => [0, 0],
          { lower: [1], upper: [3] },
        ),
        [start],
      ).parameters[0];
    expect([pinned(-9), pinned(9), pinned(2.5)]).toEqual([1, 3, 2.5]);
  });

  it('the others go on to the best that is left where one is held', () => {
    // p0 held at 1: (p1 − 2)² + p1² is least at p1 = 1.
    const fit = levenbergMarquardt(twoLines({ upper: [1, 1e6] }), [0, 0]);
    expect(fit.parameters[0]).toBe(1);
    expect(fit.parameters[1]).toBeCloseTo(1, 9);
    expect(fit).toMatchObject({ atBound: [true, false], converged: true });
    expect(fit.sumOfSquares).toBeCloseTo(2, 9);
    // And p1 held at 2 or above: (p0 − 1)² + (p0 − 3)² is least at p0 = 2.
    const other = levenbergMarquardt(twoLines({ lower: [-1e6, 2] }), [0, 5]);
    expect(other.parameters[0]).toBeCloseTo(2, 9);
    expect(other.parameters[1]).toBe(2);
    expect(other).toMatchObject({ atBound: [false, true], converged: true });
  });

  it('where all are held there is nothing to move', () => {
    const fit = levenbergMarquardt(twoLines({ upper: [1, 0] }), [1, 0]);
    expect(fit).toMatchObject({ stop: 'gradient', converged: true, iterations: 1, atBound: [true, true] });
  });
});

describe('hard problems with known answers', () => {
  it('the curved valley of Rosenbrock (1960) ends at 1, 1', () => {
    const valley = aProblem(
      2,
      ([a, b]) => [10 * (b! - a! ** 2), 1 - a!],
      ([a]) => [-20 * a!, 10, -1, 0],
    );
    const fit = levenbergMarquardt(valley, [-1.2, 1]);
    expect(fit.converged).toBe(true);
    expect(fit.parameters[0]).toBeCloseTo(1, 9);
    expect(fit.parameters[1]).toBeCloseTo(1, 9);
    expect(fit.iterations).toBeLessThan(60);
  });

  it('parameters of very different size are found as well: 1 and a million', () => {
    const uneven = aProblem(
      2,
      ([a, b]) => [a! - 1, (b! - 2) * 1e6, a! - 1 + (b! - 2) * 1e6],
      () => [1, 0, 0, 1e6, 1, 1e6],
    );
    const fit = levenbergMarquardt(uneven, [0, 0]);
    expect(fit.converged).toBe(true);
    expect(fit.parameters[0]).toBeCloseTo(1, 6);
    expect(fit.parameters[1]).toBeCloseTo(2, 9);
  });

  it('three decays of a sum of exponentials are recovered from exact values', () => {
    const times = [0, 0.5, 1, 2, 3, 5, 8];
    const at = ([a, k, c]: number[], t: number) => a! * Math.exp(-k! * t) + c!;
    const decay = aProblem(
      3,
      (p) => times.map((t) => at(p, t) - at([3, 0.7, 0.5], t)),
      ([a, k]) => times.flatMap((t) => [Math.exp(-k! * t), -t * a! * Math.exp(-k! * t), 1]),
    );
    const fit = levenbergMarquardt(decay, [1, 1, 0]);
    expect(fit.converged).toBe(true);
    [3, 0.7, 0.5].forEach((each, i) => {
      expect(fit.parameters[i]).toBeCloseTo(each, 6);
    });
  });

  it('a parameter that nothing depends on stays where it was', () => {
    const idle = aProblem(
      2,
      ([a]) => [a! - 1, a! + 1],
      () => [1, 0, 1, 0],
    );
    const fit = levenbergMarquardt(idle, [3, 7]);
    expect(fit.converged).toBe(true);
    expect(fit.parameters[0]).toBeCloseTo(0, 9);
    expect(fit.parameters[1]).toBe(7);
  });
});

describe('several starts', () => {
  const twoMinima = aProblem(
    1,
    ([p]) => [p! ** 2 - 4, 0.5 * (p! - 2)],
    ([p]) => [2 * p!, 0.5],
  );

  it('count those that lead to the best one, whatever their order', () => {
    for (const starts of [
      [[-2.2], [5], [3]],
      [[5], [-2.2], [3]],
    ]) {
      const fit = fitFromStarts(twoMinima, starts);
      expect(fit).toMatchObject({ starts: 3, agreeing: 2, best: { converged: true } });
      expect(fit.best.parameters[0]).toBeCloseTo(2, 9);
    }
  });

  it('end on the problem itself where the rough part is done on a sketch', () => {
    const sketch = aProblem(
      1,
      ([p]) => [p! - 2.5],
      () => [1],
    );
    expect(fitFromStarts(twoMinima, [[9]], sketch).best.parameters[0]).toBeCloseTo(2, 9);
  });

  it('need one at least', () => {
    expect(() => fitFromStarts(twoMinima, [])).toThrow(/at least one start/);
  });

  it('go on to the next where the best does not converge', () => {
    // Slopes that are right in the sketch and wrong in the problem beside 2 only.
    const wrongBesideTwo = aProblem(
      1,
      ([p]) => [(p! - 2) * (p! - 9)],
      ([p]) => [p! < 5 ? -1 : 2 * p! - 11],
    );
    const sketch = aProblem(
      1,
      ([p]) => [(p! - 2) * (p! - 9) * 1e-5],
      ([p]) => [(2 * p! - 11) * 1e-5],
    );
    const fit = fitFromStarts(wrongBesideTwo, [[2.001], [9.5]], sketch);
    expect(fit.best.converged).toBe(true);
    expect(fit.best.parameters[0]).toBeCloseTo(9, 6);
  });

  it('are tried less finely than the end is: roughly within a ten-thousandth', () => {
    const rough = levenbergMarquardt(twoMinima, [5], COARSE);
    const fine = levenbergMarquardt(twoMinima, [5], FINE);
    expect(rough.iterations).toBeLessThan(fine.iterations);
    expect(rough.parameters[0]).toBeCloseTo(2, 2);
    expect(fine.parameters[0]).toBeCloseTo(2, 11);
  });
});
