import type { AttributeMeasure } from '#rules/rule-sets/measure';
import type { Rule } from '#rules/rule-sets/schema';
import { attributeFact, type Scalar, sameScalar } from './attribute';
import { exact } from './exact';
import { one } from './interval';
import { type Judgement, judged, precisionOf } from './judged';
import { limitsOf, stepFor } from './limits';
import { rowFor, tableOf } from './table';
import { type Verdict, type World, without } from './world';

type AttributeRule = Rule & { measure: AttributeMeasure };

export function attributeVerdicts(world: World, rule: AttributeRule): Verdict[] {
  return [{ rule: rule.id, subject: 'mix', ...judgeAttribute(world, rule) }];
}

function judgeAttribute(world: World, rule: AttributeRule): Judgement {
  const fact = attributeFact(world, rule.measure.attribute);
  if (fact.is !== 'value') return without(fact.is === 'missing' ? 'not shown' : 'undecided');
  if (rule.limit.present) return without('pass');
  if (rule.limit.oneOf !== undefined) return judgeAllowed(world, fact.value, rule.limit.oneOf);
  if (typeof fact.value !== 'number') return without('undecided');
  const place = { world, unit: null };
  const limits = limitsOf(place, rule.limit);
  if (limits.is !== 'resolved') return without(limits.is === 'missing' ? 'not shown' : 'undecided');
  const step = stepFor(place, rule.rounding, limits.value);
  if (step === null) return without('undecided');
  return judged(one(exact(fact.value)), {
    limits: limits.value,
    method: rule.rounding?.method ?? 'absolute',
    step,
    precision: precisionOf(rule, undefined, 1),
  });
}

function judgeAllowed(world: World, value: Scalar, oneOf: NonNullable<Rule['limit']['oneOf']>): Judgement {
  let allowed: Scalar[] = [];
  if (Array.isArray(oneOf)) allowed = oneOf;
  else {
    const found = rowFor(world, tableOf(world, oneOf.table), undefined);
    if (found.is === 'no row') return without('undecided');
    const cell = found.row[oneOf.column];
    if (Array.isArray(cell)) allowed = cell;
    else if (typeof cell === 'string' || typeof cell === 'number' || typeof cell === 'boolean')
      allowed = [cell];
    else return without('undecided');
  }
  return without(allowed.some((each) => sameScalar(each, value)) ? 'pass' : 'fail');
}
