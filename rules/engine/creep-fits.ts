import { type CreepFitResult, fitCreep } from '../calculations/creep-fit';
import { masterCurve, type TemperatureSeries } from '../calculations/creep-master-curve';
import type { CreepModelName } from '../calculations/creep-model';

/**
 * The fit of a model to points, once: rules of several times at one temperature, an old and a draft edition, and the
 * analysis itself all ask for the same curve. What is kept depends on nothing but the points.
 */
export function fitOf(model: CreepModelName, points: readonly { t: number; D: number }[]): CreepFitResult {
  return keptIn(fits, `${model} ${keyOf(points)}`, () => fitCreep(model, points));
}

/** The fits of every model to the same points. */
export function fitsOf(points: readonly { t: number; D: number }[]): CreepFitResult[] {
  const key = keyOf(points);
  return MODELS.map((model) => keptIn(fits, `${model} ${key}`, () => fitCreep(model, points)));
}

const MODELS: CreepModelName[] = ['sigmoid', 'power', 'prony'];

/** The master curve of several temperatures, once in the same way. */
export function masterOf(series: readonly TemperatureSeries[]): ReturnType<typeof masterCurve> {
  const key = series.map(({ temperature, points }) => `${temperature}: ${keyOf(points)}`).join('; ');
  return keptIn(masters, key, () => masterCurve(series));
}

function keptIn<T>(kept: Map<string, T>, key: string, compute: () => T): T {
  const known = kept.get(key);
  if (known !== undefined) return known;
  const value = compute();
  if (kept.size >= KEPT_FITS) kept.clear();
  kept.set(key, value);
  return value;
}

function keyOf(points: readonly { t: number; D: number }[]): string {
  return points.map(({ t, D }) => `${t},${D}`).join(' ');
}

const KEPT_FITS = 200;
const fits = new Map<string, CreepFitResult>();
const masters = new Map<string, ReturnType<typeof masterCurve>>();

export const MODEL_WORDS: Record<CreepModelName, string> = {
  sigmoid: 'sigmoid',
  power: 'power law',
  prony: 'Prony series',
};

export const MODEL_FORMULAS: Record<CreepModelName, string> = {
  sigmoid: 'D∞ + (D0 − D∞)/(1 + (t/τ)^n)',
  power: 'D0 + D1·t^m',
  prony: 'D0 + ΣDi·(1 − exp(−t/τi))',
};
