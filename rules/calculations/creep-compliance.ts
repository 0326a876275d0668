import { cannot, known, type NumericResult, unusable } from '../numerics/numeric-result';
import { expm1, ln, log10, power } from '../numerics/transcendental';

/**
 * Creep compliance from strain and stress, 1/GPa. D(t) = ε(t)/σ0.
 *
 * Symbols: ε strain at the loading time, µε; σ0 constant stress, kPa. µε over kPa is 10⁻⁶ over 10³ Pa, which is
 * 1/GPa exactly, so no factor is needed.
 * Source: definition of creep compliance. Domain: finite strain, stress above zero.
 *
 * @example complianceFromStrain({ strain: 42.6, stress: 400 }) // 0.1065 1/GPa
 */
export function complianceFromStrain({ strain, stress }: { strain: number; stress: number }): NumericResult {
  const fault = unusable({ ε: strain }) ?? unusable({ σ0: stress }, 'positive');
  return fault ? cannot(fault) : known(strain / stress);
}

/** D0 and D∞ in 1/GPa, τ in s, n without unit. */
export interface SigmoidParameters {
  D0: number;
  Dinf: number;
  tau: number;
  n: number;
}

/**
 * Creep compliance of a viscoelastic solid, 1/GPa. D(t) = D∞ + (D0 − D∞)/(1 + (t/τ)^n).
 *
 * Symbols: D0 glassy and D∞ long-term compliance, 1/GPa; τ s, at which D is half way between them; n slope.
 * Not the modified power law D0 + (D∞ − D0)/(1 + τ/t)^n, whose exponent stands outside the bracket.
 * Source: no published source found; the form that the rule sets name. Domain: t not below zero, 0 < D0 ≤ D∞
 * (equal: purely elastic), τ > 0, n > 0.
 *
 * @example sigmoidCompliance({ D0: 0.045, Dinf: 1.2, tau: 900, n: 0.55 }, 100) // 0.3106168 1/GPa
 */
export function sigmoidCompliance({ D0, Dinf, tau, n }: SigmoidParameters, t: number): NumericResult {
  const fault = unusable({ D0, 'D∞': Dinf, τ: tau, n }, 'positive') ?? timeFault(t);
  if (fault) return cannot(fault);
  if (Dinf < D0) return cannot('D∞ is below D0');
  const grown = power(t / tau, n);
  // For long times (t/τ)^n may leave the range of numbers, where D has long reached D∞.
  return known(Number.isFinite(grown) ? Dinf + (D0 - Dinf) / (1 + grown) : Dinf);
}

/** D0 in 1/GPa, D1 in 1/GPa at 1 s, m without unit. */
export interface PowerParameters {
  D0: number;
  D1: number;
  m: number;
}

/**
 * Creep compliance by the power law, 1/GPa. D(t) = D0 + D1·t^m.
 *
 * Symbols: D0 glassy compliance, 1/GPa; D1 creep compliance at 1 s, 1/GPa; m slope. With D0 = 0 and m = 1 it is
 * the purely viscous limit, D1·t.
 * Source: three-parameter power law; NCHRP 1-37A (2004), creep compliance D1·t^m; from memory, verify. Domain: t not
 * below zero, D0 ≥ 0, D1 > 0, m > 0.
 *
 * @example powerCompliance({ D0: 0, D1: 0.0588, m: 0.20101 }, 100) // 0.148386 1/GPa
 */
export function powerCompliance({ D0, D1, m }: PowerParameters, t: number): NumericResult {
  const fault = unusable({ D0 }) ?? unusable({ D1, m }, 'positive') ?? timeFault(t);
  if (fault) return cannot(fault);
  return D0 < 0 ? cannot('D0 is below zero') : known(D0 + D1 * power(t, m));
}

/** D0 and each Di in 1/GPa, each τi in s, η in GPa·s or null for a solid. */
export interface PronyParameters {
  D0: number;
  terms: readonly { D: number; tau: number }[];
  viscosity: number | null;
}

/**
 * Creep compliance of a generalised Voigt model (Prony series), 1/GPa. D(t) = D0 + ΣDi·(1 − exp(−t/τi)) + t/η.
 *
 * Symbols: D0 glassy compliance, Di and τi compliance and retardation time of each element, η viscosity of the
 * flow term, GPa·s.
 * Source: textbook linear viscoelasticity. Domain: t not below zero, D0 ≥ 0, Di ≥ 0, τi > 0, η > 0 where given.
 *
 * @example pronyCompliance({ D0: 0.04, terms: [[0.02, 1], [0.05, 10], [0.12, 100], [0.3, 1000]], viscosity: 20000 }, 100) // 0.219401
 */
export function pronyCompliance({ D0, terms, viscosity }: PronyParameters, t: number): NumericResult {
  const fault = unusable({ D0 }) ?? timeFault(t);
  if (fault) return cannot(fault);
  if (D0 < 0) return cannot('D0 is below zero');
  let sum = D0;
  for (const { D, tau } of terms) {
    const ofTerm = unusable({ Di: D }) ?? unusable({ τi: tau }, 'positive');
    if (ofTerm) return cannot(ofTerm);
    if (D < 0) return cannot('Di is below zero');
    sum -= D * expm1(-t / tau);
  }
  if (viscosity === null) return known(sum);
  const flow = unusable({ η: viscosity }, 'positive');
  return flow ? cannot(flow) : known(sum + t / viscosity);
}

/**
 * Log-log slope of compliance between two loading times. m = log(D2/D1)/log(t2/t1).
 *
 * Source: definition. Domain: compliances and times above zero, two different times.
 *
 * @example logLogSlope({ t: 10, D: 0.154142 }, { t: 100, D: 0.299132 }) // 0.28794
 */
export function logLogSlope(
  first: { t: number; D: number },
  second: { t: number; D: number },
): NumericResult {
  const fault = unusable({ t1: first.t, D1: first.D, t2: second.t, D2: second.D }, 'positive');
  if (fault) return cannot(fault);
  if (first.t === second.t) return cannot('a slope needs two different loading times');
  return known(ln(second.D / first.D) / ln(second.t / first.t));
}

/**
 * How far a loading time lies beyond the tested ones, in decades. log10 of the ratio to the nearest tested time; 0
 * within them.
 *
 * Source: definition. Domain: times above zero, from ≤ to.
 *
 * @example decadesBeyond(1000, { from: 1, to: 100 }) // 1
 */
export function decadesBeyond(time: number, { from, to }: { from: number; to: number }): NumericResult {
  const fault = unusable({ time, from, to }, 'positive');
  if (fault) return cannot(fault);
  if (time >= from && time <= to) return known(0);
  return known(time > to ? log10(time / to) : log10(from / time));
}

/**
 * Difference between two compliances, in percent of the smaller one. 100·|D2 − D1|/min(D1, D2). In a linear material
 * the compliance does not depend on the stress, and it is zero.
 *
 * Source: homogeneity of a linear material. Domain: both above zero.
 *
 * @example nonLinearityPercent(0.105, 0.1065) // 1.42857 %
 */
export function nonLinearityPercent(D1: number, D2: number): NumericResult {
  const fault = unusable({ D1, D2 }, 'positive');
  return fault ? cannot(fault) : known((100 * Math.abs(D2 - D1)) / Math.min(D1, D2));
}

/**
 * The first place at which a series of compliances falls with time, or null: under a constant load strain only
 * grows.
 *
 * Source: thermodynamics of a passive material. Domain: any points, in any order; equal values are no fall.
 *
 * @example firstFall([{ t: 1, D: 0.05 }, { t: 2, D: 0.06 }, { t: 5, D: 0.055 }]) // the pair at 2 s and 5 s
 */
export function firstFall<T extends { t: number; D: number }>(points: readonly T[]): [T, T] | null {
  const ordered = points.toSorted((a, b) => a.t - b.t);
  for (let i = 1; i < ordered.length; i += 1) {
    const [earlier, later] = [ordered[i - 1]!, ordered[i]!];
    if (later.t > earlier.t && later.D < earlier.D) return [earlier, later];
  }
  return null;
}

function timeFault(t: number): string | null {
  const fault = unusable({ t });
  return fault ?? (t < 0 ? 't is below zero' : null);
}
