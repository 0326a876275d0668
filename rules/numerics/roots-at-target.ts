import { polynomialAt } from './least-squares';

/**
 * Where a polynomial of degree 1 or 2 takes a target value, within a range, both ends included, in rising order.
 *
 * Source: the quadratic formula in the form that loses no digits when c1² is large beside c0·c2
 * (Press and others, Numerical Recipes, section on quadratic and cubic equations; from memory, verify).
 * Domain: finite coefficients; an empty list where the curve misses the target inside the range, or where it is
 * constant (then it takes the target nowhere or everywhere, and no single place is the answer).
 *
 * @example rootsAtTarget([23.28, -5.588571, 0.342857], 4, 4, 6) // [4.95795]
 */
export function rootsAtTarget(
  coefficients: readonly number[],
  target: number,
  from: number,
  to: number,
): number[] {
  const [c0 = 0, c1 = 0, c2 = 0] = coefficients;
  const roots = solve(c2, c1, c0 - target);
  const slack = 1e-12 * Math.max(1, Math.abs(from), Math.abs(to));
  return roots
    .filter((root) => root >= from - slack && root <= to + slack)
    .map((root) => Math.min(to, Math.max(from, root)))
    .sort((a, b) => a - b);
}

/** The first of the roots at which the curve falls, for a property that goes down with binder content. */
export function fallingRoot(coefficients: readonly number[], roots: readonly number[]): number | null {
  const [, c1 = 0, c2 = 0] = coefficients;
  return roots.find((root) => polynomialAt([c1, 2 * c2], root) < 0) ?? null;
}

function solve(a: number, b: number, c: number): number[] {
  if (a === 0) return b === 0 ? [] : [-c / b];
  const discriminant = b * b - 4 * a * c;
  if (discriminant < 0) return [];
  const q = -0.5 * (b + Math.sign(b || 1) * Math.sqrt(discriminant));
  if (q === 0) return [0];
  return [...new Set([q / a, c / q])];
}
