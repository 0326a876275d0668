import { decimalsOf, roundTo } from '../numerics/round';
import { quantityById } from '../quantities/registry';
import { convert } from '../quantities/units';
import type { Conditions, Reading } from '../record';
import type { DifferenceMeasure, GradationMeasure, ReadingMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { capitalised, conditionWords, numberWords, plural, unitSuffix } from '../rule-sets/words';
import { fittedQuantities } from './analysis-design';
import { displayedUnit } from './analysis-digits';
import { type AnalysisNode, valueWith } from './analysis-node';
import { conditionsOfSubjects } from './evaluate-reading';
import type { ToPass } from './explanation';
import type { Finding, ResolvedLimit } from './finding';
import { type Rounder, rounderOf } from './judge';
import { resolveLimit } from './resolve-limit';
import type { RoomToMove } from './room';
import { roomOfRule } from './room-of-rule';
import { type Sample, type SampleItem, takeSample } from './sample';
import { lastAlike, type Side, sideOf } from './side-of-limit';
import { subjectOf } from './subject';
import type { World } from './world';

/**
 * Which readings would have to move for a failing finding to pass, and by how much: each alone, with all others as
 * they are, in steps of the digits that the laboratory writes. Only where the value follows the reading one way,
 * and only within what is plausible for it.
 */
export function toPass(asked: Asked, rule: ResolvedRule, finding: Finding): ToPass[] {
  const { world } = asked;
  const { measure } = rule;
  if (finding.outcome !== 'fail' || ('where' in measure && measure.where !== undefined)) return [];
  if (measure.kind === 'difference') return forDifference(world, rule, measure, finding);
  if (measure.kind !== 'reading' && measure.kind !== 'gradation') return [];
  return forValue(asked, rule, measure, finding);
}

/** "Gmb of 2.431 or less instead of 2.442 (mean of 3); or P0.075 of 5.5 % or less instead of 5.6." */
export function toPassWords(ways: readonly ToPass[]): string {
  return ways.length === 0 ? '' : `${capitalised(ways.map(({ words }) => words).join('; or '))}.`;
}

/** What is known of the mix before a finding is looked at. */
export interface Asked {
  world: World;
  room: RoomToMove | null;
}

/** By how far each has to go for its kind, in gauge spans. */
function nearestFirst(world: World, ways: readonly ToPass[]): ToPass[] {
  const spans = ({ quantity, present, from, to }: ToPass) => {
    const near = from !== null && from > present ? from : (to ?? present);
    return Math.abs(near - present) / (world.view.quantity(quantity)?.gaugeSpan ?? 1);
  };
  return ways.toSorted((a, b) => spans(a) - spans(b));
}

interface Judging {
  world: World;
  limit: ResolvedLimit;
  rounder: Rounder;
  /** Unit that the value comes in. */
  own: string;
}

function forValue(
  asked: Asked,
  rule: ResolvedRule,
  measure: ReadingMeasure | GradationMeasure,
  finding: Finding,
): ToPass[] {
  const { world } = asked;
  const quantity = measure.kind === 'reading' ? measure.quantity : 'percent-passing';
  const at =
    measure.kind === 'gradation'
      ? finding.evidence[0]?.at && { ...measure.at, sieve: finding.evidence[0].at.sieve }
      : conditionsOfSubjects(world, measure).find(
          (each) => subjectOf(world, measure, each) === finding.subject,
        );
  const taken = at && takeSample(world, { quantity, at });
  const judging = at && judgingOf(world, rule, quantity, at);
  if (!taken?.ok || !judging) return [];
  const { sample } = taken;
  const statistic = measure.kind === 'reading' ? measure.statistic : 'mean';
  if (measure.kind === 'reading' && measure.alsoEach !== undefined) return [];
  if (statistic === 'count') return moreResults(judging, sample);
  if (sample.items.some(({ value, qualifier }) => value === null || qualifier !== null)) return [];
  if (statistic === 'each' || statistic === 'min' || statistic === 'max') {
    return sample.recomputed === null ? ofSpecimens(judging, quantity, sample.items) : [];
  }
  if (statistic !== 'mean') return [];
  const { recomputed } = sample;
  if (recomputed === null) return ofReadings(judging, quantity, sample);
  const ways = recomputed.origin === 'interpolated' ? [] : ofInputs(judging, recomputed.node);
  return [...nearestFirst(world, ways), ...ofBinderContent(asked, rule, quantity)];
}

function judgingOf(world: World, rule: ResolvedRule, quantity: string, at: Conditions): Judging | null {
  const limit = resolveLimit(world, rule, at);
  if (!limit.ok || (limit.limit.min === null && limit.limit.max === null)) return null;
  const rounding = rounderOf(world, rule, limit.limit, at);
  if (!rounding.ok) return null;
  const own = world.view.quantity(quantity)?.unit ?? limit.limit.unit;
  return { world, limit: limit.limit, rounder: rounding.rounder, own };
}

function sideIn({ limit, rounder, own }: Judging, value: number | null): Side {
  const converted = value === null ? null : convert(value, own, limit.unit);
  return sideOf(converted?.ok ? converted.value : null, limit, rounder);
}

/** Every raw input of a computed value, moved alone. */
function ofInputs(judging: Judging, top: AnalysisNode): ToPass[] {
  const inputs = isOneResult(top) ? [top] : rawInputs(top, top.quantity);
  return inputs.flatMap((input) => {
    const { quantity, value: present, unit } = input;
    const step = stepOf(quantity, readingsOf(input));
    const way = search({
      present,
      step,
      plausible: plausibleOf(judging.world, quantity),
      valueAt: (value) => valueWith(top, input, value),
      sideOf: (value) => sideIn(judging, value),
    });
    if (way === null) return [];
    return [said({ quantity, unit, present, step, count: input.count ?? 1, name: symbolOf(input), ...way })];
  });
}

/**
 * The nearest inputs that a laboratory measures. Binder content is not among them for values that change with the
 * other readings of a trial: that answer is read from the trials. A blend's gravity is no single reading.
 */
function rawInputs(node: AnalysisNode, of: string, found: AnalysisNode[] = []): AnalysisNode[] {
  for (const input of node.inputs) {
    if (isOneResult(input)) {
      const movesOthers = input.quantity === 'binder-content' && fittedQuantities.has(of);
      if (!movesOthers && !found.includes(input)) found.push(input);
    } else if (quantityById(input.quantity)?.kind === 'derived' && input.quantity !== 'surface-area') {
      rawInputs(input, of, found);
    }
  }
  return found;
}

/** A reading, the mean of replicates, or what is computed of masses and loads and spoken of as one result. */
function isOneResult({ formula, quantity }: AnalysisNode): boolean {
  return formula === null || formula.startsWith('mean of') || REPLICATED.has(quantity);
}

const REPLICATED = new Set([
  'percent-passing',
  'bulk-specific-gravity-mix',
  'tensile-strength-dry',
  'tensile-strength-conditioned',
]);

function readingsOf(node: AnalysisNode): Reading[] {
  return node.reading !== null ? [node.reading] : node.inputs.flatMap(readingsOf);
}

function ofReadings(judging: Judging, quantity: string, sample: Sample): ToPass[] {
  const values = sample.items.map(({ value }) => value ?? Number.NaN);
  const present = values.reduce((sum, value) => sum + value, 0) / values.length;
  return moved(judging, { quantity, at: sample.items[0]?.at ?? {}, present, count: values.length });
}

function ofSpecimens(judging: Judging, quantity: string, items: readonly SampleItem[]): ToPass[] {
  const outside = items.filter(({ value }) => sideIn(judging, value) !== 'inside');
  return outside
    .slice(0, MOST_SPECIMENS)
    .flatMap(({ at, value }) =>
      value === null ? [] : moved(judging, { quantity, at, present: value, count: 1 }),
    );
}

const MOST_SPECIMENS = 3;

interface MovedReading {
  quantity: string;
  at: Conditions;
  present: number;
  count: number;
}

function moved(judging: Judging, { quantity, at, present, count }: MovedReading): ToPass[] {
  const { world, own } = judging;
  const texts = (world.readings.get(quantity) ?? [])
    .filter(({ at: other }) => other === at)
    .map(({ reading }) => reading);
  const step = stepOf(quantity, texts);
  const way = search({
    present,
    step,
    plausible: plausibleOf(world, quantity),
    valueAt: (value) => value,
    sideOf: (value) => sideIn(judging, value),
  });
  if (way === null) return [];
  const { trial: _trial, ...place } = at;
  const label = `${world.view.quantity(quantity)?.label ?? quantity}${conditionWords(count > 1 ? withoutSpecimen(place) : place)}`;
  return [said({ quantity, unit: own, present, step, count, name: label, ...way })];
}

function withoutSpecimen({ specimen: _specimen, ...others }: Conditions): Conditions {
  return others;
}

function moreResults({ limit, rounder }: Judging, { count }: Sample): ToPass[] {
  if (limit.min === null || sideOf(count, limit, rounder) !== 'below') return [];
  const least = limit.minExclusive ? Math.floor(limit.min) + 1 : Math.ceil(limit.min);
  const words = `${plural(least, 'result')} or more instead of ${numberWords(count)}`;
  return [{ quantity: 'count', name: 'results', unit: '1', present: count, from: least, to: null, words }];
}

/** Another binder content, read between the trials; where every chosen rule holds, if there is such a place. */
function ofBinderContent({ world, room }: Asked, rule: ResolvedRule, quantity: string): ToPass[] {
  const present = world.analysis.designPoint.declaredBinderContent;
  if (present === null || !fittedQuantities.has(quantity)) return [];
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

/** The contractor's own value, or the reported one, against what it is compared with. */
function forDifference(
  world: World,
  rule: ResolvedRule,
  measure: DifferenceMeasure,
  finding: Finding,
): ToPass[] {
  const { quantity } = measure;
  const at = conditionsOfSubjects(world, { quantity, at: {} }).find(
    (each) => subjectOf(world, measure, each) === finding.subject,
  );
  const judging = at && judgingOf(world, rule, quantity, at);
  if (!at || !judging || measure.statistic !== 'mean') return [];
  const pair =
    measure.between[0] === 'contractor'
      ? laboratoryMeans(world, quantity, at)
      : reportedAndComputed(world, quantity, at);
  if (pair === null) return [];
  const { present, other, name, count } = pair;
  const step = stepOf(quantity, []);
  const way = search({
    present,
    step,
    plausible: { min: Math.min(present, other), max: Math.max(present, other) },
    beyond: plausibleOf(world, quantity),
    valueAt: (value) => Math.abs(value - other),
    sideOf: (value) => sideIn(judging, value),
  });
  return way === null ? [] : [said({ quantity, unit: judging.own, present, step, count, name, ...way })];
}

interface Pair {
  present: number;
  other: number;
  name: string;
  count: number;
}

function laboratoryMeans(world: World, quantity: string, at: Conditions): Pair | null {
  const label = world.view.quantity(quantity)?.label ?? quantity;
  const [own, agency] = (['contractor', 'agency'] as const).map((laboratory) => {
    const taken = takeSample(world, { quantity, at: { ...at, laboratory } });
    if (!taken.ok) return null;
    const { recomputed, items, count } = taken.sample;
    const values = items.map(({ value }) => value ?? Number.NaN);
    return {
      value: recomputed?.value ?? values.reduce((sum, value) => sum + value, 0) / values.length,
      count,
    };
  });
  if (!own || !agency || !Number.isFinite(own.value) || !Number.isFinite(agency.value)) return null;
  return { present: own.value, other: agency.value, name: `the contractor's ${label}`, count: own.count };
}

function reportedAndComputed(world: World, quantity: string, at: Conditions): Pair | null {
  const taken = takeSample(world, { quantity, at, toCompare: true });
  const recomputed = taken.ok ? taken.sample.recomputed : null;
  const present = recomputed?.reported?.value ?? null;
  if (recomputed === null || present === null) return null;
  const label = world.view.quantity(quantity)?.label ?? quantity;
  return { present, other: recomputed.value, name: `the reported ${label}`, count: 1 };
}

interface Search {
  present: number;
  step: number;
  /** Where the reading may move to while it is looked for the first value that passes. */
  plausible: { min: number; max: number };
  /** How far it may go on passing, where that is farther. */
  beyond?: { min: number; max: number };
  valueAt(reading: number): number | null;
  sideOf(value: number | null): Side;
}

/** The nearest step at which the rule is met, and how far it stays met; null where it never is or not one way. */
function search(input: Search): { from: number | null; to: number | null } | null {
  const { present, step, valueAt } = input;
  const start = input.sideOf(valueAt(present));
  const direction = directionOf(input);
  if (start === 'inside' || direction === 0) return null;
  const towards = (start === 'below') === direction > 0 ? 1 : -1;
  const first = (towards > 0 ? Math.floor : Math.ceil)(present / step + towards * 1e-9) + towards;
  const reading = (steps: number) => Number(((first + towards * steps) * step).toPrecision(12));
  const sideAt = (steps: number) => input.sideOf(valueAt(reading(steps)));
  const isKnown = (steps: number) => valueAt(reading(steps)) !== null;
  const within = (range: { min: number; max: number }) => {
    const steps = stepsWithin(range, reading(0), towards, step);
    return steps >= 0 && isKnown(0) ? lastAlike(0, steps, isKnown) : -1;
  };
  const most = within(input.plausible);
  if (most < 0 || sideAt(most) === start) return null;
  const enters = sideAt(0) === start ? lastAlike(0, most, (steps) => sideAt(steps) === start) + 1 : 0;
  if (sideAt(enters) !== 'inside') return null;
  const farthest = within(input.beyond ?? input.plausible);
  const leaves = lastAlike(enters, farthest, (steps) => sideAt(steps) === 'inside');
  const near = reading(enters);
  const far = leaves === farthest ? null : reading(leaves);
  return towards > 0 ? { from: near, to: far } : { from: far, to: near };
}

/** 1 where the value rises with the reading over all that is plausible, −1 where it falls, 0 where it does neither. */
function directionOf({ present, plausible, valueAt }: Search): 1 | -1 | 0 {
  const low = Math.min(plausible.min, present);
  const high = Math.max(plausible.max, present);
  const values = Array.from({ length: SAMPLES + 1 }, (_, place) =>
    valueAt(low + ((high - low) * place) / SAMPLES),
  );
  let direction: 1 | -1 | 0 = 0;
  for (let place = 1; place <= SAMPLES; place += 1) {
    const before = values[place - 1];
    const after = values[place];
    // What cannot be computed far from the present reading says nothing about how it goes near it.
    if (before === null || after === null || before === undefined || after === undefined || after === before)
      continue;
    const sign = after > before ? 1 : -1;
    if (direction !== 0 && sign !== direction) return 0;
    direction = sign;
  }
  return direction;
}

const SAMPLES = 16;

function stepsWithin(
  { min, max }: { min: number; max: number },
  from: number,
  towards: number,
  step: number,
): number {
  const room = towards > 0 ? max - from : from - min;
  return Math.floor(room / step + 1e-9);
}

function plausibleOf(world: World, quantity: string): { min: number; max: number } {
  const { min = 0, max = Number.MAX_SAFE_INTEGER } = world.view.quantity(quantity)?.plausible ?? {};
  return { min, max };
}

/** The digit that the laboratory writes, but no finer than is usual. */
function stepOf(quantity: string, readings: readonly Reading[]): number {
  const usual = Number(`1e-${quantityById(quantity)?.decimals ?? 2}`);
  const written = readings.filter((reading) => reading.quantity === quantity).map(displayedUnit);
  return written.length === 0 ? usual : Math.max(usual, Number(Math.min(...written).toPrecision(6)));
}

function symbolOf({ symbol, at }: AnalysisNode): string {
  return `${symbol}${at.stockpile === undefined ? '' : ` of stockpile ${at.stockpile}`}`;
}

function said(way: Omit<ToPass, 'words'> & { step: number; count: number }): ToPass {
  const { step, count, ...rest } = way;
  const decimals = decimalsOf(step);
  const { name, unit, present, from, to } = rest;
  const number = (value: number) => numberWords(value, decimals);
  const range =
    from === null
      ? `${number(to ?? present)}${unitSuffix(unit)} or less`
      : to === null
        ? `${number(from)}${unitSuffix(unit)} or more`
        : from === to
          ? `${number(from)}${unitSuffix(unit)}`
          : `${number(from)} to ${number(to)}${unitSuffix(unit)}`;
  const of = count > 1 ? ` (mean of ${count})` : '';
  return { ...rest, words: `${name} of ${range} instead of ${presentWords(present, step)}${of}` };
}

/** One digit more than the laboratory writes where the present value is a mean between two of its steps. */
function presentWords(present: number, step: number): string {
  const decimals = decimalsOf(step);
  const rounded = roundTo({ value: present, to: step, method: 'rounding' });
  return numberWords(present, Math.abs(rounded - present) < step * 1e-6 ? decimals : decimals + 1);
}
