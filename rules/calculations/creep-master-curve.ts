import { covarianceFactor, deviationAlong } from '../numerics/covariance-factor';
import { fitFromStarts } from '../numerics/fit-from-starts';
import type { FitProblem, LeastSquaresFit } from '../numerics/levenberg-marquardt';
import { cannot, known } from '../numerics/numeric-result';
import { twoSidedT } from '../numerics/student-t';
import { exp, ln, squared } from '../numerics/transcendental';
import { type CreepFit, describeFit, spanOf } from './creep-fit';
import { type CreepModel, creepModel } from './creep-model';
import { creepStarts } from './creep-starts';

/** The compliances at one temperature: °C, s and 1/GPa. */
export interface TemperatureSeries {
  temperature: number;
  points: readonly { t: number; D: number }[];
}

export interface ShiftFactor {
  temperature: number;
  /** log10 aT of t/aT, the time at the reference temperature; 0 there, positive where it is colder. */
  logShift: number;
  /** Two-sided at 95 %; null where nothing holds the shift. */
  low: number | null;
  high: number | null;
  /** Whether its compliances overlap with those of a neighbouring temperature. */
  overlaps: boolean;
}

export interface MasterCurve {
  referenceTemperature: number;
  shifts: ShiftFactor[];
  /** The sigmoid over the shifted times; its residuals in the order of the series and their points. */
  fit: CreepFit;
}

/**
 * Shift factors and one master curve from several temperatures: D(T, t) = D(Tref, t/aT).
 *
 * One sigmoid and one log aT for each temperature but the reference are fitted together, in ln D. The reference is
 * the middle temperature. A temperature whose compliances overlap with no neighbour's is held by the form of the
 * curve alone, and is marked.
 * Source: time–temperature superposition, textbook. Domain: at least two temperatures with points at two different
 * times each, all above zero; more points than parameters.
 *
 * @example masterCurve of D0 0.045, D∞ 1.2, n 0.55 and τ 900 s at 0 °C, 1.15 decades more at −10 °C // log aT 1.15
 */
export function masterCurve(
  series: readonly TemperatureSeries[],
): { ok: true; master: MasterCurve } | { ok: false; reason: string } {
  const fault = seriesFault(series);
  if (fault) return cannot(fault);
  const ordered = series.toSorted((a, b) => a.temperature - b.temperature);
  const reference = Math.floor((ordered.length - 1) / 2);
  const firstShifts = roughShifts(ordered, reference);
  const points = ordered.flatMap((each, place) => each.points.map(({ t, D }) => ({ t, D, place })));
  const shifted = points.map(({ t, D, place }) => ({
    lnTime: ln(t) - firstShifts[place]!,
    lnD: ln(D),
  }));
  const span = spanOf(shifted.toSorted((a, b) => a.lnTime - b.lnTime || a.lnD - b.lnD));
  const model = creepModel('sigmoid', span);
  const others = ordered.map((_, place) => place).filter((place) => place !== reference);
  if (points.length <= model.parameterCount + others.length) return cannot('there are too few points');
  const problem = problemOf(model, points, others);
  const { best, starts, agreeing } = fitFromStarts(
    problem,
    creepStarts(model, shifted, span).map((start) => [
      ...start,
      ...others.map((place) => firstShifts[place]!),
    ]),
  );
  const lnShifts = ordered.map((_, place) => {
    const at = others.indexOf(place);
    return at < 0 ? 0 : best.parameters[model.parameterCount + at]!;
  });
  const reduced = points.map(({ t, D, place }) => ({ t: t * exp(-lnShifts[place]!), D }));
  const fit = describeFit({
    model,
    best,
    points: reduced.map(({ t, D }) => ({ t: settled(t), D })),
    residuals: best.residuals.map((residual) => -residual),
    starts,
    startsAgreeing: agreeing,
  });
  const shifts = shiftFactors(ordered, { reference, others, best, model });
  return { ok: true, master: { referenceTemperature: ordered[reference]!.temperature, shifts, fit } };
}

function seriesFault(series: readonly TemperatureSeries[]): string | null {
  if (series.length < 2) return 'a master curve needs at least two temperatures';
  for (const { points } of series) {
    if (points.some(({ t, D }) => !(Number.isFinite(t) && Number.isFinite(D) && t > 0 && D > 0))) {
      return 'a loading time or a compliance is not above zero';
    }
    if (new Set(points.map(({ t }) => t)).size < 2) return 'a temperature has fewer than two loading times';
  }
  return null;
}

function problemOf(
  model: CreepModel,
  points: readonly { t: number; D: number; place: number }[],
  others: readonly number[],
): FitProblem {
  const own = model.parameterCount;
  const count = own + others.length;
  const logs = points.map(({ t, D, place }) => ({
    lnTime: ln(t),
    lnD: ln(D),
    shift: others.indexOf(place),
  }));
  return {
    parameterCount: count,
    residualCount: logs.length,
    lower: [...model.lower, ...others.map(() => -LARGEST_SHIFT)],
    upper: [...model.upper, ...others.map(() => LARGEST_SHIFT)],
    evaluate(parameters, residuals, jacobian) {
      jacobian.fill(0);
      logs.forEach(({ lnTime, lnD, shift }, i) => {
        const reduced = shift < 0 ? lnTime : lnTime - parameters[own + shift]!;
        residuals[i] = model.lnCompliance(parameters, reduced, jacobian, i * count) - lnD;
        if (shift >= 0) jacobian[i * count + own + shift] = -model.slope(parameters, reduced);
      });
    },
  };
}

/** Twenty decades, in natural logarithms. */
const LARGEST_SHIFT = 20 * Math.LN10;

/** From neighbour to neighbour outwards: the mean distance in ln t between equal compliances. */
function roughShifts(ordered: readonly TemperatureSeries[], reference: number): number[] {
  const shifts = ordered.map(() => 0);
  for (let place = reference + 1; place < ordered.length; place += 1) {
    shifts[place] = shifts[place - 1]! + distanceBetween(ordered[place - 1]!, ordered[place]!);
  }
  for (let place = reference - 1; place >= 0; place -= 1) {
    shifts[place] = shifts[place + 1]! + distanceBetween(ordered[place + 1]!, ordered[place]!);
  }
  return shifts;
}

/** By straight lines in logarithms through all points of each, at compliances between the two middles. */
function distanceBetween(near: TemperatureSeries, far: TemperatureSeries): number {
  const one = lineThrough(near);
  const other = lineThrough(far);
  const level = (one.middle.lnD + other.middle.lnD) / 2;
  const at = ({ middle, slope }: Line) => middle.lnTime + (level - middle.lnD) / slope;
  return at(other) - at(one);
}

interface Line {
  middle: { lnTime: number; lnD: number };
  slope: number;
}

function lineThrough({ points }: TemperatureSeries): Line {
  const logs = points.map(({ t, D }) => ({ lnTime: ln(t), lnD: ln(D) }));
  const middle = {
    lnTime: logs.reduce((sum, { lnTime }) => sum + lnTime, 0) / logs.length,
    lnD: logs.reduce((sum, { lnD }) => sum + lnD, 0) / logs.length,
  };
  let [across, along] = [0, 0];
  for (const { lnTime, lnD } of logs) {
    across += (lnTime - middle.lnTime) * (lnD - middle.lnD);
    along += squared(lnTime - middle.lnTime);
  }
  return { middle, slope: Math.max(across / along, 0.02) };
}

function shiftFactors(
  ordered: readonly TemperatureSeries[],
  solved: { reference: number; others: readonly number[]; best: LeastSquaresFit; model: CreepModel },
): ShiftFactor[] {
  const { others, best, model } = solved;
  const count = best.parameters.length;
  const degreesOfFreedom = best.residuals.length - count;
  const variance = Math.max(best.sumOfSquares / degreesOfFreedom, 1e-6);
  const factor = covarianceFactor(best.jacobian, count, variance);
  const quantile = twoSidedT(0.95, degreesOfFreedom);
  return ordered.map(({ temperature }, place) => {
    const at = others.indexOf(place);
    if (at < 0) return { temperature, logShift: 0, low: 0, high: 0, overlaps: true };
    const index = model.parameterCount + at;
    const direction = Array.from({ length: count }, (_, i) => (i === index ? 1 : 0));
    const half = quantile.ok ? (quantile.value * deviationAlong(factor, direction)) / Math.LN10 : 1e9;
    const logShift = best.parameters[index]! / Math.LN10;
    const isHeld = half < 3;
    return {
      temperature,
      logShift: settled(logShift),
      low: isHeld ? settled(logShift - half) : null,
      high: isHeld ? settled(logShift + half) : null,
      overlaps: overlapsNeighbour(ordered, place),
    };
  });
}

function overlapsNeighbour(ordered: readonly TemperatureSeries[], place: number): boolean {
  const own = rangeOf(ordered[place]!);
  return [ordered[place - 1], ordered[place + 1]].some((neighbour) => {
    if (neighbour === undefined) return false;
    const other = rangeOf(neighbour);
    return own.from <= other.to && other.from <= own.to;
  });
}

function rangeOf({ points }: TemperatureSeries): { from: number; to: number } {
  const values = points.map(({ D }) => D);
  return { from: Math.min(...values), to: Math.max(...values) };
}

function settled(value: number): number {
  const result = known(value);
  if (!result.ok) throw new Error('A master curve gave no finite number.');
  return result.value;
}
