import { exp, expm1, ln } from '../numerics/transcendental';
export type CreepModelName = 'sigmoid' | 'power' | 'prony';

/** A curve as it is fitted: in natural logarithms of its parameters, all positive, and of its value. */
export interface CreepModel {
  name: CreepModelName;
  parameterCount: number;
  lower: number[];
  upper: number[];
  /**
   * ln D at the natural logarithm of a loading time in s. Writes ∂ln D/∂parameter into `gradient` from `offset`
   * where it is given.
   */
  lnCompliance(
    parameters: ArrayLike<number>,
    lnTime: number,
    gradient?: Float64Array | null,
    offset?: number,
  ): number;
  /** ∂ln D/∂ln t there: the slope of the curve on logarithmic axes. */
  slope(parameters: ArrayLike<number>, lnTime: number): number;
  /** The published parameters, each with its logarithm and that one's gradient in the fitted ones. */
  published(parameters: ArrayLike<number>): PublishedParameter[];
  /** τ of each term of a Prony series, s; fixed before the fit. */
  retardationTimes: number[];
  /** Of the power law: ln of the time at which its second parameter is the growth. */
  lnCentre: number;
}

export interface PublishedParameter {
  /** `D0`, `D∞`, `τ`, `n`, `D1`, `m`. */
  symbol: string;
  unit: string;
  value: number;
  gradient: number[];
}

/** What the points span; everything in natural logarithms. */
export interface PointSpan {
  lnFrom: number;
  lnTo: number;
  lnLeast: number;
  lnMost: number;
  /** Different loading times. */
  timeCount: number;
}

export function creepModel(name: CreepModelName, span: PointSpan): CreepModel {
  if (name === 'sigmoid') return sigmoid(span);
  return name === 'power' ? powerLaw(span) : prony(span);
}

/** A model as a stored fit needs it: without bounds, which only a new fit would ask for. */
export function storedModel(stored: {
  model: CreepModelName;
  retardationTimes: readonly number[];
  lnCentre: number;
}): CreepModel {
  const free = { lnFrom: 0, lnTo: 0, lnLeast: 0, lnMost: 0, timeCount: 0 };
  if (stored.model === 'sigmoid') return sigmoid(free);
  return stored.model === 'power'
    ? powerLaw(free, stored.lnCentre)
    : pronyWith(free, [...stored.retardationTimes]);
}

const DECADE = Math.LN10;

/** Parameters ln D0, ln(D∞ − D0), ln τ, ln n: in them 0 < D0 < D∞, τ > 0 and n > 0 always hold. */
function sigmoid({ lnFrom, lnTo, lnLeast, lnMost }: PointSpan): CreepModel {
  return {
    name: 'sigmoid',
    parameterCount: 4,
    lower: [lnLeast - 4 * DECADE, lnLeast - 9 * DECADE, lnFrom - 6 * DECADE, ln(0.02)],
    upper: [lnMost, lnMost + 6 * DECADE, lnTo + 12 * DECADE, ln(5)],
    lnCompliance(p, lnTime, gradient = null, offset = 0) {
      const D0 = exp(p[0]!);
      const growth = exp(p[1]!);
      const n = exp(p[3]!);
      const share = shareOf(n * (lnTime - p[2]!));
      const D = D0 + growth * share;
      if (gradient !== null) {
        const moving = (growth * share * (1 - share)) / D;
        gradient[offset] = D0 / D;
        gradient[offset + 1] = (growth * share) / D;
        gradient[offset + 2] = -moving * n;
        gradient[offset + 3] = moving * n * (lnTime - p[2]!);
      }
      return ln(D);
    },
    slope(p, lnTime) {
      const n = exp(p[3]!);
      const share = shareOf(n * (lnTime - p[2]!));
      const growth = exp(p[1]!);
      return (n * growth * share * (1 - share)) / (exp(p[0]!) + growth * share);
    },
    published(p) {
      const D0 = exp(p[0]!);
      const Dinf = D0 + exp(p[1]!);
      return [
        { symbol: 'D0', unit: '1/GPa', value: D0, gradient: [1, 0, 0, 0] },
        { symbol: 'D∞', unit: '1/GPa', value: Dinf, gradient: [D0 / Dinf, 1 - D0 / Dinf, 0, 0] },
        { symbol: 'τ', unit: 's', value: exp(p[2]!), gradient: [0, 0, 1, 0] },
        { symbol: 'n', unit: '1', value: exp(p[3]!), gradient: [0, 0, 0, 1] },
      ];
    },
    retardationTimes: [],
    lnCentre: 0,
  };
}

/** x/(1 + x) of x = (t/τ)^n, given ln x, without leaving the range of numbers. */
function shareOf(lnX: number): number {
  const small = exp(-Math.abs(lnX));
  return lnX > 0 ? 1 / (1 + small) : small / (1 + small);
}

/**
 * Parameters ln D0, ln of the growth at the middle of the tested times, ln m. The growth there hardly depends on m,
 * where D1, the growth at 1 s, would.
 */
function powerLaw({ lnFrom, lnTo, lnLeast, lnMost }: PointSpan, lnCentre = (lnFrom + lnTo) / 2): CreepModel {
  return {
    name: 'power',
    parameterCount: 3,
    lower: [lnLeast - 6 * DECADE, lnLeast - 9 * DECADE, ln(0.005)],
    upper: [lnMost, lnMost + 2 * DECADE, ln(3)],
    lnCompliance(p, lnTime, gradient = null, offset = 0) {
      const D0 = exp(p[0]!);
      const m = exp(p[2]!);
      const growth = exp(p[1]! + m * (lnTime - lnCentre));
      const D = D0 + growth;
      if (gradient !== null) {
        gradient[offset] = D0 / D;
        gradient[offset + 1] = growth / D;
        gradient[offset + 2] = (growth / D) * m * (lnTime - lnCentre);
      }
      return ln(D);
    },
    slope(p, lnTime) {
      const m = exp(p[2]!);
      const growth = exp(p[1]! + m * (lnTime - lnCentre));
      return (m * growth) / (exp(p[0]!) + growth);
    },
    published(p) {
      const m = exp(p[2]!);
      return [
        { symbol: 'D0', unit: '1/GPa', value: exp(p[0]!), gradient: [1, 0, 0] },
        {
          symbol: 'D1',
          unit: '1/GPa',
          value: exp(p[1]! - m * lnCentre),
          gradient: [0, 1, -m * lnCentre],
        },
        { symbol: 'm', unit: '1', value: m, gradient: [0, 0, 1] },
      ];
    },
    retardationTimes: [],
    lnCentre,
  };
}

/**
 * Retardation times are chosen, not fitted: one a decade from the first tested time to one decade beyond the last,
 * fewer where there are too few loading times. The one beyond lets the band open where no test reaches.
 */
function prony(span: PointSpan): CreepModel {
  const decades = Math.max((span.lnTo - span.lnFrom) / DECADE, 0.1);
  const count = Math.max(2, Math.min(Math.round(decades) + 2, span.timeCount - 2));
  const last = span.lnTo + DECADE;
  return pronyWith(
    span,
    Array.from({ length: count }, (_, i) => exp(span.lnFrom + ((last - span.lnFrom) * i) / (count - 1))),
  );
}

function pronyWith({ lnLeast, lnMost }: PointSpan, retardationTimes: number[]): CreepModel {
  const terms = retardationTimes.length;
  return {
    name: 'prony',
    parameterCount: terms + 1,
    lower: [lnLeast - 6 * DECADE, ...retardationTimes.map(() => lnLeast - 6 * DECADE)],
    upper: [lnMost, ...retardationTimes.map(() => lnMost + 3 * DECADE)],
    lnCompliance(p, lnTime, gradient = null, offset = 0) {
      const t = exp(lnTime);
      let D = exp(p[0]!);
      for (let i = 0; i < terms; i += 1) D -= exp(p[i + 1]!) * expm1(-t / retardationTimes[i]!);
      if (gradient !== null) {
        gradient[offset] = exp(p[0]!) / D;
        for (let i = 0; i < terms; i += 1) {
          gradient[offset + i + 1] = (-exp(p[i + 1]!) * expm1(-t / retardationTimes[i]!)) / D;
        }
      }
      return ln(D);
    },
    slope(p, lnTime) {
      const t = exp(lnTime);
      let D = exp(p[0]!);
      let rate = 0;
      for (let i = 0; i < terms; i += 1) {
        const x = t / retardationTimes[i]!;
        D -= exp(p[i + 1]!) * expm1(-x);
        rate += exp(p[i + 1]!) * x * exp(-x);
      }
      return rate / D;
    },
    published(p) {
      return Array.from({ length: terms + 1 }, (_, i) => ({
        symbol: i === 0 ? 'D0' : `D${i}`,
        unit: '1/GPa',
        value: exp(p[i]!),
        gradient: Array.from({ length: terms + 1 }, (_, k) => (k === i ? 1 : 0)),
      }));
    },
    retardationTimes,
    lnCentre: 0,
  };
}
