import type { CreepFit } from '../calculations/creep-fit';
import { numberWords } from '../rule-sets/words';
import type { CreepAnalysis, CreepAnalysisPoint, CreepCurve, CreepMasterCurve } from './creep-analysis';
import { fitsOf, masterOf } from './creep-fits';
import { decadeWords, fittable } from './creep-fitted-value';
import { type CreepPoint, cellOf, creepPoints, inOrder } from './creep-points';
import { remarksOf } from './creep-remarks';
import { naturalOrder } from './natural-order';
import type { World } from './world';

/** The creep tests of the design by the contractor: their points, curves and master curve. No limits enter here. */
export function analyseCreep(world: World): CreepAnalysis {
  const kept = analyses.get(world.record);
  if (kept !== undefined) return kept;
  try {
    const analysis = analysed(world);
    analyses.set(world.record, analysis);
    return analysis;
  } catch (error) {
    const detail = error instanceof Error ? error.message : String(error);
    const problem = `An internal error occurred while the creep tests were analysed: ${detail}`;
    return [{ ...NOTHING_ANALYSED, problems: [problem] }];
  }
}

/** No rule enters: judged by several editions, a record has one analysis. */
const analyses = new WeakMap<World['record'], CreepAnalysis>();

const NOTHING_ANALYSED: CreepCurve = {
  kind: 'curve',
  temperature: null,
  stress: null,
  stresses: [],
  method: null,
  specimens: [],
  points: [],
  fits: [],
  remarks: [],
  problems: [],
};

function analysed(world: World): CreepAnalysis {
  const points = creepPoints(world).filter(
    ({ at }) => (at.trial ?? 'design') === 'design' && (at.laboratory ?? 'contractor') === 'contractor',
  );
  if (points.length === 0) return [];
  const temperatures = byTemperature(points);
  const pooled = temperatures.map((group) => curveOf(group, null));
  const curves = temperatures.flatMap((group, i) => {
    const { stresses } = pooled[i]!;
    const single = stresses.length < 2 ? [] : stresses.map((stress) => curveOf(group, stress));
    return [pooled[i]!, ...single];
  });
  const master = masterCurveOf(pooled);
  return master === null ? curves : [...curves, master];
}

interface TemperatureGroup {
  temperature: number | null;
  points: CreepPoint[];
}

/** Readings within 0.5 °C of their middle belong to one test temperature. */
function byTemperature(points: CreepPoint[]): TemperatureGroup[] {
  const stated = points.filter(({ at }) => at.temperature !== undefined);
  const ordered = stated.toSorted((a, b) => a.at.temperature! - b.at.temperature!);
  const groups: CreepPoint[][] = [];
  for (const point of ordered) {
    const open = groups.at(-1);
    const first = open?.[0]?.at.temperature;
    if (open && first !== undefined && point.at.temperature! - first <= 1 + 1e-9) open.push(point);
    else groups.push([point]);
  }
  const without = points.filter(({ at }) => at.temperature === undefined);
  return [
    ...groups.map((group) => ({ temperature: middleTemperature(group), points: group })),
    ...(without.length > 0 ? [{ temperature: null, points: without }] : []),
  ];
}

function middleTemperature(group: CreepPoint[]): number {
  const temperatures = group.map(({ at }) => at.temperature!);
  return Number(temperatures[Math.floor((temperatures.length - 1) / 2)]!.toFixed(1)) + 0;
}

function curveOf({ temperature, points }: TemperatureGroup, stress: number | null): CreepCurve {
  const own = stress === null ? points : points.filter(({ at }) => at.stress === stress);
  const used = fittable(own)
    .filter(({ qualifier }) => qualifier === null)
    .toSorted(inOrder);
  const fits = fitsOf(used.map(({ at, value }) => ({ t: at.time!, D: value! })));
  const problems = new Set(own.flatMap(({ fault }) => fault ?? []));
  if (used.length > 0 && !fits[0]!.ok) problems.add(`No curve is fitted: ${fits[0]!.reason}.`);
  if (own.some(({ qualifier }) => qualifier !== null)) {
    problems.add('Values that are only known as a bound enter no curve.');
  }
  const levels = new Set(own.flatMap(({ at }) => at.stress ?? []));
  const stresses = [...levels].toSorted((a, b) => a - b);
  const methods = new Set(own.flatMap(({ evidence }) => methodOf(evidence)));
  return {
    kind: 'curve',
    temperature,
    stress:
      stress ??
      (stresses.length === 1 && own.every(({ at }) => at.stress !== undefined) ? stresses[0]! : null),
    stresses,
    method: methods.size === 1 ? [...methods][0]! : null,
    specimens: [...new Set(used.flatMap(({ specimen }) => specimen ?? []))].toSorted(naturalOrder),
    points: used.map(presented),
    fits: fits.flatMap((fit) => (fit.ok ? [{ ...fit.fit, words: fitWords(fit.fit) }] : [])),
    remarks: remarksOf(used.map(presented)),
    problems: [...problems],
  };
}

function methodOf(evidence: CreepPoint['evidence']): string[] {
  if (evidence.method !== undefined) return [evidence.method];
  return (evidence.inputs ?? []).flatMap(methodOf);
}

function presented({ at, specimen, value, count, evidence }: CreepPoint): CreepAnalysisPoint {
  return {
    specimen,
    temperature: at.temperature ?? null,
    time: at.time!,
    stress: at.stress ?? null,
    value: value!,
    count,
    origin: evidence.origin,
    source: cellOf(evidence),
  };
}

/** Why a parameter says little, and what that means. */
export function fitWords(fit: CreepFit): string[] {
  const words: string[] = [];
  if (fit.rejected !== null) words.push(`The fit is rejected: ${fit.rejected}.`);
  const loose = fit.parameters.filter(({ held }) => !held).map(({ symbol }) => symbol);
  if (fit.model === 'sigmoid' && fit.tauDecadesBeyond !== null && fit.tauDecadesBeyond > 0) {
    const tau = fit.parameters.find(({ symbol }) => symbol === 'τ')!.value;
    const [side, end] = tau > fit.window.to ? ['beyond', 'D∞'] : ['before', 'D0'];
    words.push(
      `τ lies ${decadeWords(fit.tauDecadesBeyond)} ${side} the tested times, so ${end} and τ are held by the shape of the curve, not by tested points.`,
    );
  } else if (loose.length > 0) {
    words.push(`No tested point holds ${loose.join(', ')}: the interval is wider than a factor of two.`);
  }
  if (fit.steep)
    words.push('n is above 1: the curve has no positive retardation spectrum and no relaxation modulus.');
  return words;
}

function masterCurveOf(curves: readonly CreepCurve[]): CreepMasterCurve | null {
  const series = curves.flatMap(({ temperature, points }) =>
    temperature === null || new Set(points.map(({ time }) => time)).size < 2 ? [] : [{ temperature, points }],
  );
  if (series.length < 2) return null;
  const result = masterOf(
    series.map(({ temperature, points }) => ({
      temperature,
      points: points.map(({ time, value }) => ({ t: time, D: value })),
    })),
  );
  if (!result.ok) return null;
  const { referenceTemperature, shifts, fit } = result.master;
  const apart = shifts.filter(({ overlaps }) => !overlaps);
  return {
    kind: 'master-curve',
    referenceTemperature,
    shifts,
    points: series
      .toSorted((a, b) => a.temperature - b.temperature)
      .flatMap(({ temperature, points }) => points.map((point) => ({ ...point, temperature }))),
    fit: { ...fit, words: fitWords(fit) },
    problems: apart.map(
      ({ temperature }) =>
        `The compliances at ${numberWords(temperature)} °C overlap with no other temperature's: only the form of the curve holds their shift.`,
    ),
  };
}
