import { Matrix, QrDecomposition } from 'ml-matrix';
import { cannot } from './numeric-result';
import { squared } from './transcendental';

export interface PolynomialFit {
  ok: true;
  /** c0, c1, c2 of c0 + c1·x + c2·x². */
  coefficients: number[];
  /** y − fitted y, in the order given. */
  residuals: number[];
  /** Share of the variation explained; 1 where all y are the same. */
  rSquared: number;
  /** Tested range of x; the fit says nothing beyond it. */
  from: number;
  to: number;
}

/**
 * Least-squares polynomial of degree 1 or 2 through points: minimises Σ(y − (c0 + c1·x + c2·x²))².
 *
 * Source: textbook normal problem, solved by QR factors of the centred and scaled x, because squares of binder
 * contents between 4 and 6 are nearly collinear. Domain: finite points at more different x than the degree; an
 * exact fit where there is one x more than the degree.
 *
 * @example leastSquares([4, 4.5, 5, 5.5, 6], [6.4, 5.1, 3.9, 2.9, 2.1], 2) // 23.28 − 5.588571·x + 0.342857·x²
 */
export function leastSquares(
  x: readonly number[],
  y: readonly number[],
  degree: 1 | 2,
): PolynomialFit | { ok: false; reason: string } {
  if (x.length !== y.length) return cannot('there are not as many values as places');
  if (![...x, ...y].every(Number.isFinite)) return cannot('one of the points is not a number');
  const different = new Set(x).size;
  if (different <= degree) return cannot(`a fit of degree ${degree} needs ${degree + 1} different places`);
  const from = Math.min(...x);
  const to = Math.max(...x);
  const centre = (from + to) / 2;
  const scale = (to - from) / 2;
  const design = new Matrix(x.map((place) => powers((place - centre) / scale, degree)));
  const solution = new QrDecomposition(design).solve(Matrix.columnVector([...y])).to1DArray();
  const coefficients = unscale(solution, centre, scale);
  const residuals = y.map((value, index) => value - polynomialAt(coefficients, x[index]!));
  return { ok: true, coefficients, residuals, rSquared: explained(y, residuals), from, to };
}

/** Value of c0 + c1·x + c2·x² … at x. */
export function polynomialAt(coefficients: readonly number[], x: number): number {
  return coefficients.reduceRight((value, coefficient) => value * x + coefficient, 0);
}

function powers(u: number, degree: number): number[] {
  return degree === 1 ? [1, u] : [1, u, u * u];
}

function unscale([a = 0, b = 0, c = 0]: number[], centre: number, scale: number): number[] {
  const slope = b / scale;
  const curve = c / squared(scale);
  return [a - slope * centre + curve * squared(centre), slope - 2 * curve * centre, curve];
}

function explained(y: readonly number[], residuals: readonly number[]): number {
  const average = y.reduce((sum, value) => sum + value, 0) / y.length;
  const total = y.reduce((sum, value) => sum + squared(value - average), 0);
  const left = residuals.reduce((sum, value) => sum + squared(value), 0);
  return total === 0 ? 1 : 1 - left / total;
}
