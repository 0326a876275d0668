import { EigenvalueDecomposition, Matrix } from 'ml-matrix';

/**
 * A factor F of the covariance of least-squares parameters: F·Fᵀ = s²·(JᵀJ)⁻¹, one column an eigenvector.
 *
 * The columns of J are scaled to length one first, and no eigenvalue counts as less than 10⁻¹² of the largest: a
 * direction that the data say nothing about gets a very large variance, never an infinite one and never none. The
 * factor, not the product, is kept, because the variance of a prediction, |Fᵀ·g|², would be lost in the
 * cancellation of large elements of the product.
 *
 * Source: textbook linearisation of least squares. Domain: a Jacobian of finite numbers, row by row, with at least
 * as many rows as parameters; a variance not below zero.
 *
 * @example // J = [1, 1, 1, 1]ᵀ, s² = 4: the variance of a mean of four, F = [[1]]
 */
export function covarianceFactor(
  jacobian: Float64Array,
  parameterCount: number,
  variance: number,
): number[][] {
  const p = parameterCount;
  const normal = new Float64Array(p * p);
  for (let row = 0; row < jacobian.length; row += p) {
    for (let i = 0; i < p; i += 1) {
      for (let k = 0; k <= i; k += 1) normal[i * p + k]! += jacobian[row + i]! * jacobian[row + k]!;
    }
  }
  const lengths = Array.from({ length: p }, (_, i) =>
    Math.sqrt(Math.max(normal[i * p + i]!, SHORTEST_SQUARED)),
  );
  const scaled = new Matrix(p, p);
  for (let i = 0; i < p; i += 1) {
    for (let k = 0; k <= i; k += 1) {
      const value = normal[i * p + k]! / (lengths[i]! * lengths[k]!);
      scaled.set(i, k, value);
      scaled.set(k, i, value);
    }
  }
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(scaled, {
    assumeSymmetric: true,
  });
  const least = Math.max(...realEigenvalues) * LEAST_EIGENVALUE;
  const deviation = Math.sqrt(variance);
  return lengths.map((length, i) =>
    realEigenvalues.map(
      (eigenvalue, k) =>
        (deviation * eigenvectorMatrix.get(i, k)) / (Math.sqrt(Math.max(eigenvalue, least)) * length),
    ),
  );
}

/** Standard deviation of a linear combination g of the parameters: |Fᵀ·g|. */
export function deviationAlong(factor: readonly (readonly number[])[], gradient: ArrayLike<number>): number {
  const columns = factor[0]?.length ?? 0;
  let sum = 0;
  for (let k = 0; k < columns; k += 1) {
    let along = 0;
    for (let i = 0; i < factor.length; i += 1) along += factor[i]![k]! * gradient[i]!;
    sum += along * along;
  }
  return Math.sqrt(sum);
}

/** The covariance itself, F·Fᵀ. */
export function covarianceOf(factor: readonly (readonly number[])[]): number[][] {
  return factor.map((row) =>
    factor.map((other) => row.reduce((sum, value, k) => sum + value * other[k]!, 0)),
  );
}

const LEAST_EIGENVALUE = 1e-12;
const SHORTEST_SQUARED = 1e-24;
