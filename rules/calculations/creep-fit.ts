import { covarianceFactor, covarianceOf, deviationAlong } from '../numerics/covariance-factor';
import { fitFromStarts } from '../numerics/fit-from-starts';
import type { FitProblem, LeastSquaresFit } from '../numerics/levenberg-marquardt';
import { known, unusable } from '../numerics/numeric-result';
import { twoSidedT } from '../numerics/student-t';
import { exp, ln, squared } from '../numerics/transcendental';
import { decadesBeyond } from './creep-compliance';
import { type CreepModel, type CreepModelName, creepModel, type PointSpan } from './creep-model';
import { creepStarts, type LnPoint } from './creep-starts';

export interface FittedParameter {
  symbol: string;
  unit: string;
  value: number;
  /** Two-sided interval at 95 %; null where the points set no bound. */
  low: number | null;
  high: number | null;
  /** False where no tested point holds it: its interval is wider than a factor of two, or it ended on a bound. */
  held: boolean;
}

/** A fitted creep curve, as plain data: everything that its value and band at any time are computed from. */
export interface CreepFit {
  model: CreepModelName;
  parameters: FittedParameter[];
  /** Natural logarithms of what was fitted, in the model's own order; see `creep-model`. */
  lnParameters: number[];
  /** Of the logarithms. */
  covariance: number[][];
  /** F of covariance = F·Fᵀ, from which bands are computed. */
  covarianceFactor: number[][];
  retardationTimes: number[];
  lnCentre: number;
  degreesOfFreedom: number;
  /** Standard deviation of the points about the curve, in ln D. */
  residualDeviation: number;
  /** ln D of a point − ln D of the curve, in the order of the points given. */
  residuals: number[];
  /** Share of the variation of ln D that the curve explains. */
  rSquared: number;
  converged: boolean;
  iterations: number;
  starts: number;
  /** Starts that led to this minimum. */
  startsAgreeing: number;
  /** First and last tested loading time, s. */
  window: { from: number; to: number };
  pointCount: number;
  timeCount: number;
  /** Of the sigmoid: n above 1. */
  steep: boolean;
  /** How far τ lies beyond the tested times, decades; null for models without it. */
  tauDecadesBeyond: number | null;
  /** Why the fit may not be used, or null. */
  rejected: string | null;
}

export type CreepFitResult = { ok: true; fit: CreepFit } | { ok: false; reason: string };

/**
 * Fits a creep model to points, in ln D, all points together.
 *
 * Least squares of ln D by Levenberg–Marquardt from several starts, in the logarithms of the parameters. The
 * variance is that of the residuals, never less than that of readings good to 0.1 %, because points that lie on a
 * curve exactly are still no more certain than readings are. A fit that does not converge or whose R² in ln D is
 * below 0.98 is returned with the reason why it is rejected.
 *
 * Source: methods in `levenberg-marquardt` and `covariance-factor`; the limit of 0.98 is this product's own.
 * Domain: times and compliances above zero; more points than parameters, at as many different times as parameters.
 *
 * @example fitCreep('sigmoid', points at 1 to 100 s of D0 0.045, D∞ 1.2, τ 900 s, n 0.55) // those parameters
 */
export function fitCreep(model: CreepModelName, points: readonly { t: number; D: number }[]): CreepFitResult {
  for (const { t, D } of points) {
    const fault = unusable({ 'a loading time': t, 'a compliance': D }, 'positive');
    if (fault) return { ok: false, reason: fault };
  }
  const lnPoints = points.map(({ t, D }) => ({ lnTime: ln(t), lnD: ln(D) }));
  // The same sums whatever the order of the points: rounding must not depend on it.
  const order = lnPoints.map((_, i) => i).toSorted((a, b) => byTime(lnPoints[a]!, lnPoints[b]!));
  const ordered = order.map((i) => lnPoints[i]!);
  const span = spanOf(ordered);
  const curve = creepModel(model, span);
  const lacking = lackingPoints(curve, ordered.length, span.timeCount);
  if (lacking) return { ok: false, reason: lacking };
  const sketch = sketchOf(ordered);
  const { best, starts, agreeing } = fitFromStarts(
    problemOf(curve, ordered),
    creepStarts(curve, sketch, span),
    problemOf(curve, sketch),
  );
  const residuals = new Array<number>(points.length).fill(0);
  order.forEach((place, i) => {
    residuals[place] = -best.residuals[i]!;
  });
  const fit = describeFit({ model: curve, best, points, residuals, starts, startsAgreeing: agreeing });
  return { ok: true, fit };
}

/** Least R² in ln D of a fit that may be used. */
export const LEAST_R_SQUARED = 0.98;

/** Readings are not taken as better than this, in ln D; common practice, no source. */
const LEAST_DEVIATION = 0.001;
/** In ln: a factor of a million either way is no bound. */
const WIDEST_HALF = 6 * Math.LN10;
const DESCRIBED_CONFIDENCE = 0.95;

function lackingPoints(model: CreepModel, pointCount: number, timeCount: number): string | null {
  const { parameterCount } = model;
  if (pointCount <= parameterCount) {
    return `a curve with ${parameterCount} parameters needs more than ${parameterCount} points, and there ${pointCount === 1 ? 'is' : 'are'} ${pointCount}`;
  }
  if (timeCount < parameterCount) {
    return `a curve with ${parameterCount} parameters needs at least ${parameterCount} different loading times, and there ${timeCount === 1 ? 'is' : 'are'} ${timeCount}`;
  }
  return null;
}

/** Every so many points of a long series: enough to tell one minimum from another. */
function sketchOf(ordered: readonly LnPoint[]): readonly LnPoint[] {
  if (ordered.length <= SKETCH_POINTS) return ordered;
  const step = ordered.length / SKETCH_POINTS;
  return Array.from({ length: SKETCH_POINTS }, (_, i) => ordered[Math.floor(i * step)]!);
}

const SKETCH_POINTS = 80;

function problemOf(model: CreepModel, points: readonly LnPoint[]): FitProblem {
  const { parameterCount, lower, upper } = model;
  return {
    parameterCount,
    residualCount: points.length,
    lower,
    upper,
    evaluate(parameters, residuals, jacobian) {
      for (let i = 0; i < points.length; i += 1) {
        const { lnTime, lnD } = points[i]!;
        residuals[i] = model.lnCompliance(parameters, lnTime, jacobian, i * parameterCount) - lnD;
      }
    },
  };
}

/** What a solved problem says: `best` may hold more parameters than the model, its own first. */
export function describeFit(input: {
  model: CreepModel;
  best: LeastSquaresFit;
  /** Times and compliances in the order in which residuals are told. */
  points: readonly { t: number; D: number }[];
  residuals: number[];
  starts: number;
  startsAgreeing: number;
}): CreepFit {
  const { model, best, points } = input;
  const solvedFor = best.parameters.length;
  const degreesOfFreedom = points.length - solvedFor;
  const deviation = Math.sqrt(best.sumOfSquares / degreesOfFreedom);
  const variance = squared(Math.max(deviation, LEAST_DEVIATION));
  const factor = covarianceFactor(best.jacobian, solvedFor, variance).slice(0, model.parameterCount);
  const rSquared = explained(points, best.sumOfSquares);
  const times = points.map(({ t }) => t);
  const window = { from: Math.min(...times), to: Math.max(...times) };
  const parameters = publishedParameters(model, best, factor, { degreesOfFreedom, lastTime: window.to });
  const tau = parameters.find(({ symbol }) => symbol === 'τ')?.value;
  const beyond = tau === undefined ? null : decadesBeyond(tau, window);
  return {
    model: model.name,
    parameters,
    lnParameters: best.parameters.slice(0, model.parameterCount).map(settled),
    covariance: covarianceOf(factor).map((row) => row.map(settled)),
    covarianceFactor: factor.map((row) => row.map(settled)),
    retardationTimes: model.retardationTimes.map(settled),
    lnCentre: model.lnCentre,
    degreesOfFreedom,
    residualDeviation: settled(deviation),
    residuals: input.residuals.map(settled),
    rSquared,
    converged: best.converged,
    iterations: best.iterations,
    starts: input.starts,
    startsAgreeing: input.startsAgreeing,
    window,
    pointCount: points.length,
    timeCount: new Set(times).size,
    steep: model.name === 'sigmoid' && (parameters[3]?.value ?? 0) > 1,
    tauDecadesBeyond: beyond?.ok ? beyond.value : null,
    rejected: rejection(best.converged, rSquared),
  };
}

function rejection(converged: boolean, rSquared: number): string | null {
  if (!converged) return 'the fit does not converge';
  if (rSquared >= LEAST_R_SQUARED) return null;
  return `R² in ln D is ${rSquared.toFixed(3).replace('-', '−')}, below ${LEAST_R_SQUARED}`;
}

function publishedParameters(
  model: CreepModel,
  best: LeastSquaresFit,
  factor: readonly (readonly number[])[],
  { degreesOfFreedom, lastTime }: { degreesOfFreedom: number; lastTime: number },
): FittedParameter[] {
  const quantile = twoSidedT(DESCRIBED_CONFIDENCE, degreesOfFreedom);
  const t = quantile.ok ? quantile.value : Number.POSITIVE_INFINITY;
  const reached = reachedBy(model, { best, factor, t, lnLast: ln(lastTime) });
  return model.published(best.parameters).map(({ symbol, unit, value, gradient }) => {
    const half = t * deviationAlong(factor, gradient);
    const isBounded = half <= WIDEST_HALF;
    const rests = gradient.some((share, i) => Math.abs(share) > 0.5 && best.atBound[i]);
    return {
      symbol,
      unit,
      value: settled(value),
      low: isBounded ? settled(Math.max(value * exp(-half), symbol === 'D∞' ? reached : 0)) : null,
      high: isBounded ? settled(value * exp(half)) : null,
      held: half <= Math.LN2 && !rests,
    };
  });
}

/** What the curve has reached at the last tested time, at the lower end of its band: D∞ lies above it. */
function reachedBy(
  model: CreepModel,
  {
    best,
    factor,
    t,
    lnLast,
  }: { best: LeastSquaresFit; factor: readonly (readonly number[])[]; t: number; lnLast: number },
): number {
  const gradient = new Float64Array(model.parameterCount);
  const lnD = model.lnCompliance(best.parameters, lnLast, gradient);
  return exp(lnD - t * deviationAlong(factor, gradient));
}

/** Points that hardly differ leave nothing to explain: then only a fit through all of them counts as one. */
function explained(points: readonly { D: number }[], left: number): number {
  // In order of size: the sums must not depend on the order in which points are given.
  const logs = points.map(({ D }) => ln(D)).toSorted((a, b) => a - b);
  const average = logs.reduce((sum, lnD) => sum + lnD, 0) / logs.length;
  const total = logs.reduce((sum, lnD) => sum + squared(lnD - average), 0);
  const noise = points.length * 1e-12;
  if (total <= noise) return left <= noise ? 1 : 0;
  return settled(1 - left / total);
}

export function spanOf(ordered: readonly LnPoint[]): PointSpan {
  let [lnLeast, lnMost] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const { lnD } of ordered) {
    lnLeast = Math.min(lnLeast, lnD);
    lnMost = Math.max(lnMost, lnD);
  }
  return {
    lnFrom: ordered[0]?.lnTime ?? 0,
    lnTo: ordered.at(-1)?.lnTime ?? 0,
    lnLeast,
    lnMost,
    timeCount: new Set(ordered.map(({ lnTime }) => lnTime)).size,
  };
}

function byTime(a: LnPoint, b: LnPoint): number {
  return a.lnTime - b.lnTime || a.lnD - b.lnD;
}

/** As every numeric result: 12 significant digits, so that every engine comes to the same number. */
function settled(value: number): number {
  const result = known(value);
  if (!result.ok) throw new Error('A fit gave no finite number.');
  return result.value;
}
