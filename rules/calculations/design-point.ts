import { interpolate } from '../numerics/interpolate';
import { leastSquares, polynomialAt } from '../numerics/least-squares';
import { cannot, known, type NumericResult } from '../numerics/numeric-result';
import { fallingRoot, rootsAtTarget } from '../numerics/roots-at-target';

export type FitMethod = 'quadratic' | 'linear';

/** One trial mix: its binder content and the property there, both in %. */
export interface TrialPoint {
  Pb: number;
  value: number;
}

/**
 * A property at a binder content from trial points, in the property's unit.
 *
 * Quadratic: least squares through all points, from four different binder contents on; with fewer, or where the
 * method is linear, the straight line between the two neighbours. Never beyond the tested contents.
 * Source: Asphalt Institute MS-2 (1995), plots of the properties against binder content; from memory, verify.
 * Domain: at least two different contents that enclose the one asked for.
 *
 * @example propertyAt([[4, 14.9], [4.5, 14.6], [5, 14.5], [5.5, 14.7], [6, 15.1]], 4.95795, 'quadratic') // 14.5138
 */
export function propertyAt(points: readonly TrialPoint[], Pb: number, method: FitMethod): NumericResult {
  const curve = propertyCurve(points, method);
  if (!curve.ok) return curve;
  if (Pb < curve.from || Pb > curve.to) return cannot('the binder content lies beyond the trials');
  return curve.at(Pb);
}

/** A property over all tested binder contents. */
export interface PropertyCurve {
  ok: true;
  method: FitMethod;
  /** Least and greatest tested content, %. */
  from: number;
  to: number;
  /** Contents at which the property may stop rising or falling, in rising order; between two it does neither. */
  turns: number[];
  at(Pb: number): NumericResult;
}

/**
 * The curve that `propertyAt` reads: fitted once, to be read at many binder contents between `from` and `to`.
 *
 * @example propertyCurve([[4, 14.9], [4.5, 14.6], [5, 14.5], [5.5, 14.7], [6, 15.1]], 'quadratic').turns // [4.89706]
 */
export function propertyCurve(
  points: readonly TrialPoint[],
  method: FitMethod,
): PropertyCurve | { ok: false; reason: string } {
  const contents = points.map((point) => point.Pb);
  const values = points.map((point) => point.value);
  if (new Set(contents).size < 2) return cannot('there are fewer than two trial binder contents');
  const ends = { from: Math.min(...contents), to: Math.max(...contents) };
  if (!isQuadratic(contents, method)) {
    const turns = [...new Set(contents)].filter((Pb) => Pb > ends.from && Pb < ends.to).sort((a, b) => a - b);
    return { ok: true, method: 'linear', ...ends, turns, at: (Pb) => interpolate(contents, values, Pb) };
  }
  const fit = leastSquares(contents, values, 2);
  if (!fit.ok) return fit;
  const [, slope = 0, curve = 0] = fit.coefficients;
  const turn = -slope / (2 * curve);
  const turns = turn > ends.from && turn < ends.to ? [turn] : [];
  const at = (Pb: number) => known(polynomialAt(fit.coefficients, Pb));
  return { ok: true, method: 'quadratic', ...ends, turns, at };
}

/**
 * Design binder content, %: where the air voids of the trials take their target.
 *
 * The same fit as `propertyAt`, solved for the target; of two places the one where air voids fall with binder.
 * Source: AASHTO R 35 and MS-2 (1995), binder content at the design air voids; from memory, verify.
 * Domain: at least two different contents; a target that the fit takes within the trials, never beyond them.
 *
 * @example designBinderContent([[4, 6.4], [4.5, 5.1], [5, 3.9], [5.5, 2.9], [6, 2.1]], 4, 'quadratic') // 4.95795
 */
export function designBinderContent(
  points: readonly TrialPoint[],
  targetAirVoids: number,
  method: FitMethod,
): NumericResult {
  const contents = points.map((point) => point.Pb);
  if (new Set(contents).size < 2) return cannot('there are fewer than two trial binder contents');
  const place = isQuadratic(contents, method)
    ? quadraticPlace(points, targetAirVoids)
    : linearPlace(points, targetAirVoids);
  return place === null ? cannot('the trials do not reach the target air voids') : known(place);
}

/** Fewer than four different contents leave a parabola nothing to smooth. */
export function isQuadratic(contents: readonly number[], method: FitMethod): boolean {
  return method === 'quadratic' && new Set(contents).size >= 4;
}

function quadraticPlace(points: readonly TrialPoint[], target: number): number | null {
  const fit = leastSquares(
    points.map((point) => point.Pb),
    points.map((point) => point.value),
    2,
  );
  if (!fit.ok) return null;
  return fallingRoot(fit.coefficients, rootsAtTarget(fit.coefficients, target, fit.from, fit.to));
}

function linearPlace(points: readonly TrialPoint[], target: number): number | null {
  const ordered = points.toSorted((a, b) => a.Pb - b.Pb);
  for (let index = 1; index < ordered.length; index += 1) {
    const left = ordered[index - 1]!;
    const right = ordered[index]!;
    if (left.Pb === right.Pb || left.value < target || right.value > target || left.value === right.value)
      continue;
    return left.Pb + ((right.Pb - left.Pb) * (left.value - target)) / (left.value - right.value);
  }
  return null;
}
