import { mean } from '../numerics/mean';
import type { CreepComplianceMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { conditionWords, numberWords } from '../rule-sets/words';
import type { CreepPoint } from './creep-points';
import { selectCreepPoints, testedAt } from './creep-selection';
import { creepValue } from './creep-value';
import type { ToPass } from './explanation';
import type { Side } from './side-of-limit';
import { type Judging, judgingOf, sideIn } from './to-pass-judging';
import { type Moved, plausibleOf, said, search, stepOf } from './to-pass-search';
import type { World } from './world';

/**
 * A measured compliance: what the mean at the rule's time, or the specimen farthest out alone, would have to be, as
 * strain where the tests were read in strain. A fitted one: by what factor every compliance of the test would have to
 * change, which moves curve and bounds by the same factor.
 */
export function forCreep(world: World, rule: ResolvedRule, measure: CreepComplianceMeasure): ToPass[] {
  if (measure.where !== undefined) return [];
  const selected = selectCreepPoints(world, measure);
  const judging = judgingOf(world, rule, {}, OWN_UNIT);
  if (!selected.ok || !judging) return [];
  const test: Test = { judging, measure, points: selected.points };
  const value = creepValue({ measure, points: test.points, limit: judging.limit });
  if (!value.ok) return [];
  const [only, ...others] = value.judgeables;
  const isMeasured = only?.statistic === 'mean' && others.length === 0;
  if (!isMeasured) return byFactor(test);
  return only.judgeable.allowed === null ? ofMeasured(test, only.judgeable.value, value.count) : [];
}

const OWN_UNIT = '1/GPa';

interface Test {
  judging: Judging;
  measure: CreepComplianceMeasure;
  points: readonly CreepPoint[];
}

function ofMeasured(test: Test, present: number, count: number): ToPass[] {
  const atTime = testedAt(test.points, test.measure.time);
  const stress = commonStress(atTime);
  const whole = moved(test, { present, count, stress, specimen: null }, () => true);
  const specimens = new Map<string, number[]>();
  for (const { specimen, value, count: behind } of atTime) {
    if (specimen === null || value === null || behind > 1) return whole;
    specimens.set(specimen, [...(specimens.get(specimen) ?? []), value]);
  }
  if (specimens.size < 2) return whole;
  const side = sideOfPoints(test, test.points);
  const values = [...specimens].map(([specimen, own]) => ({ specimen, value: mean(own) }));
  const known = values.flatMap(({ specimen, value }) => (value.ok ? [{ specimen, value: value.value }] : []));
  const [farthest] = known.toSorted((a, b) => (side === 'below' ? a.value - b.value : b.value - a.value));
  if (farthest === undefined) return whole;
  const { specimen, value } = farthest;
  const alone = moved(
    test,
    { present: value, count: 1, stress, specimen },
    (point) => point.specimen === specimen,
  );
  return [...whole, ...alone];
}

interface What {
  present: number;
  count: number;
  /** kPa, where what was read is strain under it. */
  stress: number | null;
  specimen: string | null;
}

function moved(
  test: Test,
  { present, count, stress, specimen }: What,
  isMoved: (point: CreepPoint) => boolean,
): ToPass[] {
  const { judging, measure } = test;
  const { world } = judging;
  const quantity = stress === null ? 'creep-compliance' : 'creep-strain';
  const factor = stress ?? 1;
  const entry = world.view.quantity(quantity);
  const at = {
    temperature: measure.temperature,
    time: measure.time,
    ...(stress === null ? {} : { stress }),
    ...(specimen === null ? {} : { specimen }),
  };
  const atTime = new Set(testedAt(test.points, measure.time).filter(isMoved));
  // µε of a stress in kPa is 1/GPa.
  const pointsWith = (value: number) =>
    test.points.map((point) => (atTime.has(point) ? { ...point, value: value / factor } : point));
  const own = present * factor;
  const step = stepOf(world, quantity, []);
  const way = search({
    present: own,
    step,
    plausible: plausibleOf(world, quantity),
    valueAt: (value) => (value > 0 ? measuredMean(test, pointsWith(value)) : null),
    sideOf: (value) => sideIn(judging, value),
  });
  if (way === null) return [];
  const name = `${entry?.label ?? quantity}${conditionWords(at)}`;
  const what: Moved = { quantity, name, unit: entry?.unit ?? '1', present: own, step, count, ...way };
  return [said(what)];
}

function measuredMean({ measure, judging }: Test, points: readonly CreepPoint[]): number | null {
  const value = creepValue({ measure, points, limit: judging.limit });
  return value.ok ? (value.judgeables[0]?.judgeable.value ?? null) : null;
}

/** The stress under which every specimen was strained, or null where they were not or it differs. */
function commonStress(points: readonly CreepPoint[]): number | null {
  const [first] = points;
  const stress = first?.at.stress;
  if (stress === undefined || !(stress > 0)) return null;
  return points.every(({ evidence, at }) => evidence.formula === 'εt/σ0' && at.stress === stress)
    ? stress
    : null;
}

function byFactor(test: Test): ToPass[] {
  const { judging, measure, points } = test;
  const value = creepValue({ measure, points, limit: judging.limit });
  if (!value.ok) return [];
  const sideAt = (factor: number) =>
    worstSide(value.judgeables.map(({ judgeable }) => sideIn(judging, judgeable.value * factor)));
  const step = 0.01;
  const way = search({
    present: 1,
    step,
    plausible: { min: step, max: 100 },
    valueAt: (factor) => factor,
    sideOf: (factor) => (factor === null ? 'below' : sideAt(factor)),
  });
  if (way === null) return [];
  const near = way.from !== null && way.from > 1 ? way.from : way.to;
  // The curve is fitted again through the moved points: what is said has been seen to pass.
  if (near === null || sideOfPoints(test, scaled(points, near)) !== 'inside') return [];
  const { from, to } = way;
  const two = (factor: number) => numberWords(factor, 2);
  const range =
    from === null
      ? `${two(near)} or less`
      : to === null
        ? `${two(near)} or more`
        : `${two(from)} to ${two(to)}`;
  const name = `every creep compliance${conditionWords({ temperature: measure.temperature })}`;
  const words = `${name} times ${range}`;
  return [{ quantity: 'creep-compliance', name, unit: '1', present: 1, from, to, words }];
}

function scaled(points: readonly CreepPoint[], factor: number): CreepPoint[] {
  return points.map((point) => (point.value === null ? point : { ...point, value: point.value * factor }));
}

function sideOfPoints({ judging, measure }: Test, points: readonly CreepPoint[]): Side | null {
  const value = creepValue({ measure, points, limit: judging.limit });
  return value.ok
    ? worstSide(value.judgeables.map(({ judgeable }) => sideIn(judging, judgeable.value)))
    : null;
}

/** The first that is outside: of two bounds the worse counts. */
function worstSide(sides: readonly Side[]): Side {
  return sides.find((side) => side !== 'inside') ?? 'inside';
}
