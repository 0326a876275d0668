import type { Reading } from '#rules/record';
import type { CreepComplianceMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { exact, over } from './exact';
import { type Allowed, isOne, meanOf, one } from './interval';
import { type Judgement, judged, precisionOf } from './judged';
import { limitsOf, stepFor } from './limits';
import { allowedOf } from './quantity-value';
import { select } from './selection';
import { type Verdict, type World, without } from './world';

type CreepRule = Rule & { measure: CreepComplianceMeasure };

export function creepVerdicts(world: World, rule: CreepRule): Verdict[] {
  return [{ rule: rule.id, subject: 'design point', ...judgeCreep(world, rule) }];
}

/** Measured points only: no curve is drawn through them here. */
function judgeCreep(world: World, rule: CreepRule): Judgement {
  const { temperature, time, stress } = rule.measure;
  const wanted = { trial: 'design', temperature, ...(stress === undefined ? {} : { stress }) };
  const pooled = { pooled: ['stress', 'time'] };
  const compliance = select(world, 'creep-compliance', { ...wanted, time }, pooled);
  const strain = select(world, 'creep-strain', { ...wanted, time }, pooled);
  const found = [compliance, strain];
  const points: Allowed[] = [];
  for (const each of found) {
    for (const reading of each.is === 'readings' ? each.readings : []) {
      const point = pointOf(reading);
      if (point === null || !isOne(point)) return without('undecided');
      points.push(point);
    }
  }
  if (points.length === 0) {
    return without(found.some(({ is }) => is === 'doubtful') ? 'undecided' : 'not shown');
  }
  const place = { world, unit: '1/GPa' };
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return without(limits.is === 'missing' ? 'not shown' : 'undecided');
  const step = stepFor(place, rule.rounding, limits.value);
  if (step === null) return without('undecided');
  return judged(meanOf(points), {
    limits: limits.value,
    method: rule.rounding?.method ?? 'absolute',
    step,
    precision: precisionOf(rule, undefined, points.length),
  });
}

/** D in 1/GPa: a strain in µε over a stress in kPa is the same number. */
function pointOf(reading: Reading): Allowed | null {
  if (reading.quantity === 'creep-compliance') return allowedOf(reading.quantity, reading);
  const { stress } = reading.at;
  if (stress === undefined || stress === 0 || reading.value === null) return null;
  return one(over(exact(reading.value), exact(stress)));
}
