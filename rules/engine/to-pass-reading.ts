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
  if (measure.kind === 'reading' && measure.alsoEach !== undefined) return [];
  if (statistic === 'count') return moreResults(judging, sample);
  if (sample.items.some(({ value, qualifier }) => value === null || qualifier !== null)) return [];
  if (statistic === 'mean') return ofMean(asked, rule, judging, quantity, sample);
  if (sample.recomputed !== null) return [];
  if (statistic === 'range') return ofRange(judging, quantity, sample.items);
  return statistic === 'each' || statistic === 'min' || statistic === 'max'
    ? ofSpecimens(judging, quantity, sample.items)
    : [];
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

function ofSpecimens(judging: Judging, quantity: string, items: readonly SampleItem[]): ToPass[] {
  const outside = items.filter(({ value }) => sideIn(judging, value) !== 'inside');
  return outside
    .slice(0, MOST_SPECIMENS)
    .flatMap(({ at, value }) =>
      value === null ? [] : wayOfReadings(judging, { kind: 'read', quantity, at, value, count: 1 }),
    );
}

const MOST_SPECIMENS = 3;

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
