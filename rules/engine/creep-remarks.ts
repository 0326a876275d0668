import { firstFall, nonLinearityPercent } from '../calculations/creep-compliance';
import { numberWords } from '../rule-sets/words';
import type { CreepAnalysisPoint, CreepCurve } from './creep-analysis';

type Remark = CreepCurve['remarks'][number];

/** What is looked at before a curve is fitted: growth, linearity, scatter. */
export function remarksOf(points: readonly CreepAnalysisPoint[]): Remark[] {
  if (points.length === 0) return [];
  const remarks = [growth(points)];
  const linear = linearity(points);
  if (linear !== null) remarks.push(linear);
  const scatter = scatterAtEnd(points);
  if (scatter !== null) remarks.push(scatter);
  return remarks;
}

/** Two readings of one specimen under one stress, the later of which is the smaller. */
export interface Fall {
  specimen: string | null;
  earlier: CreepAnalysisPoint;
  later: CreepAnalysisPoint;
}

/** The first fall of each specimen under each stress. */
export function fallsOf(points: readonly CreepAnalysisPoint[]): Fall[] {
  const series = new Map<string, CreepAnalysisPoint[]>();
  for (const point of points) {
    const key = `${point.specimen}|${point.stress}`;
    const known = series.get(key);
    if (known) known.push(point);
    else series.set(key, [point]);
  }
  return [...series.values()].flatMap((own) => {
    const fall = firstFall(own.map((point) => ({ t: point.time, D: point.value, point })));
    if (fall === null) return [];
    return [{ specimen: own[0]!.specimen, earlier: fall[0].point, later: fall[1].point }];
  });
}

/** Two levels of stress agree within this, % of the smaller compliance; common practice, no source. */
export const LINEAR_WITHIN_PERCENT = 10;

export interface NonLinearity {
  low: number;
  high: number;
  time: number;
  percent: number;
  points: CreepAnalysisPoint[];
}

/** The largest difference between neighbouring levels of stress, at a loading time that both were read at. */
export function worstNonLinearity(points: readonly CreepAnalysisPoint[]): NonLinearity | null {
  const stresses = [...new Set(points.flatMap(({ stress }) => stress ?? []))].toSorted((a, b) => a - b);
  const times = new Set(points.map(({ time }) => time));
  let worst: NonLinearity | null = null;
  for (let i = 1; i < stresses.length; i += 1) {
    const [low, high] = [stresses[i - 1]!, stresses[i]!];
    for (const time of times) {
      const at = (level: number) => points.filter((point) => point.time === time && point.stress === level);
      const [lower, upper] = [at(low), at(high)];
      const means = comparableMeans(lower, upper);
      const percent = means === null ? null : nonLinearityPercent(...means);
      if (!percent?.ok || (worst !== null && percent.value <= worst.percent)) continue;
      worst = { low, high, time, percent: percent.value, points: [...lower, ...upper] };
    }
  }
  return worst;
}

/** Means over the specimens that were tested under both; over all where no specimen was. */
function comparableMeans(
  low: readonly CreepAnalysisPoint[],
  high: readonly CreepAnalysisPoint[],
): [number, number] | null {
  if (low.length === 0 || high.length === 0) return null;
  const ofHigh = new Set(high.flatMap(({ specimen }) => specimen ?? []));
  const both = new Set(low.flatMap(({ specimen }) => specimen ?? []).filter((each) => ofHigh.has(each)));
  const mean = (points: readonly CreepAnalysisPoint[]) => {
    const chosen =
      both.size === 0 ? points : points.filter(({ specimen }) => specimen !== null && both.has(specimen));
    return chosen.reduce((sum, { value }) => sum + value, 0) / chosen.length;
  };
  return [mean(low), mean(high)];
}

function growth(points: readonly CreepAnalysisPoint[]): Remark {
  const [fall] = fallsOf(points);
  if (fall === undefined) return { holds: true, text: 'Compliance rises with every reading' };
  const of = fall.specimen === null ? '' : ` of specimen ${fall.specimen}`;
  const between = `${numberWords(fall.earlier.time)} and ${numberWords(fall.later.time)} s`;
  return { holds: false, text: `Compliance${of} falls between ${between}` };
}

function linearity(points: readonly CreepAnalysisPoint[]): Remark | null {
  const worst = worstNonLinearity(points);
  if (worst === null) return null;
  const levels = `${numberWords(worst.low)} and ${numberWords(worst.high)} kPa`;
  const amount = `${percentWords(worst.percent)} %`;
  return worst.percent <= LINEAR_WITHIN_PERCENT
    ? { holds: true, text: `Linear: ${levels} agree within ${amount}` }
    : { holds: false, text: `Not linear: ${levels} differ by ${amount}` };
}

function scatterAtEnd(points: readonly CreepAnalysisPoint[]): Remark | null {
  const last = Math.max(...points.map(({ time }) => time));
  const ended = points.filter(({ time, specimen }) => time === last && specimen !== null);
  if (new Set(ended.map(({ specimen }) => specimen)).size < 2) return null;
  const average = ended.reduce((sum, { value }) => sum + value, 0) / ended.length;
  const away = Math.max(...ended.map(({ value }) => (100 * Math.abs(value - average)) / average));
  const within = Math.max(1, Math.ceil(away));
  return { holds: true, text: `Specimens within ${within} % of their mean at ${numberWords(last)} s` };
}

/** Two significant digits. */
export function percentWords(percent: number): string {
  return numberWords(Number(percent.toPrecision(2)));
}
