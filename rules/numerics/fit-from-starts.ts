import { COARSE, type FitProblem, type LeastSquaresFit, levenbergMarquardt } from './levenberg-marquardt';

export interface BestFit {
  best: LeastSquaresFit;
  starts: number;
  /** Starts that were on the way to the same minimum. */
  agreeing: number;
}

/**
 * The best of the fits from several starts: each start roughly, then the best of them to the end; another one only
 * where that does not converge. The rough part may be done on a sketch, a problem of the same parameters with fewer
 * residuals.
 *
 * Source: common practice, no source. Domain: at least one start; residuals of order one, such as logarithms.
 *
 * @example // two starts of r = p² − 4, p = 1 and p = 5, agree on p = 2
 */
export function fitFromStarts(
  problem: FitProblem,
  starts: readonly (readonly number[])[],
  sketch: FitProblem = problem,
): BestFit {
  const rough = starts
    .map((start) => levenbergMarquardt(sketch, start, COARSE))
    .toSorted((a, b) => a.sumOfSquares - b.sumOfSquares);
  const [first] = rough;
  if (first === undefined) throw new RangeError('A fit needs at least one start.');
  const good = rough.filter(
    ({ sumOfSquares }) => sumOfSquares <= first.sumOfSquares * (1 + SAME_MINIMUM) + SMALLEST_SUM,
  );
  let best = levenbergMarquardt(problem, first.parameters);
  for (const { parameters } of good.slice(1)) {
    if (best.converged) break;
    best = levenbergMarquardt(problem, parameters);
  }
  return { best, starts: rough.length, agreeing: good.length };
}

/** Sums of squares that differ by less than this, in proportion, are on the way to the same minimum. */
const SAME_MINIMUM = 0.05;
/** What is left of a perfect fit before its end: far below any reading's own noise. */
const SMALLEST_SUM = 1e-8;
