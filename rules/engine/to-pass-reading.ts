import { decimalsOf } from '../numerics/round';
import { range as rangeOf } from '../numerics/spread';
import type { Conditions } from '../record';
import type { GradationMeasure, ReadingMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { conditionWords, numberWords, plural } from '../rule-sets/words';
import { fittedQuantities } from './analysis-design';
import { conditionsOfSubjects } from './evaluate-reading';
import type { ToPass } from './explanation';
import type { Finding } from './finding';
import { resolveInterval } from './resolve-limit';
import { roomOfRule } from './room-of-rule';
import { type Sample, type SampleItem, takeSample } from './sample';
import { sideOf } from './side-of-limit';
import { subjectOf } from './subject';
import { wayOfReadings, waysOfParts } from './to-pass-inputs';
import { type Asked, type Judging, judgingOf, sideIn } from './to-pass-judging';
import { plausibleOf, said, search, stepOf } from './to-pass-search';
import type { World } from './world';

/** A statistic of readings, or a value computed from them. */
export function forValue(
  asked: Asked,
  rule: ResolvedRule,
  measure: ReadingMeasure | GradationMeasure,
  finding: Finding,
): ToPass[] {
  const { world } = asked;
  const quantity = measure.kind === 'reading' ? measure.quantity : 'percent-passing';
  const at = conditionsOf(world, measure, finding);
  // What counts only while another reading of the specimen allows it is moved as long as that is another quantity.
  const where = measure.where?.some((each) => each.quantity === quantity) ? null : measure.where;
  if (at === undefined || where === null) return [];
  const taken = takeSample(world, { quantity, at, where });
  const judging = judgingOf(world, rule, at, world.view.quantity(quantity)?.unit);
  if (!taken.ok || !judging) return [];
  const { sample } = taken;
  const statistic = measure.kind === 'reading' ? measure.statistic : 'mean';
  if (statistic === 'count') return moreResults(judging, sample);
  if (sample.items.some(({ value, qualifier }) => value === null || qualifier !== null)) return [];
  if (measure.kind === 'reading' && measure.alsoEach !== undefined)
    return ofEachBeside(asked, rule, { judging, quantity, sample, at, interval: measure.alsoEach });
  if (statistic === 'mean') return ofMean(asked, rule, judging, quantity, sample);
  if (sample.recomputed !== null) return [];
  if (statistic === 'range') return ofRange(judging, quantity, sample.items);
  return statistic === 'each' || statistic === 'min' || statistic === 'max'
    ? together(judging, quantity, outsideOf(judging, statistic, sample.items))
    : [];
}

/** The mean where every single value is inside its own limits, else the single values where the mean is. */
function ofEachBeside(
  asked: Asked,
  rule: ResolvedRule,
  given: {
    judging: Judging;
    quantity: string;
    sample: Sample;
    at: Conditions;
    interval: NonNullable<ReadingMeasure['alsoEach']>;
  },
): ToPass[] {
  const { judging, quantity, sample, at } = given;
  const { limit, own } = judging;
  const units = { written: own, wanted: limit.unit };
  const resolved = resolveInterval(judging.world, given.interval, at, units);
  if (!resolved.ok || sample.recomputed !== null) return [];
  const each = { ...judging, limit: { ...limit, ...resolved.interval } };
  const outside = outsideOf(each, 'each', sample.items);
  const values = sample.items.map(({ value }) => value ?? Number.NaN);
  const isMeanInside =
    sideIn(judging, values.reduce((sum, value) => sum + value, 0) / values.length) === 'inside';
  if (isMeanInside === (outside.length === 0)) return [];
  return isMeanInside ? together(each, quantity, outside) : ofMean(asked, rule, judging, quantity, sample);
}

function conditionsOf(
  world: World,
  measure: ReadingMeasure | GradationMeasure,
  finding: Finding,
): Conditions | undefined {
  if (measure.kind === 'gradation') {
    const own = finding.evidence[0]?.at;
    return own && { ...measure.at, sieve: own.sieve };
  }
  return conditionsOfSubjects(world, measure).find(
    (each) => subjectOf(world, measure, each) === finding.subject,
  );
}

function ofMean(
  asked: Asked,
  rule: ResolvedRule,
  judging: Judging,
  quantity: string,
  sample: Sample,
): ToPass[] {
  const { recomputed } = sample;
  if (recomputed === null) {
    const values = sample.items.map(({ value }) => value ?? Number.NaN);
    const value = values.reduce((sum, each) => sum + each, 0) / values.length;
    const at = sample.items[0]?.at ?? {};
    return wayOfReadings(judging, { kind: 'read', quantity, at, value, count: values.length });
  }
  if (rule.measure.where !== undefined) return [];
  const ofContent = fittedQuantities.has(quantity) ? ofBinderContent(asked, rule) : [];
  if (recomputed.origin === 'interpolated') return ofContent;
  const ways = waysOfParts(judging, [{ kind: 'computed', node: recomputed.node }], ([value = 0]) => value);
  return [...ways, ...ofContent];
}

/** The single values that keep the statistic outside. */
function outsideOf(
  judging: Judging,
  statistic: 'each' | 'min' | 'max',
  items: readonly SampleItem[],
): SampleItem[] {
  if (statistic === 'each') return items.filter(({ value }) => sideIn(judging, value) !== 'inside');
  const sorted = items.toSorted((a, b) => (a.value ?? 0) - (b.value ?? 0));
  const judged = statistic === 'max' ? sorted.at(-1) : sorted[0];
  const side = sideIn(judging, judged?.value ?? null);
  const outermost = statistic === 'max' ? 'above' : 'below';
  // The greatest alone raises a maximum; to lower it everything above has to come down.
  if (side === outermost) return items.filter(({ value }) => sideIn(judging, value) === side);
  return judged === undefined || side === 'inside' ? [] : [judged];
}

/** All of them at once: one way, and none where one of them cannot be mended. */
function together(judging: Judging, quantity: string, outside: readonly SampleItem[]): ToPass[] {
  const ways = outside.flatMap(({ at, value }) =>
    value === null ? [] : wayOfReadings(judging, { kind: 'read', quantity, at, value, count: 1 }),
  );
  const [first] = ways;
  if (first === undefined || ways.length < outside.length) return [];
  if (ways.length === 1) return ways;
  const words = ways.map((way) => way.words).join(' and ');
  return [{ ...first, present: null, from: null, to: null, words }];
}

/** Of a range only its ends make it wide: each is brought towards the others. */
function ofRange(judging: Judging, quantity: string, items: readonly SampleItem[]): ToPass[] {
  const { world } = judging;
  const sorted = items.toSorted((a, b) => (a.value ?? 0) - (b.value ?? 0));
  const ends = sorted.length < 2 ? [] : [sorted.at(-1), sorted[0]];
  return ends.flatMap((end) => {
    const present = end?.value ?? null;
    if (end === undefined || present === null) return [];
    const others = sorted.filter((each) => each !== end).map(({ value }) => value ?? Number.NaN);
    const { trial: _trial, ...place } = end.at;
    const readings = (world.readings.get(quantity) ?? []).filter(({ at }) => at === end.at);
    const step = stepOf(
      world,
      quantity,
      readings.map(({ reading }) => reading),
    );
    const bounds = [present, ...others];
    const way = search({
      present,
      step,
      plausible: { min: Math.min(...bounds), max: Math.max(...bounds) },
      beyond: plausibleOf(world, quantity),
      valueAt: (value) => {
        const width = rangeOf([...others, value]);
        return width.ok ? width.value : null;
      },
      sideOf: (value) => sideIn(judging, value),
    });
    const name = `${world.view.quantity(quantity)?.label ?? quantity}${conditionWords(place)}`;
    return way === null ? [] : [said({ quantity, unit: judging.own, present, step, count: 1, name, ...way })];
  });
}

function moreResults({ limit, rounder }: Judging, { count }: Sample): ToPass[] {
  if (limit.min === null || sideOf(count, limit, rounder) !== 'below') return [];
  const least = limit.minExclusive ? Math.floor(limit.min) + 1 : Math.ceil(limit.min);
  const words = `${plural(least, 'result')} or more instead of ${numberWords(count)}`;
  return [{ quantity: 'count', name: 'results', unit: '1', present: count, from: least, to: null, words }];
}

/** Another binder content, read between the trials; where every chosen rule holds, if there is such a place. */
export function ofBinderContent({ world, room }: Asked, rule: ResolvedRule): ToPass[] {
  const present = world.analysis.designPoint.declaredBinderContent;
  if (present === null) return [];
  const { state, holds } = roomOfRule(world, rule);
  const holdsNow = holds.some(({ from, to }) => from <= present && present <= to);
  if (state !== 'computed' || holdsNow) return [];
  const shared = world.edition.roomToMove.includes(rule.id) ? (room?.room ?? null) : null;
  const [nearest] = shared ? [shared] : holds.toSorted((a, b) => distance(a, present) - distance(b, present));
  if (nearest === undefined) return [];
  const { from, to } = nearest;
  const range = from === to ? numberWords(from, 2) : `${numberWords(from, 2)} to ${numberWords(to, 2)}`;
  const where = shared ? 'the room to move' : 'read between the trials';
  const words = `Pb of ${range} % instead of ${numberWords(present, Math.max(2, decimalsOf(present)))} (${where})`;
  return [{ quantity: 'binder-content', name: 'Pb', unit: '%', present, from, to, words }];
}

function distance({ from, to }: { from: number; to: number }, place: number): number {
  return place < from ? from - place : place - to;
}
