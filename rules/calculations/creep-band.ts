import { deviationAlong } from '../numerics/covariance-factor';
import { known, unusable } from '../numerics/numeric-result';
import { twoSidedT } from '../numerics/student-t';
import { exp, ln } from '../numerics/transcendental';
import type { CreepFit } from './creep-fit';
import { storedModel } from './creep-model';

/** ln D of a fit at a loading time, with half the width of its band, both in ln D. */
export function lnBandAt(
  fit: BandSource,
  time: number,
  confidence: number,
): { ok: true; lnD: number; halfWidth: number } | { ok: false; reason: string } {
  const fault = unusable({ 'the loading time': time }, 'positive');
  if (fault) return { ok: false, reason: fault };
  const quantile = twoSidedT(confidence, fit.degreesOfFreedom);
  if (!quantile.ok) return quantile;
  const gradient = new Float64Array(fit.lnParameters.length);
  const lnD = storedModel(fit).lnCompliance(fit.lnParameters, ln(time), gradient);
  return { ok: true, lnD, halfWidth: quantile.value * deviationAlong(fit.covarianceFactor, gradient) };
}

export type BandSource = Pick<
  CreepFit,
  'model' | 'lnParameters' | 'covarianceFactor' | 'retardationTimes' | 'lnCentre' | 'degreesOfFreedom'
>;

/** Values of a curve at one time, 1/GPa; a bound that leaves the range of sensible numbers is null. */
export interface CreepBand {
  estimate: number;
  lower: number | null;
  upper: number | null;
}

/**
 * The fitted mean curve at a loading time with its two-sided confidence band, 1/GPa. exp(ln D ± t·√(gᵀ·C·g)).
 *
 * Symbols: g gradient of ln D in the fitted parameters, C their covariance, t the quantile at (1 + confidence)/2 for
 * the degrees of freedom of the fit.
 * Source: textbook linearisation. Domain: time above zero, confidence between 0 and 1.
 *
 * @example creepBandAt(fit of exact points of D0 0.045, D∞ 1.2, τ 900, n 0.55, 100, 0.95).estimate // 0.3106168
 */
export function creepBandAt(
  fit: BandSource,
  time: number,
  confidence: number,
): { ok: true; band: CreepBand } | { ok: false; reason: string } {
  const band = lnBandAt(fit, time, confidence);
  if (!band.ok) return band;
  const estimate = known(exp(band.lnD));
  if (!estimate.ok) return estimate;
  return {
    ok: true,
    band: {
      estimate: estimate.value,
      lower: expOrNull(band.lnD - band.halfWidth),
      upper: expOrNull(band.lnD + band.halfWidth),
    },
  };
}

function expOrNull(ln: number): number | null {
  const bounded = Math.abs(ln) < 30 * Math.LN10 ? known(exp(ln)) : null;
  return bounded?.ok ? bounded.value : null;
}
