import { exp, ln, squared } from '../numerics/transcendental';
import type { CreepModel, PointSpan } from './creep-model';

/** A point as it is fitted: natural logarithms of loading time and compliance, and how many points it stands for. */
export interface LnPoint {
  lnTime: number;
  lnD: number;
}

/**
 * Starting values for a fit, the best first: a coarse grid of what is nonlinear (τ and n, or m), at each the
 * straight-line fit of what is linear (D0 and the growth), in relative terms; the best of the grid, far enough apart
 * to lead to different minima.
 */
export function creepStarts(model: CreepModel, points: readonly LnPoint[], span: PointSpan): number[][] {
  if (model.name === 'prony') return pronyStarts(model, span);
  const shapes = model.name === 'sigmoid' ? sigmoidShapes(span) : powerShapes();
  const values = points.map(({ lnD }) => exp(lnD));
  const candidates = shapes.map(({ parameters, share }) => {
    const linear = linearFit(
      points.map(({ lnTime }) => share(lnTime, model.lnCentre)),
      values,
    );
    return { start: [ln(linear.D0), ln(linear.growth), ...parameters], sum: linear.sum };
  });
  const starts: number[][] = [];
  for (const { start } of candidates.toSorted((a, b) => a.sum - b.sum)) {
    if (starts.every((other) => distance(start, other) > LEAST_DISTANCE)) starts.push(start);
    if (starts.length === MOST_STARTS) break;
  }
  return starts;
}

const MOST_STARTS = 4;
/** In the nonlinear parameters, all of them logarithms. */
const LEAST_DISTANCE = 1.2;

interface Shape {
  parameters: number[];
  /** Share of the growth that has happened by then. */
  share: (lnTime: number, lnCentre: number) => number;
}

function sigmoidShapes({ lnFrom, lnTo }: PointSpan): Shape[] {
  const shapes: Shape[] = [];
  for (let step = 0; step <= 8; step += 1) {
    const lnTau = lnFrom - Math.LN10 + ((lnTo - lnFrom + 4 * Math.LN10) * step) / 8;
    for (const n of [0.25, 0.45, 0.75, 1.2]) {
      shapes.push({
        parameters: [lnTau, ln(n)],
        share: (lnTime) => 1 / (1 + exp(-n * (lnTime - lnTau))),
      });
    }
  }
  return shapes;
}

function powerShapes(): Shape[] {
  return [0.03, 0.08, 0.15, 0.25, 0.4, 0.6, 0.9, 1.4].map((m) => ({
    parameters: [ln(m)],
    share: (lnTime, lnCentre) => exp(m * (lnTime - lnCentre)),
  }));
}

/** D0 + growth·share through the values, errors counted in proportion; both kept above zero. */
function linearFit(shares: number[], values: number[]): { D0: number; growth: number; sum: number } {
  let [a11, a12, a22, b1, b2] = [0, 0, 0, 0, 0];
  for (let i = 0; i < shares.length; i += 1) {
    const u = 1 / values[i]!;
    const v = shares[i]! / values[i]!;
    a11 += u * u;
    a12 += u * v;
    a22 += v * v;
    b1 += u;
    b2 += v;
  }
  const determinant = a11 * a22 - a12 * a12;
  const least = Math.min(...values);
  let D0 = (b1 * a22 - b2 * a12) / determinant;
  let growth = (a11 * b2 - a12 * b1) / determinant;
  if (!Number.isFinite(D0) || D0 < least * 1e-3) {
    D0 = least * 1e-3;
    growth = (b2 - a12 * D0) / a22;
  }
  if (!Number.isFinite(growth) || growth < least * 1e-4) growth = least * 1e-4;
  let sum = 0;
  for (let i = 0; i < shares.length; i += 1) sum += squared(1 - (D0 + growth * shares[i]!) / values[i]!);
  return { D0, growth, sum };
}

function distance(one: number[], other: number[]): number {
  return Math.max(...one.slice(2).map((value, i) => Math.abs(value - other[i + 2]!)));
}

/** In the Prony series everything is linear but for the signs: any positive start leads to the one minimum. */
function pronyStarts(model: CreepModel, { lnLeast, lnMost }: PointSpan): number[][] {
  const terms = model.retardationTimes.length;
  const growth = Math.max(exp(lnMost) - exp(lnLeast), exp(lnLeast) * 1e-3);
  const even = model.retardationTimes.map(() => ln(growth / terms));
  const rising = model.retardationTimes.map((_, i) => ln((growth * (i + 1)) / squared(terms)));
  return [
    [lnLeast, ...even],
    [lnLeast - 1, ...rising],
  ];
}
