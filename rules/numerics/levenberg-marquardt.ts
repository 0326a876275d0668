import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import { squared } from './transcendental';

export interface FitProblem {
  parameterCount: number;
  residualCount: number;
  /** Least and greatest value of each parameter, both allowed. */
  lower: readonly number[];
  upper: readonly number[];
  /** Writes fitted − observed into `residuals` and ∂residual/∂parameter, row by row, into `jacobian`. */
  evaluate(parameters: Float64Array, residuals: Float64Array, jacobian: Float64Array): void;
}

export interface LeastSquaresFit {
  parameters: number[];
  /** fitted − observed, in the order of the problem. */
  residuals: number[];
  /** Row by row, at the solution. */
  jacobian: Float64Array;
  sumOfSquares: number;
  iterations: number;
  converged: boolean;
  /** What ended it: `exact`, `gradient`, `step`, `reduction`, or without convergence `stalled`, `iterations`. */
  stop: 'exact' | 'gradient' | 'step' | 'reduction' | 'stalled' | 'iterations' | 'not-finite';
  /** Parameters that ended on one of their bounds. */
  atBound: boolean[];
}

/** When a fit counts as converged; all relative. */
export interface FitTolerance {
  /** Largest cosine between the residuals and a column of the Jacobian. */
  cosine: number;
  /** Longest last step, of each parameter or of one. */
  step: number;
  /** Gain of the last step in the sum of squares. */
  reduction: number;
  /** Largest such cosine with which a short or idle step still counts: a damped step is short anywhere. */
  proof: number;
}

/** As near to the minimum as the arithmetic comes. */
export const FINE: FitTolerance = { cosine: 1e-11, step: 1e-11, reduction: 1e-13, proof: 1e-5 };

/** Near enough to tell one minimum from another, for choosing among several starts. */
export const COARSE: FitTolerance = { cosine: 1e-4, step: 1e-3, reduction: 1e-3, proof: 2 };

/**
 * Nonlinear least squares from one start: minimises Σr(p)², with bounds.
 *
 * Levenberg's damped Gauss–Newton step (JᵀJ + λ·diag)·δ = −Jᵀr with Marquardt's scaling by the largest diagonal
 * seen so far; a step that does not reduce the sum of squares is rejected and λ raised. A parameter on a bound
 * whose gradient points outwards is held there. Converged where the residuals vanish, the gradient stands at a
 * right angle to them, or a step changes neither the parameters nor the sum by more than a relative hair; never
 * because of an absolute size, which would depend on the unit.
 *
 * Source: Marquardt, An algorithm for least-squares estimation of nonlinear parameters, J. SIAM 11 (1963);
 * Moré, The Levenberg–Marquardt algorithm, 1978 (scaling); from memory, verify. Domain: a start within the bounds
 * at which residuals are finite; else `not-finite`, not converged.
 *
 * @example // r = exp(p) − 2 from p = 0 gives p = ln 2
 */
export function levenbergMarquardt(
  problem: FitProblem,
  start: readonly number[],
  tolerance: FitTolerance = FINE,
): LeastSquaresFit {
  const state = new State(problem, start);
  if (!Number.isFinite(state.sum)) return state.result('not-finite');
  for (let iteration = 1; iteration <= MOST_ITERATIONS; iteration += 1) {
    state.iterations = iteration;
    if (state.isExact()) return state.result('exact');
    const free = state.linearise();
    if (free.length === 0 || state.largestCosine(free) < tolerance.cosine) return state.result('gradient');
    const stop = improve(state, free, tolerance);
    if (stop !== null) return state.result(stop);
  }
  return state.result('iterations');
}

/** Tries steps, each shorter than the one before, until one reduces the sum. Null where it goes on from there. */
function improve(state: State, free: number[], tolerance: FitTolerance): LeastSquaresFit['stop'] | null {
  const isFlat = state.largestCosine(free) < Math.max(tolerance.proof, state.cosineNoise());
  while (state.damping < MOST_DAMPING) {
    const step = state.dampedStep(free);
    if (step !== null) {
      const before = state.sum;
      const { accepted, relativeStep } = state.attempt(free, step);
      if (accepted) {
        state.damping = Math.max(state.damping / 8, LEAST_DAMPING);
        if (!isFlat) return null;
        if (relativeStep < tolerance.step) return 'step';
        const gain = (before - state.sum) / before;
        const isIdle = gain < (state.isNegligible() ? NEGLIGIBLE_GAIN : VALLEY_GAIN);
        state.idleSteps = isIdle ? state.idleSteps + 1 : 0;
        if (state.idleSteps >= MOST_IDLE_STEPS) return 'reduction';
        return gain < tolerance.reduction && relativeStep < LONGEST_LAST_STEP ? 'reduction' : null;
      }
      if (isFlat && relativeStep < tolerance.step) return 'step';
    }
    state.damping *= 6;
  }
  // No step helps any more: where the sum is flat that is the minimum, elsewhere it is a failure.
  return isFlat ? 'gradient' : 'stalled';
}

const MOST_ITERATIONS = 300;
/** A tiny gain on a long step is a flat valley, along which it is worth going on, but not for ever. */
const LONGEST_LAST_STEP = 1e-4;
const VALLEY_GAIN = 1e-7;
const NEGLIGIBLE_GAIN = 0.02;
const MOST_IDLE_STEPS = 6;
const LEAST_DAMPING = 1e-12;
const MOST_DAMPING = 1e16;
/** Residuals in logarithms or otherwise of order one, so small that they are the arithmetic's own. */
const EXACT_RESIDUAL = 1e-14;
/** Of order one, too: a tenth of what any reading's own digits leave open. */
const NEGLIGIBLE_RESIDUAL = 1e-4;

const CONVERGED = new Set<LeastSquaresFit['stop']>(['exact', 'gradient', 'step', 'reduction']);

class State {
  parameters: Float64Array;
  residuals: Float64Array;
  jacobian: Float64Array;
  sum: number;
  damping = 1e-3;
  /** Steps in a row that gained next to nothing. */
  idleSteps = 0;
  iterations = 0;

  private trial: Float64Array;
  private trialResiduals: Float64Array;
  private trialJacobian: Float64Array;
  private readonly gradient: Float64Array;
  private readonly normal: Float64Array;
  private readonly scale: Float64Array;
  /** Filled anew at every step; making a matrix is dearer than solving one of this size. */
  private system = new Matrix(0, 0);
  private right = new Matrix(0, 1);

  constructor(
    private readonly problem: FitProblem,
    start: readonly number[],
  ) {
    const { parameterCount: p, residualCount: n } = problem;
    this.parameters = Float64Array.from(start, (value, i) => this.within(i, value));
    this.trial = new Float64Array(p);
    this.residuals = new Float64Array(n);
    this.trialResiduals = new Float64Array(n);
    this.jacobian = new Float64Array(n * p);
    this.trialJacobian = new Float64Array(n * p);
    this.gradient = new Float64Array(p);
    this.normal = new Float64Array(p * p);
    this.scale = new Float64Array(p);
    problem.evaluate(this.parameters, this.residuals, this.jacobian);
    this.sum = sumOfSquares(this.residuals);
  }

  isExact(): boolean {
    return this.sum <= this.problem.residualCount * squared(EXACT_RESIDUAL);
  }

  /** Where a valley without an end is still being walked, though what is left is less than any reading's digits. */
  isNegligible(): boolean {
    return this.sum <= this.problem.residualCount * squared(NEGLIGIBLE_RESIDUAL);
  }

  /** Gradient and normal matrix here; the parameters that may move. */
  linearise(): number[] {
    const { parameterCount: p, residualCount: n, lower, upper } = this.problem;
    this.gradient.fill(0);
    this.normal.fill(0);
    for (let row = 0; row < n; row += 1) {
      const r = this.residuals[row]!;
      for (let i = 0; i < p; i += 1) {
        const ji = this.jacobian[row * p + i]!;
        this.gradient[i]! += ji * r;
        for (let k = 0; k <= i; k += 1) this.normal[i * p + k]! += ji * this.jacobian[row * p + k]!;
      }
    }
    const free: number[] = [];
    let largest = 0;
    for (let i = 0; i < p; i += 1) largest = Math.max(largest, this.normal[i * p + i]!);
    for (let i = 0; i < p; i += 1) {
      this.scale[i] = Math.max(this.scale[i]!, this.normal[i * p + i]!, largest * 1e-14, 1e-300);
      const outwards =
        (this.parameters[i]! <= lower[i]! && this.gradient[i]! > 0) ||
        (this.parameters[i]! >= upper[i]! && this.gradient[i]! < 0);
      if (!outwards) free.push(i);
    }
    return free;
  }

  /** The largest cosine between the residuals and a column of the Jacobian: 0 at a minimum. */
  largestCosine(free: number[]): number {
    const { parameterCount: p } = this.problem;
    let largest = 0;
    for (const i of free) {
      const length = Math.sqrt(this.normal[i * p + i]! * this.sum);
      if (length > 0) largest = Math.max(largest, Math.abs(this.gradient[i]!) / length);
    }
    return largest;
  }

  /** What rounding alone makes of that cosine where the residuals have all but vanished. */
  cosineNoise(): number {
    return EXACT_RESIDUAL / Math.sqrt(this.sum / this.problem.residualCount);
  }

  dampedStep(free: number[]): Float64Array | null {
    const { parameterCount: p } = this.problem;
    const size = free.length;
    if (this.system.rows !== size) {
      this.system = new Matrix(size, size);
      this.right = new Matrix(size, 1);
    }
    const { system, right } = this;
    for (let a = 0; a < size; a += 1) {
      const i = free[a]!;
      right.set(a, 0, -this.gradient[i]!);
      for (let b = 0; b <= a; b += 1) {
        const value = this.normal[i * p + free[b]!]!;
        system.set(a, b, value);
        system.set(b, a, value);
      }
      system.set(a, a, this.normal[i * p + i]! + this.damping * this.scale[i]!);
    }
    const factors = new CholeskyDecomposition(system);
    if (!factors.isPositiveDefinite()) return null;
    const solved = factors.solve(right);
    return Float64Array.from(free, (_, a) => solved.get(a, 0));
  }

  attempt(free: number[], step: Float64Array): { accepted: boolean; relativeStep: number } {
    this.trial.set(this.parameters);
    let relativeStep = 0;
    free.forEach((i, a) => {
      // Half a dozen e-folds at once leave the region in which the linear step means anything.
      const bounded = Math.max(-LONGEST_STEP, Math.min(LONGEST_STEP, step[a]!));
      const moved = this.within(i, this.parameters[i]! + bounded);
      relativeStep = Math.max(
        relativeStep,
        Math.abs(moved - this.parameters[i]!) / Math.max(Math.abs(this.parameters[i]!), 1),
      );
      this.trial[i] = moved;
    });
    this.problem.evaluate(this.trial, this.trialResiduals, this.trialJacobian);
    const sum = sumOfSquares(this.trialResiduals);
    if (!(sum < this.sum)) return { accepted: false, relativeStep };
    [this.parameters, this.trial] = [this.trial, this.parameters];
    [this.residuals, this.trialResiduals] = [this.trialResiduals, this.residuals];
    [this.jacobian, this.trialJacobian] = [this.trialJacobian, this.jacobian];
    this.sum = sum;
    return { accepted: true, relativeStep };
  }

  result(stop: LeastSquaresFit['stop']): LeastSquaresFit {
    const { lower, upper } = this.problem;
    return {
      parameters: [...this.parameters],
      residuals: [...this.residuals],
      jacobian: this.jacobian,
      sumOfSquares: this.sum,
      iterations: this.iterations,
      converged: CONVERGED.has(stop) || (stop === 'iterations' && this.isNegligible()),
      stop,
      atBound: [...this.parameters].map((value, i) => value <= lower[i]! || value >= upper[i]!),
    };
  }

  private within(i: number, value: number): number {
    return Math.min(this.problem.upper[i]!, Math.max(this.problem.lower[i]!, value));
  }
}

const LONGEST_STEP = 4;

function sumOfSquares(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return Number.isFinite(sum) ? sum : Number.POSITIVE_INFINITY;
}
