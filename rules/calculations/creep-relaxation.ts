import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';
import { exp, log10, power, squared } from '../numerics/transcendental';
import type { PronyParameters } from './creep-compliance';

/** E∞ and each Ej in GPa, each ρj in s: a generalised Maxwell model. */
export interface MaxwellParameters {
  Einf: number;
  terms: { E: number; rho: number }[];
}

/**
 * Relaxation modulus of the material that a Voigt series describes, exactly, as a generalised Maxwell model.
 *
 * In the Laplace transform (times s) the two are reciprocal: 1/(D0 + ΣDi/(1 + s·τi)) = E∞ + ΣEj·s·ρj/(1 + s·ρj).
 * The zeros of the left denominator lie one between each two poles −1/τi and one beyond the last; ρj = −1/sj, and
 * Ej = 1/(sj·f′(sj)) of f the denominator.
 * Source: textbook linear viscoelasticity; Park and Schapery, Int. J. Solids Structures 36 (1999), from memory,
 * verify. Domain: a solid (no flow term) with D0 above zero and every Di above zero at different τi.
 *
 * @example voigtToMaxwell({ D0: 1, terms: [{ D: 1, tau: 1 }], viscosity: null }) // E∞ 0.5, E1 0.5, ρ1 0.5
 */
export function voigtToMaxwell({
  D0,
  terms,
  viscosity,
}: PronyParameters): { ok: true; maxwell: MaxwellParameters } | { ok: false; reason: string } {
  if (viscosity !== null) return cannot('a series with a flow term is no solid');
  const fault = unusable({ D0 }, 'positive');
  if (fault) return cannot(fault);
  for (const { D, tau } of terms) {
    const ofTerm = unusable({ Di: D, τi: tau }, 'positive');
    if (ofTerm) return cannot(ofTerm);
  }
  const ordered = terms.toSorted((a, b) => b.tau - a.tau);
  if (ordered.some(({ tau }, i) => tau === ordered[i + 1]?.tau)) {
    return cannot('two terms have the same retardation time');
  }
  const total = ordered.reduce((sum, { D }) => sum + D, D0);
  const converted = ordered.map(({ tau }, i) => {
    const rate = zeroBetween(D0, ordered, 1 / tau, ordered[i + 1] ? 1 / ordered[i + 1]!.tau : null);
    const slope = ordered.reduce((sum, each) => sum - (each.D * each.tau) / squared(1 - rate * each.tau), 0);
    return { E: 1 / (-rate * slope), rho: 1 / rate };
  });
  return { ok: true, maxwell: { Einf: 1 / total, terms: converted } };
}

/**
 * Relaxation modulus of a generalised Maxwell model, GPa. E(t) = E∞ + ΣEj·exp(−t/ρj).
 *
 * Source: textbook linear viscoelasticity. Domain: t not below zero.
 *
 * @example relaxationModulus({ Einf: 0.5, terms: [{ E: 0.5, rho: 0.5 }] }, 0) // 1 GPa
 */
export function relaxationModulus({ Einf, terms }: MaxwellParameters, t: number): NumericResult {
  const fault = unusable({ t });
  if (fault) return cannot(fault);
  if (t < 0) return cannot('t is below zero');
  return known(terms.reduce((sum, { E, rho }) => sum + E * exp(-t / rho), Einf));
}

/**
 * Relaxation modulus at increasing times from a compliance known as a function, GPa: numerical inversion of
 * ∫E(t − s)·dD(s) = 1.
 *
 * The convolution is written as a sum over intervals within which E stands still, E of the latest follows from the
 * earlier ones: E = (t − ΣEi·[F(t − ti) − F(t − ti+1)])/F(t − tn) with F(t) = ∫D. It ends within a few tenths of a
 * percent with the 40 intervals a decade that are used here.
 * Source: Hopkins and Hamming, J. Applied Physics 28 (1957); from memory, verify. Domain: D above zero and growing,
 * with a positive retardation spectrum: the sigmoid only with n ≤ 1 (beyond it 1/(1 + x^n) is not completely
 * monotonic), the power law only with D0 > 0 and m ≤ 1. `isConvertible` says which; others are refused.
 */
export function relaxationByInversion(
  compliance: (time: number) => NumericResult,
  { from, to }: { from: number; to: number },
): { ok: true; points: { time: number; E: number }[] } | { ok: false; reason: string } {
  const fault = unusable({ from, to }, 'positive');
  if (fault) return cannot(fault);
  if (to <= from) return cannot('the last time must lie after the first');
  const times = [0, ...grid(from / 1000, to)];
  const integral = integralOf(compliance, times);
  if (!integral.ok) return integral;
  const F = integral.at;
  const moduli: number[] = [];
  for (let n = 1; n < times.length; n += 1) {
    const t = times[n]!;
    let used = 0;
    for (let i = 0; i < n - 1; i += 1) used += moduli[i]! * (F(t - times[i]!) - F(t - times[i + 1]!));
    moduli.push((t - used) / F(t - times[n - 1]!));
  }
  const points = moduli.map((E, i) => ({
    time: Math.sqrt(times[i + 1]! * Math.max(times[i]!, from / 2000)),
    E,
  }));
  if (points.some(({ E }) => !Number.isFinite(E) || E <= 0)) return cannot('the inversion does not hold');
  return { ok: true, points: points.filter(({ time }) => time >= from && time <= to) };
}

/** Why a fitted model has no relaxation modulus, or null where it has one. */
export function whyNotConvertible(
  model: { model: 'sigmoid'; n: number } | { model: 'power'; D0: number; m: number } | { model: 'prony' },
): string | null {
  if (model.model === 'sigmoid' && model.n > 1) {
    return 'n is above 1: the curve has no positive retardation spectrum';
  }
  if (model.model === 'power' && model.m > 1)
    return 'm is above 1: the curve has no positive retardation spectrum';
  if (model.model === 'power' && !(model.D0 > 0)) return 'D0 is not above zero: the modulus has no start';
  return null;
}

const INTERVALS_A_DECADE = 40;

function grid(from: number, to: number): number[] {
  const count = Math.ceil(INTERVALS_A_DECADE * log10(to / from));
  return Array.from({ length: count + 1 }, (_, i) => from * power(to / from, i / count));
}

/** ∫D as a function, by Simpson's rule between the times of a fine grid and the same rule for what is left. */
function integralOf(
  compliance: (time: number) => NumericResult,
  times: readonly number[],
): { ok: true; at: (time: number) => number } | { ok: false; reason: string } {
  const valueAt = (time: number) => {
    const value = compliance(time);
    return value.ok ? value.value : Number.NaN;
  };
  const simpson = (a: number, b: number) =>
    ((b - a) / 6) * (valueAt(a) + 4 * valueAt((a + b) / 2) + valueAt(b));
  const sums = [0];
  for (let i = 1; i < times.length; i += 1) sums.push(sums[i - 1]! + simpson(times[i - 1]!, times[i]!));
  if (!sums.every(Number.isFinite)) return cannot('the compliance is not known at every time');
  return {
    ok: true,
    at: (time) => {
      let low = 0;
      let high = times.length - 1;
      while (high - low > 1) {
        const middle = (low + high) >> 1;
        if (times[middle]! <= time) low = middle;
        else high = middle;
      }
      return sums[low]! + simpson(times[low]!, Math.max(time, 0));
    },
  };
}

/** The rate x = −s at which D0 + ΣDi/(1 − x·τi) vanishes between two poles, or beyond the last. */
function zeroBetween(
  D0: number,
  terms: readonly { D: number; tau: number }[],
  from: number,
  to: number | null,
): number {
  const f = (x: number) => terms.reduce((sum, { D, tau }) => sum + D / (1 - x * tau), D0);
  let low = from;
  let high = to ?? from * 2;
  while (to === null && f(high) < 0) high *= 2;
  for (let step = 0; step < 200; step += 1) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (f(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
