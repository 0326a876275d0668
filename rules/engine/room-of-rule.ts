import type { PropertyCurve } from '../calculations/design-point';
import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import { isQuantityReference } from '../rule-sets/bounds-of';
import { resolvedLimitWords } from '../rule-sets/limit-words';
import type { ReadingMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { comparisonsOf } from '../rule-sets/when';
import { withUnit } from '../rule-sets/words';
import { fittedQuantities } from './analysis-design';
import { applicabilityOf } from './applicability';
import type { ResolvedLimit } from './finding';
import { type Rounder, rounderOf } from './judge';
import { resolveLimit } from './resolve-limit';
import type { RoomOfRule } from './room';
import { curveOf, labelOf, leftOut, notComputed, type Refusal } from './room-curves';
import { formulaCurve } from './room-of-formula';
import { stretchesOf } from './room-stretches';
import { isPerTrial } from './scope';
import { sideOf } from './side-of-limit';
import type { World } from './world';

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
  if (measure.kind !== 'reading' && measure.kind !== 'formula') {
    return refused(leftOut(`A rule of the kind ${measure.kind} is not followed along the binder content.`));
  }
  const held = heldTo(world, rule, measure.at);
  if (!held.ok) return refused(held);
  const { limit, rounder } = held;
  base.limitWords = withUnit(resolvedLimitWords(limit), limit.unit);
  const read = measure.kind === 'reading' ? ofReading(world, measure) : formulaCurve(world, measure);
  if (!read.ok) return refused(read);
  const own =
    measure.kind === 'reading' ? world.view.quantity(measure.quantity)?.unit : (measure.unit ?? limit.unit);
  const unit = own ?? limit.unit;
  if (!convert(1, unit, limit.unit).ok)
    return refused(notComputed(`The value is in ${unit} and the limit in ${limit.unit}.`));
  const { curve } = read;
  const holds = stretchesOf({
    ...curve,
    sideAt: (content) => sideOf(valueAt(curve, content, unit, limit.unit), limit, rounder),
  });
  const trials = { from: curve.from, to: curve.to };
  return { ...base, state: 'computed', reason: null, fit: curve.method, trials, holds };
}

function ofReading(world: World, measure: ReadingMeasure): ReturnType<typeof curveOf> {
  const { quantity, statistic, alsoEach, where } = measure;
  if (
    fittedQuantities.has(quantity) &&
    (statistic !== 'mean' || alsoEach !== undefined || where !== undefined)
  )
    return leftOut('Between trials only the mean is known, not the values of single specimens.');
  return curveOf(world, measure);
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
  at: Conditions,
): { ok: true; limit: ResolvedLimit; rounder: Rounder } | Refusal {
  const { min, max, target, tolerance } = rule.limit;
  const moves = [min, max, target, tolerance].some(
    (bound) => bound !== undefined && isQuantityReference(bound) && isPerTrial(world, bound.quantity),
  );
  if (moves) return leftOut('Its limit changes with the binder content.');
  const limit = resolveLimit(world, rule, at);
  if (!limit.ok) {
    const state = limit.outcome === 'not applicable' ? 'not applicable' : 'not computed';
    return { ok: false, state, reason: limit.reason };
  }
  if (limit.limit.min === null && limit.limit.max === null) return leftOut('It has no limit in numbers.');
  const rounding = rounderOf(world, rule, limit.limit, at);
  return rounding.ok
    ? { ok: true, limit: limit.limit, rounder: rounding.rounder }
    : notComputed(rounding.reason);
}

function valueAt(curve: PropertyCurve, content: number, own: string, unit: string): number | null {
  const value = curve.at(content);
  if (!value.ok) return null;
  const converted = convert(value.value, own, unit);
  return converted.ok ? converted.value : null;
}
