import type { Conditions } from '../record';
import type { CreepComplianceMeasure } from '../rule-sets/measure';
import { numberWords, orList } from '../rule-sets/words';
import { CREEP_QUANTITIES, type CreepPoint, creepPoints } from './creep-points';
import { doubtAbout } from './doubts';
import { notShown, type Obstacle, undecided } from './obstacle';
import { inScope } from './scope';
import { select } from './select';
import { applyWhere } from './where';
import type { World } from './world';

/** The points of the tests that a rule names: its temperature, its stress where it names one. */
export function selectCreepPoints(
  world: World,
  measure: CreepComplianceMeasure,
): { ok: true; points: CreepPoint[] } | Obstacle {
  const candidates = creepPoints(world);
  const label = 'creep compliance';
  const inside = inScope({ world, quantity: 'creep-compliance', label, wanted: {}, candidates });
  if (!inside.ok) return inside;
  const { temperature, stress } = measure;
  const wanted = stress === undefined ? { temperature } : { temperature, stress };
  // Loading time is looked at afterwards, and levels of stress are pooled where the rule names none.
  const tests = inside.chosen.map((point) => ({
    point,
    at: testConditions(point.at, stress !== undefined),
  }));
  const selected = select({ world, candidates: tests, wanted, label, preferPlain: false });
  if (!selected.ok) return selected;
  const points = selected.chosen.map(({ point }) => point);
  const timed = points.filter(({ at, fault }) => at.time !== undefined || fault !== null);
  if (timed.length === 0)
    return undecided(
      'Readings of creep compliance do not say the loading time.',
      'State the loading time of each reading.',
    );
  return whereMet(world, measure, timed);
}

/** Specimens that the rule's conditions leave out, left out. */
function whereMet(
  world: World,
  measure: CreepComplianceMeasure,
  points: CreepPoint[],
): { ok: true; points: CreepPoint[] } | Obstacle {
  const { where } = measure;
  if (where === undefined || where.length === 0) return { ok: true, points };
  const specimens = [...new Set(points.map(({ specimen }) => specimen))];
  const items = specimens.map((specimen) => ({
    specimen,
    value: null,
    qualifier: null,
    at: specimen === null ? {} : { specimen },
    evidence: points.find((point) => point.specimen === specimen)!.evidence,
  }));
  const sample = { items, meanOnly: false, count: items.length, interpolated: false, recomputed: null };
  const kept = applyWhere(world, { quantity: 'creep-compliance', at: {}, where }, sample);
  if (!kept.ok) return kept;
  const left = new Set(kept.items.map(({ specimen }) => specimen));
  const chosen = points.filter(({ specimen }) => left.has(specimen));
  return chosen.length > 0
    ? { ok: true, points: chosen }
    : notShown('No specimen of creep compliance meets the conditions under which it counts.');
}

/** The points at the rule's loading time, within 1 %. */
export function testedAt(points: readonly CreepPoint[], time: number): CreepPoint[] {
  return points.filter(({ at }) => at.time !== undefined && isTime(at.time, time));
}

/** Loading times match within 1 %; a whisker more, for binary arithmetic. */
export function isTime(tested: number, asked: number): boolean {
  return Math.abs(tested - asked) <= asked * (0.01 + 1e-12);
}

/** Where nothing was tested at the rule's time: which times were. */
export function testedWords(points: readonly CreepPoint[]): string {
  const times = [...new Set(points.flatMap(({ at }) => at.time ?? []))].toSorted((a, b) => a - b);
  const [first] = times;
  const last = times.at(-1);
  if (first === undefined || last === undefined) return 'at no stated loading time';
  if (times.length <= 3) return `at ${orList(times.map((time) => `${numberWords(time)} s`))}`;
  return `at ${times.length} loading times from ${numberWords(first)} to ${numberWords(last)} s`;
}

/**
 * Why the compliance is doubtful, or null: an unanswered doubt about a reading that would count, or about a dimension
 * behind one, with no sure reading in its place. `time` is given where only one loading time is judged.
 */
export function creepDoubt(
  world: World,
  measure: CreepComplianceMeasure,
  points: readonly CreepPoint[],
  time: number | null,
): Obstacle | null {
  if (world.record.doubts.length === 0) return null;
  const at: Conditions = {
    temperature: measure.temperature,
    ...(measure.stress === undefined ? {} : { stress: measure.stress }),
    ...(time === null ? {} : { time }),
  };
  // What the workbook states does not matter where everything was computed from rawer readings.
  const computed = points.length > 0 && points.every(({ evidence }) => evidence.formula !== undefined);
  const tested = CREEP_QUANTITIES.filter((quantity) => !(computed && quantity === 'creep-compliance'));
  const dimensions = DIMENSIONS.filter((quantity) =>
    points.some(({ evidence }) => restsOn(evidence, quantity)),
  );
  const requests = [
    ...tested.map((quantity) => ({ quantity, at })),
    ...dimensions.map((quantity) => ({ quantity, at: {} })),
  ];
  for (const request of requests) {
    const doubt = doubtAbout(world, request, AS_READ);
    if (doubt !== null) return doubt;
  }
  return null;
}

/** Only the quantity itself is asked about, not what it could be derived from. */
const AS_READ = { items: [], meanOnly: false, count: 0, interpolated: false, recomputed: null };

const DIMENSIONS = ['specimen-thickness', 'specimen-diameter', 'creep-load', 'gauge-length'];

function restsOn(evidence: CreepPoint['evidence'], quantity: string): boolean {
  return evidence.quantity === quantity || (evidence.inputs ?? []).some((input) => restsOn(input, quantity));
}

function testConditions(at: Conditions, keepStress: boolean): Conditions {
  const { time: _time, stress, ...others } = at;
  return keepStress && stress !== undefined ? { ...others, stress } : others;
}
