import type { DifferenceMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { passingOfStockpiles } from './blend';
import { type Exact, exact, magnitude, minus, over, times } from './exact';
import { isOne, one } from './interval';
import { type Judgement, judged, measuresOf, precisionOf } from './judged';
import { knownOf } from './known';
import { haveUnits, meanAt, valuesOf } from './quantity-value';
import { isDoubted, select } from './selection';
import { statisticOf } from './statistic-of';
import { subjectOf } from './subject';
import { converted } from './units';
import { countingReadings } from './where';
import { type Verdict, type World, without } from './world';

export type DifferenceRule = Rule & { measure: DifferenceMeasure };
type Side = { is: 'value'; value: Exact } | { is: 'missing' } | { is: 'doubtful' };

export function differenceVerdicts(world: World, rule: DifferenceRule): Verdict[] {
  const { quantity } = rule.measure;
  if (quantity !== 'percent-passing') {
    return [{ rule: rule.id, subject: subjectOf(quantity, {}), ...judgeDifference(world, rule) }];
  }
  const stated = world.record.readings.filter(
    (reading) => reading.quantity === quantity && reading.at.stockpile === undefined,
  );
  const sieves = [...new Set(stated.map(({ at }) => at.sieve!))];
  return sieves.map((sieve) => ({
    rule: rule.id,
    subject: subjectOf(quantity, { sieve }),
    ...judgeDifference(world, rule, sieve),
  }));
}

function judgeDifference(world: World, rule: DifferenceRule, sieve?: number): Judgement {
  const { quantity } = rule.measure;
  const values: Exact[] = [];
  const sides = sieve === undefined ? sidesOf(world, rule.measure) : sidesOfSieve(world, sieve);
  const areOfWorkbook = rule.measure.between[0] === 'reported';
  // Of one workbook a doubtful cell may be the missing one; two laboratories are asked one after the other.
  if (areOfWorkbook && sides.some(({ is }) => is === 'doubtful')) return without('undecided');
  for (const side of sides) {
    if (side.is !== 'value') return without(side.is === 'missing' ? 'not shown' : 'undecided');
    values.push(side.value);
  }
  const [left, right] = values as [Exact, Exact];
  const { unit } = knownOf(quantity);
  const measures = measuresOf({ world, unit }, rule);
  if (measures.is !== 'resolved') return without(measures.is);
  const target = measures.value.limits.unit ?? unit;
  const ends = [converted(left, unit, target), converted(right, unit, target)] as const;
  if (ends[0] === null || ends[1] === null) return without('undecided');
  const apart = magnitude(minus(ends[0], ends[1]));
  return judged(one(apart), measures.value, precisionOf(rule, undefined, 1));
}

function sidesOf(world: World, measure: DifferenceMeasure): Side[] {
  if (measure.between[0] === 'contractor') {
    return [sideOfLaboratory(world, measure, 'contractor'), sideOfLaboratory(world, measure, 'agency')];
  }
  return [recomputedVoids(world), reportedVoids(world)];
}

function sidesOfSieve(world: World, sieve: number): Side[] {
  const computed = passingOfStockpiles(world, sieve);
  const ofBlend = world.record.readings.filter(
    ({ quantity, at }) => quantity === 'percent-passing' && at.stockpile === undefined,
  );
  // The job mix's own gradation, where there is one, is all of it: the blend's does not fill its gaps.
  const ofJobMix = ofBlend.filter(({ at }) => at.trial === 'design');
  const stated = (ofJobMix.length > 0 ? ofJobMix : ofBlend).find(({ at }) => at.sieve === sieve);
  return [computed, stated?.value == null ? null : exact(stated.value)].map((value) =>
    value === null ? { is: 'missing' } : { is: 'value', value },
  );
}

/** One number a side: a censored one leaves the distance open. */
function sideOfLaboratory(
  world: World,
  { quantity, statistic, where }: DifferenceMeasure,
  laboratory: 'contractor' | 'agency',
): Side {
  const chosen = select(world, quantity, { laboratory });
  if (chosen.is !== 'readings') return chosen;
  if (!haveUnits(quantity, chosen.readings)) return { is: 'doubtful' };
  const counting = countingReadings(world, chosen.readings, where ?? []);
  if (counting === null) return { is: 'doubtful' };
  if (counting.length === 0) return { is: 'missing' };
  const values = valuesOf(quantity, counting, knownOf(quantity).unit, true);
  if (values.is !== 'values') return values;
  const value = statisticOf(values.values, statistic, null);
  return value === null || !isOne(value) ? { is: 'doubtful' } : { is: 'value', value: value.low };
}

/** 100·(Gmm − Gmb)/Gmm from the means of the design's own gravities (AASHTO T 269; from memory, verify). */
function recomputedVoids(world: World): Side {
  const maximum = meanAt(world, 'maximum-specific-gravity', {});
  const bulk = meanAt(world, 'bulk-specific-gravity-mix', {});
  if (maximum.is === 'doubtful' || bulk.is === 'doubtful') return { is: 'doubtful' };
  if (maximum.is === 'missing' || bulk.is === 'missing') return { is: 'missing' };
  if (!isOne(maximum.value) || !isOne(bulk.value)) return { is: 'doubtful' };
  const share = over(minus(maximum.value.low, bulk.value.low), maximum.value.low);
  return { is: 'value', value: times(exact(100), share) };
}

function reportedVoids(world: World): Side {
  if (isDoubted(world, 'air-voids', {})) return { is: 'doubtful' };
  const reported = world.record.readings.find(({ quantity }) => quantity === 'air-voids');
  return reported?.value == null ? { is: 'missing' } : { is: 'value', value: exact(reported.value) };
}
