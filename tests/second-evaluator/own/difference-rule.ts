import type { DifferenceMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { compare, exact, minus, over, times } from './exact';
import { type Allowed, isOne, one } from './interval';
import { type Judgement, judged, precisionOf } from './judged';
import { knownOf } from './known';
import { limitsOf, stepFor } from './limits';
import { meanAt, valuesOf } from './quantity-value';
import { subjectOf } from './reading-rule';
import { select } from './selection';
import { statisticOf } from './statistic-of';
import { type Verdict, type World, without } from './world';

type DifferenceRule = Rule & { measure: DifferenceMeasure };
type Side = { is: 'value'; value: Allowed } | { is: 'missing' } | { is: 'doubtful' };

export function differenceVerdicts(world: World, rule: DifferenceRule): Verdict[] {
  const { measure } = rule;
  return [{ rule: rule.id, subject: subjectOf(measure.quantity, {}), ...judgeDifference(world, rule) }];
}

function judgeDifference(world: World, rule: DifferenceRule): Judgement {
  const { quantity, between } = rule.measure;
  const [left, right] =
    between[0] === 'contractor'
      ? [sideOfLaboratory(world, rule.measure, 'contractor'), sideOfLaboratory(world, rule.measure, 'agency')]
      : [meanAt(world, quantity, {}), recomputedVoids(world)];
  if (left.is === 'missing' || right.is === 'missing') return without('not shown');
  if (left.is === 'doubtful' || right.is === 'doubtful') return without('undecided');
  const place = { world, unit: knownOf(quantity).unit };
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return without(limits.is === 'missing' ? 'not shown' : 'undecided');
  const step = stepFor(place, rule.rounding, limits.value);
  if (step === null) return without('undecided');
  return judged(apart(left.value, right.value), {
    limits: limits.value,
    method: rule.rounding?.method ?? 'absolute',
    step,
    precision: precisionOf(rule, undefined, 1),
  });
}

function sideOfLaboratory(
  world: World,
  { quantity, statistic }: DifferenceMeasure,
  laboratory: 'contractor' | 'agency',
): Side {
  const chosen = select(world, quantity, { laboratory });
  if (chosen.is !== 'readings') return chosen;
  const values = valuesOf(quantity, chosen.readings);
  if (values.is !== 'values') return values;
  const value = statisticOf(values.values, statistic, null);
  return value === null ? { is: 'doubtful' } : { is: 'value', value };
}

/** 100·(Gmm − Gmb)/Gmm from the means of the design's own gravities (AASHTO T 269; from memory, verify). */
export function recomputedVoids(world: World): Side {
  const maximum = meanAt(world, 'maximum-specific-gravity', {});
  const bulk = meanAt(world, 'bulk-specific-gravity-mix', {});
  if (maximum.is === 'missing' || bulk.is === 'missing') return { is: 'missing' };
  if (maximum.is !== 'value' || bulk.is !== 'value') return { is: 'doubtful' };
  if (!isOne(maximum.value) || !isOne(bulk.value)) return { is: 'doubtful' };
  const share = over(minus(maximum.value.low, bulk.value.low), maximum.value.low);
  return { is: 'value', value: one(times(exact(100), share)) };
}

function apart(left: Allowed, right: Allowed): Allowed {
  const low = minus(left.low, right.high);
  const high = minus(left.high, right.low);
  const zero = exact(0);
  const flipped = { low: minus(zero, high), high: minus(zero, low) };
  if (compare(low, zero) >= 0) return { low, high };
  if (compare(high, zero) <= 0) return flipped;
  return { low: zero, high: compare(high, flipped.high) > 0 ? high : flipped.high };
}
