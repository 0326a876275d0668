import { type PropertyCurve, propertyCurve, type TrialPoint } from '../calculations/design-point';
import { known } from '../numerics/numeric-result';
import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import { isQuantityReference } from '../rule-sets/bounds-of';
import { resolvedLimitWords } from '../rule-sets/limit-words';
import type { ReadingMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { comparisonsOf } from '../rule-sets/when';
import { capitalised, plural, withUnit } from '../rule-sets/words';
import type { TestedContent } from './analysis';
import { fittedQuantities } from './analysis-design';
import { type AnalysisNode, evidenceOf } from './analysis-node';
import { applicabilityOf } from './applicability';
import { doubtWords, subjectsOf } from './doubts';
import type { Evidence, ResolvedLimit } from './finding';
import { type Rounder, rounderOf } from './judge';
import { resolveLimit } from './resolve-limit';
import type { RoomOfRule } from './room';
import { stretchesOf } from './room-stretches';
import { isPerTrial } from './scope';
import { sideOf } from './side-of-limit';
import type { World } from './world';

interface Refusal {
  ok: false;
  state: Exclude<RoomOfRule['state'], 'computed'>;
  reason: string;
}

/** Where one rule holds between the trials, by its own limit and rounding; or why that cannot be said. */
export function roomOfRule(world: World, rule: ResolvedRule): RoomOfRule {
  const base = { rule: rule.id, clause: rule.clause, title: rule.title, limitWords: '' };
  const refused = ({ state, reason }: Refusal): RoomOfRule => ({
    ...base,
    state,
    reason,
    fit: null,
    trials: null,
    holds: [],
  });
  const applies = whetherItApplies(world, rule);
  if (applies !== null) return refused(applies);
  const { measure } = rule;
  if (measure.kind !== 'reading') {
    return refused(leftOut(`A rule of the kind ${measure.kind} is not followed along the binder content.`));
  }
  const held = heldTo(world, rule, measure);
  if (!held.ok) return refused(held);
  const { limit, rounder } = held;
  base.limitWords = withUnit(resolvedLimitWords(limit), limit.unit);
  const read = curveOf(world, measure);
  if (!read.ok) return refused(read);
  const own = world.view.quantity(measure.quantity)?.unit ?? limit.unit;
  if (!convert(1, own, limit.unit).ok)
    return refused(notComputed(`The value is in ${own} and the limit in ${limit.unit}.`));
  const { curve } = read;
  const holds = stretchesOf({
    ...curve,
    sideAt: (content) => sideOf(valueAt(curve, content, own, limit.unit), limit, rounder),
  });
  const trials = { from: curve.from, to: curve.to };
  return { ...base, state: 'computed', reason: null, fit: curve.method, trials, holds };
}

function whetherItApplies(world: World, rule: ResolvedRule): Refusal | null {
  const moving = comparisonsOf(rule.when ?? { all: [] }).find(
    ({ comparison: { params } }) => params !== undefined && isPerTrial(world, params.quantity),
  );
  if (moving) {
    const label = labelOf(world, moving.comparison.params?.quantity ?? '');
    return leftOut(`Whether the rule applies depends on ${label}, which changes with the binder content.`);
  }
  const applicability = applicabilityOf(world, rule);
  if (applicability.kind === 'applies') return null;
  if (applicability.kind === 'not applicable')
    return { ok: false, state: 'not applicable', reason: applicability.reason };
  return notComputed(applicability.reason);
}

function heldTo(
  world: World,
  rule: ResolvedRule,
  measure: ReadingMeasure,
): { ok: true; limit: ResolvedLimit; rounder: Rounder } | Refusal {
  const { min, max, target, tolerance } = rule.limit;
  const moves = [min, max, target, tolerance].some(
    (bound) => bound !== undefined && isQuantityReference(bound) && isPerTrial(world, bound.quantity),
  );
  if (moves) return leftOut('Its limit changes with the binder content.');
  const limit = resolveLimit(world, rule, measure.at);
  if (!limit.ok) {
    const state = limit.outcome === 'not applicable' ? 'not applicable' : 'not computed';
    return { ok: false, state, reason: limit.reason };
  }
  if (limit.limit.min === null && limit.limit.max === null) return leftOut('It has no limit in numbers.');
  const rounding = rounderOf(world, rule, limit.limit, measure.at);
  return rounding.ok
    ? { ok: true, limit: limit.limit, rounder: rounding.rounder }
    : notComputed(rounding.reason);
}

/** The curve that the rule's value runs along, of recomputed values only. */
function curveOf(world: World, measure: ReadingMeasure): { ok: true; curve: PropertyCurve } | Refusal {
  const { quantity, at, statistic, minimumCount } = measure;
  const label = labelOf(world, quantity);
  const { trial = 'design', laboratory = 'contractor', ...conditions } = at;
  if (trial !== 'design' || laboratory !== 'contractor' || Object.keys(conditions).length > 0)
    return leftOut(`${label} at these conditions is never taken from other trials.`);
  const contents = world.analysis.testedContents;
  if (quantity === 'binder-content') return ofContentItself(world, contents);
  if (!fittedQuantities.has(quantity)) return leftOut(`${label} is never taken from other trials.`);
  if (statistic !== 'mean' || measure.alsoEach !== undefined || measure.where !== undefined)
    return leftOut('Between trials only the mean is known, not the values of single specimens.');
  const points = pointsOf(contents, quantity);
  const curve = propertyCurve(
    points.map(({ content, value }): TrialPoint => ({ Pb: content.value, value: value.value })),
    world.edition.designPoint.fit,
  );
  if (!curve.ok) return tooFewTrials(points.length, label);
  const count = Math.min(...points.map(({ value }) => value.count ?? 1));
  if (minimumCount !== undefined && count < minimumCount) {
    return notComputed(
      `One of the trials has ${plural(count, 'result')} of ${label}, and the rule asks for at least ${minimumCount}.`,
    );
  }
  const doubt = doubtAmong(
    world,
    points.flatMap(({ content, value }) => [content, value]),
  );
  return doubt === null ? { ok: true, curve } : notComputed(doubt);
}

function ofContentItself(
  world: World,
  contents: readonly TestedContent[],
): { ok: true; curve: PropertyCurve } | Refusal {
  const numbers = contents.map(({ binderContent }) => binderContent.value);
  const [from, to] = [Math.min(...numbers), Math.max(...numbers)];
  if (numbers.length < 2 || from === to) return tooFewTrials(numbers.length, 'binder content');
  const doubt = doubtAmong(
    world,
    contents.map(({ binderContent }) => binderContent),
  );
  if (doubt !== null) return notComputed(doubt);
  return { ok: true, curve: { ok: true, method: 'linear', from, to, turns: [], at: known } };
}

function pointsOf(contents: readonly TestedContent[], quantity: string) {
  return contents.flatMap(({ binderContent, values }) => {
    const value = values.find((node) => node.quantity === quantity);
    return value ? [{ content: binderContent, value }] : [];
  });
}

function tooFewTrials(count: number, label: string): Refusal {
  return notComputed(
    count === 0
      ? `No trial has a recomputed value of ${label}.`
      : `Only one trial binder content has a recomputed value of ${label}; two or more show how it changes.`,
  );
}

/** Any open doubt about what the trials rest on: one of its meanings could move the room. */
function doubtAmong(world: World, nodes: readonly AnalysisNode[]): string | null {
  if (world.record.doubts.length === 0) return null;
  const used: Evidence[] = [];
  const visit = (evidence: Evidence) => {
    used.push(evidence);
    evidence.inputs?.forEach(visit);
  };
  nodes.map(evidenceOf).forEach(visit);
  for (const doubt of world.record.doubts) {
    const concerned = subjectsOf(doubt).find((subject) => used.some((each) => isAbout(world, subject, each)));
    if (concerned) return doubtWords(world, doubt, concerned.quantity);
  }
  return null;
}

/** A property of aggregate or binder without a trial belongs to every trial. */
function isAbout(
  world: World,
  doubted: { quantity: string; at: Conditions },
  { quantity, at = {} }: Evidence,
) {
  if (doubted.quantity !== quantity || (doubted.at.laboratory ?? 'contractor') !== 'contractor') return false;
  if (doubted.at.sieve !== undefined && doubted.at.sieve !== at.sieve) return false;
  const trial = isPerTrial(world, quantity) ? (doubted.at.trial ?? 'design') : doubted.at.trial;
  return trial === undefined || at.trial === undefined || trial === at.trial;
}

function valueAt(curve: PropertyCurve, content: number, own: string, unit: string): number | null {
  const value = curve.at(content);
  if (!value.ok) return null;
  const converted = convert(value.value, own, unit);
  return converted.ok ? converted.value : null;
}

function labelOf(world: World, quantity: string): string {
  return world.view.quantity(quantity)?.label ?? quantity;
}

function notComputed(reason: string): Refusal {
  return { ok: false, state: 'not computed', reason: capitalised(reason) };
}

function leftOut(reason: string): Refusal {
  return { ok: false, state: 'left out', reason: capitalised(reason) };
}
